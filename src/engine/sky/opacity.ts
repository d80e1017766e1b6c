import { DomainError } from "../../base/errors.ts";
import { checkFinite } from "./checks.ts";
import { OXYGEN_LINES, WATER_LINES } from "./gaslines.ts";

/** Air at one height. */
export interface Air {
  /** Partial pressure of dry air, hPa. */
  readonly dryHPa: number;
  /** Partial pressure of water vapour, hPa. */
  readonly vapourHPa: number;
  readonly temperatureK: number;
}

/** Attenuation along a path in air, dB/km. */
export interface GasAttenuation {
  readonly dryDbPerKm: number;
  readonly vapourDbPerKm: number;
}

const MOST_GHZ = 1000;

/**
 * Specific attenuation of dry air and of water vapour, line by line: ITU-R P.676-13 annex 1 §1, equations 1 to 9.
 *
 * @param frequencyHz - Above 0, at most 1000 GHz, as the standard has it.
 * @throws {@link DomainError} outside that range, or for air that is none.
 */
export function gasAttenuation(frequencyHz: number, { dryHPa, vapourHPa, temperatureK }: Air): GasAttenuation {
  checkFinite({ frequencyHz, dryHPa, vapourHPa, temperatureK });
  const f = frequencyHz / 1e9;
  if (!(f > 0 && f <= MOST_GHZ)) throw new DomainError("frequencyHz", frequencyHz, "a frequency above 0 and at most 1e12 Hz");
  if (dryHPa < 0) throw new DomainError("dryHPa", dryHPa, "a pressure of 0 or more, hPa");
  if (vapourHPa < 0) throw new DomainError("vapourHPa", vapourHPa, "a pressure of 0 or more, hPa");
  if (!(temperatureK > 0)) throw new DomainError("temperatureK", temperatureK, "a temperature above 0 K");
  const theta = 300 / temperatureK;
  const [p, e] = [dryHPa, vapourHPa];
  return { dryDbPerKm: 0.182 * f * oxygen(f, p, e, theta), vapourDbPerKm: 0.182 * f * vapour(f, p, e, theta) };
}

/** Equation 5: the shape of a line of width `df`, displaced by `delta` where lines overlap. */
const shape = (f: number, f0: number, df: number, delta: number): number =>
  (f / f0) * ((df - delta * (f0 - f)) / ((f0 - f) ** 2 + df ** 2) + (df - delta * (f0 + f)) / ((f0 + f) ** 2 + df ** 2));

function oxygen(f: number, p: number, e: number, theta: number): number {
  let sum = dryContinuum(f, p, e, theta);
  for (const [f0, a1, a2, a3, a5, a6] of OXYGEN_LINES) {
    const strength = a1 * 1e-7 * p * theta ** 3 * Math.exp(a2 * (1 - theta));
    const pressed = a3 * 1e-4 * (p * theta ** 0.8 + 1.1 * e * theta);
    const width = Math.sqrt(pressed * pressed + 2.25e-6); // Zeeman splitting
    const delta = (a5 + a6 * theta) * 1e-4 * (p + e) * theta ** 0.8;
    sum += strength * shape(f, f0, width, delta);
  }
  return sum;
}

function vapour(f: number, p: number, e: number, theta: number): number {
  let sum = 0;
  for (const [f0, b1, b2, b3, b4, b5, b6] of WATER_LINES) {
    const strength = b1 * 0.1 * e * theta ** 3.5 * Math.exp(b2 * (1 - theta));
    const pressed = b3 * 1e-4 * (p * theta ** b4 + b5 * e * theta ** b6);
    const width = 0.535 * pressed + Math.sqrt(0.217 * pressed * pressed + (2.1316e-12 * f0 * f0) / theta); // Doppler
    sum += strength * shape(f, f0, width, 0);
  }
  return sum;
}

/** Equations 8 and 9: nitrogen and the Debye spectrum of oxygen. */
function dryContinuum(f: number, p: number, e: number, theta: number): number {
  const d = 5.6e-4 * (p + e) * theta ** 0.8;
  const debye = 6.14e-5 / (d * (1 + (f / d) ** 2));
  return d === 0 ? 0 : f * p * theta * theta * (debye + (1.4e-12 * p * theta ** 1.5) / (1 + 1.9e-5 * f ** 1.5));
}

