import { describe, expect, it } from "vitest";
import { beamAt } from "../../../src/engine/measure/lobe.ts";
import { cyclicExtreme, halfPowerWidths, walkRays } from "../../../src/engine/measure/rays.ts";
import { sidelobes } from "../../../src/engine/measure/sidelobes.ts";
import { discBeam, gaussianBeam, ringBeam, squarePlane } from "../../support/analytic.ts";

const round = (fwhm: number) => ({ majorRad: fwhm, minorRad: fwhm, positionAngleRad: 0 });

describe("rays through analytic beams", () => {
  const rho = 1e5;
  // Sources: closed forms. Disc 2J₁(x)/x, x = 2πρθ: half level 0.705084844527/ρ, first zero 0.609834946/ρ, first minimum where
  // J₂ first vanishes, j₂,₁ = 5.135622302/2π = 0.817359604/ρ, value −0.132279487396 (Born & Wolf; Abramowitz & Stegun table 9.5).
  // Ring J₀(x): half level 0.484195191866/ρ, zero 0.765479749562/2ρ, minimum j₁,₁ = 3.831705970/2π = 0.609834946/ρ, −0.402759395703.
  it.each([
    ["disc", discBeam(rho), 0.705084844527, 0.609834946, 0.817359604, -0.132279487396],
    ["ring", ringBeam(rho), 0.484195191866, 0.382739874781, 0.609834946, -0.402759395703],
  ] as const)("find half level, zero, minimum and depth of a uv %s", (_, beam, half, zero, minimum, depth) => {
    const pixel = half / rho / 6;
    const plane = squarePlane(256, pixel, beam);
    const zoom = squarePlane(192, half / rho / 32, beam);
    const rays = walkRays(beamAt([zoom, plane]), round(half / rho));
    const widths = halfPowerWidths(rays);
    if (!widths) throw new Error("no half level");
    // 32 pixels a FWHM by sixth-order interpolation: measured below 1e-7.
    expect(Math.abs(widths.majorRad * rho - half)).toBeLessThan(1e-6);
    expect(Math.abs(widths.minorRad * rho - half)).toBeLessThan(1e-6);
    for (const r of rays.zeroRad) expect(Math.abs(r * rho - zero)).toBeLessThan(1e-6);
    // A minimum is flat: it is placed to the cubic term of a parabola over steps of FWHM/320.
    for (const r of rays.minimumRad) expect(Math.abs(r * rho - minimum)).toBeLessThan(1e-5);
    for (const v of rays.minimum) expect(Math.abs(v - depth)).toBeLessThan(1e-6);
  });

  it("find the largest and smallest sidelobes of a disc, and its rms, beyond the first minimum", () => {
    const beam = discBeam(rho);
    const plane = squarePlane(512, 0.705 / rho / 6, beam);
    const zoom = squarePlane(192, 0.705 / rho / 32, beam);
    const rays = walkRays(beamAt([zoom, plane]), round(0.705 / rho));
    const found = sidelobes(plane, rays, 6 / rho);
    if (!found) throw new Error("no sidelobes");
    // Source: 2J₁(x)/x beyond its first minimum: −0.132279487396 there, then +0.0644825277461 (mpmath).
    expect(Math.abs(found.deepest.value + 0.132279487396)).toBeLessThan(1e-5); // between pixels, as below
    expect(Math.abs(found.highest.value - 0.0644825277461)).toBeLessThan(1e-5); // six pixels a FWHM, sixth-order interpolation
    // Radius of the second maximum: j₂,₂ = 8.417244140/2π = 1.339645/ρ (Abramowitz & Stegun table 9.5).
    expect(Math.abs(found.highest.offsetRad * rho - 1.339645)).toBeLessThan(1e-2);
    // rms by one-dimensional quadrature of the same formula over r dr, from 0.817360/ρ to 6/ρ.
    let [sum, area] = [0, 0];
    for (let k = 0; k < 20_000; k++) {
      const r = (0.8173596 + ((6 - 0.8173596) * (k + 0.5)) / 20_000) / rho;
      sum += beam(r, 0) ** 2 * r;
      area += r;
    }
    // Pixels of 0.12/ρ, those on the edges counted in part: measured 1e-3.
    expect(found.rms / Math.sqrt(sum / area)).toBeCloseTo(1, 2);
  });

  it("give widths of an elliptical Gaussian along and across, and no zero and no minimum", () => {
    // Small enough that the beam has not fallen to rounding at the edge, where any wiggle is a minimum.
    const plane = squarePlane(128, 1e-6, gaussianBeam(5e-5, 2e-5, 1));
    const rays = walkRays(beamAt([plane]), { majorRad: 5e-5, minorRad: 2e-5, positionAngleRad: 1 });
    const widths = halfPowerWidths(rays);
    expect((widths?.majorRad ?? 0) / 5e-5).toBeCloseTo(1, 5);
    expect((widths?.minorRad ?? 0) / 2e-5).toBeCloseTo(1, 5);
    expect(rays.zeroRad.every(Number.isNaN)).toBe(true);
    expect(rays.minimumRad.every(Number.isNaN)).toBe(true);
    expect(sidelobes(plane, rays, 5e-5)).toBeUndefined();
  });

  it("refine an extreme over angle across the seam of the half turn", () => {
    const n = 360;
    const radii = Float64Array.from({ length: n }, (_, k) => 2 + Math.cos(2 * ((Math.PI * k) / n - 0.003)));
    expect(cyclicExtreme(radii, 1)).toBeCloseTo(3, 8);
    expect(cyclicExtreme(radii, -1)).toBeCloseTo(1, 8);
  });
});
