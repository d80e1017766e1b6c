import type { FullBeam } from "../assess/image.ts";
import { RAD_PER_DEG } from "../base/constants.ts";
import { isoToJulian } from "../engine/sky/calendar.ts";
import { precessFromJ2000 } from "../engine/sky/precession.ts";
import type { BeamFits } from "../formats/beam-fits.ts";
import type { Layout, Observation, Plan } from "../plan/schema.ts";
import { weightingText } from "../view/observation.ts";
import { program } from "./version.ts";

/** A settled beam as the FITS writer wants it, with what its figures assume. */
export function beamHeader(plan: Plan, layout: Layout, observation: Observation, beam: FullBeam): BeamFits {
  const { majorArcsec, minorArcsec, positionAngleDeg } = beam.result.beam;
  const { startUtc } = observation;
  return {
    values: beam.values,
    size: beam.size,
    pixelRad: beam.pixelRad,
    program,
    title: plan.title,
    layout: layout.id,
    observation: observation.id,
    ...placeOfDate(observation),
    startUtc: startUtc === null ? null : utcText(startUtc),
    frequencyHz: observation.frequencyHz,
    bandwidthHz: observation.bandwidthHz,
    fitted:
      majorArcsec === null || minorArcsec === null || positionAngleDeg === null
        ? null
        : { majorArcsec, minorArcsec, positionAngleDeg },
    remarks: [...settings(observation, beam), ...beam.result.warnings.map((text) => `Warning: ${text}.`)],
  };
}

/** Where the engine points: a J2000 place is brought to date as it does, when date and right ascension are known. */
function placeOfDate({ epoch, startUtc, rightAscensionDeg, declinationDeg }: Observation): {
  readonly rightAscensionDeg: number | null;
  readonly declinationDeg: number;
} {
  if (epoch !== "J2000" || startUtc === null || rightAscensionDeg === null) return { rightAscensionDeg, declinationDeg };
  const { day, frac } = isoToJulian(startUtc);
  const place = precessFromJ2000(rightAscensionDeg * RAD_PER_DEG, declinationDeg * RAD_PER_DEG, day, frac);
  return { rightAscensionDeg: place.raRad / RAD_PER_DEG, declinationDeg: place.decRad / RAD_PER_DEG };
}

/** The time in a form every reader of ISO 8601 takes; without a zone it is UTC. */
function utcText(startUtc: string): string {
  const { day, frac } = isoToJulian(startUtc);
  return new Date(Math.round((day - 2_440_587.5 + frac) * 86_400_000)).toISOString();
}

function settings(observation: Observation, { result }: FullBeam): readonly string[] {
  const { fromH, toH } = observation.hourAngle;
  const field =
    result.densityFieldArcsec === null ? "" : `, density cells for a field of ${result.densityFieldArcsec.toPrecision(6)} arcsec`;
  const taper = observation.weighting.taperArcsec === null ? "no taper" : `taper ${observation.weighting.taperArcsec} arcsec`;
  const planar = result.planarRadiusArcsec;
  return [
    `Weights: ${weightingText(observation)}, ${taper}${field}.`,
    `Hour angle ${fromH} to ${toH} h, ${result.samplesPerBaseline} samples a baseline; channels: ${observation.channels}.`,
    ...(observation.epoch === "J2000" && observation.startUtc !== null && observation.rightAscensionDeg !== null
      ? [
          `The plan gives RA ${observation.rightAscensionDeg}, Dec ${observation.declinationDeg} deg of J2000; CRVAL and north are of date.`,
        ]
      : []),
    ...(planar === null
      ? []
      : [`The w term is left out: a phase error of 0.1 rad is reached ${planar.toPrecision(4)} arcsec from the peak.`]),
    "Nutation, aberration and refraction are left out.",
  ];
}
