/** Rectangle of a plot inside its figure, px. */
export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

export interface Size {
  readonly width: number;
  readonly height: number;
}

export interface Tick {
  /** px along its axis. */
  readonly at: number;
  readonly label: string;
  /** Second line under the label. */
  readonly below?: string;
}

/** The same figure in words and in numbers, for those who do not see it. */
export interface TextEquivalent {
  readonly summary: string;
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** SVG path through points, with breaks where one is not finite. One decimal: finer than a screen shows. */
export function pathThrough(count: number, x: (k: number) => number, y: (k: number) => number): string {
  let d = "";
  let open = false;
  for (let k = 0; k < count; k++) {
    const px = x(k);
    const py = y(k);
    if (!Number.isFinite(px) || !Number.isFinite(py)) {
      open = false;
      continue;
    }
    d += `${open ? "L" : "M"}${px.toFixed(1)} ${py.toFixed(1)}`;
    open = true;
  }
  return d;
}

/** 1, 2 or 5 times a power of ten, at or below a value. */
export function niceBelow(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value) + 1e-9);
  const lead = value / power + 1e-9;
  return power * (lead >= 5 ? 5 : lead >= 2 ? 2 : 1);
}

/** Multiples of `step` inside [from, to], each rounded to the step so that 0.30000000000000004 is 0.3. */
export function multiples(from: number, to: number, step: number): number[] {
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, k) => Number(((first + k) * step).toPrecision(12)));
}
