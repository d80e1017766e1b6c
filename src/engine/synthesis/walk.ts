import type { Track } from "./track.ts";
import { SEES, type Visibility } from "./visibility.ts";

/** The samples of one baseline that count, reused from call to call: copy what must outlive the visit. */
export interface BaselineRun {
  /** Station rows, i < j; the baseline is position of j minus position of i. */
  i: number;
  j: number;
  /** Samples that count; the arrays hold this many, in order of time. */
  count: number;
  /** Metres: u east, v north, w toward the source. */
  readonly uM: Float64Array;
  readonly vM: Float64Array;
  readonly wM: Float64Array;
}

/** Hour-angle tables and scratch for walking the baselines of one track; one walk at a time. */
export class Walk {
  readonly track: Track;
  readonly baselineCount: number;
  private readonly seen: Visibility;
  private readonly sinH: Float64Array;
  private readonly cosH: Float64Array;
  private readonly run: BaselineRun;

  constructor(track: Track, seen: Visibility) {
    this.track = track;
    this.seen = seen;
    const n = track.diameterM.length;
    const times = track.hourAngleRad.length;
    this.baselineCount = (n * (n - 1)) / 2;
    this.sinH = track.hourAngleRad.map(Math.sin);
    this.cosH = track.hourAngleRad.map(Math.cos);
    this.run = { i: 0, j: 0, count: 0, uM: new Float64Array(times), vM: new Float64Array(times), wM: new Float64Array(times) };
  }

  /**
   * Visits every baseline whose first station lies in [fromStation, toStation), in station order, with its samples that
   * count (both stations see the source, neither is shadowed). Thompson, Moran & Swenson, 3rd ed., eq. 4.1.
   */
  baselines(fromStation: number, toStation: number, visit: (run: BaselineRun) => void): void {
    const { stationXyzM, hourAngleRad, decRad } = this.track;
    const { flags } = this.seen;
    const { sinH, cosH, run } = this;
    const { uM, vM, wM } = run;
    const n = this.track.diameterM.length;
    const times = hourAngleRad.length;
    const cosDec = Math.cos(decRad);
    const sinDec = Math.sin(decRad);
    for (let i = fromStation; i < toStation; i++) {
      for (let j = i + 1; j < n; j++) {
        const x = stationXyzM[3 * j] - stationXyzM[3 * i];
        const y = stationXyzM[3 * j + 1] - stationXyzM[3 * i + 1];
        const z = stationXyzM[3 * j + 2] - stationXyzM[3 * i + 2];
        let count = 0;
        for (let t = 0; t < times; t++) {
          if ((flags[times * i + t] | flags[times * j + t]) !== SEES) continue;
          const along = x * cosH[t] - y * sinH[t];
          uM[count] = x * sinH[t] + y * cosH[t];
          vM[count] = z * cosDec - along * sinDec;
          wM[count] = along * cosDec + z * sinDec;
          count++;
        }
        if (count === 0) continue;
        run.i = i;
        run.j = j;
        run.count = count;
        visit(run);
      }
    }
  }
}
