import { quantityOf } from "../assess/requirements.ts";
import type { AssessResult } from "../assess/result.ts";
import { sampleTimes } from "../engine/synthesis/track.ts";
import type { Observation, Pair, Plan } from "../plan/schema.ts";
import { decimalsFor, fixed, plain, signed } from "./numbers.ts";
import { declinationText, wavelengthM, weightingText, windowText } from "./observation.ts";
import { figure, frequencyText, type Kind, shownAs, unitFor, wavelengthText } from "./units.ts";

/** One figure of the results, across layouts. */
export interface TableRow {
  /** What it is and, where names could mislead, by which definition. */
  readonly label: string;
  readonly unit: string;
  /** One for each column; "–" where it cannot be had. */
  readonly cells: readonly string[];
}

/** The results of one observation: figures down, layouts across. Plain text, no layout of lines. */
export interface ResultTable {
  readonly title: string;
  /** What the figures assume, a line each. */
  readonly settings: readonly string[];
  /** Ids of layouts. */
  readonly columns: readonly string[];
  /** Groups of rows that belong together. */
  readonly groups: readonly (readonly TableRow[])[];
}

type Figure = readonly [label: string, kind: Kind, value: string | ((result: AssessResult) => number | null)];

/** What stands for a figure that cannot be had. */
export const NONE = "–";

/** Rows of the beam's widths share a unit, so that its two axes can be compared at a glance. */
const BEAM_GROUP = 1;

const groups: readonly (readonly Figure[])[] = [
  [
    ["stations", "count", "stationCount"],
    ["baselines", "count", "baselineCount"],
    ["longest baseline, straight", "length", "longestBaselineM"],
    ["longest as seen from the source", "length", "longestProjectedM"],
    ["shortest as seen from the source", "length", "shortestProjectedM"],
    ["hours two or more stations see it", "hours", "hoursVisible"],
    ["station samples lost to shadow", "fraction", shadowed],
  ],
  [
    ["beam major axis, FWHM of the fit", "angle", "beam.majorArcsec"],
    ["beam minor axis, FWHM of the fit", "angle", "beam.minorArcsec"],
    ["position angle, north through east", "degrees", "beam.positionAngleDeg"],
    ["half-power width, longest", "angle", "beam.halfPowerMajorArcsec"],
    ["half-power width, shortest", "angle", "beam.halfPowerMinorArcsec"],
    ["first minimum, nearest", "angle", "beam.firstMinimumMinArcsec"],
    ["1.22 λ/b of the longest", "angle", "apertureResolutionArcsec.circular"],
  ],
  [
    ["highest sidelobe", "fraction", "beam.peakSidelobe"],
    ["deepest sidelobe", "fraction", "beam.deepestSidelobe"],
    ["rms beyond the main lobe", "fraction", "beam.rmsSidelobe"],
    ["sidelobes within", "angle", "beam.sidelobeRadiusArcsec"],
  ],
  [
    ["largest scale, 0.6 λ/b", "angle", "largestScaleArcsec"],
    ["disc half seen by the shortest", "angle", "recoverable.discArcsec"],
    ["primary beam, FWHM, smallest", "angle", "primaryBeamArcsec"],
    ["uv cells filled", "fraction", "coverage.filledFraction"],
    ["largest radial gap, ratio", "ratio", "coverage.largestRadialGap"],
    ["azimuthal evenness, 1 is even", "ratio", "coverage.azimuthalUniformity"],
  ],
  [
    ["noise in the image, per beam", "flux", "noiseJy"],
    ["noise over natural", "times", "weightingNoiseFactor"],
    ["brightness noise", "temperature", "brightnessNoiseK"],
    ["of it, by the air over the stations", "times", "air.noiseFactor"],
  ],
  [
    ["10 % bandwidth smearing at", "angle", "smearing.bandwidthArcsec"],
    ["10 % time smearing at", "angle", "smearing.timeArcsec"],
    ["plane approximation holds to", "angle", "planarRadiusArcsec"],
    ["field that sets the density cells", "angle", "densityFieldArcsec"],
  ],
  [
    ["band protected for radio astronomy", "fraction", "protectedFraction"],
    ["peak left by the stated position error", "fraction", "positionError.coherence"],
    ["far field of the largest dish from", "length", "fraunhoferM.antenna"],
    ["whole primary beam: channels of", "frequency", "fullField.channelWidthHz"],
    ["whole primary beam: samples of", "seconds", "fullField.sampleS"],
    ["whole primary beam: visibilities a second", "count", "fullField.visibilitiesPerS"],
  ],
];

/** Kinds whose sign says something. */
const signedRows = new Set(["beam.peakSidelobe", "beam.deepestSidelobe"]);

/**
 * A table of results that share an observation.
 *
 * @param results - Of this observation, one a column, in order. They may hold a pair, the same for all.
 */
export function resultTable(
  plan: Plan,
  observation: Observation,
  results: readonly AssessResult[],
  pair: Pair | null,
): ResultTable {
  const rows = groups.map((group, k) => {
    const widths = k === BEAM_GROUP ? group.filter(([, kind]) => kind === "angle").flatMap((item) => sizesOf(item, results)) : [];
    return group.map((item) => row(item, results, item[1] === "angle" && widths.length > 0 ? Math.max(...widths) : null));
  });
  return {
    title: heading(observation.id, observation.label),
    settings: [...settings(plan, observation), ...(pair ? [`pair: ${pairText(pair)}`] : [])],
    columns: results.map((result) => result.layout),
    groups: pair ? [...rows.slice(0, 3), pairRows(results), ...rows.slice(3)] : rows,
  };
}

