import type { Fault } from "./faults.ts";
import { isRow, number, type Row, rows } from "./rows.ts";

/** Most samples of a baseline in one observation. A day at a tenth of a second has 864 000. */
const MOST_SAMPLES = 1_000_000;
/** Most points of a requirement's range, as for a sweep. */
const MOST_POINTS = 10_000;

/** Pairs of fields that are the wrong way round or do not go together. */
export function* rangeFaults(document: unknown): Generator<Fault> {
  for (const [path, antenna] of rows(document, "antennas")) {
    yield* reversed(path, antenna, "elevationLimitDeg", "elevationUpperLimitDeg");
    for (const [at, receiver] of rows(antenna, "receivers", path)) yield* reversed(at, receiver, "fromHz", "toHz");
  }
  for (const [path, observation] of rows(document, "observations")) yield* observationFaults(path, observation);
  for (const [path, requirement] of rows(document, "requirements")) yield* requirementFaults(path, requirement);
}

/** A fault when `upper` is below `lower`. */
function* reversed(path: string, row: Row, lower: string, upper: string): Generator<Fault> {
  const [least, value] = [number(row[lower]), number(row[upper])];
  if (least !== undefined && value !== undefined && value < least) {
    yield { path: `${path}.${upper}`, value, expected: `at least ${lower}, ${least}` };
  }
}

function* observationFaults(path: string, observation: Row): Generator<Fault> {
  const [bandwidth, frequency] = [number(observation.bandwidthHz), number(observation.frequencyHz)];
  if (bandwidth !== undefined && frequency !== undefined && bandwidth >= 2 * frequency) {
    yield { path: `${path}.bandwidthHz`, value: bandwidth, expected: `less than twice frequencyHz, ${2 * frequency}` };
  }
  const { hourAngle } = observation;
  if (!isRow(hourAngle)) return;
  yield* reversed(`${path}.hourAngle`, hourAngle, "fromH", "toH");
  const [from, to, integration] = [number(hourAngle.fromH), number(hourAngle.toH), number(observation.integrationS)];
  if (from === undefined || to === undefined || integration === undefined) return;
  const least = (3600 * (to - from)) / MOST_SAMPLES;
  if (integration < least) {
    const expected = `at least ${least} s for a window of ${to - from} h: ${MOST_SAMPLES} samples a baseline are the most`;
    yield { path: `${path}.integrationS`, value: integration, expected };
  }
}

function* requirementFaults(path: string, requirement: Row): Generator<Fault> {
  const { atMost, atLeast, when } = requirement;
  if (atMost === null && atLeast === null) yield { path: `${path}.atMost`, value: null, expected: "a limit: atMost or atLeast" };
  yield* reversed(path, requirement, "atLeast", "atMost");
  if (!isRow(when)) return;
  const ranges = ["declinationDeg", "wavelengthM"].filter((name) => isRow(when[name]));
  for (const name of ranges) yield* pointFaults(`${path}.when.${name}`, when[name] as Row);
  if (ranges.length === 2) {
    yield { path: `${path}.when`, value: when, found: "over two ranges", expected: "declinationDeg or wavelengthM, not both" };
  }
}

function* pointFaults(path: string, range: Row): Generator<Fault> {
  yield* reversed(path, range, "from", "to");
  const [from, to, step] = [number(range.from), number(range.to), number(range.step)];
  if (from === undefined || to === undefined || step === undefined || !(step > 0)) return;
  if ((to - from) / step + 1 > MOST_POINTS) {
    yield { path: `${path}.step`, value: step, expected: `a step that makes at most ${MOST_POINTS} points from ${from} to ${to}` };
  }
}
