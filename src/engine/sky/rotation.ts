/** The J2000.0 epoch as a Julian date, and days in a Julian century. */
const J2000 = 2_451_545;
const CENTURY = 36_525;
const TURN = 2 * Math.PI;

/**
 * Earth rotation angle, radians in [0, 2π).
 *
 * @param ut1Day, ut1Frac - Julian date UT1 in two parts, whose sum it is: one double resolves only 40 µs.
 * Source: IAU 2000 Resolution B1.8: 2π(0.7790572732640 + 1.00273781191135448·(JD − 2451545.0)).
 */
export function earthRotationAngle(ut1Day: number, ut1Frac: number): number {
  const days = ut1Day - J2000 + ut1Frac;
  const fraction = (ut1Day % 1) + (ut1Frac % 1);
  // Whole days are whole turns and are left out, so that the small rate alone multiplies a large number.
  return wrapTurn(TURN * (fraction + 0.779057273264 + 0.00273781191135448 * days));
}

/**
 * Greenwich mean sidereal time by IAU 2006, radians in [0, 2π).
 *
 * @param ttDay, ttFrac - Terrestrial time; UT1 serves, being within 70 s: the polynomial then errs by 1e-9 rad.
 * Source: Capitaine, Wallace & Chapront, Astron. Astrophys. 412 (2003) 567, eq. 42.
 */
export function greenwichMeanSiderealTime(ut1Day: number, ut1Frac: number, ttDay = ut1Day, ttFrac = ut1Frac): number {
  const t = (ttDay - J2000 + ttFrac) / CENTURY;
  const arcsec = 0.014506 + (4612.156534 + (1.3915817 + (-0.00000044 + (-0.000029956 - 0.0000000368 * t) * t) * t) * t) * t;
  return wrapTurn(earthRotationAngle(ut1Day, ut1Frac) + (arcsec * Math.PI) / 648_000);
}

/** An angle in [0, 2π). */
export function wrapTurn(angle: number): number {
  const wrapped = angle - TURN * Math.floor(angle / TURN);
  return wrapped >= 0 && wrapped < TURN ? wrapped : 0;
}
