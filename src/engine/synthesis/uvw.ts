import { DomainError } from "../../base/errors.ts";

/**
 * Baselines seen along the axes of one source direction.
 *
 * @param baselineXyzM - (B, 3) row-major, metres, in the XYZ frame of the origin's meridian (`stationXyzM`): row b is
 *   station j minus station i, component k at `3 * b + k`.
 * @param hourAngleRad - At the origin's meridian, radians, any finite value.
 * @param decRad - Declination of date, radians, [−π/2, π/2].
 * @param out - Where to write; may be `baselineXyzM` itself. A new array if left out.
 * @returns `out`, (B, 3) row-major, metres: u east, v north, w toward the source. Swapping i and j flips every sign.
 * @throws {@link DomainError} for a non-finite angle, a declination past a pole, a length not divisible by 3, or an `out` of
 *   another length.
 *
 * Accuracy: rounding only, within 4 ε of the baseline length (11 nm over an Earth diameter). No precession, aberration or refraction: the direction must already be of date.
 * Source: Thompson, Moran & Swenson, Interferometry and Synthesis in Radio Astronomy, 3rd ed. (2017), eq. 4.1.
 */
export function uvwM(
  baselineXyzM: Float64Array,
  hourAngleRad: number,
  decRad: number,
  out: Float64Array = new Float64Array(baselineXyzM.length),
): Float64Array {
  if (!Number.isFinite(hourAngleRad)) throw new DomainError("hourAngleRad", hourAngleRad, "a finite angle in radians");
  if (!(Math.abs(decRad) <= Math.PI / 2)) throw new DomainError("decRad", decRad, "radians in [-π/2, π/2]", "Were degrees passed?");
  if (baselineXyzM.length % 3 !== 0) throw new DomainError("baselineXyzM.length", baselineXyzM.length, "a multiple of 3");
  if (out.length !== baselineXyzM.length)
    throw new DomainError("out.length", out.length, `${baselineXyzM.length}, as baselineXyzM has`);
  const [sinH, cosH] = [Math.sin(hourAngleRad), Math.cos(hourAngleRad)];
  const [sinDec, cosDec] = [Math.sin(decRad), Math.cos(decRad)];
  for (let k = 0; k < baselineXyzM.length; k += 3) {
    const x = baselineXyzM[k];
    const y = baselineXyzM[k + 1];
    const z = baselineXyzM[k + 2];
    const along = x * cosH - y * sinH;
    out[k] = x * sinH + y * cosH;
    out[k + 1] = z * cosDec - along * sinDec;
    out[k + 2] = along * cosDec + z * sinDec;
  }
  return out;
}
