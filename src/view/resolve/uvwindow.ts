import type { UvDensity } from "../../assess/result.ts";

/**
 * The part of a uv grid that reaches `halfWavelengths` from its centre, cell for cell: a grid drawn with room for a moving
 * station is shown at the scale of the settled one before it.
 */
export function windowed(uv: UvDensity, halfWavelengths: number): { readonly counts: Float32Array; readonly size: number } {
  const reach = Math.round(halfWavelengths / uv.cellWavelengths);
  const size = 2 * reach;
  if (size === uv.size) return { counts: uv.counts, size };
  const counts = new Float32Array(size * size);
  const shift = uv.size / 2 - reach;
  for (let y = Math.max(0, -shift); y < Math.min(size, uv.size - shift); y++) {
    for (let x = Math.max(0, -shift); x < Math.min(size, uv.size - shift); x++) {
      counts[size * y + x] = uv.counts[uv.size * (y + shift) + x + shift];
    }
  }
  return { counts, size };
}
