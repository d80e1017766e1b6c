/** What a number field shows and how it reads what is typed. */
export interface FieldModel<T = number> {
  /** Name for those who do not see where it stands. */
  readonly label: string;
  /** The value as text, without its unit. */
  readonly text: string;
  readonly unit: string;
  /** The value, in the unit of the plan. */
  readonly value: number;
  /** Width in characters. */
  readonly width: number;
  /** Worth of one unit of each run of digits, for the arrow keys. */
  readonly sizes: readonly number[];
  /** @throws {@link DomainError} for what it cannot read or will not take. */
  readonly parse: (text: string) => T;
}

/** One handle of a slider: its place and what it says. */
export interface Handle {
  readonly label: string;
  /** 0 to 1 along the track. */
  readonly at: number;
  readonly text: string;
  /** One press of an arrow key, as a fraction of the track. */
  readonly step: number;
}

export interface SliderModel {
  readonly handles: readonly Handle[];
  readonly ticks: readonly { readonly at: number; readonly label: string }[];
  /** Parts that can be reached, drawn solid; the rest is dotted. */
  readonly reach: readonly (readonly [from: number, to: number])[];
  /** The part between two handles is filled. */
  readonly filled: boolean;
}
