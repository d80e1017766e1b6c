/** Gaussian FWHM × b/λ whose visibility is one half: √(ln 2)·2·√(ln 2)/π. */
export const GAUSSIAN_HALF_VISIBILITY = (2 * Math.LN2) / Math.PI;

/** Uniform disc diameter × b/λ whose visibility is one half: 2J₁(πx)/(πx) = ½ (root by scipy, in the outside checks). */
export const DISC_HALF_VISIBILITY = 0.7050848445271;

/** Largest angular scale × b/λ for the shortest projected baseline. Common practice; other definitions reach 0.98. */
export const LARGEST_SCALE = 0.6;

/** First dark ring of a filled circular aperture, × λ/D: first zero of J₁ over π (Rayleigh 1879; Airy 1835). */
export const AIRY_FIRST_ZERO = 1.2196698912665;

/** Loss of 10 % of a point source's peak by averaging over a square band: offset × Δν/(ν·FWHM) (Bridle & Schwab 1999, ASP 180 ch. 18). */
export const BANDWIDTH_TEN_PERCENT = 0.6903214235;

/** Mean loss by averaging in time, per (offset/FWHM)²·s²: ω_e²·ln 2/3 (Bridle & Schwab 1999). */
export const TIME_LOSS = 1.2286e-9;

/** Offset at which averaging over one channel costs 10 % of a point source's peak, radians. FWHM: geometric mean. */
export function bandwidthSmearingRad(fwhmRad: number, frequencyHz: number, channelWidthHz: number): number {
  return (BANDWIDTH_TEN_PERCENT * fwhmRad * frequencyHz) / channelWidthHz;
}

/** Offset at which averaging over one sample costs 10 % on average over directions, radians; exact for no one direction. */
export function timeSmearingRad(fwhmRad: number, sampleS: number): number {
  return (fwhmRad * Math.sqrt(0.1 / TIME_LOSS)) / sampleS;
}

/** Radius at which leaving w out costs a phase of 0.1 rad: π·w·θ² = 0.1 (the plane approximation's limit). */
export function planarRadiusRad(maxWWavelengths: number): number {
  return Math.sqrt(0.1 / (Math.PI * maxWWavelengths));
}

/** FWHM of an antenna's power pattern, radians: factor·λ/D; 1.029 for a uniformly lit circular aperture. */
export function primaryBeamRad(beamFactor: number, wavelengthM: number, diameterM: number): number {
  return (beamFactor * wavelengthM) / diameterM;
}
