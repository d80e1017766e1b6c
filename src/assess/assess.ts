import type { Checkpoint } from "../base/checkpoint.ts";
import { ARCSEC_PER_RAD, RAD_PER_DEG, SIDEREAL_RATE, SPEED_OF_LIGHT } from "../base/constants.ts";
import { coverage } from "../engine/measure/coverage.ts";
import { correlatorLoad, fieldNeeds } from "../engine/measure/load.ts";
import { curvatureEllipse } from "../engine/measure/lobe.ts";
import { fraunhoferM } from "../engine/measure/nearfield.ts";
import { beamSolidAngle, brightnessK, imageNoiseJy } from "../engine/measure/noise.ts";
import { type PairOutcome, pairOutcome } from "../engine/measure/pair.ts";
import { cyclicExtreme, halfPowerWidths, radiusAt } from "../engine/measure/rays.ts";
import {
  AIRY_FIRST_ZERO,
  bandwidthSmearingRad,
  DISC_HALF_VISIBILITY,
  GAUSSIAN_HALF_VISIBILITY,
  LARGEST_SCALE,
  planarRadiusRad,
  primaryBeamRad,
  timeSmearingRad,
} from "../engine/measure/scales.ts";
import { positionTolerance } from "../engine/measure/tolerance.ts";
import { protectionOf } from "../engine/sky/bands.ts";
import { noiseFactor } from "../engine/synthesis/sums.ts";
import { TOO_HIGH, TOO_LOW, type Visibility } from "../engine/synthesis/visibility.ts";
import type { Observation, Pair, Plan } from "../plan/schema.ts";
import { airOver, NO_AIR } from "./air.ts";
import { type MeasuredBeam, measureBeam } from "./beam.ts";
import type { AssessResult, BeamFigures, FullField, PairResult, PositionErrorResult } from "./result.ts";
import { setup } from "./setup.ts";
import { type Synthesis, synthesize } from "./synthesis.ts";

export interface AssessOptions {
  readonly pair?: Pair | null;
  /** In place of the observation's own. */
  readonly sidelobeRadiusArcsec?: number | null;
}

/** A result with the beam it was read from, for those who draw it. */
export interface Assessment {
  readonly result: AssessResult;
  readonly synthesis: Synthesis;
  readonly beam: MeasuredBeam | undefined;
}

/**
 * Everything the program says of one layout and one observation.
 *
 * @throws {@link DomainError} for an id the plan does not have.
 */
export async function assess(
  plan: Plan,
  layoutId: string,
  observationId: string,
  options?: AssessOptions,
  checkpoint?: Checkpoint,
): Promise<AssessResult> {
  return (await assessment(plan, layoutId, observationId, options, checkpoint)).result;
}

export async function assessment(
  plan: Plan,
  layoutId: string,
  observationId: string,
  options?: AssessOptions,
  checkpoint?: Checkpoint,
): Promise<Assessment> {
  const synthesis = await synthesize(setup(plan, layoutId, observationId), checkpoint);
  const radius = options?.sidelobeRadiusArcsec ?? synthesis.setup.observation.image.sidelobeRadiusArcsec;
  const beam = await measureBeam(synthesis, radius, checkpoint);
  return { result: figures(synthesis, beam, options?.pair ?? null), synthesis, beam };
}

