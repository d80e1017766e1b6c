import * as v from "valibot";
import { ARCSEC_PER_RAD, RAD_PER_DEG, SPEED_OF_LIGHT } from "../../../src/base/constants.ts";
import { stationNormals, stationXyzM } from "../../../src/engine/geodesy/originframe.ts";
import { geodeticToEcef } from "../../../src/engine/geodesy/wgs84.ts";
import { beamAt, curvatureEllipse } from "../../../src/engine/measure/lobe.ts";
import { beamSolidAngle } from "../../../src/engine/measure/noise.ts";
import { pairOutcome } from "../../../src/engine/measure/pair.ts";
import { halfPowerWidths, parabola, walkRays } from "../../../src/engine/measure/rays.ts";
import { AIRY_FIRST_ZERO, primaryBeamRad } from "../../../src/engine/measure/scales.ts";
import { exactBeam, exactSamples } from "../../../src/engine/synthesis/exact.ts";
import { squareAxes } from "../../../src/engine/synthesis/plane.ts";
import type { Track } from "../../../src/engine/synthesis/track.ts";
import { antennaSchema } from "../../../src/plan/schema.ts";
import { besselJ, discBeam, ringBeam, squarePlane } from "../../support/analytic.ts";
import { settle } from "../../support/settle.ts";
import { trackOf } from "../../support/track.ts";
import { checksOf, type Figure, type Left } from "../check.ts";
import points from "../data/beam-points.json" with { type: "json" };
import rows from "../data/beams.json" with { type: "json" };
import vectors from "../data/uvw-vectors.json" with { type: "json" };

const round = (fwhm: number) => ({ majorRad: fwhm, minorRad: fwhm, positionAngleRad: 0 });

/** What the program reads off a round beam of about this FWHM: half-level width, first zero, the minimum and what follows it. */
function read(beam: (l: number, m: number) => number, fwhm: number) {
  const at = beamAt([squarePlane(96, fwhm / 32, beam), squarePlane(128, fwhm / 16, beam)]);
  const rays = walkRays(at, round(fwhm));
  const start = rays.minimumRad[0];
  let peak = Number.NaN;
  for (let n = 2, step = fwhm / 40; Number.isNaN(peak) && n < 400; n++) {
    const [a, b, c] = [-1, 0, 1].map((k) => at(0, start + (n + k) * step));
    if (b >= a && b > c) peak = parabola(a, b, c).value;
  }
  return { width: halfPowerWidths(rays)?.majorRad as number, zero: rays.zeroRad[0], minimum: rays.minimum[0], next: peak };
}

const RHO = 0.5; // so that 1/(2ρ) is 1
const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));
const annulus = (e: number) => (l: number, m: number) => {
  const disc = (k: number) => discBeam(RHO * k)(l, m);
  return (disc(1) - e * e * disc(e)) / (1 - e * e);
};
/** Λ functions: the beam of a disc weighted by (1 − r²)^n. */
const lambda = (n: number) => (l: number, m: number) => {
  const x = Math.PI * Math.hypot(l, m);
  if (x < 1e-3) return 1 - (x * x) / (4 * (n + 2));
  let scale = 1;
  for (let k = 1; k <= n + 1; k++) scale *= (2 * k) / x;
  return scale * besselJ(n + 1, x);
};
const squared = (beam: (l: number, m: number) => number) => (l: number, m: number) => beam(l, m) ** 2;

/** Largest separation, by bisection, at which two equal sources are blended. */
function blendedBelow(beam: (l: number, m: number) => number, scale: number): number {
  let [low, high] = [0.5 * scale, 1.5 * scale];
  for (let k = 0; k < 40; k++) {
    const middle = (low + high) / 2;
    const verdict = pairOutcome(beam, middle, 0, 1, Number.POSITIVE_INFINITY, scale / 400)?.verdict;
    if (verdict === "blended") low = middle;
    else high = middle;
  }
  return low;
}