/** Height of the top of the air that counts, metres, and the scale height of water vapour of the reference atmosphere. */
const TOP_M = 80_000;
const VAPOUR_SCALE_M = 2_000;
/** Gas constant as ITU-R P.835 has it: g/m³ of vapour at a temperature to hPa. */
const VAPOUR_CONSTANT = 216.7;
const EARTH_RADIUS_KM = 6356.766;

/** Layers of the mean annual global reference atmosphere, ITU-R P.835-6 annex 1: base km', K, K/km', hPa, geopotential height. */
const LAYERS: readonly (readonly [base: number, k: number, lapse: number, hPa: number])[] = [
  [0, 288.15, -6.5, 1013.25],
  [11, 216.65, 0, 226.3226],
  [20, 216.65, 1, 54.7498],
  [32, 228.65, 2.8, 8.680422],
  [47, 270.65, 0, 1.109106],
  [51, 270.65, -2.8, 0.6694167],
  [71, 214.65, -2, 0.03956649],
];

/**
 * Air at a height of the mean annual global reference atmosphere (ITU-R P.835-6 annex 1), temperature and pressure by
 * geopotential height, vapour falling off by e every 2 km from its density at sea level.
 *
 * @param heightM - Above sea level, −500 to 80 000.
 * @param seaLevelVapourGm3 - 7.5 g/m³ on the yearly mean of the globe; a dry site has less.
 */
export function referenceAir(heightM: number, seaLevelVapourGm3 = 7.5): Air {
  checkFinite({ heightM, seaLevelVapourGm3 });
  if (!(heightM >= -500 && heightM <= TOP_M)) throw new DomainError("heightM", heightM, "metres in [-500, 80000]");
  if (seaLevelVapourGm3 < 0) throw new DomainError("seaLevelVapourGm3", seaLevelVapourGm3, "a density of 0 or more, g/m³");
  const km = heightM / 1000;
  const potential = (EARTH_RADIUS_KM * km) / (EARTH_RADIUS_KM + km);
  const [base, k, lapse, hPa] = LAYERS.findLast(([from]) => potential >= from) ?? LAYERS[0];
  const temperatureK = k + lapse * (potential - base);
  const totalHPa =
    lapse === 0 ? hPa * Math.exp((-34.1632 * (potential - base)) / k) : hPa * (k / temperatureK) ** (34.1632 / lapse);
  const vapourHPa = (seaLevelVapourGm3 * Math.exp(-heightM / VAPOUR_SCALE_M) * temperatureK) / VAPOUR_CONSTANT;
  return { dryHPa: Math.max(0, totalHPa - vapourHPa), vapourHPa, temperatureK };
}

/**
 * Opacity of the air over a site toward the zenith, nepers: specific attenuation summed over the reference atmosphere in
 * layers that grow with height, as ITU-R P.676-13 annex 1 §2 has it. Clear air: no cloud, no rain.
 */
export function zenithOpacity(frequencyHz: number, siteHeightM: number, seaLevelVapourGm3 = 7.5): number {
  let decibels = 0;
  let fromM = siteHeightM;
  for (let layer = 0; fromM < TOP_M; layer++) {
    const toM = Math.min(TOP_M, fromM + 10 * Math.exp(layer / 50));
    const { dryDbPerKm, vapourDbPerKm } = gasAttenuation(frequencyHz, referenceAir((fromM + toM) / 2, seaLevelVapourGm3));
    decibels += ((dryDbPerKm + vapourDbPerKm) * (toM - fromM)) / 1000;
    fromM = toM;
  }
  return (decibels * Math.LN10) / 10;
}

/**
 * By how much air of this opacity raises an antenna's SEFD: it weakens the source and adds its own glow,
 * (T + T_air (1 − e^−τA)) e^τA / T, with the air mass A = 1/sin(elevation) of a flat atmosphere (Thompson, Moran & Swenson,
 * 3rd ed., ch. 13). Good above some 10° of elevation.
 *
 * @param systemK - System temperature without the air.
 */
export function airFactor(opacity: number, elevationRad: number, systemK: number, airK: number): number {
  checkFinite({ opacity, elevationRad, systemK, airK });
  if (!(elevationRad > 0 && elevationRad <= Math.PI / 2)) {
    throw new DomainError("elevationRad", elevationRad, "radians above 0 and at most π/2");
  }
  if (!(systemK > 0)) throw new DomainError("systemK", systemK, "a temperature above 0 K");
  const along = opacity / Math.sin(elevationRad);
  return ((systemK + airK * -Math.expm1(-along)) * Math.exp(along)) / systemK;
}
