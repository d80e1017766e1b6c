/** The smallest of 1, 2 and 5 times a power of ten that is at least `least` (> 0). */
export function niceAtLeast(least: number): number {
  const power = 10 ** Math.floor(Math.log10(least) + 1e-12);
  for (const step of [1, 2, 5, 10]) if (step * power >= least * (1 - 1e-12)) return tidy(step * power);
  return tidy(10 * power);
}

/** The largest of 1, 2 and 5 times a power of ten that is at most `most` (> 0). */
export function niceAtMost(most: number): number {
  const power = 10 ** Math.floor(Math.log10(most) + 1e-12);
  for (const step of [5, 2, 1]) if (step * power <= most * (1 + 1e-12)) return tidy(step * power);
  return tidy(power);
}

/** 5 × 10⁻³ computed as a product is 0.005000…1: twelve figures bring back the number meant. */
const tidy = (x: number): number => Number(x.toPrecision(12));