/** A regular east-west line of N stations seen at transit, through the program's whole chain, in units of λ/d. */
function lineArray(n: number): { width: number; minimum: number; firstSidelobe: number; grating: number } {
  const spacing = 100;
  const enu = Array.from({ length: n }, (_, k) => [k * spacing, 0, 0]);
  const track = trackOf(enu, { fromH: 0, toH: 0, decDeg: -31.6, diameterM: 10, frequencyHz: SPEED_OF_LIGHT });
  const { plane } = settle(track, { scheme: "natural", robustness: 0, taperRad: null }, 1e-4);
  const unit = 1 / spacing;
  const image = plane(squareAxes(2048, unit / 12 / n));
  const at = beamAt([image]);
  const rays = walkRays(at, { majorRad: Number.POSITIVE_INFINITY, minorRad: (0.8 * unit) / n, positionAngleRad: 0 });
  const east = rays.halfRad.length / 2; // position angle 90°
  const step = unit / n / 400;
  let first = Number.NaN;
  for (let k = 1; Number.isNaN(first); k++) {
    const r = rays.minimumRad[east] + k * step;
    const [a, b, c] = [at(r - step, 0), at(r, 0), at(r + step, 0)];
    if (b >= a && b > c) first = parabola(a, b, c).value;
  }
  return {
    width: (2 * rays.halfRad[east] * n) / unit,
    minimum: rays.minimum[east],
    // The beam leaves autocorrelations out: F² = (B(N − 1) + 1)/N.
    firstSidelobe: (first * (n - 1) + 1) / n,
    grating: at(unit, 0),
  };
}

/** The figures of the row of a line of N stations. */
const lineRow = (n: number) => (): readonly number[] => {
  const { width, minimum, firstSidelobe, grating } = lineArray(n);
  return [width, firstSidelobe, grating, minimum];
};

/** The invented seven-station array of the vectors, one snapshot. */
function sevenStations(): Track {
  const stations = Object.values(vectors.stations);
  const ecef = Float64Array.from(
    stations.flatMap(({ lat, lon, h }) => [...geodeticToEcef(lat * RAD_PER_DEG, lon * RAD_PER_DEG, h)]),
  );
  const origin = vectors.reference.lon * RAD_PER_DEG;
  const n = stations.length;
  const frequencyHz = SPEED_OF_LIGHT / points.lambda_m;
  return {
    stationXyzM: stationXyzM(ecef, origin),
    normals: stationNormals(
      Float64Array.from(stations, (s) => s.lat * RAD_PER_DEG),
      Float64Array.from(stations, (s) => s.lon * RAD_PER_DEG),
      origin,
    ),
    diameterM: new Float64Array(n).fill(1),
    sefdJy: null,
    lowestRad: new Float64Array(n).fill(0),
    highestRad: new Float64Array(n).fill(Math.PI / 2),
    decRad: points.dec * RAD_PER_DEG,
    hourAngleRad: Float64Array.of(points.ha * 15 * RAD_PER_DEG),
    sampleS: 1,
    frequencyHz,
    channelHz: Float64Array.of(frequencyHz),
    channelWidthHz: 1,
  };
}
const seven = sevenStations();
const farBeam = (): Float64Array => settle(seven, natural, 1e-3).plane(squareAxes(1024, 7.3 / ARCSEC_PER_RAD)).values;
const natural = { scheme: "natural", robustness: 0, taperRad: null } as const;