function figures(synthesis: Synthesis, beam: MeasuredBeam | undefined, pair: Pair | null): AssessResult {
  const { setup: given, seen, extent, topPerMetre, sums } = synthesis;
  const { stations, antennas, observation, track } = given;
  const warnings = [...given.warnings, ...(beam?.warnings ?? [])];
  const wavelengthM = SPEED_OF_LIGHT / observation.frequencyHz;
  const times = track.hourAngleRad.length;
  const kept = extent.samples > 0;
  const lengths = chords(given.ecefM);
  const centrePerMetre = 1 / wavelengthM;
  const longest = extent.longestM * centrePerMetre;
  const shortest = extent.shortestM * centrePerMetre;
  const factor = kept ? noiseFactor(sums) : null;
  const fwhmRad = beam?.lobe ? Math.sqrt(beam.lobe.majorRad * beam.lobe.minorRad) : null;
  const inverse = kept ? inverseSefdSquares(synthesis) : null;
  const air = kept && inverse !== null ? airOver(given, seen, warnings) : NO_AIR;
  const noiseJy =
    inverse === null || factor === null
      ? null
      : imageNoiseJy({
          inverseSefdSquares: inverse,
          channelWidthHz: track.channelWidthHz,
          sampleS: track.sampleS,
          polarizations: observation.polarizations,
          efficiency: observation.efficiency,
          repeats: observation.repeats,
          weightingFactor: factor * (air.noiseFactor ?? 1),
        });
  const smearing = {
    bandwidthArcsec: fwhmRad && ARCSEC_PER_RAD * bandwidthSmearingRad(fwhmRad, observation.frequencyHz, track.channelWidthHz),
    timeArcsec: fwhmRad && ARCSEC_PER_RAD * timeSmearingRad(fwhmRad, track.sampleS),
  };
  const maxW = extent.maxWM * topPerMetre;
  const planarRadiusArcsec = kept && maxW > 0 ? ARCSEC_PER_RAD * planarRadiusRad(maxW) : null;
  const covered = kept && extent.longestM > 0 ? coverage(synthesis.density, extent.longestM * topPerMetre) : null;
  const primaryBeams = Object.fromEntries(
    antennas.map((a) => [a.id, ARCSEC_PER_RAD * primaryBeamRad(a.beamFactor, wavelengthM, a.diameterM)]),
  );
  const shown = beamFigures(beam);
  const pairResult = pair === null ? undefined : pairFigures(beam, pair, warnings);
  warnOfLayout(
    given.stations.map((s) => s.id),
    lengths,
    seen,
    kept,
    warnings,
  );
  warnOfRadius(shown, smearing, planarRadiusArcsec, warnings);
  if (kept && observation.weighting.scheme !== "natural" && factor !== null && factor - 1 < 1e-12) {
    warnings.push(
      `${observation.weighting.scheme} weights equal natural ones: every density cell holds one sample; a shorter integration or a smaller field would tell them apart`,
    );
  }
  if (kept && extent.shortestM === 0) warnings.push("a projected baseline has no length: largest scales cannot be had");
  const scale = (k: number): number | null => (kept && shortest > 0 ? (ARCSEC_PER_RAD * k) / shortest : null);
  const resolution = (k: number): number | null => (kept && longest > 0 ? (ARCSEC_PER_RAD * k) / longest : null);
  const sampleH =
    times === 1 && observation.hourAngle.fromH === observation.hourAngle.toH
      ? (track.sampleS * SIDEREAL_RATE) / 3600
      : (observation.hourAngle.toH - observation.hourAngle.fromH) / times;
  return {
    layout: given.layout.id,
    observation: observation.id,
    stationCount: stations.length,
    baselineCount: (stations.length * (stations.length - 1)) / 2,
    longestBaselineM: lengths.longest,
    shortestBaselineM: lengths.shortest,
    samplesPerBaseline: times,
    samplesKept: extent.samples,
    longestProjectedM: kept ? extent.longestM : null,
    shortestProjectedM: kept ? extent.shortestM : null,
    longestUvWavelengths: kept ? extent.longestM * topPerMetre : null,
    maxWWavelengths: kept ? maxW : null,
    shadowedStationSamples: seen.shadowed,
    visibleStationSamples: seen.visible,
    hoursVisible: seen.timesShared * sampleH,
    coverage: {
      filledFraction: covered?.filledFraction ?? null,
      largestRadialGap: kept && extent.longestM > 0 ? extent.largestRadialGap : null,
      azimuthalUniformity: covered?.azimuthalUniformity ?? null,
    },
    beam: shown,
    ...(pairResult ? { pair: pairResult } : {}),
    apertureResolutionArcsec: { slit: resolution(1), circular: resolution(AIRY_FIRST_ZERO) },
    largestScaleArcsec: scale(LARGEST_SCALE),
    recoverable: { gaussianArcsec: scale(GAUSSIAN_HALF_VISIBILITY), discArcsec: scale(DISC_HALF_VISIBILITY) },
    primaryBeamArcsec: Math.min(...Object.values(primaryBeams)),
    primaryBeams,
    densityFieldArcsec: ARCSEC_PER_RAD * synthesis.density.fieldRad,
    noiseJy,
    weightingNoiseFactor: factor,
    air,
    brightnessNoiseK:
      noiseJy !== null && beam?.lobe
        ? brightnessK(noiseJy, observation.frequencyHz, beamSolidAngle(beam.lobe.majorRad, beam.lobe.minorRad))
        : null,
    smearing,
    planarRadiusArcsec,
    fraunhoferM: {
      antenna: fraunhoferM(Math.max(...antennas.map((a) => a.diameterM)), wavelengthM),
      array: lengths.longest === null ? null : fraunhoferM(lengths.longest, wavelengthM),
    },
    protectedFraction: protectionOf(...bandOf(observation)).fraction,
    positionError: positionError(synthesis, wavelengthM),
    fullField: fullField(fwhmRad, Math.min(...Object.values(primaryBeams)) / ARCSEC_PER_RAD, stations.length, observation),
    warnings,
  };
}

