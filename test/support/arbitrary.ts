import fc from "fast-check";

/** Every property draws from this seed, so that a failure is the same tomorrow. */
export const SEED = { seed: 20260101 };

const real = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

/** Any direction along a circle, several turns of it, −0 included. */
export const arbAngle = real(-20, 20);
/** Latitude, declination or elevation; the poles, the equator and −0 come up often. */
export const arbQuarter = fc.oneof(
  { weight: 4, arbitrary: real(-Math.PI / 2, Math.PI / 2) },
  fc.constantFrom(-Math.PI / 2, -0, 0, Math.PI / 2),
);
/** Longitude in [−π, π]; Greenwich and the antimeridian come up often. */
export const arbLongitude = fc.oneof({ weight: 4, arbitrary: real(-Math.PI, Math.PI) }, fc.constantFrom(-Math.PI, -0, 0, Math.PI));
/** Where stations stand, metres. */
export const arbHeightM = real(-500, 9000);
/** N vectors within the Earth's diameter, (N, 3) row-major, metres; none so tiny that it leaves the normal numbers. */
export const arbXyzM = fc
  .array(fc.tuple(...Array.from({ length: 3 }, () => real(-1.3e7, 1.3e7))), { minLength: 1, maxLength: 12 })
  .map((rows) => Float64Array.from(rows.flat(), (x) => (Math.abs(x) < 1e-200 ? 0 : x)));
/** A length to compare rounding with, metres. */
export const arbLengthM = real(-2e7, 2e7);

/** Distance between two points. */
export const apart = (a: ArrayLike<number>, b: ArrayLike<number>): number => Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2]);

/** Smallest difference between two angles, whole turns aside. */
export function turnApart(a: number, b: number): number {
  const off = Math.abs(a - b) % (2 * Math.PI);
  return Math.min(off, 2 * Math.PI - off);
}
