/** An arc of a baseline's track: equal steps of hour angle from `startRad`. */
export interface Arc {
  readonly xM: number;
  readonly yM: number;
  readonly zM: number;
  readonly startRad: number;
  readonly stepRad: number;
  readonly count: number;
}

/**
 * Adds `step` to the cell nearest to each sample of an arc, one Hermitian half only; `foldedCounts` adds the other.
 *
 * The track is a circle turned by equal angles, so each sample follows from the one before by a rotation; two chains of
 * every other sample run side by side, since one would wait for itself. Error after 1000 steps: 1e-13 of the length.
 *
 * @param counts - (size, size), (u, v) nearest cell (x, y) at `size * (y + size/2) + x + size/2`.
 * @param cellsPerMetre - The whole arc must fall on the grid: at most `arcReach` × this below size/2 − 1.
 */
export function countArc(counts: Int32Array, size: number, cellsPerMetre: number, decRad: number, arc: Arc, step: number): void {
  const { count, startRad, stepRad } = arc;
  const x = arc.xM * cellsPerMetre;
  const y = arc.yM * cellsPerMetre;
  const sinDec = Math.sin(decRad);
  // Truncation rounds half up once everything is made positive.
  const offset = size / 2 + 0.5;
  const rise = arc.zM * cellsPerMetre * Math.cos(decRad) + offset;
  let [p, q] = turned(x, y, startRad);
  let [p2, q2] = turned(x, y, startRad + stepRad);
  const cos = Math.cos(2 * stepRad);
  const sin = Math.sin(2 * stepRad);
  let k = 0;
  for (; k + 1 < count; k += 2) {
    const a = size * ((rise - q * sinDec) | 0) + ((p + offset) | 0);
    const b = size * ((rise - q2 * sinDec) | 0) + ((p2 + offset) | 0);
    counts[a] = (counts[a] + step) | 0;
    counts[b] = (counts[b] + step) | 0;
    const next = p * cos + q * sin;
    q = q * cos - p * sin;
    p = next;
    const next2 = p2 * cos + q2 * sin;
    q2 = q2 * cos - p2 * sin;
    p2 = next2;
  }
  if (k < count) counts[size * ((rise - q * sinDec) | 0) + ((p + offset) | 0)] += step;
}

/** u and the part of v that turns, at an hour angle: (X sin H + Y cos H, X cos H − Y sin H). */
function turned(x: number, y: number, hourAngleRad: number): [number, number] {
  const sin = Math.sin(hourAngleRad);
  const cos = Math.cos(hourAngleRad);
  return [x * sin + y * cos, x * cos - y * sin];
}

/** Largest |u| or |v| an arc can reach, metres. */
export function arcReach(arc: Arc, decRad: number): number {
  const circle = Math.hypot(arc.xM, arc.yM);
  return Math.max(circle, circle * Math.abs(Math.sin(decRad)) + Math.abs(arc.zM * Math.cos(decRad)));
}

/** Counts with each sample's conjugate added: what a point-symmetric grid holds. Row and column 0 have no mirror and stay. */
export function foldedCounts(counts: Int32Array, size: number): Float32Array {
  const out = new Float32Array(counts.length);
  for (let y = 1; y < size; y++) {
    for (let x = 1; x < size; x++) out[size * y + x] = counts[size * y + x] + counts[size * (size - y) + size - x];
  }
  return out;
}

/**
 * Runs of times at which two stations' samples count, as [from, to) pairs.
 *
 * @param flags - (N, T) of `visibility`.
 */
export function* sharedRuns(flags: Uint8Array, times: number, i: number, j: number): Generator<readonly [number, number]> {
  let from = -1;
  for (let t = 0; t < times; t++) {
    const counts = (flags[times * i + t] | flags[times * j + t]) === 0;
    if (counts && from < 0) from = t;
    if (!counts && from >= 0) {
      yield [from, t];
      from = -1;
    }
  }
  if (from >= 0) yield [from, times];
}
