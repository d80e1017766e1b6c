import { BOLTZMANN, JANSKY } from "../../base/constants.ts";
import { DomainError } from "../../base/errors.ts";

/** Effective area of a round dish, m². @param efficiency - Of the aperture, (0, 1]. */
export function effectiveAreaM2(diameterM: number, efficiency: number): number {
  if (!(diameterM > 0 && Number.isFinite(diameterM))) throw new DomainError("diameterM", diameterM, "metres above 0");
  if (!(efficiency > 0 && efficiency <= 1)) throw new DomainError("efficiency", efficiency, "a fraction in (0, 1]");
  return (efficiency * Math.PI * diameterM ** 2) / 4;
}

/** Jansky of a source that doubles one kelvin of system temperature: 2k/A (Thompson, Moran & Swenson, 3rd ed., ch. 1). */
export const janskyPerKelvin = (areaM2: number): number => (2 * BOLTZMANN) / areaM2 / JANSKY;

/** System equivalent flux density of a dish, Jy: 2kT/A. */
export function sefdJy(systemK: number, diameterM: number, efficiency: number): number {
  if (!(systemK > 0 && Number.isFinite(systemK))) throw new DomainError("systemK", systemK, "a temperature above 0 K");
  return systemK * janskyPerKelvin(effectiveAreaM2(diameterM, efficiency));
}

/** What a surface of rms error leaves of an aperture's efficiency: exp(−(4πε/λ)²) (Ruze 1966, Proc. IEEE 54, 633). */
export const ruzeFactor = (surfaceRmsM: number, wavelengthM: number): number =>
  Math.exp(-(((4 * Math.PI * surfaceRmsM) / wavelengthM) ** 2));

/** Radiance of a black body over what the Rayleigh–Jeans law gives it: x/(e^x − 1), x = hν/kT (Planck 1901). */
export function planckFactor(frequencyHz: number, temperatureK: number): number {
  const x = (PLANCK * frequencyHz) / (BOLTZMANN * temperatureK);
  return x === 0 ? 1 : x / Math.expm1(x);
}

/** Planck constant, J s. Exact (SI 2019). */
const PLANCK = 6.62607015e-34;
