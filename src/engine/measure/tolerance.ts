import { DomainError } from "../../base/errors.ts";

/** What errors of the stations' positions do, every coordinate off by the same rms and independent of the others. */
export interface PositionTolerance {
  /** Phase error of a baseline, rms radians. */
  readonly phaseRad: number;
  /** What remains of a point source's peak: exp(−σ²/2). */
  readonly coherence: number;
  /** Largest first-order change of a beam width, as a fraction. */
  readonly widthFraction: number;
}

/**
 * How far figures move for an error of station positions that nobody knows of.
 *
 * - Each baseline is the difference of two stations, so its length toward the source is off by √2·rms: phase 2π√2·rms/λ.
 * - Visibilities with independent phase errors of σ lose exp(−σ²/2) of the peak (Thompson, Moran & Swenson, 3rd ed., ch. 13).
 * - Widths follow the projected baselines; a change of √2·rms in the shortest side of the rms baseline bounds their fraction.
 *
 * Errors that are known, as from an astrometric solution, are taken out and cost nothing.
 *
 * @param errorM - Rms of every coordinate, metres.
 * @param rmsBaselineM - Root mean square projected baseline of the samples along the narrower direction, metres.
 */
export function positionTolerance(errorM: number, wavelengthM: number, rmsBaselineM: number): PositionTolerance {
  if (!(errorM >= 0 && Number.isFinite(errorM))) throw new DomainError("errorM", errorM, "metres, 0 or more");
  if (!(wavelengthM > 0)) throw new DomainError("wavelengthM", wavelengthM, "metres above 0");
  if (!(rmsBaselineM > 0)) throw new DomainError("rmsBaselineM", rmsBaselineM, "metres above 0");
  const phaseRad = (2 * Math.PI * Math.SQRT2 * errorM) / wavelengthM;
  return { phaseRad, coherence: phaseCoherence(phaseRad), widthFraction: (Math.SQRT2 * errorM) / rmsBaselineM };
}

/** Mean of e^{iφ} for Gaussian phases of this rms: exp(−σ²/2). */
export const phaseCoherence = (phaseRad: number): number => Math.exp((-phaseRad * phaseRad) / 2);
