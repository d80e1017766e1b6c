import type { Pair, Plan } from "../plan/schema.ts";

/**
 * What one layout does for one observation. Key names are a contract: requirements, tables and scripts point at them.
 * A quantity that cannot be had is `null`, and `warnings` says why; it is never 0 or NaN.
 */
export interface AssessResult {
  readonly layout: string;
  readonly observation: string;
  readonly stationCount: number;
  readonly baselineCount: number;
  /** Metres, straight through the Earth (chord). */
  readonly longestBaselineM: number | null;
  readonly shortestBaselineM: number | null;
  readonly samplesPerBaseline: number;
  /** Baseline, time and channel samples that count, every channel counted. */
  readonly samplesKept: number;
  readonly longestProjectedM: number | null;
  readonly shortestProjectedM: number | null;
  readonly longestUvWavelengths: number | null;
  readonly maxWWavelengths: number | null;
  readonly shadowedStationSamples: number;
  readonly visibleStationSamples: number;
  /** Hours of hour angle inside the window in which at least two stations see the source at once. */
  readonly hoursVisible: number;
  readonly coverage: CoverageResult;
  readonly beam: BeamFigures;
  /** Present only where a pair was asked for. */
  readonly pair?: PairResult;
  readonly apertureResolutionArcsec: { readonly slit: number | null; readonly circular: number | null };
  readonly largestScaleArcsec: number | null;
  readonly recoverable: { readonly gaussianArcsec: number | null; readonly discArcsec: number | null };
  /** The smallest of `primaryBeams`. */
  readonly primaryBeamArcsec: number;
  /** FWHM by antenna id. */
  readonly primaryBeams: { readonly [antenna: string]: number };
  readonly densityFieldArcsec: number | null;
  readonly noiseJy: number | null;
  readonly weightingNoiseFactor: number | null;
  /** Clear air over the stations, counted in `noiseJy` where the observation gives its water vapour. */
  readonly air: AirResult;
  readonly brightnessNoiseK: number | null;
  readonly smearing: { readonly bandwidthArcsec: number | null; readonly timeArcsec: number | null };
  readonly planarRadiusArcsec: number | null;
  /** Beyond this a wave is flat to λ/16 over the largest dish, and over the longest baseline: 2D²/λ. */
  readonly fraunhoferM: { readonly antenna: number; readonly array: number | null };
  /** Part of the band that the Radio Regulations protect for radio astronomy (Nos. 5.149, 5.340), below 100 GHz. */
  readonly protectedFraction: number;
  /** What the observation's position error costs: rms phase, what is left of a point's peak, change of the beam's width at most. */
  readonly positionError: PositionErrorResult;
  /** What an image out to the half level of the smallest primary beam asks for, at 10 % loss there by each. */
  readonly fullField: FullField;
  readonly warnings: readonly string[];
}

/** All null where the observation states no error, or there are no samples. */
export interface PositionErrorResult {
  readonly phaseDeg: number | null;
  readonly coherence: number | null;
  readonly widthFraction: number | null;
}

/** Both null where the observation gives no water vapour, or the air cannot be counted: a warning says why. */
export interface AirResult {
  /** Nepers toward the zenith, over the station with the most. */
  readonly zenithOpacity: number | null;
  readonly noiseFactor: number | null;
}

export interface FullField {
  /** Widest channel and longest sample. */
  readonly channelWidthHz: number | null;
  readonly sampleS: number | null;
  /** What a correlator then hands over: baselines and autocorrelations, all channels and products; 8 bytes each. */
  readonly visibilitiesPerS: number | null;
  readonly bytesPerS: number | null;
}

export interface CoverageResult {
  readonly filledFraction: number | null;
  readonly largestRadialGap: number | null;
  /** 1 = even. */
  readonly azimuthalUniformity: number | null;
}

/** Figures of the synthesized beam; fractions are of the peak, position angles north through east. */
export interface BeamFigures {
  readonly majorArcsec: number | null;
  readonly minorArcsec: number | null;
  readonly axisRatio: number | null;
  readonly positionAngleDeg: number | null;
  readonly halfPowerMajorArcsec: number | null;
  readonly halfPowerMinorArcsec: number | null;
  readonly firstZeroMinArcsec: number | null;
  readonly firstZeroMaxArcsec: number | null;
  readonly firstMinimumMinArcsec: number | null;
  readonly firstMinimumMaxArcsec: number | null;
  readonly peakSidelobe: number | null;
  readonly deepestSidelobe: number | null;
  readonly peakAbsoluteSidelobe: number | null;
  readonly rmsSidelobe: number | null;
  readonly sidelobeRadiusArcsec: number | null;
  readonly pixelArcsec: number | null;
  readonly sizePx: number | null;
}

export interface PairResult {
  readonly dip: number | null;
  readonly verdict: "resolved" | "marginal" | "blended" | null;
}

/** A sampled image of the beam: `values[size * y + x]`, fraction of the peak; l (east) = (x - size/2) * pixelRad,
 *  m (north) = (y - size/2) * pixelRad. The peak is at (size/2, size/2). Painters flip x so that east is left. */
export interface BeamImage {
  readonly size: number;
  readonly pixelRad: number;
  readonly values: Float32Array;
}

/** Profile along one position angle through the peak. */
export interface BeamCut {
  readonly positionAngleDeg: number;
  /** Offsets from the peak in arcsec, ascending. */
  readonly offsetArcsec: Float64Array;
  /** Fraction of peak. */
  readonly value: Float64Array;
}

/** Counts of samples on a square uv grid, both Hermitian halves: `counts[size * y + x]`, u = (x - size/2) * cellWavelengths east, v likewise north. */
export interface UvDensity {
  readonly size: number;
  readonly cellWavelengths: number;
  readonly counts: Float32Array;
}

/** What a page needs to draw one layout × observation. `settled` false: a preview while dragging (nearest-cell, no sidelobe figures). */
export interface Picture {
  readonly settled: boolean;
  readonly result: AssessResult;
  readonly beam: BeamImage | null;
  readonly uv: UvDensity | null;
  /** Along the fitted major and minor axes. */
  readonly cuts: { readonly major: BeamCut; readonly minor: BeamCut } | null;
}

export interface PictureRequest {
  readonly plan: Plan;
  readonly layout: string;
  readonly observation: string;
  readonly pair: Pair | null;
  /** Side of the uv density image in cells. */
  readonly uvSize: number;
}

export interface PreviewRequest extends PictureRequest {
  /** Changes when anything but the places of stations changed: then the kept grids are made anew. */
  readonly key: string;
  /** The last settled result, of the same layout and observation. */
  readonly base: AssessResult;
}
