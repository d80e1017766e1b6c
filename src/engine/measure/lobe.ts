import { type BeamPlane, interpolate, planePixel, planeReach } from "../synthesis/plane.ts";

/** An ellipse about the peak. */
export interface Ellipse {
  /** Full widths, radians; `major` ≥ `minor`. */
  readonly majorRad: number;
  readonly minorRad: number;
  /** Of the major axis, north through east, [0, π). */
  readonly positionAngleRad: number;
}

const FWHM_PER_SIGMA = Math.sqrt(8 * Math.LN2);

/**
 * The Gaussian with the beam's curvature at its peak, from the second moments of the weighted uv distribution:
 * FWHM = √(8 ln 2)/(2π σ_uv) along each principal axis.
 *
 * @param uu - Mean of u², u·v and v², wavelengths².
 * @param uv - Goes with uu.
 * @param vv - Goes with uu.
 * @returns Widths may be infinite: a line of samples has no width across it.
 */
export function curvatureEllipse(uu: number, uv: number, vv: number): Ellipse {
  const mean = (uu + vv) / 2;
  const spread = Math.hypot((uu - vv) / 2, uv);
  // The smaller eigenvalue by the determinant: mean − spread cancels for thin distributions.
  const large = mean + spread;
  const small = large > 0 ? Math.max(0, (uu * vv - uv * uv) / large) : 0;
  const width = (variance: number): number => FWHM_PER_SIGMA / (2 * Math.PI * Math.sqrt(variance));
  // The uv distribution is longest at angle θ from u toward v; the beam is widest across it, and p runs from m toward l.
  const theta = 0.5 * Math.atan2(2 * uv, uu - vv);
  return { majorRad: width(small), minorRad: width(large), positionAngleRad: wrapAngle(-theta) };
}

/** A position angle of an axis in [0, π). */
export function wrapAngle(angle: number): number {
  const wrapped = angle - Math.PI * Math.floor(angle / Math.PI);
  return wrapped > 0 && wrapped < Math.PI ? wrapped : 0;
}

/** Direction cosines of a step of one radian at a position angle, north through east. */
export function alongAngle(positionAngleRad: number): { l: number; m: number } {
  return { l: Math.sin(positionAngleRad), m: Math.cos(positionAngleRad) };
}

/**
 * Unweighted least-squares elliptical Gaussian in linear intensity, peak fixed at 1 and centred, over the samples at or
 * above half that are connected to the peak.
 *
 * @param plane - At least 20 pixels a minor FWHM.
 * @returns The ellipse, or undefined where the half-level region reaches the plane's edge (its size is then not known),
 *   or is too small to hold a shape.
 *
 * Gauss–Newton on exp(−(a x² + 2 b x y + c y²)) in pixels, started from the region's extent; converges in a few steps
 * since the samples above half differ little from the curve.
 */
export function fitLobe(plane: BeamPlane): Ellipse | undefined {
  const region = regionAboveHalf(plane);
  if (!region || region.x.length < 9) return undefined;
  const { x, y, value } = region;
  // Start: −ln(value) is the quadratic form itself.
  let [a, b, c] = solveForm(
    x,
    y,
    value.map((v) => -Math.log(v)),
    undefined,
  );
  for (let step = 0; step < 50; step++) {
    const model = x.map((_, k) => Math.exp(-(a * x[k] * x[k] + 2 * b * x[k] * y[k] + c * y[k] * y[k])));
    const [da, db, dc] = solveForm(
      x,
      y,
      model.map((g, k) => g - value[k]),
      model,
    );
    a += da;
    b += db;
    c += dc;
    if (Math.abs(da) + Math.abs(db) + Math.abs(dc) < 1e-13 * (Math.abs(a) + Math.abs(c))) break;
  }
  // From pixels to directions: the form is xᵀ Q x with x = T (l, m).
  const { xl, xm, yl, ym } = plane;
  const det = xl * ym - xm * yl;
  const [p, q, r, s] = [ym / det, -yl / det, -xm / det, xl / det];
  const ll = a * p * p + 2 * b * p * r + c * r * r;
  const lm = a * p * q + b * (p * s + q * r) + c * r * s;
  const mm = a * q * q + 2 * b * q * s + c * s * s;
  const mean = (ll + mm) / 2;
  const spread = Math.hypot((ll - mm) / 2, lm);
  const steep = mean + spread;
  const gentle = (ll * mm - lm * lm) / steep;
  if (!(gentle > 0)) return undefined;
  const width = (form: number): number => 2 * Math.sqrt(Math.LN2 / form);
  // The form is steepest at angle θ from l toward m, so the major axis is across it.
  const theta = 0.5 * Math.atan2(2 * lm, ll - mm);
  return { majorRad: width(gentle), minorRad: width(steep), positionAngleRad: wrapAngle(-theta) };
}

