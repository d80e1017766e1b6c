import type { Fault } from "./faults.ts";
import { isRow, number, type Row, rows } from "./rows.ts";

/** Most samples of a baseline in one observation. A day at a tenth of a second has 864 000. */
const MOST_SAMPLES = 1_000_000;
/** Most points of a requirement's range, as for a sweep. */
const MOST_POINTS = 10_000;

/** Pairs of fields that are the wrong way round or do not go together. */
export function rangeFaults(document: unknown): Fault[] {
  return [
    ...rows(document, "antennas").flatMap(([path, antenna]) => antennaFaults(path, antenna)),
    ...rows(document, "observations").flatMap(([path, observation]) => observationFaults(path, observation)),
    ...rows(document, "requirements").flatMap(([path, requirement]) => requirementFaults(path, requirement)),
  ];
}

/** A fault when `upper` is below `lower`. */
function reversed(path: string, row: Row, lower: string, upper: string): Fault[] {
  const [least, value] = [number(row[lower]), number(row[upper])];
  if (least === undefined || value === undefined || value >= least) return [];
  return [{ path: `${path}.${upper}`, value, expected: `at least ${lower}, ${least}` }];
}

function antennaFaults(path: string, antenna: Row): Fault[] {
  return [
    ...reversed(path, antenna, "elevationLimitDeg", "elevationUpperLimitDeg"),
    ...rows(antenna, "receivers", path).flatMap(([at, receiver]) => reversed(at, receiver, "fromHz", "toHz")),
  ];
}

function observationFaults(path: string, observation: Row): Fault[] {
  const faults: Fault[] = [];
  const [bandwidth, frequency] = [number(observation.bandwidthHz), number(observation.frequencyHz)];
  if (bandwidth !== undefined && frequency !== undefined && bandwidth >= 2 * frequency) {
    faults.push({ path: `${path}.bandwidthHz`, value: bandwidth, expected: `less than twice frequencyHz, ${2 * frequency}` });
  }
  const { hourAngle } = observation;
  if (!isRow(hourAngle)) return faults;
  faults.push(...reversed(`${path}.hourAngle`, hourAngle, "fromH", "toH"));
  const [from, to, integration] = [number(hourAngle.fromH), number(hourAngle.toH), number(observation.integrationS)];
  if (from === undefined || to === undefined || integration === undefined) return faults;
  const least = (3600 * (to - from)) / MOST_SAMPLES;
  if (integration < least) {
    const expected = `at least ${least} s for a window of ${to - from} h: ${MOST_SAMPLES} samples a baseline are the most`;
    faults.push({ path: `${path}.integrationS`, value: integration, expected });
  }
  return faults;
}

function requirementFaults(path: string, requirement: Row): Fault[] {
  const { atMost, atLeast, when } = requirement;
  const faults: Fault[] = [];
  if (atMost === null && atLeast === null)
    faults.push({ path: `${path}.atMost`, value: null, expected: "a limit: atMost or atLeast" });
  faults.push(...reversed(path, requirement, "atLeast", "atMost"));
  if (!isRow(when)) return faults;
  const ranges = ["declinationDeg", "wavelengthM"].filter((name) => isRow(when[name]));
  for (const name of ranges) faults.push(...pointFaults(`${path}.when.${name}`, when[name] as Row));
  if (ranges.length === 2) {
    faults.push({
      path: `${path}.when`,
      value: when,
      found: "over two ranges",
      expected: "declinationDeg or wavelengthM, not both",
    });
  }
  return faults;
}

function pointFaults(path: string, range: Row): Fault[] {
  const faults = reversed(path, range, "from", "to");
  const [from, to, step] = [number(range.from), number(range.to), number(range.step)];
  if (from === undefined || to === undefined || step === undefined || !(step > 0)) return faults;
  if ((to - from) / step + 1 > MOST_POINTS) {
    faults.push({
      path: `${path}.step`,
      value: step,
      expected: `a step that makes at most ${MOST_POINTS} points from ${from} to ${to}`,
    });
  }
  return faults;
}
