import type { Fault } from "./faults.ts";
import type { Geometry, Plan } from "./schema.ts";

/** Faults that no single field shows: names that point nowhere, doubles, reversed ranges, open rings. */
export function crossFaults(plan: Plan): Fault[] {
  return [
    ...doubles("antennas", plan.antennas),
    ...doubles("stations", plan.stations),
    ...doubles("layouts", plan.layouts),
    ...doubles("observations", plan.observations),
    ...doubles("requirements", plan.requirements),
    ...antennaFaults(plan),
    ...nameFaults(plan),
    ...windowFaults(plan),
    ...requirementFaults(plan),
    ...ringFaults(plan),
  ];
}

/** A requirement may outlive the observation or layout it names: it stays in the ledger and says so. */
export function crossWarnings(plan: Plan): string[] {
  const warnings: string[] = [];
  const observations = new Set(plan.observations.map((o) => o.id));
  const layouts = new Set(plan.layouts.map((l) => l.id));
  for (const [k, { when }] of plan.requirements.entries()) {
    const path = `requirements[${k}].when`;
    if (when.observation && !observations.has(when.observation)) {
      warnings.push(`${path}.observation names ${when.observation}, which the plan does not have: the line cannot be computed`);
    }
    for (const id of when.layouts ?? []) {
      if (!layouts.has(id)) warnings.push(`${path}.layouts names ${id}, which the plan does not have`);
    }
  }
  return warnings;
}

function doubles(list: string, rows: readonly { readonly id: string }[]): Fault[] {
  const first = new Map<string, number>();
  const faults: Fault[] = [];
  for (const [k, { id }] of rows.entries()) {
    const before = first.get(id);
    if (before === undefined) first.set(id, k);
    else faults.push({ path: `${list}[${k}].id`, value: id, expected: `an id that no other has; ${list}[${before}] has it` });
  }
  return faults;
}

function antennaFaults(plan: Plan): Fault[] {
  const faults: Fault[] = [];
  for (const [k, antenna] of plan.antennas.entries()) {
    if (antenna.elevationUpperLimitDeg < antenna.elevationLimitDeg) {
      faults.push({
        path: `antennas[${k}].elevationUpperLimitDeg`,
        value: antenna.elevationUpperLimitDeg,
        expected: `at least elevationLimitDeg, ${antenna.elevationLimitDeg}`,
      });
    }
    for (const [r, { fromHz, toHz }] of antenna.receivers.entries()) {
      if (toHz < fromHz)
        faults.push({ path: `antennas[${k}].receivers[${r}].toHz`, value: toHz, expected: `at least fromHz, ${fromHz}` });
    }
  }
  return faults;
}

function nameFaults(plan: Plan): Fault[] {
  const faults: Fault[] = [];
  const antennas = new Set(plan.antennas.map((a) => a.id));
  const stations = new Set(plan.stations.map((s) => s.id));
  for (const [k, { antenna }] of plan.stations.entries()) {
    if (!antennas.has(antenna))
      faults.push({ path: `stations[${k}].antenna`, value: antenna, expected: `one of ${[...antennas].join(", ")}` });
  }
  for (const [k, layout] of plan.layouts.entries()) {
    const listed = new Set<string>();
    for (const [s, id] of layout.stations.entries()) {
      const path = `layouts[${k}].stations[${s}]`;
      if (!stations.has(id)) faults.push({ path, value: id, expected: "the id of a station of the plan" });
      else if (listed.has(id)) faults.push({ path, value: id, expected: "each station once" });
      listed.add(id);
    }
  }
  return faults;
}

function windowFaults(plan: Plan): Fault[] {
  const faults: Fault[] = [];
  for (const [k, { hourAngle, bandwidthHz, frequencyHz }] of plan.observations.entries()) {
    const path = `observations[${k}]`;
    if (hourAngle.toH < hourAngle.fromH) {
      faults.push({
        path: `${path}.hourAngle.toH`,
        value: hourAngle.toH,
        expected: `at least hourAngle.fromH, ${hourAngle.fromH}`,
      });
    }
    if (bandwidthHz >= 2 * frequencyHz) {
      faults.push({ path: `${path}.bandwidthHz`, value: bandwidthHz, expected: `less than twice frequencyHz, ${2 * frequencyHz}` });
    }
  }
  return faults;
}

function requirementFaults(plan: Plan): Fault[] {
  const faults: Fault[] = [];
  for (const [k, { atMost, atLeast, when }] of plan.requirements.entries()) {
    if (atMost === null && atLeast === null) {
      faults.push({ path: `requirements[${k}].atMost`, value: null, expected: "a limit: atMost or atLeast" });
    }
    for (const name of ["declinationDeg", "wavelengthM"] as const) {
      const range = when[name];
      if (range && range.to < range.from) {
        faults.push({ path: `requirements[${k}].when.${name}.to`, value: range.to, expected: `at least from, ${range.from}` });
      }
    }
  }
  return faults;
}

function ringFaults(plan: Plan): Fault[] {
  const { allowed, keepOut, costAreas } = plan.site;
  return [
    ...(allowed ? rings("site.allowed", allowed) : []),
    ...keepOut.flatMap(({ geometry }, k) => rings(`site.keepOut[${k}].geometry`, geometry)),
    ...costAreas.flatMap(({ geometry }, k) => rings(`site.costAreas[${k}].geometry`, geometry)),
  ];
}

function rings(path: string, geometry: Geometry): Fault[] {
  const polygons = geometry.type === "Polygon" ? [geometry.coordinates] : geometry.coordinates;
  const faults: Fault[] = [];
  for (const [p, polygon] of polygons.entries()) {
    for (const [r, ring] of polygon.entries()) {
      const at = `${path}.coordinates${geometry.type === "Polygon" ? "" : `[${p}]`}[${r}]`;
      const [first, last] = [ring[0], ring[ring.length - 1]];
      if (first[0] !== last[0] || first[1] !== last[1]) {
        faults.push({
          path: `${at}[${ring.length - 1}]`,
          value: last,
          expected: `the ring's first position again, ${JSON.stringify(first)}`,
        });
      }
      if (new Set(ring.map(([lon, lat]) => `${lon},${lat}`)).size < 3) {
        faults.push({ path: at, value: ring.length, expected: "a ring of at least three different positions" });
      }
      for (const [k, [lon, lat]] of ring.entries()) {
        if (!(Math.abs(lat) <= 90 && lon >= -180 && lon <= 360)) {
          faults.push({
            path: `${at}[${k}]`,
            value: [lon, lat],
            expected: "a longitude in [-180, 360] and a latitude in [-90, 90] degrees",
          });
        }
      }
    }
  }
  return faults;
}
