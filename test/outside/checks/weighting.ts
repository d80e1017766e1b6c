import { beamAt } from "../../../src/engine/measure/lobe.ts";
import { halfPowerWidths, walkRays } from "../../../src/engine/measure/rays.ts";
import type { DensityGrid } from "../../../src/engine/synthesis/density.ts";
import { squareAxes } from "../../../src/engine/synthesis/plane.ts";
import { noiseFactor } from "../../../src/engine/synthesis/sums.ts";
import { sampleWeights, type Weighting } from "../../../src/engine/synthesis/weights.ts";
import { squarePlane } from "../../support/analytic.ts";
import { settle } from "../../support/settle.ts";
import { madeUpTrack } from "../../support/track.ts";
import { checksOf, type Left } from "../check.ts";
import rows from "../data/weighting.json" with { type: "json" };

/** Samples of unit weight in cells along u, as many in each as the published example has. */
const CELLS = [1, 1, 2, 3, 5, 8, 13, 21];
const counts = CELLS.flatMap((n) => new Array<number>(n).fill(n));
const places = Float64Array.from(CELLS.flatMap((n, k) => new Array<number>(n).fill(k + 1)));

/** The program's weights of these samples: cells of one wavelength at a metre of wavelength. */
function weightsOf(scheme: Weighting["scheme"], robustness: number): Float64Array {
  const reach = CELLS.length + 1;
  const density: DensityGrid = { fieldRad: 1, reach, weight: new Float64Array((reach + 1) * (2 * reach + 1)) };
  for (const place of places) density.weight[(2 * reach + 1) * place + reach] += 1;
  const out = new Float64Array(places.length);
  const run = {
    i: 0,
    j: 1,
    count: places.length,
    uM: places,
    vM: new Float64Array(places.length),
    wM: new Float64Array(places.length),
  };
  sampleWeights({ scheme, robustness, taperRad: null }, () => 1, density)(run, 299_792_458, out);
  return out;
}

const factorOf = (weights: Float64Array): number => {
  const weight = weights.reduce((sum, w) => sum + w, 0);
  const squareOverNatural = weights.reduce((sum, w) => sum + w * w, 0);
  return noiseFactor({ weight, natural: weights.length, squareOverNatural, uu: 0, uv: 0, vv: 0 });
};
/** From a sample alone in its cell: w = 1/(1 + f²). */
const f2 = (robustness: number): number => 1 / weightsOf("robust", robustness)[0] - 1;
const spread = (values: readonly number[]): number => (Math.max(...values) - Math.min(...values)) / Math.max(...values);

/** A Gaussian density of samples needs no array: its beam is in closed form. */
function tapered(fwhm: number): number {
  const beam = (theta: number) => (l: number, m: number) => Math.exp((-4 * Math.LN2 * (l * l + m * m)) / (theta * theta));
  const both = Math.hypot(fwhm, fwhm);
  const at = beamAt([squarePlane(96, both / 32, beam(both))]);
  return halfPowerWidths(walkRays(at, { majorRad: both, minorRad: both, positionAngleRad: 0 }))?.majorRad ?? Number.NaN;
}

function twice(scheme: Weighting["scheme"]): number {
  const once = madeUpTrack({ stations: 6, spanM: 3000, integrationS: 1200, seed: 3 });
  // The same channel twice is every sample twice.
  const double = { ...once, channelHz: Float64Array.of(once.channelHz[0], once.channelHz[0]) };
  const image = (track: typeof once) =>
    settle(track, { scheme, robustness: 0, taperRad: null }, 1e-3).plane(squareAxes(128, 2e-6)).values;
  const [a, b] = [image(once), image(double)];
  return a.reduce((most, v, k) => Math.max(most, Math.abs(v - b[k])), 0);
}

/** Section 8: weighting. */
export const weightingChecks = checksOf(rows, {
  W01: () =>
    [0, 0.5].map((r) => {
      const weights = weightsOf("robust", r);
      return weights.reduce((most, w, k) => Math.max(most, Math.abs(w - 1 / (1 + counts[k] * f2(r)))), 0);
    }),
  W02: () => [-2, -1, 0, 0.5, 1, 2].map(f2),
  W03: () => [...[-2, -1, 0, 0.5, 1, 2].map((r) => factorOf(weightsOf("robust", r))), factorOf(weightsOf("uniform", 0))],
  W04: () => [spread([...weightsOf("robust", -2)].map((w, k) => w * counts[k]))],
  W04b: () => [spread([...weightsOf("robust", 2)])],
  W06: () => {
    const density: DensityGrid = { fieldRad: 1, reach: 3, weight: new Float64Array(28) };
    const out = new Float64Array(1);
    const theta = 0.25;
    const run = { i: 0, j: 1, count: 1, uM: Float64Array.of(0.581568924 / theta), vM: Float64Array.of(0), wM: Float64Array.of(0) };
    sampleWeights({ scheme: "natural", robustness: 0, taperRad: theta }, () => 1, density)(run, 299_792_458, out);
    return [out[0]];
  },
  W06b: () => [tapered(1)],
  W07: () => [twice("natural"), twice("uniform")],
});

export const weightingLeft: Left = { W05: "the ideal Y's figures stand among the layouts" };
