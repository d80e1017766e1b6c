/**
 * A plan in, named results out: the same objects that the page shows and the terminal prints.
 *
 * ```ts
 * {@includeCode ./examples/assess.ts}
 * ```
 *
 * @module assess
 */
export { type AssessOptions, assess } from "../assess/assess.ts";
export { beamImage, type FullBeam } from "../assess/image.ts";
export { judge, marginOf, quantityOf, type RequirementOutcome } from "../assess/requirements.ts";
export type { AssessResult, BeamCut, BeamFigures, BeamImage, CoverageResult, PairResult } from "../assess/result.ts";
export { type SweepAxis, type SweepPoint, type SweepSpec, sweep, sweepValues } from "../assess/sweep.ts";
export { type TrackSample, tracks } from "../assess/tracks.ts";
export { DomainError } from "../base/errors.ts";
