import { RAD_PER_HOUR, SIDEREAL_RATE } from "../../base/constants.ts";
import { DomainError } from "../../base/errors.ts";

/**
 * Everything the engine needs to know of one layout observing one source.
 *
 * Vectors are in the XYZ frame of the plan's origin (Thompson, Moran & Swenson, 3rd ed., §4.1): X toward hour angle 0 on
 * the equator, Y toward hour angle −6 h, Z toward the pole. N stations, T times, C channels.
 */
export interface Track {
  /** (N, 3) row-major, metres. */
  readonly stationXyzM: Float64Array;
  /** (N, 3) row-major, unit vectors along each station's own ellipsoid normal. */
  readonly normals: Float64Array;
  /** (N) dish diameters, metres. */
  readonly diameterM: Float64Array;
  /** (N) system equivalent flux densities, Jy; null when one is not known, and then all natural weights are 1. */
  readonly sefdJy: Float64Array | null;
  /** (N) lowest and highest elevation at which a station sees the source, radians. */
  readonly lowestRad: Float64Array;
  readonly highestRad: Float64Array;
  /** Of date, radians. */
  readonly decRad: number;
  /** (T) hour angles at the origin's meridian, radians, at the midpoints of the samples. */
  readonly hourAngleRad: Float64Array;
  /** Length of one sample, SI seconds. */
  readonly sampleS: number;
  readonly frequencyHz: number;
  /** (C) channel centres, hertz. */
  readonly channelHz: Float64Array;
  readonly channelWidthHz: number;
}

/**
 * Times of the samples in a window of hour angle.
 *
 * @param fromH - Start of the window, sidereal hours.
 * @param toH - End of the window, ≥ `fromH`; equal for a snapshot, which is one sample lasting `integrationS`.
 * @param integrationS - Wanted length of a sample, SI seconds; the real one is the nearest that divides the window.
 * @returns Midpoints in radians and the true length of a sample in SI seconds (1 s of time is 1.00273790935 s of hour angle).
 * @throws {@link DomainError} for a reversed window or a length that is not positive.
 */
export function sampleTimes(fromH: number, toH: number, integrationS: number): { hourAngleRad: Float64Array; sampleS: number } {
  if (!(toH >= fromH)) throw new DomainError("hourAngle.toH", toH, `at least hourAngle.fromH, ${fromH}`);
  if (!(integrationS > 0)) throw new DomainError("integrationS", integrationS, "seconds above 0");
  if (toH === fromH) return { hourAngleRad: Float64Array.of(fromH * RAD_PER_HOUR), sampleS: integrationS };
  const windowS = 3600 * (toH - fromH);
  const n = Math.max(1, Math.round(windowS / (integrationS * SIDEREAL_RATE)));
  const hourAngleRad = new Float64Array(n);
  for (let k = 0; k < n; k++) hourAngleRad[k] = (fromH + ((toH - fromH) * (k + 0.5)) / n) * RAD_PER_HOUR;
  return { hourAngleRad, sampleS: windowS / (SIDEREAL_RATE * n) };
}

/** Centres of `count` equal channels that fill a band: ν0 − B/2 + (c + ½)·B/count, hertz. */
export function channelCentres(frequencyHz: number, bandwidthHz: number, count: number): Float64Array {
  if (!(bandwidthHz < 2 * frequencyHz)) {
    throw new DomainError("bandwidthHz", bandwidthHz, `less than twice the frequency, ${2 * frequencyHz} Hz`);
  }
  return Float64Array.from({ length: count }, (_, c) => frequencyHz - bandwidthHz / 2 + ((c + 0.5) * bandwidthHz) / count);
}
