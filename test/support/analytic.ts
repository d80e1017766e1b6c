import type { BeamPlane, PlaneAxes } from "../../src/engine/synthesis/plane.ts";
import { squareAxes } from "../../src/engine/synthesis/plane.ts";

/** A beam given by formula on an image. */
export function planeOf(axes: PlaneAxes, beam: (l: number, m: number) => number): BeamPlane {
  const { size, xl, xm, yl, ym } = axes;
  const values = new Float64Array(size * size);
  for (let y = 0; y < size; y++) {
    for (let x = 0; x < size; x++) {
      const [a, b] = [x - size / 2, y - size / 2];
      values[size * y + x] = beam(a * xl + b * yl, a * xm + b * ym);
    }
  }
  return { ...axes, values };
}

export function squarePlane(size: number, pixelRad: number, beam: (l: number, m: number) => number): BeamPlane {
  return planeOf(squareAxes(size, pixelRad), beam);
}

/** Bessel functions of the first kind, whole order, by their integral (Abramowitz & Stegun 1964, 9.1.21), exact to rounding. */
export function besselJ(order: number, x: number): number {
  const n = 64 + 2 * Math.ceil(Math.abs(x));
  let sum = 0;
  for (let k = 0; k < n; k++) {
    const t = (Math.PI * (k + 0.5)) / n;
    sum += Math.cos(order * t - x * Math.sin(t));
  }
  return sum / n;
}

/** Beam of a uniform uv disc of radius ρ wavelengths: 2J₁(x)/x, x = 2πρθ. */
export function discBeam(rho: number): (l: number, m: number) => number {
  return (l, m) => {
    const x = 2 * Math.PI * rho * Math.hypot(l, m);
    return x < 1e-9 ? 1 : (2 * besselJ(1, x)) / x;
  };
}

/** Beam of a thin uv ring: J₀(x). */
export function ringBeam(rho: number): (l: number, m: number) => number {
  return (l, m) => besselJ(0, 2 * Math.PI * rho * Math.hypot(l, m));
}

/** Elliptical Gaussian, FWHM major and minor, position angle north through east. */
export function gaussianBeam(major: number, minor: number, positionAngle: number): (l: number, m: number) => number {
  return (l, m) => {
    const along = l * Math.sin(positionAngle) + m * Math.cos(positionAngle);
    const across = l * Math.cos(positionAngle) - m * Math.sin(positionAngle);
    return Math.exp(-4 * Math.LN2 * ((along / major) ** 2 + (across / minor) ** 2));
  };
}