const answers: { [id: string]: () => readonly Figure[] } = {
  B01: () => {
    const { zero, width, minimum, next } = read(discBeam(RHO), 1.41);
    return [zero, width, minimum, next];
  },
  B02: () => [AIRY_FIRST_ZERO, read(squared(discBeam(RHO)), 1.03).width, read(squared(discBeam(RHO)), 1.03).next],
  B04: () => {
    const { zero, width, minimum } = read(ringBeam(RHO), 0.968);
    return [zero, width, minimum];
  },
  B05: () => {
    const { width, next } = read(squared(ringBeam(RHO)), 0.717);
    return [width, next];
  },
  B06: () => {
    const { width, minimum, next } = read((l, m) => sinc(Math.hypot(l, m)), 1.2);
    return [width, minimum, next];
  },
  B07: () => {
    const { width, next } = read((l, m) => sinc(Math.hypot(l, m)) ** 2, 0.886);
    return [width, next];
  },
  B08: () => [curvatureEllipse(1, 0, 1).majorRad * Math.sqrt(8 * Math.LN2)],
  B09: () => [
    curvatureEllipse(1, 0, 1).majorRad * 2 * Math.PI,
    beamSolidAngle(1, 1),
    curvatureEllipse(1, 0, 1).majorRad / Math.sqrt(8 * Math.LN2),
  ],
  B10: () => [(curvatureEllipse(1, 0, 1).majorRad * Math.sqrt(8 * Math.LN2) * ARCSEC_PER_RAD) / 1000],
  "B11-4": lineRow(4),
  "B11-8": lineRow(8),
  "B11-16": lineRow(16),
  "B11-27": lineRow(27),
  "B11-64": lineRow(64),
  B12: () => [lineArray(4).firstSidelobe],
  B15: () => [1 - (pairOutcome(squared(discBeam(RHO)), AIRY_FIRST_ZERO, 0, 1, AIRY_FIRST_ZERO, 0.01)?.dip as number)],
  B16: () => [1 - (pairOutcome((_, m) => sinc(m) ** 2, 1, 0, 1, 1, 0.01)?.dip as number)],
  B17: () => [
    blendedBelow(squared(discBeam(RHO)), 0.95),
    blendedBelow((_, m) => sinc(m) ** 2, 0.83),
    blendedBelow(discBeam(RHO), 1.46),
    blendedBelow((_, m) => Math.exp(-4 * Math.LN2 * m * m), 0.85),
  ],
  B18: () => [1 - (pairOutcome((_, m) => Math.exp(-4 * Math.LN2 * m * m), 1, 0, 1, 1, 1 / 400)?.dip as number)],
  B20: () => [ARCSEC_PER_RAD],
  B02b: () => [primaryBeamRad(v.getDefault(antennaSchema.entries.beamFactor) as number, 1, 1)],
  B21: () => {
    const image = settle(seven, natural, 1e-3).plane(squareAxes(2048, 0.1 / ARCSEC_PER_RAD));
    return points.points.map(({ l_arcsec, m_arcsec }) => {
      const [x, y] = [Math.round(l_arcsec * 10) + 1024, Math.round(m_arcsec * 10) + 1024];
      return image.values[2048 * y + x];
    });
  },
  B21b: () => {
    const exact = exactSamples(seven, { ...natural, fieldRad: 1e-3 });
    return points.points.map(({ l_arcsec, m_arcsec }) => exactBeam(exact, l_arcsec / ARCSEC_PER_RAD, m_arcsec / ARCSEC_PER_RAD));
  },
  B22: () => {
    const { sums } = settle(seven, natural, 1e-3);
    const { majorRad, minorRad, positionAngleRad } = curvatureEllipse(
      sums.uu / sums.weight,
      sums.uv / sums.weight,
      sums.vv / sums.weight,
    );
    return [majorRad * ARCSEC_PER_RAD, minorRad * ARCSEC_PER_RAD, positionAngleRad / RAD_PER_DEG];
  },
  B22b: () => {
    const image = settle(seven, natural, 1e-3).plane(squareAxes(256, 0.08 / ARCSEC_PER_RAD));
    const about = { majorRad: 2.8 / ARCSEC_PER_RAD, minorRad: 1.8 / ARCSEC_PER_RAD, positionAngleRad: 0.3 };
    const widths = halfPowerWidths(walkRays(beamAt([image]), about));
    return [widths?.majorRad ?? Number.NaN, widths?.minorRad ?? Number.NaN].map((rad) => rad * ARCSEC_PER_RAD);
  },
  B23: () => {
    const values = farBeam();
    return [Math.sqrt(values.reduce((sum, v) => sum + v * v, 0) / values.length) * Math.sqrt(42)];
  },
  B23b: () => [Math.max(0, -1 / 6 - farBeam().reduce((least, v) => Math.min(least, v), 0))],
};
for (const e of [0.1, 0.2, 0.5]) {
  answers[`B13-${e}`] = () => {
    const { width, zero, minimum } = read(annulus(e), 1.38);
    return [width, zero, minimum];
  };
}
for (const [n, fwhm] of [1.41, 1.75, 2.04].entries()) {
  answers[`B14-${n}`] = () => {
    const { width, minimum } = read(lambda(n), fwhm);
    const dish = read(squared(lambda(n)), fwhm / 1.38);
    return [width, minimum, dish.width, 10 * Math.log10(dish.next)];
  };
}

/** Section 4: beams in closed form, and a snapshot computed by others. */
export const beamChecks = checksOf(rows, answers);

export const beamsLeft: Left = {
  B03: "encircled energy is not a figure of this program",
  B19: "an empirical rule for eyes, from memory",
};
