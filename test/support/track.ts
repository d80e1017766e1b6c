import { channelCentres, sampleTimes, type Track } from "../../src/engine/synthesis/track.ts";
import { parkMiller } from "./random.ts";

export interface MadeUp {
  readonly stations: number;
  readonly spanM?: number;
  readonly latitudeDeg?: number;
  readonly decDeg?: number;
  readonly fromH?: number;
  readonly toH?: number;
  readonly integrationS?: number;
  readonly frequencyHz?: number;
  readonly bandwidthHz?: number;
  readonly channels?: number;
  readonly diameterM?: number;
  readonly lowestDeg?: number;
  readonly highestDeg?: number;
  readonly sefdJy?: readonly number[];
  readonly seed?: number;
}

const DEG = Math.PI / 180;

/** A made-up array on a plane: stations at random in a square, all normals alike. */
export function madeUpTrack(given: MadeUp): Track {
  const n = given.stations;
  const random = parkMiller(given.seed ?? 7);
  const span = given.spanM ?? 10_000;
  const enu = Array.from({ length: n }, () => [(random() - 0.5) * span, (random() - 0.5) * span, (random() - 0.5) * span * 0.005]);
  return trackOf(enu, given);
}

/** A track of stations given east, north, up of the origin, in metres. */
export function trackOf(enuM: readonly (readonly number[])[], given: Omit<MadeUp, "stations">): Track {
  const n = enuM.length;
  const lat = (given.latitudeDeg ?? -31.6) * DEG;
  const stationXyzM = new Float64Array(3 * n);
  const normals = new Float64Array(3 * n);
  for (const [i, [e, no, up]] of enuM.entries()) {
    stationXyzM.set([-Math.sin(lat) * no + Math.cos(lat) * up, e, Math.cos(lat) * no + Math.sin(lat) * up], 3 * i);
    normals.set([Math.cos(lat), 0, Math.sin(lat)], 3 * i);
  }
  const frequencyHz = given.frequencyHz ?? 1.42e9;
  const channels = given.channels ?? 1;
  const bandwidthHz = given.bandwidthHz ?? 1e6;
  const { hourAngleRad, sampleS } = sampleTimes(given.fromH ?? -4, given.toH ?? 4, given.integrationS ?? 400);
  return {
    stationXyzM,
    normals,
    diameterM: new Float64Array(n).fill(given.diameterM ?? 12),
    sefdJy: given.sefdJy
      ? Float64Array.from(enuM, (_, i) => (given.sefdJy as number[])[i % (given.sefdJy as number[]).length])
      : null,
    lowestRad: new Float64Array(n).fill((given.lowestDeg ?? 15) * DEG),
    highestRad: new Float64Array(n).fill((given.highestDeg ?? 90) * DEG),
    decRad: (given.decDeg ?? -30) * DEG,
    hourAngleRad,
    sampleS,
    frequencyHz,
    channelHz: channelCentres(frequencyHz, bandwidthHz, channels),
    channelWidthHz: bandwidthHz / channels,
  };
}
