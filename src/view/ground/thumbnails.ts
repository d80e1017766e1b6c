import type { Picture } from "../../assess/result.ts";
import { ARCSEC_PER_RAD } from "../../base/constants.ts";
import { fixed, joined, plain } from "../numbers.ts";
import { resampled } from "../resolve/sample.ts";
import { unitFor } from "../units.ts";
import { niceAtMost } from "./nice.ts";

/** A square image ready to paint, `values[size * y + x]`, and the line under it. */
export interface Thumbnail {
  readonly size: number;
  readonly values: Float32Array;
  readonly caption: string;
  /** What the image spans: arcsec across, or wavelengths from the middle to the edge. Hand it back to hold it while a station moves. */
  readonly span: number;
}

/**
 * The beam about twelve widths across, a round angle: the main lobe and its first sidelobes.
 *
 * @param held - Arcsec across, to keep the scale of an image before.
 */
export function beamThumbnail({ beam, result }: Picture, size: number, held?: number): Thumbnail | null {
  if (!beam) return null;
  const wholeArcsec = beam.size * beam.pixelRad * ARCSEC_PER_RAD;
  const major = result.beam.majorArcsec;
  const span = held ?? niceAtMost(major ? Math.min(wholeArcsec, 12 * major) : wholeArcsec);
  const unit = unitFor("angle", span);
  const caption = `${joined(plain(span / unit.size), unit.word)} across, east left`;
  return { size, values: resampled(beam, span / 2, size), caption, span };
}

/**
 * The uv plane out to the longest sample, cells pooled down to no fewer than `leastPx` a side.
 *
 * @param held - Wavelengths to the edge, to keep the scale of an image before.
 */
export function uvThumbnail({ uv }: Picture, leastPx: number, held?: number): Thumbnail | null {
  if (!uv) return null;
  const whole = (uv.size / 2) * uv.cellWavelengths;
  const span = held ?? whole;
  let pool = 1;
  while (uv.size % (2 * pool) === 0 && uv.size / (2 * pool) >= leastPx) pool *= 2;
  const size = uv.size / pool;
  const unit = unitFor("wavelengths", span);
  const caption = `±${joined(plain(span / unit.size, span / unit.size < 10 ? 2 : 3), unit.word)}`;
  return { ...middle(pooled(uv.counts, uv.size, pool), size, 2 * Math.round((size * span) / whole / 2)), caption, span };
}

/** The middle `side` cells, or the image with empty cells round it where `side` is larger; both sides even. */
function middle(values: Float32Array, size: number, side: number): { size: number; values: Float32Array } {
  if (side === size) return { size, values };
  const cut = new Float32Array(side * side);
  const skip = (size - side) / 2;
  for (let y = Math.max(0, -skip); y < Math.min(side, size - skip); y++) {
    const from = size * (y + skip);
    const row = values.subarray(from + Math.max(0, skip), from + Math.min(size, skip + side));
    cut.set(row, side * y + Math.max(0, -skip));
  }
  return { size: side, values: cut };
}

function pooled(counts: Float32Array, size: number, pool: number): Float32Array {
  if (pool === 1) return counts;
  const side = size / pool;
  const sums = new Float32Array(side * side);
  for (let y = 0; y < size; y++) {
    const row = Math.floor(y / pool) * side;
    for (let x = 0; x < size; x++) sums[row + Math.floor(x / pool)] += counts[size * y + x];
  }
  return sums;
}

/** The size of the beam in one line, and whether it is a preview. */
export function beamLine({ settled, result: { beam } }: Picture): string {
  const { majorArcsec: major, minorArcsec: minor, positionAngleDeg: angle } = beam;
  if (major === null || minor === null) return settled ? "No beam: see the ledger for why" : "Preview, coarse grid";
  const unit = unitFor("angle", major);
  const width = (arcsec: number): string => joined(fixed(arcsec / unit.size, unit.decimals), unit.word);
  const size = `${width(major)} × ${width(minor)}${angle === null ? "" : ` at PA ${fixed(angle, 0)}°`}`;
  return settled ? size : `${size}, preview`;
}
