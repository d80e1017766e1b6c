import { RAD_PER_DEG, RAD_PER_HOUR } from "../../base/constants.ts";
import { ecefToEnu, enuFrame } from "../../engine/geodesy/enu.ts";
import { geodeticToEcef } from "../../engine/geodesy/wgs84.ts";
import { toHorizontal } from "../../engine/sky/direction.ts";
import type { Area } from "../ground/areas.ts";
import { labelOf, type PlaceModel, type PlaceStation } from "../ground/model.ts";
import { niceAtMost } from "../ground/nice.ts";
import { plain } from "../numbers.ts";
import { shownAs } from "../units.ts";
import { fan, type SceneMark, Segments, type SpaceModel, type SpaceSource } from "./model.ts";

type Point = readonly [number, number, number];

/** Heights fill no more than this part of the array's reach. */
const RELIEF = 0.12;
const DOME = 1.25;
/** Steps of a path over the dome, hours. */
const STEP_H = 0.1;

/**
 * A local array in space: stations at their heights over a flat ground, and the source's path over the sky of the origin.
 * x east, y north, z up at the plan's origin; the farthest station or corner of the land lies at 1.
 */
export function groundSpace(model: PlaceModel, source: SpaceSource): SpaceModel {
  const { origin } = model.frame;
  const enu = enuFrame(origin.latitudeDeg * RAD_PER_DEG, origin.longitudeDeg * RAD_PER_DEG, origin.heightM);
  const upM = ({ latitudeDeg, longitudeDeg, heightM }: PlaceStation): number =>
    ecefToEnu(enu, geodeticToEcef(latitudeDeg * RAD_PER_DEG, longitudeDeg * RAD_PER_DEG, heightM))[2];
  const all = [...model.stations, ...model.candidates];
  const corners = model.land?.rings.flat() ?? [];
  const reachM = Math.max(1, ...[...all, ...corners].map(({ eastM, northM }) => Math.hypot(eastM, northM)));
  const heights = new Map(all.map((station) => [station.id, upM(station)]));
  const floorM = all.length === 0 ? 0 : Math.min(...heights.values());
  const spreadM = all.length === 0 ? 0 : Math.max(...heights.values()) - floorM;
  const times = spreadM > 0 ? Math.max(1, Math.min(100, niceAtMost((RELIEF * reachM) / spreadM))) : 1;
  const place = (eastM: number, northM: number, up = floorM): Point => [
    eastM / reachM,
    northM / reachM,
    (times * (up - floorM)) / reachM,
  ];
  const stationAt = (station: PlaceStation): Point => place(station.eastM, station.northM, heights.get(station.id));

  const grid = new Segments();
  const step = niceAtMost(reachM / 3);
  for (let k = -Math.floor(reachM / step); k * step <= reachM; k++) {
    const half = Math.sqrt(Math.max(0, reachM * reachM - (k * step) ** 2));
    grid.add(place(k * step, -half), place(k * step, half));
    grid.add(place(-half, k * step), place(half, k * step));
  }
  const outline = (area: Area | null): Segments => {
    const lines = new Segments();
    for (const ring of area?.rings ?? [])
      lines.through(
        ring.map(({ eastM, northM }) => place(eastM, northM)),
        true,
      );
    return lines;
  };
  const stems = new Segments();
  for (const station of all) if (spreadM > 0) stems.add(place(station.eastM, station.northM), stationAt(station));
  const links = new Segments();
  const { selected } = model;
  if (selected) for (const other of model.stations) if (other.id !== selected.id) links.add(stationAt(selected), stationAt(other));

  const sky = skyOf(source, origin.latitudeDeg);
  return {
    kind: "ground",
    radius: DOME,
    aimUp: 0.36 * DOME,
    faces: [
      {
        kind: "ground",
        triangles: fan(1, 72, (k, j) => [k * Math.cos(j * (Math.PI / 36)), k * Math.sin(j * (Math.PI / 36)), -0.002]),
      },
    ],
    lines: [
      ...grid.line("grid"),
      ...outline(model.land).line("land"),
      ...model.keepOuts.flatMap((area) => outline(area).line("keepOut")),
      ...stems.line("stem"),
      ...links.line("link"),
      ...sky.horizon.line("horizon"),
      ...sky.path.line("path"),
      ...sky.window.line("window"),
      ...sky.ray.line("ray"),
    ],
    marks: [
      ...(selected ? [mark("selected", labelOf(selected), stationAt(selected))] : []),
      ...sky.marks,
      ...(model.hub ? [mark("hub", "Hub house", place(model.hub.eastM, model.hub.northM))] : []),
      ...model.stations.filter((s) => s !== selected).map((s) => mark("station", labelOf(s), stationAt(s))),
      ...model.candidates.filter((s) => s !== selected).map((s) => mark("candidate", labelOf(s), stationAt(s))),
    ],
    text: `${model.stations.length} stations of ${model.layoutLabel} within ${shownAs("length", reachM)} of the origin, grid of ${shownAs("length", step)}. ${sky.text}`,
    note: `Ground drawn flat at the lowest station: terrain heights are not read yet. ${
      spreadM > 0 ? `Stations stand at their own heights${times > 1 ? `, drawn ${plain(times)} times as high` : ""}.` : ""
    }`.trim(),
  };
}

