import { SPEED_OF_LIGHT } from "../../base/constants.ts";
import type { Walk } from "./walk.ts";

/** What the samples that count span. Lengths in wavelengths are the largest over the channels. */
export interface Extent {
  /** Samples that count, every channel counted. */
  samples: number;
  longestM: number;
  shortestM: number;
  maxUM: number;
  maxVM: number;
  maxWM: number;
  /** Largest ratio of neighbouring sample radii, at the centre frequency; 1 when all radii are equal. */
  largestRadialGap: number;
}

/** Radii are sorted into this many logarithmic bins an e-fold: gaps above 0.05 % are found exactly, smaller ones do not matter. */
const BINS_PER_EFOLD = 2048;
const LOG_RANGE = 40;

/** First pass over the samples: counts, projected lengths and the largest gap in radius. */
export function extent(walk: Walk): Extent {
  const bins = BINS_PER_EFOLD * LOG_RANGE;
  const low = new Float64Array(bins).fill(Number.POSITIVE_INFINITY);
  const high = new Float64Array(bins);
  const out: Extent = {
    samples: 0,
    longestM: 0,
    shortestM: Number.POSITIVE_INFINITY,
    maxUM: 0,
    maxVM: 0,
    maxWM: 0,
    largestRadialGap: 1,
  };
  const stations = walk.track.diameterM.length;
  walk.baselines(0, stations, ({ count, uM, vM, wM }) => {
    out.samples += count * walk.track.channelHz.length;
    for (let k = 0; k < count; k++) {
      const u = Math.abs(uM[k]);
      const v = Math.abs(vM[k]);
      const w = Math.abs(wM[k]);
      const r = Math.sqrt(u * u + v * v);
      if (u > out.maxUM) out.maxUM = u;
      if (v > out.maxVM) out.maxVM = v;
      if (w > out.maxWM) out.maxWM = w;
      if (r > out.longestM) out.longestM = r;
      if (r < out.shortestM) out.shortestM = r;
      if (r > 0) {
        const bin = Math.min(bins - 1, Math.max(0, Math.floor((Math.log(r) + LOG_RANGE / 2) * BINS_PER_EFOLD)));
        if (r < low[bin]) low[bin] = r;
        if (r > high[bin]) high[bin] = r;
      }
    }
  });
  let previous = 0;
  for (let bin = 0; bin < bins; bin++) {
    if (high[bin] === 0) continue;
    if (previous > 0) out.largestRadialGap = Math.max(out.largestRadialGap, low[bin] / previous);
    previous = high[bin];
  }
  return out;
}

/** Metres to wavelengths at a frequency. */
export function wavelengthsPerMetre(frequencyHz: number): number {
  return frequencyHz / SPEED_OF_LIGHT;
}
