import { wrapTurn } from "./rotation.ts";

const J2000 = 2_451_545;
const CENTURY = 36_525;
const ARCSEC = Math.PI / 648_000;

/** A direction on the sky. */
export interface Equatorial {
  readonly raRad: number;
  readonly decRad: number;
}

/**
 * Brings a direction from the mean equator and equinox of J2000.0 to that of a date.
 *
 * @param raRad, decRad - Mean place of J2000, radians.
 * @param ttDay, ttFrac - Julian date in two parts; UTC serves.
 * @returns Mean place of date. Nutation and aberration (< 0.01°) are left out.
 *
 * The equatorial angles ζ_A, z_A, θ_A of the IAU 2006 precession (Capitaine, Wallace & Chapront, Astron. Astrophys. 412
 * (2003) 567, eq. 40), good to a milliarcsecond within a few centuries of J2000.
 */
export function precessFromJ2000(raRad: number, decRad: number, ttDay: number, ttFrac: number): Equatorial {
  const t = (ttDay - J2000 + ttFrac) / CENTURY;
  const zeta = ARCSEC * (2.650545 + (2306.083227 + (0.2988499 + (0.01801828 + (-0.000005971 - 0.0000003173 * t) * t) * t) * t) * t);
  const z = ARCSEC * (-2.650545 + (2306.077181 + (1.0927348 + (0.01826837 + (-0.000028596 - 0.0000002904 * t) * t) * t) * t) * t);
  const theta = ARCSEC * (2004.191903 + (-0.4294934 + (-0.04182264 + (-0.000007089 - 0.0000001274 * t) * t) * t) * t) * t;
  const ra = raRad + zeta;
  const a = Math.cos(decRad) * Math.sin(ra);
  const b = Math.cos(theta) * Math.cos(decRad) * Math.cos(ra) - Math.sin(theta) * Math.sin(decRad);
  const c = Math.sin(theta) * Math.cos(decRad) * Math.cos(ra) + Math.cos(theta) * Math.sin(decRad);
  // Near the poles the arcsine loses half its digits; the arctangent of both parts keeps them.
  return { raRad: wrapTurn(Math.atan2(a, b) + z), decRad: Math.atan2(c, Math.hypot(a, b)) };
}
