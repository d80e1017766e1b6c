import { ARCSEC_PER_RAD, RAD_PER_DEG, SPEED_OF_LIGHT } from "../base/constants.ts";
import { stationNormals, stationXyzM } from "../engine/geodesy/originframe.ts";
import { geodeticToEcef } from "../engine/geodesy/wgs84.ts";
import { primaryBeamRad } from "../engine/measure/scales.ts";
import { ruzeFactor, sefdJy } from "../engine/measure/sefd.ts";
import { isoToJulian } from "../engine/sky/calendar.ts";
import { precessFromJ2000 } from "../engine/sky/precession.ts";
import { channelCentres, sampleTimes, type Track } from "../engine/synthesis/track.ts";
import type { Weighting } from "../engine/synthesis/weights.ts";
import { antennaById, layoutById, observationById, stationById } from "../plan/find.ts";
import type { Antenna, Layout, Observation, Plan, Receiver, Station } from "../plan/schema.ts";

/** One layout and observation of a plan, as the engine wants them. */
export interface Setup {
  readonly layout: Layout;
  readonly observation: Observation;
  readonly stations: readonly Station[];
  readonly antennas: readonly Antenna[];
  readonly ecefM: Float64Array;
  readonly track: Track;
  readonly weighting: Weighting;
  /** Wanted field of the density cells, radians. */
  readonly fieldRad: number;
  readonly warnings: readonly string[];
}

/**
 * Turns a layout and an observation into engine terms: degrees to radians, stations to the XYZ frame, receivers to
 * sensitivities, the declination to date.
 *
 * @throws {@link DomainError} for an id the plan does not have, or a band wider than twice its frequency.
 */
export function setup(plan: Plan, layoutId: string, observationId: string): Setup {
  const layout = layoutById(plan, layoutId);
  const observation = observationById(plan, observationId);
  const stations = layout.stations.map((id) => stationById(plan, id));
  const antennas = stations.map((station) => antennaById(plan, station.antenna));
  const warnings: string[] = [];
  const originLonRad = plan.site.origin.longitudeDeg * RAD_PER_DEG;
  const latRad = Float64Array.from(stations, (s) => s.latitudeDeg * RAD_PER_DEG);
  const lonRad = Float64Array.from(stations, (s) => s.longitudeDeg * RAD_PER_DEG);
  const ecefM = new Float64Array(3 * stations.length);
  for (const [i, s] of stations.entries()) ecefM.set(geodeticToEcef(latRad[i], lonRad[i], s.heightM), 3 * i);
  const sefds = antennas.map((antenna) => sefdAt(antenna, observation.frequencyHz));
  const missing = [...new Set(antennas.filter((_, i) => sefds[i] === undefined).map((a) => a.id))];
  if (missing.length > 0) {
    warnings.push(
      `antenna ${missing.join(", ")} has no receiver for ${observation.frequencyHz / 1e9} GHz: all natural weights are 1 and noise cannot be had`,
    );
  }
  if (plan.site.terrain) warnings.push("the terrain horizon is not computed yet: the flat elevation limits are used");
  const { hourAngleRad, sampleS } = sampleTimes(observation.hourAngle.fromH, observation.hourAngle.toH, observation.integrationS);
  const channelHz = channelCentres(observation.frequencyHz, observation.bandwidthHz, observation.channels);
  const wavelengthM = SPEED_OF_LIGHT / observation.frequencyHz;
  const { weighting } = observation;
  return {
    layout,
    observation,
    stations,
    antennas,
    ecefM,
    track: {
      stationXyzM: stationXyzM(ecefM, originLonRad),
      normals: stationNormals(latRad, lonRad, originLonRad),
      diameterM: Float64Array.from(antennas, (a) => a.diameterM),
      sefdJy: missing.length > 0 ? null : Float64Array.from(sefds as number[]),
      lowestRad: Float64Array.from(antennas, (a) => Math.max(a.elevationLimitDeg, observation.elevationLimitDeg) * RAD_PER_DEG),
      highestRad: Float64Array.from(antennas, (a) => a.elevationUpperLimitDeg * RAD_PER_DEG),
      decRad: declinationOfDate(observation, warnings),
      hourAngleRad,
      sampleS,
      frequencyHz: observation.frequencyHz,
      channelHz,
      channelWidthHz: observation.bandwidthHz / observation.channels,
    },
    weighting: {
      scheme: weighting.scheme,
      robustness: weighting.robustness,
      taperRad: weighting.taperArcsec === null ? null : weighting.taperArcsec / ARCSEC_PER_RAD,
    },
    fieldRad: weighting.fieldArcsec === null ? smallestDishBeamRad(antennas, wavelengthM) : weighting.fieldArcsec / ARCSEC_PER_RAD,
    warnings,
  };
}

function smallestDishBeamRad(antennas: readonly Antenna[], wavelengthM: number): number {
  const { beamFactor, diameterM } = antennas.reduce((least, a) => (a.diameterM < least.diameterM ? a : least));
  return primaryBeamRad(beamFactor, wavelengthM, diameterM);
}

/** The first receiver whose band holds the frequency; undefined where none does. */
export const receiverAt = (antenna: Antenna, frequencyHz: number): Receiver | undefined =>
  antenna.receivers.find((r) => r.fromHz <= frequencyHz && frequencyHz <= r.toHz);

/** Its sensitivity without the air, Jy: as given, or of system temperature, aperture efficiency and surface. */
export function sefdAt(antenna: Antenna, frequencyHz: number): number | undefined {
  const receiver = receiverAt(antenna, frequencyHz);
  if (!receiver) return undefined;
  const { sefdJy: given, systemK, apertureEfficiency, surfaceRmsM } = receiver;
  if (given !== null) return given;
  if (systemK === null || apertureEfficiency === null) return undefined;
  return sefdJy(systemK, antenna.diameterM, apertureEfficiency * ruzeFactor(surfaceRmsM, SPEED_OF_LIGHT / frequencyHz));
}

function declinationOfDate(observation: Observation, warnings: string[]): number {
  const decRad = observation.declinationDeg * RAD_PER_DEG;
  if (observation.epoch !== "J2000") return decRad;
  if (observation.startUtc === null || observation.rightAscensionDeg === null) {
    const lacking = observation.startUtc === null ? "startUtc" : "rightAscensionDeg";
    warnings.push(`the declination is J2000 but ${lacking} is not given: it is taken as of date`);
    return decRad;
  }
  const { day, frac } = isoToJulian(observation.startUtc);
  return precessFromJ2000(observation.rightAscensionDeg * RAD_PER_DEG, decRad, day, frac).decRad;
}