/** From the spread of the samples along the beam's narrower axis: √(8 ln 2)/(2π·FWHM of the peak's curvature). */
function positionError({ setup: { observation }, sums }: Synthesis, wavelengthM: number): PositionErrorResult {
  const { positionErrorM } = observation;
  if (positionErrorM === null || !(sums.weight > 0) || !(sums.uu + sums.vv > 0)) {
    return { phaseDeg: null, coherence: null, widthFraction: null };
  }
  const { minorRad } = curvatureEllipse(sums.uu / sums.weight, sums.uv / sums.weight, sums.vv / sums.weight);
  const rmsBaselineM = (Math.sqrt(8 * Math.LN2) / (2 * Math.PI * minorRad)) * wavelengthM;
  const { phaseRad, coherence, widthFraction } = positionTolerance(positionErrorM, wavelengthM, rmsBaselineM);
  return { phaseDeg: phaseRad / RAD_PER_DEG, coherence, widthFraction };
}

const bandOf = ({ frequencyHz, bandwidthHz }: Observation): [number, number] => [
  frequencyHz - bandwidthHz / 2,
  frequencyHz + bandwidthHz / 2,
];

/** Loss of a point source's peak that a full field may have at its edge, by each of band and time. */
const FIELD_LOSS = 0.1;

function fullField(fwhmRad: number | null, primaryRad: number, stationCount: number, observation: Observation): FullField {
  if (fwhmRad === null) return { channelWidthHz: null, sampleS: null, visibilitiesPerS: null, bytesPerS: null };
  const needs = fieldNeeds(primaryRad / 2, fwhmRad, observation.frequencyHz, FIELD_LOSS);
  const { visibilitiesPerS, bytesPerS } = correlatorLoad(stationCount, observation.bandwidthHz, needs, observation.polarizations);
  return { ...needs, visibilitiesPerS, bytesPerS };
}

/** Σ 1/(SEFD_i·SEFD_j) over the samples that count; null where a sensitivity is not known. */
function inverseSefdSquares({ setup: { track }, sums }: Synthesis): number | null {
  // Natural weights are relative to the first station's sensitivity, squared.
  return track.sefdJy ? sums.natural / track.sefdJy[0] ** 2 : null;
}

/** The figures of a beam, in the units of results; all null where there is none. */
export function beamFigures(beam: MeasuredBeam | undefined): BeamFigures {
  const arc = (rad: number | undefined | null): number | null =>
    rad === undefined || rad === null || !Number.isFinite(rad) ? null : rad * ARCSEC_PER_RAD;
  const lobe = beam?.lobe;
  const half = beam ? halfPowerWidths(beam.rays) : undefined;
  const found = beam?.sidelobes;
  return {
    majorArcsec: arc(lobe?.majorRad),
    minorArcsec: arc(lobe?.minorRad),
    axisRatio: lobe ? lobe.majorRad / lobe.minorRad : null,
    positionAngleDeg: lobe ? lobe.positionAngleRad / RAD_PER_DEG : null,
    halfPowerMajorArcsec: arc(half?.majorRad),
    halfPowerMinorArcsec: arc(half?.minorRad),
    firstZeroMinArcsec: arc(beam && nearest(beam.rays.zeroRad)),
    firstZeroMaxArcsec: arc(beam && farthest(beam.rays.zeroRad)),
    firstMinimumMinArcsec: arc(beam && nearest(beam.rays.minimumRad)),
    firstMinimumMaxArcsec: arc(beam && farthest(beam.rays.minimumRad)),
    peakSidelobe: found?.highest.value ?? null,
    deepestSidelobe: found?.deepest.value ?? null,
    peakAbsoluteSidelobe: found ? Math.max(Math.abs(found.highest.value), Math.abs(found.deepest.value)) : null,
    rmsSidelobe: found?.rms ?? null,
    sidelobeRadiusArcsec: arc(beam?.sidelobeRadiusRad),
    pixelArcsec: arc(beam?.image.xl),
    sizePx: beam?.image.size ?? null,
  };
}

