/** Speed of light in vacuum, m/s. Exact (SI 2019). */
export const SPEED_OF_LIGHT = 299_792_458;

/** Boltzmann constant, J/K. Exact (SI 2019). */
export const BOLTZMANN = 1.380649e-23;

/** One jansky, W m⁻² Hz⁻¹. By definition. */
export const JANSKY = 1e-26;

export const RAD_PER_DEG = Math.PI / 180;
export const ARCSEC_PER_RAD = 648_000 / Math.PI;
export const RAD_PER_HOUR = Math.PI / 12;

/** Hours of hour angle per hour of UT1: mean sidereal over mean solar time (IAU 2006 rate, rounded as in engine use). */
export const SIDEREAL_RATE = 1.00273790935;
