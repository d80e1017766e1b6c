import { checkFinite } from "./checks.ts";
import { centuriesSinceJ2000, J2000_DAY } from "./epoch.ts";

const TURN = 2 * Math.PI;

/**
 * Earth rotation angle, radians in [0, 2π).
 *
 * @param ut1Day - Julian date UT1 in two parts, whose sum it is: one double resolves only 40 µs. Best kept are
 *   digits with the first part at a midnight or noon and the second within a day. UTC serves within 0.9 s of time, 14″.
 * @param ut1Frac - Goes with ut1Day.
 * @throws {@link DomainError} for a value that is not finite.
 *
 * Source: IAU 2000 Resolution B1.8: 2π(0.7790572732640 + 1.00273781191135448·(JD UT1 − 2451545.0)).
 */
export function earthRotationAngle(ut1Day: number, ut1Frac: number): number {
  checkFinite({ ut1Day, ut1Frac });
  const days = ut1Day - J2000_DAY + ut1Frac;
  // Whole days are whole turns and are left out, so that the small rate alone multiplies a large number.
  const fraction = (ut1Day % 1) + (ut1Frac % 1);
  return wrapTurn(TURN * (fraction + 0.779057273264 + 0.00273781191135448 * days));
}

/**
 * Greenwich mean sidereal time by IAU 2006, radians in [0, 2π).
 *
 * @param ut1Day - Julian date UT1 in two parts; UTC serves as for the Earth rotation angle.
 * @param ut1Frac - Goes with ut1Day.
 * @param ttDay - Terrestrial time. Left out, UT1 takes its place: 70 s apart, as now, that errs by 5e-10 rad.
 * @param ttFrac - Goes with ttDay.
 * @throws {@link DomainError} for a value that is not finite.
 *
 * Source: Capitaine, Wallace & Chapront, Astron. Astrophys. 412 (2003) 567, eq. 42 (the equation's number from memory);
 * the polynomial is that of IERS Conventions (2010), chapter 5. Apparent time, which needs nutation, is left out (1.2 s at most).
 */
export function greenwichMeanSiderealTime(ut1Day: number, ut1Frac: number, ttDay = ut1Day, ttFrac = ut1Frac): number {
  checkFinite({ ttDay, ttFrac });
  const t = centuriesSinceJ2000(ttDay, ttFrac);
  const arcsec = 0.014506 + (4612.156534 + (1.3915817 + (-0.00000044 + (-0.000029956 - 0.0000000368 * t) * t) * t) * t) * t;
  return wrapTurn(earthRotationAngle(ut1Day, ut1Frac) + (arcsec * Math.PI) / 648_000);
}

/**
 * Hour angle of a source at a meridian, radians in (−π, π], west positive.
 *
 * @param raRad - Right ascension of date, radians.
 * @param lonRad - Longitude of the meridian, radians, east positive.
 */
export function hourAngleAt(raRad: number, lonRad: number, ut1Day: number, ut1Frac: number): number {
  checkFinite({ raRad, lonRad });
  const angle = wrapTurn(greenwichMeanSiderealTime(ut1Day, ut1Frac) + lonRad - raRad);
  return angle > Math.PI ? angle - TURN : angle;
}

/** A finite angle in [0, 2π), never −0. */
export function wrapTurn(angle: number): number {
  const wrapped = angle - TURN * Math.floor(angle / TURN);
  // A tiny negative angle rounds up to the whole turn, which is 0.
  return wrapped > 0 && wrapped < TURN ? wrapped : 0;
}
