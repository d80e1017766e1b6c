import { layoutById, observationById, stationById } from "./find.ts";
import type { Observation, Plan, Station } from "./schema.ts";

/** Where a station stands. */
export interface Place {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  /** Kept as it is when left out. */
  readonly heightM?: number;
}

/** A plan with one station elsewhere, in every layout that lists it. */
export function moveStation(plan: Plan, id: string, place: Place): Plan {
  return changeStation(plan, id, { ...place });
}

export function changeStation(plan: Plan, id: string, change: Partial<Omit<Station, "id">>): Plan {
  const changed = { ...stationById(plan, id), ...change };
  return { ...plan, stations: plan.stations.map((s) => (s.id === id ? changed : s)) };
}

export function changeObservation(plan: Plan, id: string, change: Partial<Omit<Observation, "id">>): Plan {
  const changed = { ...observationById(plan, id), ...change };
  return { ...plan, observations: plan.observations.map((o) => (o.id === id ? changed : o)) };
}

/** A plan with one more station, listed last in a layout. Its id must be new. */
export function addStation(plan: Plan, layoutId: string, station: Station): Plan {
  const layout = layoutById(plan, layoutId);
  const listed = { ...layout, stations: [...layout.stations, station.id] };
  return { ...plan, stations: [...plan.stations, station], layouts: plan.layouts.map((l) => (l.id === layoutId ? listed : l)) };
}

/** A plan without a station, in no layout. A layout keeps its last station: an empty one is no layout. */
export function removeStation(plan: Plan, id: string): Plan {
  stationById(plan, id);
  const without = plan.layouts.map((l) => ({ ...l, stations: l.stations.filter((s) => s !== id) }));
  return { ...plan, stations: plan.stations.filter((s) => s.id !== id), layouts: without.filter((l) => l.stations.length > 0) };
}

export function renamePlan(plan: Plan, title: string): Plan {
  return { ...plan, title };
}
