import { BOLTZMANN, JANSKY, SPEED_OF_LIGHT } from "../../base/constants.ts";

/** What turns a sum over samples into a noise level. */
export interface NoiseTerms {
  /** Σ over the samples that count, every channel, of 1/(SEFD_i·SEFD_j), Jy⁻². */
  readonly inverseSefdSquares: number;
  readonly channelWidthHz: number;
  readonly sampleS: number;
  /** 1, or 2 for Stokes I from two. */
  readonly polarizations: 1 | 2;
  /** Of the signal chain, (0, 1]. */
  readonly efficiency: number;
  readonly repeats: number;
  /** By which the weighting raises the noise over natural weights. */
  readonly weightingFactor: number;
}

/**
 * Thermal noise of the image, Jy a beam: [n_pol Σ 2 Δν Δt η²/(SEFD_i SEFD_j)]^−½ × weighting factor/√repeats
 * (Thompson, Moran & Swenson, 3rd ed., ch. 6).
 */
export function imageNoiseJy(terms: NoiseTerms): number {
  const { inverseSefdSquares, channelWidthHz, sampleS, polarizations, efficiency, repeats, weightingFactor } = terms;
  const information = polarizations * 2 * channelWidthHz * sampleS * efficiency ** 2 * inverseSefdSquares;
  return weightingFactor / Math.sqrt(information * repeats);
}

/** Solid angle of an elliptical Gaussian beam, sr: π/(4 ln 2)·major·minor (FWHM, radians). */
export function beamSolidAngle(majorRad: number, minorRad: number): number {
  return (Math.PI * majorRad * minorRad) / (4 * Math.LN2);
}

/** Brightness temperature of a flux density a beam, K, by the Rayleigh–Jeans law: S λ²/(2kΩ). */
export function brightnessK(fluxJy: number, frequencyHz: number, solidAngleSr: number): number {
  const wavelengthM = SPEED_OF_LIGHT / frequencyHz;
  return (fluxJy * JANSKY * wavelengthM ** 2) / (2 * BOLTZMANN * solidAngleSr);
}
