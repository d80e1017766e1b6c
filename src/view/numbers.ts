/** U+2212, as wide as a digit. */
const MINUS = "\u2212";
const NO_BREAK = "\u00a0";

/** A number with a fixed count of decimals and a true minus; a value that rounds to zero has no sign. */
export function fixed(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(decimals);
  return value < 0 && Number(text) !== 0 ? MINUS + text : text;
}

/** The same with a plus where it is positive. */
export function signed(value: number, decimals: number): string {
  const text = fixed(value, decimals);
  return value > 0 && Number(text) !== 0 ? `+${text}` : text;
}

/** Decimals that show about three figures of a value of this size, at most `most`. */
export function decimalsFor(size: number, most = 4): number {
  if (!(Math.abs(size) > 0)) return 0;
  return Math.max(0, Math.min(most, 2 - Math.floor(Math.log10(Math.abs(size)) + 1e-9)));
}

/** A number with three figures and no trailing zeros. */
export function plain(value: number, figures = 3): string {
  const rounded = Number(value.toPrecision(figures));
  return rounded < 0 ? MINUS + String(-rounded) : String(rounded);
}

/** A unit word is set off by a no-break space; the signs of angle are not. */
export function joined(text: string, unit: string): string {
  if (unit === "") return text;
  return /^[″′°]/.test(unit) ? text + unit : text + NO_BREAK + unit;
}