/** Least squares for (a, b, c) of a x² + 2 b x y + c y² against `target`, each row scaled by `factor` where given. */
function solveForm(
  x: Float64Array,
  y: Float64Array,
  target: Float64Array,
  factor: Float64Array | undefined,
): [number, number, number] {
  const n = [0, 0, 0, 0, 0, 0];
  const rhs = [0, 0, 0];
  for (let k = 0; k < x.length; k++) {
    const f = factor ? factor[k] : 1;
    const r0 = f * x[k] * x[k];
    const r1 = f * 2 * x[k] * y[k];
    const r2 = f * y[k] * y[k];
    n[0] += r0 * r0;
    n[1] += r0 * r1;
    n[2] += r0 * r2;
    n[3] += r1 * r1;
    n[4] += r1 * r2;
    n[5] += r2 * r2;
    rhs[0] += r0 * target[k];
    rhs[1] += r1 * target[k];
    rhs[2] += r2 * target[k];
  }
  // Symmetric 3 × 3 by cofactors.
  const [n00, n01, n02, n11, n12, n22] = n;
  const c00 = n11 * n22 - n12 * n12;
  const c01 = n02 * n12 - n01 * n22;
  const c02 = n01 * n12 - n02 * n11;
  const c11 = n00 * n22 - n02 * n02;
  const c12 = n01 * n02 - n00 * n12;
  const c22 = n00 * n11 - n01 * n01;
  const det = n00 * c00 + n01 * c01 + n02 * c02;
  return [
    (c00 * rhs[0] + c01 * rhs[1] + c02 * rhs[2]) / det,
    (c01 * rhs[0] + c11 * rhs[1] + c12 * rhs[2]) / det,
    (c02 * rhs[0] + c12 * rhs[1] + c22 * rhs[2]) / det,
  ];
}

/** Pixels ≥ 0.5 four-connected to the peak; undefined when they touch the edge. */
function regionAboveHalf(plane: BeamPlane): { x: Float64Array; y: Float64Array; value: Float64Array } | undefined {
  const { size, values } = plane;
  const centre = (size / 2) * size + size / 2;
  const seen = new Uint8Array(size * size);
  const stack = [centre];
  const found: number[] = [];
  seen[centre] = 1;
  while (stack.length > 0) {
    const at = stack.pop() as number;
    found.push(at);
    const x = at % size;
    const y = (at - x) / size;
    if (x === 0 || y === 0 || x === size - 1 || y === size - 1) return undefined;
    for (const next of [at - 1, at + 1, at - size, at + size]) {
      if (seen[next] || values[next] < 0.5) continue;
      seen[next] = 1;
      stack.push(next);
    }
  }
  found.sort((p, q) => p - q);
  return {
    x: Float64Array.from(found, (at) => (at % size) - size / 2),
    y: Float64Array.from(found, (at) => Math.floor(at / size) - size / 2),
    value: Float64Array.from(found, (at) => Math.min(1, values[at])),
  };
}

/** A beam known on one or more planes, finest first; NaN where none reaches. */
export type BeamAt = (l: number, m: number) => number;

export function beamAt(planes: readonly BeamPlane[]): BeamAt {
  return (l, m) => {
    for (const plane of planes) {
      const { x, y } = planePixel(plane, l, m);
      const reach = planeReach(plane);
      if (Math.abs(x) <= reach && Math.abs(y) <= reach) return interpolate(plane, x, y);
    }
    return Number.NaN;
  };
}
