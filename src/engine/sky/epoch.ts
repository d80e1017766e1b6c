/** The epoch J2000.0 as a Julian date. */
export const J2000_DAY = 2_451_545;

/** Julian centuries since J2000.0 of a Julian date in two parts. */
export function centuriesSinceJ2000(day: number, frac: number): number {
  return (day - J2000_DAY + frac) / 36_525;
}