/** "south: Cold discs", or the id alone where there is no other name. */
export const heading = (id: string, label: string): string => (label === "" || label === id ? id : `${id}: ${label}`);

/** What a pair is, in words. */
export function pairText(pair: Pair): string {
  const apart = `${shownAs("angle", pair.separationArcsec)} apart at PA ${plain(pair.positionAngleDeg, 4)}°`;
  return pair.fluxRatio === 1 ? `two equal sources ${apart}` : `two sources ${apart}, fluxes 1 : ${plain(pair.fluxRatio)}`;
}

const valuesOf = ([, , value]: Figure, results: readonly AssessResult[]): readonly (number | null)[] =>
  results.map((result) => (typeof value === "string" ? (quantityOf(result, value) ?? null) : value(result)));

const sizesOf = (item: Figure, results: readonly AssessResult[]): readonly number[] =>
  valuesOf(item, results).flatMap((x) => (x === null || x === 0 ? [] : [Math.abs(x)]));

/** @param like - Size that decides the unit; null: the largest of the row. */
function row(item: Figure, results: readonly AssessResult[], like: number | null): TableRow {
  const [label, kind, value] = item;
  const values = valuesOf(item, results);
  const sizes = sizesOf(item, results);
  if (sizes.length === 0) {
    const { word, decimals } = unitFor(kind, 0);
    return {
      label,
      unit: kind === "flux" || kind === "temperature" ? "" : word,
      cells: values.map((x) => (x === null ? NONE : fixed(0, decimals))),
    };
  }
  // One unit a row; decimals enough for the smallest to show three figures.
  const unit = unitFor(kind, like ?? Math.max(...sizes));
  const decimals =
    kind === "count" ? 0 : Math.max(unit.decimals, kind in fixedDecimals ? 0 : decimalsFor(Math.min(...sizes) / unit.size));
  const written = { ...unit, decimals };
  const withSign = typeof value === "string" && signedRows.has(value);
  const text = (x: number): string => (withSign ? signed(x / unit.size, decimals) : figure(x, written));
  return { label, unit: unit.word, cells: values.map((x) => (x === null ? NONE : text(x))) };
}

/** Kinds whose decimals do not follow their size. */
const fixedDecimals: { readonly [K in Kind]?: true } = { degrees: true, fraction: true, ratio: true, times: true, hours: true };

function pairRows(results: readonly AssessResult[]): readonly TableRow[] {
  const dips = results.map((result) => result.pair?.dip ?? null);
  return [
    { label: "pair", unit: "", cells: results.map((result) => result.pair?.verdict ?? NONE) },
    { label: "dip between, below the fainter", unit: "%", cells: dips.map((dip) => (dip === null ? NONE : fixed(100 * dip, 1))) },
  ];
}

function settings(plan: Plan, observation: Observation): readonly string[] {
  const { weighting, epoch, startUtc, rightAscensionDeg } = observation;
  const { hourAngleRad, sampleS } = sampleTimes(observation.hourAngle.fromH, observation.hourAngle.toH, observation.integrationS);
  const taper = weighting.taperArcsec === null ? "no taper" : `taper ${shownAs("angle", weighting.taperArcsec)}`;
  const channels = observation.channels === 1 ? "1 channel" : `${observation.channels} channels`;
  const brought = startUtc !== null && rightAscensionDeg !== null;
  const place = epoch !== "J2000" ? "of date" : brought ? `of J2000, brought to ${startUtc}` : "of J2000, taken as of date";
  const window =
    observation.hourAngle.fromH === observation.hourAngle.toH ? `snapshot at ${windowStart(observation)}` : windowText(observation);
  const times = hourAngleRad.length === 1 ? "1 sample" : `${hourAngleRad.length} samples`;
  const limits = new Set(plan.antennas.map((a) => a.elevationLimitDeg));
  const higher = [...limits].some((limit) => limit > observation.elevationLimitDeg) ? ", more where an antenna asks for it" : "";
  return [
    `declination ${declinationText(observation.declinationDeg, true)} ${place}, hour angle ${window}`,
    `elevation from ${plain(observation.elevationLimitDeg)}°${higher}; ${times} a baseline, ${plain(sampleS, 4)} s each`,
    `${frequencyText(observation.frequencyHz, 6)} (${wavelengthText(wavelengthM(observation), 4)}), ${frequencyText(observation.bandwidthHz, 4)} in ${channels}, ${observation.polarizations === 2 ? "2 polarizations (Stokes I)" : "1 polarization"}`,
    `${weightingText(observation)} weights, ${taper}${observation.repeats > 1 ? `, ${observation.repeats} repeats` : ""}; efficiency ${plain(observation.efficiency)}`,
  ];
}

const windowStart = ({ hourAngle }: Observation): string => `${signed(hourAngle.fromH, 2)} h`;

function shadowed(result: AssessResult): number | null {
  return result.visibleStationSamples > 0 ? result.shadowedStationSamples / result.visibleStationSamples : null;
}
