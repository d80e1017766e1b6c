import { DomainError } from "../base/errors.ts";
import { changed, freeId, withNew, without } from "./edit.ts";
import { layoutById, stationById } from "./find.ts";
import type { Layout, Observation, Plan, Requirement, Site, Station } from "./schema.ts";

/*
 * Changes of a plan. Each returns a new plan that shares whatever did not change with the old one, which stays as it was. Each
 * throws a DomainError for an id the plan does not have, or has already where a new one is wanted. Values are not checked here:
 * those who take them from a person do.
 */

/** Where a station stands. */
export interface Place {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  /** Kept as it is when left out. */
  readonly heightM?: number;
}

export const renamePlan = (plan: Plan, title: string): Plan => ({ ...plan, title });

export const changeSite = (plan: Plan, change: Partial<Site>): Plan => ({ ...plan, site: { ...plan.site, ...change } });

/** A plan with one station elsewhere, in every layout that lists it. */
export function moveStation(plan: Plan, id: string, { latitudeDeg, longitudeDeg, heightM }: Place): Plan {
  return changeStation(plan, id, { latitudeDeg, longitudeDeg, ...(heightM === undefined ? {} : { heightM }) });
}

export function changeStation(plan: Plan, id: string, change: Partial<Omit<Station, "id">>): Plan {
  return { ...plan, stations: changed("station", plan.stations, id, change) };
}

/** A plan with one more station, listed last in a layout; with no layout it is a candidate pad. */
export function addStation(plan: Plan, layoutId: string | null, station: Station): Plan {
  const more = { ...plan, stations: withNew("station", plan.stations, station) };
  return layoutId === null ? more : listStation(more, layoutId, station.id);
}

/**
 * A plan without a station, in no layout either.
 *
 * @throws {@link DomainError} for the last station of a layout: an empty layout is none.
 */
export function removeStation(plan: Plan, id: string): Plan {
  const stations = without("station", plan.stations, id);
  const layouts = plan.layouts.filter((l) => l.stations.includes(id));
  return layouts.reduce((less, layout) => unlistStation(less, layout.id, id), { ...plan, stations });
}

/** A plan with a station it has listed in one more layout. */
export function listStation(plan: Plan, layoutId: string, stationId: string): Plan {
  const { stations } = layoutById(plan, layoutId);
  stationById(plan, stationId);
  if (stations.includes(stationId))
    throw new DomainError("station", stationId, `a station that layout ${layoutId} does not have yet`);
  return changeLayout(plan, layoutId, { stations: [...stations, stationId] });
}

/** A plan with a station out of one layout; it stays as a candidate pad. */
export function unlistStation(plan: Plan, layoutId: string, stationId: string): Plan {
  const { stations } = layoutById(plan, layoutId);
  const left = stations.filter((id) => id !== stationId);
  if (left.length === stations.length) throw new DomainError("station", stationId, `a station of layout ${layoutId}`);
  if (left.length === 0) throw new DomainError("station", stationId, `one that is not the last of layout ${layoutId}`);
  return changeLayout(plan, layoutId, { stations: left });
}

export function changeLayout(plan: Plan, id: string, change: Partial<Omit<Layout, "id">>): Plan {
  return { ...plan, layouts: changed("layout", plan.layouts, id, change) };
}

/** Characters of a station's id that a copy keeps: an id has 64 at most, and there are four figures of stations. */
const STEM = 59;

/**
 * A plan with a copy of a layout, right after it.
 *
 * @param stations - "shared": the copy lists the same stations, and one that moves moves in both. "own": it lists copies of them,
 *   named after them, that can move by themselves.
 */
export function cloneLayout(
  plan: Plan,
  id: string,
  made: { readonly id: string; readonly label: string },
  stations: "shared" | "own",
): Plan {
  const layout = layoutById(plan, id);
  const taken = new Set(plan.stations.map((s) => s.id));
  const copies = (stations === "shared" ? [] : layout.stations).map((from) => {
    const copy = { ...stationById(plan, from), id: freeId(taken, `${[...from].slice(0, STEM).join("")}-`) };
    taken.add(copy.id);
    return copy;
  });
  const clone = { ...layout, ...made, stations: stations === "shared" ? layout.stations : copies.map((s) => s.id) };
  const layouts = withNew("layout", plan.layouts, clone, plan.layouts.indexOf(layout) + 1);
  return { ...plan, layouts, stations: copies.length > 0 ? [...plan.stations, ...copies] : plan.stations };
}

/** A plan without a layout; its stations stay, and so do requirements that name it, which then cannot be computed. */
export function removeLayout(plan: Plan, id: string): Plan {
  return { ...plan, layouts: without("layout", plan.layouts, id, "one that is not the last layout") };
}

export function changeObservation(plan: Plan, id: string, change: Partial<Omit<Observation, "id">>): Plan {
  return { ...plan, observations: changed("observation", plan.observations, id, change) };
}

export function addObservation(plan: Plan, observation: Observation): Plan {
  return { ...plan, observations: withNew("observation", plan.observations, observation) };
}

/** A plan without an observation; requirements that name it stay, and cannot be computed. */
export function removeObservation(plan: Plan, id: string): Plan {
  return { ...plan, observations: without("observation", plan.observations, id, "one that is not the last observation") };
}

export function addRequirement(plan: Plan, requirement: Requirement): Plan {
  return { ...plan, requirements: withNew("requirement", plan.requirements, requirement) };
}

export function changeRequirement(plan: Plan, id: string, change: Partial<Omit<Requirement, "id">>): Plan {
  return { ...plan, requirements: changed("requirement", plan.requirements, id, change) };
}

export function removeRequirement(plan: Plan, id: string): Plan {
  return { ...plan, requirements: without("requirement", plan.requirements, id) };
}