const mark = (kind: SceneMark["kind"], label: string, at: Point): SceneMark => ({ kind, label, at, outward: null });

/** The point of the dome in the direction of the source; the dome stands on the horizon of the origin. */
export function domePoint(hourAngleH: number, declinationDeg: number, latitudeDeg: number): Point {
  const { azimuthRad, elevationRad } = toHorizontal(
    hourAngleH * RAD_PER_HOUR,
    declinationDeg * RAD_PER_DEG,
    latitudeDeg * RAD_PER_DEG,
  );
  const across = DOME * Math.cos(elevationRad);
  return [across * Math.sin(azimuthRad), across * Math.cos(azimuthRad), DOME * Math.sin(elevationRad)];
}

function skyOf({ declinationDeg, fromH, toH, elevationLimitDeg, hourAngleH }: SpaceSource, latitudeDeg: number) {
  const at = (h: number): Point => domePoint(h, declinationDeg, latitudeDeg);
  const limit = DOME * Math.sin(elevationLimitDeg * RAD_PER_DEG);
  const trace = (start: number, end: number, least: number): Segments => {
    const lines = new Segments();
    const steps = Math.max(1, Math.round((end - start) / STEP_H));
    for (let k = 0; k < steps; k++) {
      const [a, b] = [at(start + ((end - start) * k) / steps), at(start + ((end - start) * (k + 1)) / steps)];
      if (a[2] >= least && b[2] >= least) lines.add(a, b);
    }
    return lines;
  };
  const horizon = new Segments();
  horizon.through(
    Array.from({ length: 144 }, (_, k) => [DOME * Math.sin(k * (Math.PI / 72)), DOME * Math.cos(k * (Math.PI / 72)), 0]),
    true,
  );
  const now = at(hourAngleH);
  const up = now[2] >= 0;
  const ray = new Segments();
  if (up) ray.add([0, 0, 0], now);
  const elevationDeg = Math.asin(now[2] / DOME) / RAD_PER_DEG;
  const compass = (label: string, x: number, y: number): SceneMark => mark("compass", label, [DOME * x, DOME * y, 0]);
  return {
    horizon,
    path: trace(-12, 12, 0),
    window: toH > fromH ? trace(fromH, toH, limit) : new Segments(),
    ray,
    marks: [
      ...(up ? [mark("target", "Target", now)] : []),
      compass("N", 0, 1),
      compass("E", 1, 0),
      compass("S", 0, -1),
      compass("W", -1, 0),
    ],
    text: up
      ? `The target stands ${plain(elevationDeg)}° above the horizon at hour angle ${plain(hourAngleH)}\u00a0h${elevationDeg < elevationLimitDeg ? `, below the limit of ${plain(elevationLimitDeg)}°` : ""}.`
      : `The target is below the horizon at hour angle ${plain(hourAngleH)}\u00a0h.`,
  };
}
