import { ARCSEC_PER_RAD, RAD_PER_DEG, SPEED_OF_LIGHT } from "../../../src/base/constants.ts";
import {
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
} from "../../../src/engine/measure/loss.ts";
import { bandwidthSmearingRad, DISC_HALF_VISIBILITY, LARGEST_SCALE } from "../../../src/engine/measure/scales.ts";
import { wavelengthsPerMetre } from "../../../src/engine/synthesis/extent.ts";
import { checksOf, type Left } from "../check.ts";
import rows from "../data/smearing.json" with { type: "json" };

const tenArcmin = (10 / 60) * RAD_PER_DEG;
/** Resolution of a slit as long as the baseline: λ/b. */
const slit = (baselineM: number, wavelengthM: number): number =>
  1 / (baselineM * wavelengthsPerMetre(SPEED_OF_LIGHT / wavelengthM));

/** Section 7: smearing and the largest scale. */
export const smearingChecks = checksOf(rows, {
  M01: () => [0.1, 0.25, 0.5, 0.75, 1, 1.5, 2, 3, 5].map(squareBandPeak),
  M02: () => [0.5, 0.75, 1, 2].map(squareBandPeak),
  M03: () => [0.5, 1, 2].map(gaussianBandPeak),
  M04: () => [0.01, 0.05, 0.1].map(betaOfLoss),
  M04b: () => [bandwidthSmearingRad(1, 1, 1)],
  M05: () => [(1 - squareBandPeak(1e-4)) / 1e-8],
  M07: () => [1 - timeAveragePeak(1, 1)],
  M08: () => {
    const turns = bandTurns(1e6, 10_000, tenArcmin, SPEED_OF_LIGHT);
    return [turns, turnsAverage(turns)];
  },
  M09: () => {
    const turns = timeTurns(10_000 * wavelengthsPerMetre(SPEED_OF_LIGHT / 0.21), tenArcmin, 10);
    return [turns, turnsAverage(turns)];
  },
  M13: () => [discVisibility(LARGEST_SCALE, 1), gaussianVisibility(LARGEST_SCALE, 1)],
  M14: () => [0.5, Math.exp(-1), 0.1].map(gaussianOfVisibility),
  M14b: () => [DISC_HALF_VISIBILITY],
  M15: () => [0.9, 0.5, 0.21, 0.18, 0.13, 0.06].map((wavelengthM) => slit(8_611_000, wavelengthM) * ARCSEC_PER_RAD * 1000),
  M16: () => [200, 18_000].map((b) => slit(b, SPEED_OF_LIGHT / 100e9) * ARCSEC_PER_RAD),
});

export const smearingLeft: Left = { M06: "the exact law at the pole alone: the program uses the mean over directions and says so" };
