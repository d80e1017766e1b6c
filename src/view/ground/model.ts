import type { Plan, Site, Station } from "../../plan/schema.ts";
import { type Area, areasOf } from "./areas.ts";
import { isWide } from "./fit.ts";
import { type GroundPoint, type LocalFrame, localFrame } from "./frame.ts";
import { angleBetween, EARTH_RADIUS_M } from "./sheet.ts";

/** A station as the Place task shows it. */
export interface PlaceStation extends GroundPoint {
  readonly id: string;
  /** Empty where the plan gives none. */
  readonly name: string;
  readonly heightM: number;
  readonly locked: boolean;
  /** In the layout shown; a station in no layout at all is a candidate place. */
  readonly inLayout: boolean;
  /** The plan's record it was made from. */
  readonly record: Station;
}

/** What the Place task says and draws, decided without a DOM. */
export interface PlaceModel {
  readonly layoutId: string;
  readonly layoutLabel: string;
  readonly site: Site;
  readonly frame: LocalFrame;
  readonly land: Area | null;
  readonly keepOuts: readonly Area[];
  readonly hub: GroundPoint | null;
  /** Stations of the layout, in the order of the plan. */
  readonly stations: readonly PlaceStation[];
  /** Stations that belong to no layout, in the order of the plan. */
  readonly candidates: readonly PlaceStation[];
  readonly selected: PlaceStation | null;
  /** A drag is under way: figures are a preview. */
  readonly moving: boolean;
  /** No one side of the globe shows the layout. */
  readonly wide: boolean;
  /** The layout is small enough, and near enough to the origin, to be told in east and north. */
  readonly local: boolean;
  /** What east and north are written in. */
  readonly unit: GroundUnit;
}

/** Kilometres, or metres for arrays that reach no farther than 2 km from the origin. */
export type GroundUnit = "km" | "m";
const METRES_WITHIN_M = 2_000;

/** 500 km: there the touching plane is 20 km above the ground. */
const LOCAL_RAD = 500_000 / EARTH_RADIUS_M;

/**
 * The Place task for one layout of a plan.
 *
 * @param selectionId - Picked station; an id that stands in neither the layout nor the candidates selects nothing.
 * @param moving - Whether a drag is under way.
 * @param previous - The model shown before: what did not change is taken over from it as it is.
 */
export function placeModel(
  plan: Plan,
  layoutId: string,
  selectionId: string | null,
  moving: boolean,
  previous?: PlaceModel,
): PlaceModel {
  const kept = previous && previous.site === plan.site ? previous : undefined;
  const frame = kept?.frame ?? localFrame(plan.site.origin);
  const layout = plan.layouts.find(({ id }) => id === layoutId);
  const members = new Set(layout?.stations);
  const elsewhere = new Set(plan.layouts.flatMap(({ stations }) => stations));
  const old = new Map(kept ? [...kept.stations, ...kept.candidates].map((station) => [station.record, station]) : []);
  const shown = (record: Station, inLayout: boolean): PlaceStation => {
    const same = old.get(record);
    return same?.inLayout === inLayout ? same : placeStation(record, frame, inLayout);
  };
  const stations = plan.stations.filter(({ id }) => members.has(id)).map((record) => shown(record, true));
  const candidates = plan.stations.filter(({ id }) => !elsewhere.has(id)).map((record) => shown(record, false));
  const { land, keepOuts } = kept ?? areasOf(plan.site, frame);
  const { hub, origin } = plan.site;
  return {
    layoutId,
    layoutLabel: layout?.label || layoutId,
    site: plan.site,
    frame,
    land,
    keepOuts,
    hub: kept ? kept.hub : hub && frame.point(hub.latitudeDeg, hub.longitudeDeg, origin.heightM),
    stations,
    candidates,
    selected: stations.find(({ id }) => id === selectionId) ?? candidates.find(({ id }) => id === selectionId) ?? null,
    moving,
    wide: isWide(stations),
    unit: stations.every(({ eastM, northM }) => Math.hypot(eastM, northM) < METRES_WITHIN_M) ? "m" : "km",
    local: stations.every((station) => angleBetween(station, plan.site.origin) < LOCAL_RAD),
  };
}

function placeStation(record: Station, frame: LocalFrame, inLayout: boolean): PlaceStation {
  const { id, name, latitudeDeg, longitudeDeg, heightM, locked } = record;
  return { ...frame.point(latitudeDeg, longitudeDeg, heightM), id, name, heightM, locked, inLayout, record };
}

/** Id and name, as a title. */
export const titleOf = ({ id, name }: Pick<PlaceStation, "id" | "name">): string => (name && name !== id ? `${id} ${name}` : id);

/** The short word on the map. */
export const labelOf = ({ id, name }: Pick<PlaceStation, "id" | "name">): string => name || id;

/** What the whole plan of the layout spans: stations, hub, and the land where it is no more than three times as wide. */
export function extentOf({ stations, hub, land }: PlaceModel): readonly GroundPoint[] {
  const array: GroundPoint[] = hub ? [...stations, hub] : [...stations];
  if (!land) return array;
  const corners = land.rings.flat();
  return array.length < 2 || spanM(corners) <= 3 * spanM(array) ? [...array, ...corners] : array;
}

function spanM(points: readonly GroundPoint[]): number {
  let [west, east, south, north] = [Infinity, -Infinity, Infinity, -Infinity];
  for (const { eastM, northM } of points) {
    west = Math.min(west, eastM);
    east = Math.max(east, eastM);
    south = Math.min(south, northM);
    north = Math.max(north, northM);
  }
  return Math.max(east - west, north - south);
}
