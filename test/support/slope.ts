/**
 * Derivative by central differences of eighth order over nine points (Fornberg, Math. Comp. 51 (1988) 699, table 1): the
 * remainder is step⁸/630 of the ninth derivative.
 */
export function derivative(f: (x: number) => number, x: number, step: number): number {
  const weights = [4 / 5, -1 / 5, 4 / 105, -1 / 280];
  return weights.reduce((sum, weight, k) => sum + weight * (f(x + (k + 1) * step) - f(x - (k + 1) * step)), 0) / step;
}
