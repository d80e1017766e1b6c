/**
 * JSON whose figures are rounded to 9 significant digits, so that page and terminal print the same bytes.
 * Typed arrays become arrays. NaN and infinities do not occur in results; they become null, as JSON demands.
 */
export function roundedJson(value: unknown, indent?: number): string {
  return JSON.stringify(
    value,
    (_key, x: unknown) => (typeof x === "number" ? rounded(x) : ArrayBuffer.isView(x) ? Array.from(x as Float64Array) : x),
    indent,
  );
}

/** Nine significant digits; −0 becomes 0. */
export function rounded(x: number): number | null {
  return Number.isFinite(x) ? Number(x.toPrecision(9)) + 0 : null;
}
