/**
 * The synthesized beam by FFT, settled to a millionth of its peak, and what is read off it.
 *
 * ```ts
 * {@includeCode ./examples/beam.ts}
 * ```
 *
 * @module beam
 */
export { type BeamAt, beamAt, curvatureEllipse, type Ellipse, fitLobe } from "../engine/measure/lobe.ts";
export { type PairOutcome, pairOutcome } from "../engine/measure/pair.ts";
export { halfPowerWidths, type Rays, radiusAt, walkRays } from "../engine/measure/rays.ts";
export { cut, cutOffsets, type Sidelobe, type Sidelobes, sidelobes } from "../engine/measure/sidelobes.ts";
export { type BeamPlane, type PlaneAxes, squareAxes } from "../engine/synthesis/plane.ts";
export { SettledBeam } from "../engine/synthesis/settled.ts";
