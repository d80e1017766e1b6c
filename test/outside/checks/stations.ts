import { baselineLengthsM, baselineXyzM } from "../../../src/engine/array/baselines.ts";
import { stationXyzM } from "../../../src/engine/geodesy/originframe.ts";
import { geodeticToEcef } from "../../../src/engine/geodesy/wgs84.ts";
import vectors from "../data/uvw-vectors.json" with { type: "json" };

const DEG = Math.PI / 180;

/** The seven invented stations of the uvw vectors, by way of our own frames. */
export const ecefM = Float64Array.from(
  Object.values(vectors.stations).flatMap(({ lat, lon, h }) => geodeticToEcef(lat * DEG, lon * DEG, h)),
);
export const baselines = baselineXyzM(stationXyzM(ecefM, vectors.reference.lon * DEG));
export const latitudeDeg = vectors.reference.lat;

export const lengthsM = (xyzM: Float64Array): readonly number[] => [...baselineLengthsM(xyzM)];

/** X, Y, Z of one baseline, by name. */
export function baselineNamed(name: string): Float64Array {
  const row = vectors.baseline_order.indexOf(name);
  return baselines.slice(3 * row, 3 * row + 3);
}
