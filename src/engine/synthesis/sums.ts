import type { NaturalWeight } from "./density.ts";
import { wavelengthsPerMetre } from "./extent.ts";
import type { Walk } from "./walk.ts";
import type { SampleWeights } from "./weights.ts";

/** Sums over the samples that count, one Hermitian half, weights as used and as natural. */
export interface WeightSums {
  weight: number;
  natural: number;
  /** Σ w²/w_natural: the variance of a weighted mean whose samples have variance 1/w_natural. */
  squareOverNatural: number;
  /** Second moments of the weighted uv distribution, wavelengths²: Σ w u², Σ w u v, Σ w v². */
  uu: number;
  uv: number;
  vv: number;
}

export function emptySums(): WeightSums {
  return { weight: 0, natural: 0, squareOverNatural: 0, uu: 0, uv: 0, vv: 0 };
}

/** Adds the samples of the baselines whose first station lies in [from, to). */
export function addToSums(
  sums: WeightSums,
  walk: Walk,
  natural: NaturalWeight,
  weights: SampleWeights,
  from: number,
  to: number,
): void {
  const scratch = new Float64Array(walk.track.hourAngleRad.length);
  walk.baselines(from, to, (run) => {
    const wNatural = natural(run.i, run.j);
    const { count, uM, vM } = run;
    for (const channelHz of walk.track.channelHz) {
      weights(run, channelHz, scratch);
      const scale = wavelengthsPerMetre(channelHz);
      let w0 = 0;
      let w2 = 0;
      let uu = 0;
      let uv = 0;
      let vv = 0;
      for (let k = 0; k < count; k++) {
        const w = scratch[k];
        w0 += w;
        w2 += w * w;
        uu += w * uM[k] * uM[k];
        uv += w * uM[k] * vM[k];
        vv += w * vM[k] * vM[k];
      }
      sums.weight += w0;
      sums.natural += wNatural * count;
      sums.squareOverNatural += w2 / wNatural;
      sums.uu += uu * scale * scale;
      sums.uv += uv * scale * scale;
      sums.vv += vv * scale * scale;
    }
  });
}

/** How much the weighting raises the noise over natural weights: √(Σw²/w_nat · Σw_nat)/Σw, at least 1 (Cauchy–Schwarz). */
export function noiseFactor(sums: WeightSums): number {
  return Math.sqrt(sums.squareOverNatural * sums.natural) / sums.weight;
}
