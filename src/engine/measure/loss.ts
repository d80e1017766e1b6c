import { DomainError } from "../../base/errors.ts";
import { TIME_LOSS } from "./scales.ts";

/** Sidereal rotation of the Earth, rad/s (IAU 2000 Resolution B1.8). */
export const EARTH_RATE = 7.292115146706979e-5;

const SQRT_LN2 = Math.sqrt(Math.LN2);

/**
 * What averaging over a square band leaves of the peak of a point source away from the middle of a Gaussian beam:
 * √π/(2√ln2 β)·erf(√ln2 β) (Bridle & Schwab 1999, ASP 180, ch. 18).
 *
 * @param beta - (Δν/ν)·(offset/FWHM), 0 or more.
 */
export function squareBandPeak(beta: number): number {
  if (!(beta >= 0)) throw new DomainError("beta", beta, "0 or more");
  if (beta < 1e-4) return 1 - (Math.LN2 * beta * beta) / 3;
  return (Math.sqrt(Math.PI) * erf(SQRT_LN2 * beta)) / (2 * SQRT_LN2 * beta);
}

/** The same for a band of Gaussian shape whose FWHM is Δν: 1/√(1+β²). */
export const gaussianBandPeak = (beta: number): number => 1 / Math.sqrt(1 + beta * beta);

/** β at which a square band loses this part of the peak. @param loss - In [0, 1). */
export function betaOfLoss(loss: number): number {
  if (!(loss >= 0 && loss < 1)) throw new DomainError("loss", loss, "a fraction in [0, 1)");
  let [low, high] = [0, 1];
  while (squareBandPeak(high) > 1 - loss) high *= 2;
  for (let k = 0; k < 200 && high - low > 0; k++) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (squareBandPeak(middle) > 1 - loss) low = middle;
    else high = middle;
  }
  return low;
}

/** Mean part of the peak that averaging in time leaves, over directions: 1 − 1.2286e-9·(offset/FWHM)²·t²; for small losses. */
export const timeAveragePeak = (offsetOverFwhm: number, sampleS: number): number => 1 - TIME_LOSS * (offsetOverFwhm * sampleS) ** 2;

/** sin(πx)/(πx) of the turns of phase that one sample runs through. */
export const turnsAverage = (turns: number): number => (turns === 0 ? 1 : Math.sin(Math.PI * turns) / (Math.PI * turns));

/** Turns of phase across a channel on one baseline, worst case: Δν·b·θ/c. @param speed - of light, m/s. */
export const bandTurns = (channelWidthHz: number, baselineM: number, offsetRad: number, speed: number): number =>
  (channelWidthHz * baselineM * offsetRad) / speed;

/** Turns of phase through a sample on one baseline, worst case: ω·u·θ·t. */
export const timeTurns = (uWavelengths: number, offsetRad: number, sampleS: number): number =>
  EARTH_RATE * uWavelengths * offsetRad * sampleS;

/** Visibility of a Gaussian of this FWHM on a baseline, both in the same measure: radians and wavelengths. */
export const gaussianVisibility = (fwhm: number, baseline: number): number =>
  Math.exp(-((Math.PI * fwhm * baseline) ** 2) / (4 * Math.LN2));

/** FWHM × baseline of a Gaussian whose visibility is this. @param visibility - In (0, 1]. */
export function gaussianOfVisibility(visibility: number): number {
  if (!(visibility > 0 && visibility <= 1)) throw new DomainError("visibility", visibility, "a fraction in (0, 1]");
  return Math.sqrt(-4 * Math.LN2 * Math.log(visibility)) / Math.PI;
}

/** Visibility of a uniform disc of this diameter on a baseline: 2J₁(x)/x, x = π·diameter·baseline. */
export function discVisibility(diameter: number, baseline: number): number {
  const x = Math.PI * diameter * baseline;
  return x === 0 ? 1 : (2 * besselJ1(x)) / x;
}

/** J₁ by its integral, (1/π)∫cos(t − x sin t)dt over half a turn (Abramowitz & Stegun 9.1.21): the trapezoid rule is exact to rounding on a period. */
export function besselJ1(x: number): number {
  const steps = 64 + 2 * Math.ceil(Math.abs(x));
  let sum = 0;
  for (let k = 0; k < steps; k++) {
    const t = (2 * Math.PI * k) / steps;
    sum += Math.cos(t - x * Math.sin(t));
  }
  return sum / steps;
}

/** The error function: its series (Abramowitz & Stegun 7.1.6), below 3 exact to rounding; above, one less its continued fraction (7.1.14). */
export function erf(x: number): number {
  if (x < 0) return -erf(-x);
  if (x < 3) {
    let [term, sum] = [x, x];
    for (let n = 1; term > 1e-18 * sum; n++) {
      term *= (2 * x * x) / (2 * n + 1);
      sum += term;
    }
    return (2 / Math.sqrt(Math.PI)) * Math.exp(-x * x) * sum;
  }
  let fraction = 0;
  for (let n = 60; n > 0; n--) fraction = n / 2 / (x + fraction);
  return 1 - Math.exp(-x * x) / (Math.sqrt(Math.PI) * (x + fraction));
}
