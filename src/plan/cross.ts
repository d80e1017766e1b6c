import type { Fault } from "./faults.ts";
import { someOf } from "./find.ts";
import { rangeFaults } from "./ranges.ts";
import { ringFaults } from "./rings.ts";
import { type Row, rows } from "./rows.ts";
import type { Plan } from "./schema.ts";

/**
 * Faults that no single field shows: names that point nowhere, doubles, reversed ranges, open rings.
 *
 * @param document - A plan, or as much of one as could be made out: fields of a wrong type are passed over, since their own
 *   fault is told already.
 * @param most - No more than this many are looked for.
 */
export function crossFaults(document: unknown, most: number): Fault[] {
  const faults: Fault[] = [];
  for (const fault of allFaults(document)) {
    if (faults.length >= most) break;
    faults.push(fault);
  }
  return faults;
}

function* allFaults(document: unknown): Generator<Fault> {
  yield* doubleIds(document);
  yield* namesNowhere(document);
  yield* receiversOfNoSensitivity(document);
  yield* rangeFaults(document);
  yield* ringFaults(document);
}

/** A requirement may outlive the observation or layout it names: it stays in the ledger and says so. */
export function crossWarnings(plan: Plan): string[] {
  const warnings: string[] = [];
  const observations = new Set(plan.observations.map((o) => o.id));
  const layouts = new Set(plan.layouts.map((l) => l.id));
  for (const [k, { when }] of plan.requirements.entries()) {
    const path = `requirements[${k}].when`;
    if (when.observation !== null && !observations.has(when.observation)) {
      warnings.push(`${path}.observation names ${when.observation}, which the plan does not have: the line cannot be computed`);
    }
    for (const id of when.layouts ?? []) {
      if (!layouts.has(id)) warnings.push(`${path}.layouts names ${id}, which the plan does not have`);
    }
    if (when.layouts?.length === 0) warnings.push(`${path}.layouts is empty: the line speaks of no layout`);
  }
  return warnings;
}

function* doubleIds(document: unknown): Generator<Fault> {
  for (const list of ["antennas", "stations", "layouts", "observations", "requirements"]) {
    const first = new Map<string, string>();
    for (const [path, { id }] of rows(document, list)) {
      if (typeof id !== "string") continue;
      const before = first.get(id);
      if (before === undefined) first.set(id, path);
      else yield { path: `${path}.id`, value: id, expected: `an id that no other has; ${before} has it` };
    }
  }
}

function* namesNowhere(document: unknown): Generator<Fault> {
  const antennas = idsOf(document, "antennas");
  for (const [path, { antenna }] of rows(document, "stations")) {
    if (typeof antenna === "string" && antennas.size > 0 && !antennas.has(antenna)) {
      yield { path: `${path}.antenna`, value: antenna, expected: `one of ${someOf([...antennas])}` };
    }
  }
  const stations = idsOf(document, "stations");
  for (const [path, layout] of rows(document, "layouts")) yield* listedFaults(path, layout, stations);
}

/** A receiver says how sensitive it is in one of two ways. */
function* receiversOfNoSensitivity(document: unknown): Generator<Fault> {
  for (const [antennaPath, antenna] of rows(document, "antennas")) {
    for (const [path, { sefdJy = null, systemK = null, apertureEfficiency = null }] of rows(antenna, "receivers", antennaPath)) {
      if (sefdJy === null && (systemK === null || apertureEfficiency === null)) {
        yield {
          path: `${path}.sefdJy`,
          value: undefined,
          expected: "a system equivalent flux density, or systemK and apertureEfficiency",
        };
      } else if (sefdJy !== null && (systemK !== null) !== (apertureEfficiency !== null)) {
        const lacking = systemK === null ? "systemK" : "apertureEfficiency";
        yield { path: `${path}.${lacking}`, value: undefined, expected: "both systemK and apertureEfficiency, or neither" };
      } else if (sefdJy !== null && systemK !== null) {
        yield { path: `${path}.sefdJy`, value: sefdJy, expected: "null where systemK and apertureEfficiency say it" };
      }
    }
  }
}

function* listedFaults(layoutPath: string, layout: Row, stations: ReadonlySet<string>): Generator<Fault> {
  if (!Array.isArray(layout.stations)) return;
  const listed = new Set<string>();
  for (const [k, id] of layout.stations.entries()) {
    if (typeof id !== "string") continue;
    const path = `${layoutPath}.stations[${k}]`;
    if (listed.has(id)) yield { path, value: id, expected: "each station once" };
    else if (!stations.has(id)) yield { path, value: id, expected: "the id of a station of the plan" };
    listed.add(id);
  }
}

function idsOf(document: unknown, list: string): ReadonlySet<string> {
  const ids = new Set<string>();
  for (const [, { id }] of rows(document, list)) if (typeof id === "string") ids.add(id);
  return ids;
}
