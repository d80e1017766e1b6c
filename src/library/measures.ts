/**
 * Scales, noise and losses of a layout, and what a site does to them: air, protected bands, near field, shade.
 *
 * ```ts
 * {@includeCode ./examples/measures.ts}
 * ```
 *
 * @module measures
 */
export { type Coverage, coverage } from "../engine/measure/coverage.ts";
export { type CorrelatorLoad, correlatorLoad, type FieldNeeds, fieldNeeds } from "../engine/measure/load.ts";
export {
  bandTurns,
  betaOfLoss,
  discVisibility,
  gaussianBandPeak,
  gaussianOfVisibility,
  gaussianVisibility,
  squareBandPeak,
  timeAveragePeak,
  timeTurns,
  turnsAverage,
} from "../engine/measure/loss.ts";
export { fraunhoferM, planeFieldRad } from "../engine/measure/nearfield.ts";
export { beamSolidAngle, brightnessK, imageNoiseJy, type NoiseTerms } from "../engine/measure/noise.ts";
export { bandwidthSmearingRad, planarRadiusRad, primaryBeamRad, timeSmearingRad } from "../engine/measure/scales.ts";
export { effectiveAreaM2, janskyPerKelvin, planckFactor, ruzeFactor, sefdJy } from "../engine/measure/sefd.ts";
export { hiddenPart, shadeElevationRad } from "../engine/measure/shade.ts";
export { type PositionTolerance, phaseCoherence, positionTolerance } from "../engine/measure/tolerance.ts";
export { PROTECTED_BANDS, type ProtectedBand, protectionOf } from "../engine/sky/bands.ts";
export { type Air, airFactor, type GasAttenuation, gasAttenuation, referenceAir, zenithOpacity } from "../engine/sky/opacity.ts";
