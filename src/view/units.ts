import { decimalsFor, fixed, joined, plain } from "./numbers.ts";

/** What kind of thing a quantity is; it decides unit and decimals. */
export type Kind =
  | "angle"
  | "degrees"
  | "fraction"
  | "ratio"
  | "times"
  | "length"
  | "hours"
  | "flux"
  | "temperature"
  | "count"
  | "frequency"
  | "seconds"
  | "wavelengths";

/** One way of writing a kind: `value / size` is the figure shown. */
export interface Unit {
  readonly word: string;
  readonly size: number;
  readonly decimals: number;
}

const steps: { readonly [K in Kind]?: readonly (readonly [from: number, word: string, size: number])[] } = {
  angle: [
    [0, "µas", 1e-6],
    [5e-4, "mas", 1e-3],
    [0.1, "″", 1],
    [600, "′", 60],
    [36_000, "°", 3600],
  ],
  length: [
    [0, "mm", 1e-3],
    [0.01, "cm", 1e-2],
    [1, "m", 1],
    [1000, "km", 1000],
  ],
  flux: [
    [0, "nJy", 1e-9],
    [1e-6, "µJy", 1e-6],
    [1e-3, "mJy", 1e-3],
    [1, "Jy", 1],
  ],
  temperature: [
    [0, "µK", 1e-6],
    [1e-3, "mK", 1e-3],
    [1, "K", 1],
  ],
  frequency: [
    [0, "Hz", 1],
    [1e3, "kHz", 1e3],
    [1e6, "MHz", 1e6],
    [1e9, "GHz", 1e9],
  ],
  seconds: [
    [0, "ms", 1e-3],
    [1, "s", 1],
  ],
  wavelengths: [
    [0, "λ", 1],
    [1e3, "kλ", 1e3],
    [1e6, "Mλ", 1e6],
    [1e9, "Gλ", 1e9],
  ],
};

const one: { readonly [K in Kind]?: Unit } = {
  degrees: { word: "°", size: 1, decimals: 1 },
  fraction: { word: "%", size: 0.01, decimals: 1 },
  ratio: { word: "", size: 1, decimals: 2 },
  times: { word: "×", size: 1, decimals: 2 },
  hours: { word: "h", size: 1, decimals: 1 },
  count: { word: "", size: 1, decimals: 0 },
};

/**
 * The unit a value of this size is written in, with decimals for three figures. Take it from a limit or a settled value and
 * write every live value with it: then the width does not change while a station is dragged.
 */
export function unitFor(kind: Kind, like: number): Unit {
  const only = one[kind];
  if (only) return only;
  const table = steps[kind] as readonly (readonly [number, string, number])[];
  // A figure that would round up to the next unit's start belongs to that unit.
  const size = Math.abs(like) * (1 + 1e-9);
  const [, word, unit] = table.findLast(([from]) => size >= from) ?? table[0];
  return { word, size: unit, decimals: decimalsFor(like / unit, 2) };
}

/** A value in a given unit, without the unit's word. */
export const figure = (value: number, unit: Unit): string => fixed(value / unit.size, unit.decimals);

/** A value with its unit. */
export const withUnit = (value: number, unit: Unit): string => joined(figure(value, unit), unit.word);

/** A value in the unit that suits it. */
export const shownAs = (kind: Kind, value: number): string => withUnit(value, unitFor(kind, value));

/** A frequency in Hz, three figures unless more are asked for. */
export function frequencyText(hertz: number, figures = 4): string {
  for (const [size, word] of [
    [1e12, "THz"],
    [1e9, "GHz"],
    [1e6, "MHz"],
    [1e3, "kHz"],
  ] as const) {
    if (hertz >= size * (1 - 1e-9)) return joined(plain(hertz / size, figures), word);
  }
  return joined(plain(hertz, figures), "Hz");
}

/** A wavelength in metres, three figures unless more are asked for. */
export function wavelengthText(metres: number, figures = 3): string {
  for (const [size, word] of [
    [1000, "km"],
    [1, "m"],
    [0.01, "cm"],
    [0.001, "mm"],
  ] as const) {
    if (metres >= size * (1 - 1e-9)) return joined(plain(metres / size, figures), word);
  }
  return joined(plain(metres / 1e-6, figures), "µm");
}
