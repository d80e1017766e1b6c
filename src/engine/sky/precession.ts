import { checkFinite, checkQuarter } from "./checks.ts";
import { centuriesSinceJ2000 } from "./epoch.ts";
import { wrapTurn } from "./rotation.ts";

const ARCSEC = Math.PI / 648_000;

/** A direction on the sky. */
export interface Equatorial {
  /** [0, 2π); 0 at a pole, where it has no meaning. */
  readonly raRad: number;
  readonly decRad: number;
}

/**
 * Brings a direction from the mean equator and equinox of J2000.0 to those of a date.
 *
 * @param raRad - Mean right ascension of J2000, radians, any finite value.
 * @param decRad - Mean declination of J2000, radians, [−π/2, π/2].
 * @param ttDay - Julian date TT in two parts. UTC serves: precession moves 0.1 mas in the minute between them.
 * @param ttFrac - Goes with ttDay.
 * @returns Mean place of date. Nutation and aberration (each < 0.01°), proper motion and the 23 mas between ICRS and
 *   mean J2000 axes are left out.
 * @throws {@link DomainError} for a declination past a pole or a value that is not finite.
 *
 * The equatorial angles ζ_A, z_A, θ_A of the IAU 2006 precession: Capitaine, Wallace & Chapront, Astron. Astrophys. 412
 * (2003) 567, eq. 40 (the equation's number from memory). Within a century of J2000 the four-angle form of IAU 2006 agrees
 * within 5e-12 rad; the polynomials are made for a few centuries around it.
 */
export function precessFromJ2000(raRad: number, decRad: number, ttDay: number, ttFrac: number): Equatorial {
  checkFinite({ raRad, ttDay, ttFrac });
  checkQuarter({ decRad });
  const t = centuriesSinceJ2000(ttDay, ttFrac);
  const zeta = ARCSEC * (2.650545 + (2306.083227 + (0.2988499 + (0.01801828 + (-0.000005971 - 0.0000003173 * t) * t) * t) * t) * t);
  const z = ARCSEC * (-2.650545 + (2306.077181 + (1.0927348 + (0.01826837 + (-0.000028596 - 0.0000002904 * t) * t) * t) * t) * t);
  const theta = ARCSEC * (2004.191903 + (-0.4294934 + (-0.04182264 + (-0.000007089 - 0.0000001274 * t) * t) * t) * t) * t;
  const ra = raRad + zeta;
  const a = Math.cos(decRad) * Math.sin(ra);
  const b = Math.cos(theta) * Math.cos(decRad) * Math.cos(ra) - Math.sin(theta) * Math.sin(decRad);
  const c = Math.sin(theta) * Math.cos(decRad) * Math.cos(ra) + Math.cos(theta) * Math.sin(decRad);
  // Near the poles the arcsine loses half its digits; the arctangent of both parts keeps them.
  const flat = Math.hypot(a, b);
  return { raRad: flat === 0 ? 0 : wrapTurn(Math.atan2(a, b) + z), decRad: Math.atan2(c, flat) };
}
