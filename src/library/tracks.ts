/**
 * From stations and a window of hour angle to uv samples: which count, where they lie, how much they weigh.
 *
 * ```ts
 * {@includeCode ./examples/tracks.ts}
 * ```
 *
 * @module tracks
 */
export {
  addToDensity,
  type DensityGrid,
  densityField,
  emptyDensity,
  type NaturalWeight,
  naturalWeight,
} from "../engine/synthesis/density.ts";
export { type Extent, extent, wavelengthsPerMetre } from "../engine/synthesis/extent.ts";
export { addToSums, emptySums, noiseFactor, type WeightSums } from "../engine/synthesis/sums.ts";
export { channelCentres, sampleTimes, type Track } from "../engine/synthesis/track.ts";
export { uvwM } from "../engine/synthesis/uvw.ts";
export { SEES, SHADOWED, TOO_HIGH, TOO_LOW, type Visibility, visibility } from "../engine/synthesis/visibility.ts";
export { type BaselineRun, Walk } from "../engine/synthesis/walk.ts";
export { type SampleWeights, sampleWeights, type Weighting } from "../engine/synthesis/weights.ts";
