/**
 * How much one step of the digit at the caret is worth: in "21.12" with the caret after the second digit, one unit.
 *
 * @param caret - Characters before the caret. The digit before it is stepped, else the one after it.
 * @param sizes - Worth of one whole unit of each run of digits: [1, 1/60, 1/3600] for degrees, minutes, seconds. The last holds on.
 * @returns undefined when there is no digit at the caret.
 */
export function caretStep(text: string, caret: number, sizes: readonly number[]): number | undefined {
  const digit = (k: number): boolean => /\d/.test(text.charAt(k));
  const at = digit(caret - 1) ? caret - 1 : digit(caret) ? caret : -1;
  if (at < 0) return undefined;
  let run = 0;
  for (const found of text.matchAll(/\d+(\.\d+)?/g)) {
    const end = found.index + found[0].length;
    if (at < end) {
      const point = found[0].indexOf(".");
      const ones = found.index + (point < 0 ? found[0].length : point) - 1;
      const place = at <= ones ? ones - at : ones - at + 1;
      return 10 ** place * (sizes[Math.min(run, sizes.length - 1)] ?? 1);
    }
    run += 1;
  }
  return undefined;
}
