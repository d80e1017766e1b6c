import { DomainError } from "../../base/errors.ts";

/** Distance beyond which a wave over an aperture is flat to λ/16, metres: 2D²/λ (Fraunhofer; IEEE Std 145). For an array, D is its longest baseline. */
export function fraunhoferM(apertureM: number, wavelengthM: number): number {
  if (!(apertureM >= 0)) throw new DomainError("apertureM", apertureM, "metres, 0 or more");
  if (!(wavelengthM > 0)) throw new DomainError("wavelengthM", wavelengthM, "metres above 0");
  return (2 * apertureM ** 2) / wavelengthM;
}

/** Scale of the field that a plane image of a baseline covers, radians: √(λ/b) (Cornwell & Perley 1992, A&A 261, 353). */
export const planeFieldRad = (wavelengthM: number, baselineM: number): number => Math.sqrt(wavelengthM / baselineM);