/** Smallest radius over the rays that have one. */
function nearest(radii: Float64Array): number {
  const known = radii.filter((r) => !Number.isNaN(r));
  if (known.length === radii.length) return cyclicExtreme(radii, -1);
  return known.length > 0 ? Math.min(...known) : Number.NaN;
}

/** Largest radius, when every ray has one. */
function farthest(radii: Float64Array): number {
  return radii.some(Number.isNaN) ? Number.NaN : cyclicExtreme(radii, 1);
}

function pairFigures(beam: MeasuredBeam | undefined, pair: Pair, warnings: string[]): PairResult {
  if (!beam) return { dip: null, verdict: null };
  const angle = pair.positionAngleDeg * RAD_PER_DEG;
  const outcome: PairOutcome | undefined = pairOutcome(
    beam.at,
    pair.separationArcsec / ARCSEC_PER_RAD,
    angle,
    pair.fluxRatio,
    radiusAt(beam.rays.minimumRad, angle),
    beam.shape.minorRad / 40,
  );
  if (!outcome) {
    warnings.push(`the pair is ${pair.separationArcsec} arcsec apart, which the image does not cover: no verdict`);
    return { dip: null, verdict: null };
  }
  return outcome;
}

/** Longest and shortest distance between stations, straight through the ground. */
export function chords(ecefM: Float64Array): { longest: number | null; shortest: number | null } {
  const n = ecefM.length / 3;
  if (n < 2) return { longest: null, shortest: null };
  let longest = 0;
  let shortest = Number.POSITIVE_INFINITY;
  for (let i = 0; i < n; i++) {
    for (let j = i + 1; j < n; j++) {
      const d = Math.hypot(ecefM[3 * j] - ecefM[3 * i], ecefM[3 * j + 1] - ecefM[3 * i + 1], ecefM[3 * j + 2] - ecefM[3 * i + 2]);
      if (d > longest) longest = d;
      if (d < shortest) shortest = d;
    }
  }
  return { longest, shortest };
}

function warnOfLayout(
  ids: readonly string[],
  lengths: { shortest: number | null },
  seen: Visibility,
  kept: boolean,
  warnings: string[],
): void {
  if (ids.length === 1) warnings.push("the layout has one station: there is no baseline, no beam and no noise figure");
  else if (seen.visible === 0) {
    const where = seen.flags.every((flag) => flag === TOO_HIGH)
      ? "stays above the upper elevation limits"
      : "never rises above the elevation limits";
    const mixed = seen.flags.some((flag) => flag === TOO_HIGH) && seen.flags.some((flag) => flag === TOO_LOW);
    warnings.push(`the source ${mixed ? "is never within the elevation limits" : where} within the window: no samples`);
  } else if (!kept) warnings.push("no two stations see the source at the same time: no samples");
  if (lengths.shortest === 0) warnings.push("two stations of the layout stand at one place");
}

function warnOfRadius(
  beam: BeamFigures,
  smearing: AssessResult["smearing"],
  planarRadiusArcsec: number | null,
  warnings: string[],
): void {
  const radius = beam.sidelobeRadiusArcsec;
  if (radius === null) return;
  for (const [name, limit] of [
    ["bandwidth smearing", smearing.bandwidthArcsec],
    ["time smearing", smearing.timeArcsec],
    ["planar", planarRadiusArcsec],
  ] as const) {
    if (limit !== null && radius > limit) {
      warnings.push(`the sidelobe radius, ${figure(radius)} arcsec, exceeds the ${name} radius, ${figure(limit)} arcsec`);
    }
  }
}

/** Four figures, without an exponent where there is room. */
function figure(x: number): string {
  return String(Number(x.toPrecision(4)));
}
