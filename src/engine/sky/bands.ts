import { DomainError } from "../../base/errors.ts";

/** A band that the Radio Regulations speak of for radio astronomy. */
export interface ProtectedBand {
  readonly fromHz: number;
  readonly toHz: number;
  /** `passive`: all emissions prohibited (5.340). `urged`: administrations are urged to protect (5.149). */
  readonly protection: "passive" | "urged";
}

const MHZ = 1e6;
const GHZ = 1e9;

/** No. 5.149 as of WRC-07, read in two copies; some entries hold in some Regions only. MHz below 10 GHz, then GHz. */
const URGED_MHZ: readonly (readonly [number, number])[] = [
  [13.36, 13.41],
  [25.55, 25.67],
  [37.5, 38.25],
  [73, 74.6],
  [150.05, 153],
  [322, 328.6],
  [406.1, 410],
  [608, 614],
  [1330, 1400],
  [1610.6, 1613.8],
  [1660, 1670],
  [1718.8, 1722.2],
  [2655, 2690],
  [3260, 3267],
  [3332, 3339],
  [3345.8, 3352.5],
  [4825, 4835],
  [4950, 5000],
  [6650, 6675.2],
];
const URGED_GHZ: readonly (readonly [number, number])[] = [
  [10.6, 10.68],
  [14.47, 14.5],
  [22.01, 22.5],
  [22.81, 22.86],
  [23.07, 23.12],
  [31.2, 31.3],
  [31.5, 31.8],
  [36.43, 36.5],
  [42.5, 43.5],
  [48.94, 49.04],
  [76, 86],
  [92, 94],
  [94.1, 100],
];
/** No. 5.340, those below 100 GHz that radio astronomy uses most; from memory. */
const PASSIVE_GHZ: readonly (readonly [number, number])[] = [
  [1.4, 1.427],
  [2.69, 2.7],
  [10.68, 10.7],
  [15.35, 15.4],
  [23.6, 24],
  [31.3, 31.5],
  [86, 92],
];

const bands = (list: readonly (readonly [number, number])[], unit: number, protection: ProtectedBand["protection"]) =>
  list.map(([from, to]): ProtectedBand => ({ fromHz: from * unit, toHz: to * unit, protection }));

/**
 * Bands below 100 GHz, lowest first. A planning aid: what holds at a site is for the national spectrum authority to say.
 * Sources: ITU Radio Regulations Nos. 5.149 and 5.340.
 */
export const PROTECTED_BANDS: readonly ProtectedBand[] = [
  ...bands(URGED_MHZ, MHZ, "urged"),
  ...bands(URGED_GHZ, GHZ, "urged"),
  ...bands(PASSIVE_GHZ, GHZ, "passive"),
].sort((a, b) => a.fromHz - b.fromHz);

/** The protected bands that overlap a band in use, and how much of it they cover. @throws {@link DomainError} for an empty band. */
export function protectionOf(
  fromHz: number,
  toHz: number,
): { readonly bands: readonly ProtectedBand[]; readonly fraction: number } {
  if (!(toHz > fromHz)) throw new DomainError("toHz", toHz, `a frequency above ${fromHz}`);
  const found = PROTECTED_BANDS.filter((band) => band.fromHz < toHz && band.toHz > fromHz);
  const covered = found.reduce((sum, band) => sum + Math.min(toHz, band.toHz) - Math.max(fromHz, band.fromHz), 0);
  return { bands: found, fraction: covered / (toHz - fromHz) };
}
