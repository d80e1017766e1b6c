import { RAD_PER_DEG } from "../base/constants.ts";
import { airNoiseFactor } from "../engine/measure/airnoise.ts";
import { airFactor, referenceAir, zenithOpacity } from "../engine/sky/opacity.ts";
import type { Visibility } from "../engine/synthesis/visibility.ts";
import type { AirResult } from "./result.ts";
import { receiverAt, type Setup } from "./setup.ts";

/** Below this a flat atmosphere overstates the way through it: the air is taken as there. */
const LOWEST_RAD = 10 * RAD_PER_DEG;
/** The standard's range, as the program uses it. */
const MOST_HZ = 1e12;

/** No air counted. */
export const NO_AIR: AirResult = { zenithOpacity: null, noiseFactor: null };

/** What clear air over the stations does to the noise, where the observation gives its water vapour. */
export function airOver({ stations, antennas, observation, track }: Setup, seen: Visibility, warnings: string[]): AirResult {
  const { vapourGm3, frequencyHz } = observation;
  if (vapourGm3 === null) return NO_AIR;
  if (frequencyHz > MOST_HZ) {
    warnings.push("the air's opacity cannot be had above 1000 GHz: noise is without it");
    return NO_AIR;
  }
  const systemK = antennas.map((antenna) => receiverAt(antenna, frequencyHz)?.systemK ?? null);
  const lacking = [...new Set(antennas.filter((_, i) => systemK[i] === null).map(({ id }) => id))];
  if (lacking.length > 0) {
    warnings.push(
      `antenna ${lacking.join(", ")} gives no systemK for the band: what the air adds is not known, noise is without it`,
    );
    return NO_AIR;
  }
  // Stations of one height share one column of air.
  const columns = new Map<number, { readonly opacity: number; readonly airK: number }>();
  for (const { heightM } of stations) {
    const heightOfAir = Math.min(80_000, Math.max(-500, heightM));
    if (columns.has(heightM)) continue;
    columns.set(heightM, {
      opacity: zenithOpacity(frequencyHz, heightOfAir, vapourGm3),
      airK: referenceAir(heightOfAir, vapourGm3).temperatureK,
    });
  }
  const factor = airNoiseFactor(track, seen, (i, elevationRad) => {
    const { opacity, airK } = columns.get(stations[i].heightM) as { opacity: number; airK: number };
    return airFactor(opacity, Math.max(LOWEST_RAD, elevationRad), systemK[i] as number, airK);
  });
  return { zenithOpacity: Math.max(...[...columns.values()].map(({ opacity }) => opacity)), noiseFactor: factor };
}
