import { RAD_PER_HOUR } from "../base/constants.ts";
import { baselineXyzM } from "../engine/array/baselines.ts";
import { wavelengthsPerMetre } from "../engine/synthesis/extent.ts";
import { uvwM } from "../engine/synthesis/uvw.ts";
import { SEES, SHADOWED, TOO_HIGH, TOO_LOW, visibility } from "../engine/synthesis/visibility.ts";
import type { Plan } from "../plan/schema.ts";
import { setup } from "./setup.ts";

/** One baseline at one time. */
export interface TrackSample {
  readonly stationA: string;
  readonly stationB: string;
  /** At the origin's meridian. */
  readonly hourAngleH: number;
  readonly uM: number;
  readonly vM: number;
  readonly wM: number;
  /** At the centre frequency. */
  readonly uWavelengths: number;
  readonly vWavelengths: number;
  readonly wWavelengths: number;
  /** null when the sample counts; else why it does not. */
  readonly reason: string | null;
}

const WHY: { readonly [flag: number]: string } = {
  [TOO_LOW]: "below its elevation limit",
  [TOO_HIGH]: "above its elevation limit",
  [SHADOWED]: "shadowed",
};

/** Every baseline at every time, those that do not count included, baseline by baseline. Times × baselines are not held. */
export function* tracks(plan: Plan, layoutId: string, observationId: string): Generator<TrackSample> {
  const { stations, track } = setup(plan, layoutId, observationId);
  const { flags } = visibility(track);
  const times = track.hourAngleRad.length;
  const baselines = baselineXyzM(track.stationXyzM);
  const perMetre = wavelengthsPerMetre(track.frequencyHz);
  const uvw = new Float64Array(3);
  let b = 0;
  for (let i = 0; i < stations.length; i++) {
    for (let j = i + 1; j < stations.length; j++, b++) {
      const xyzM = baselines.subarray(3 * b, 3 * b + 3);
      for (let t = 0; t < times; t++) {
        const [uM, vM, wM] = uvwM(xyzM, track.hourAngleRad[t], track.decRad, uvw);
        yield {
          stationA: stations[i].id,
          stationB: stations[j].id,
          hourAngleH: track.hourAngleRad[t] / RAD_PER_HOUR,
          uM,
          vM,
          wM,
          uWavelengths: uM * perMetre,
          vWavelengths: vM * perMetre,
          wWavelengths: wM * perMetre,
          reason: why(stations[i].id, flags[times * i + t]) ?? why(stations[j].id, flags[times * j + t]),
        };
      }
    }
  }
}

function why(station: string, flag: number): string | null {
  return flag === SEES ? null : `${station} ${WHY[flag]}`;
}
