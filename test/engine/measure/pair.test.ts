import { describe, expect, it } from "vitest";
import { pairOutcome } from "../../../src/engine/measure/pair.ts";
import { discBeam, gaussianBeam } from "../../support/analytic.ts";

describe("two sources", () => {
  it("dip by 26.5 % through a filled round aperture's power pattern at Rayleigh's separation", () => {
    // Source: Born & Wolf, Principles of Optics, §8.6.2 (0.735); mid over peak 0.735031662423 at 1.21966989127 λ/D (mpmath).
    const amplitude = discBeam(0.5); // x = πθ in units of λ/D
    const power = (l: number, m: number) => amplitude(l, m) ** 2;
    // The pattern's first minimum is its zero.
    const got = pairOutcome(power, 1.21966989127, 0.4, 1, 1.21966989127, 0.01);
    expect(got?.dip).toBeCloseTo(1 - 0.735031662423, 8);
    expect(got?.verdict).toBe("resolved");
    expect(pairOutcome(power, 1.2196, 0.4, 1, 1.21966989127, 0.01)?.verdict).toBe("marginal");
  });

  it("one FWHM apart dip to 0.927 through a Gaussian, which has no first minimum and so never resolves by the rule", () => {
    // Source: mathematics; mid over the profile's maximum 0.927197959354, mid exactly one source's peak (mpmath).
    const got = pairOutcome(gaussianBeam(1, 1, 0), 1, Math.PI / 2, 1, Number.NaN, 1 / 40);
    expect(got?.dip).toBeCloseTo(1 - 0.927197959354, 5); // parabolas over steps of FWHM/40
    expect(got?.verdict).toBe("marginal");
  });

  it("blend below Sparrow's separation", () => {
    // Source: Sparrow (1916), second derivative zero: 1.4641683909/(2ρ) for a uniform uv disc, 2σ = 0.849321800288 FWHM for a Gaussian.
    const disc = discBeam(1);
    const sparrow = 1.4641683909 / 2;
    expect(pairOutcome(disc, 0.99 * sparrow, 0, 1, 0.817, 0.01)).toEqual({ dip: null, verdict: "blended" });
    expect(pairOutcome(disc, 1.03 * sparrow, 0, 1, 0.817, 0.01)?.verdict).toBe("marginal");
    const gauss = gaussianBeam(1, 1, 0);
    expect(pairOutcome(gauss, 0.845, 0, 1, 0.8, 0.01)?.verdict).toBe("blended");
    expect(pairOutcome(gauss, 0.88, 0, 1, 0.8, 0.01)?.verdict).toBe("resolved");
  });

  it("with a faint companion on the shoulder have no dip, and one farther out does", () => {
    const gauss = gaussianBeam(1, 1, 0);
    expect(pairOutcome(gauss, 1, 0, 0.05, 0.9, 0.01)).toEqual({ dip: null, verdict: "blended" });
    expect(pairOutcome(gauss, 2.5, 0, 0.05, 0.9, 0.01)?.verdict).toBe("resolved");
  });

  it("cannot be judged where the beam is not known", () => {
    expect(pairOutcome((l) => (Math.abs(l) < 1 ? 1 : Number.NaN), 3, Math.PI / 2, 1, 1, 0.1)).toBeUndefined();
  });
});
