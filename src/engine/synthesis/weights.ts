import { DomainError } from "../../base/errors.ts";
import { type DensityGrid, densityIndex, densityMoments, type NaturalWeight } from "./density.ts";
import { wavelengthsPerMetre } from "./extent.ts";
import type { BaselineRun } from "./walk.ts";

export interface Weighting {
  readonly scheme: "natural" | "uniform" | "robust";
  /** −2 (toward uniform) to 2 (toward natural); read for `robust` alone. */
  readonly robustness: number;
  /** Image-plane FWHM of the taper, radians; null for none. */
  readonly taperRad: number | null;
}

/** Writes the weights of one baseline's samples at one channel into `out`. */
export type SampleWeights = (run: BaselineRun, channelHz: number, out: Float64Array) => void;

/**
 * Weights of the samples, given the density of all of them.
 *
 * - natural: 1/(SEFD_i·SEFD_j);
 * - uniform: natural over the summed natural weight W of the sample's cell;
 * - robust: Briggs, High Fidelity Deconvolution of Moderately Resolved Sources, thesis, New Mexico Tech (1995), ch. 3:
 *   w/(1 + W·f²), f² = (5·10^−R)²/(ΣW²/Σw), both sums over both Hermitian halves;
 * - taper: exp(−π²θ²(u²+v²)/(4 ln 2)), applied last; its image-plane FWHM is θ.
 *
 * @throws {@link DomainError} for a robustness outside −2 to 2.
 */
export function sampleWeights(weighting: Weighting, natural: NaturalWeight, density: DensityGrid): SampleWeights {
  const { scheme, robustness, taperRad } = weighting;
  if (scheme === "robust" && !(Math.abs(robustness) <= 2)) {
    throw new DomainError("weighting.robustness", robustness, "a robustness in [-2, 2]");
  }
  const moments = densityMoments(density);
  const f2 = scheme === "robust" ? ((5 * 10 ** -robustness) ** 2 * moments.sum) / moments.squares : 0;
  const taper = taperRad === null ? 0 : (Math.PI * taperRad) ** 2 / (4 * Math.LN2);
  return ({ i, j, count, uM, vM }, channelHz, out) => {
    const w = natural(i, j);
    const perMetre = wavelengthsPerMetre(channelHz);
    if (scheme === "natural") {
      out.fill(w, 0, count);
    } else {
      const scale = perMetre * density.fieldRad;
      for (let k = 0; k < count; k++) {
        const cell = density.weight[densityIndex(density, uM[k] * scale, vM[k] * scale)];
        out[k] = scheme === "uniform" ? w / cell : w / (1 + cell * f2);
      }
    }
    if (taper > 0) {
      const t = taper * perMetre * perMetre;
      for (let k = 0; k < count; k++) out[k] *= Math.exp(-t * (uM[k] * uM[k] + vM[k] * vM[k]));
    }
  };
}
