import { RAD_PER_DEG, RAD_PER_HOUR } from "../../base/constants.ts";
import { direct, inverse } from "../../engine/geodesy/geodesic.ts";
import { geodeticToEcef, WGS84 } from "../../engine/geodesy/wgs84.ts";
import type { GeoPoint } from "../ground/frame.ts";
import { labelOf, type PlaceModel, type PlaceStation } from "../ground/model.ts";
import { plain } from "../numbers.ts";
import { fan, type SceneMark, Segments, type SpaceModel, type SpaceSource } from "./model.ts";

type Point = readonly [number, number, number];

/** Lines lie this much above the ellipsoid, so that its faces do not hide them. */
const LIFT = 1.004;
/** A geodesic is drawn in pieces of about this, metres. */
const PIECE_M = 250_000;
/** More links than this are a net that shows nothing; then only those of the picked station are drawn. */
const MOST_LINKS = 300;

/** A place on the ellipsoid in scene units: the Earth's equatorial radius is 1, ECEF axes. */
export const globePoint = ({ latitudeDeg, longitudeDeg }: GeoPoint, lift = 1): Point => {
  const [x, y, z] = geodeticToEcef(latitudeDeg * RAD_PER_DEG, longitudeDeg * RAD_PER_DEG, 0);
  return [(lift * x) / WGS84.aM, (lift * y) / WGS84.aM, (lift * z) / WGS84.aM];
};

/** The direction of the vertical: the ellipsoid's normal. */
export const normalAt = ({ latitudeDeg, longitudeDeg }: GeoPoint): Point => {
  const [lat, lon] = [latitudeDeg * RAD_PER_DEG, longitudeDeg * RAD_PER_DEG];
  return [Math.cos(lat) * Math.cos(lon), Math.cos(lat) * Math.sin(lon), Math.sin(lat)];
};

/**
 * The places that see the source at an elevation, as a ring. The elevation belongs to the ellipsoid's normal, and normals of
 * one angle to the source's direction are a circle in geodetic latitude and longitude, so the ring is exact on the ellipsoid.
 *
 * @param zenithDistanceDeg - 90° less the elevation.
 */
export function sightRing(
  { declinationDeg, hourAngleH }: Pick<SpaceSource, "declinationDeg" | "hourAngleH">,
  originLongitudeDeg: number,
  zenithDistanceDeg: number,
  side: number,
): GeoPoint {
  const overLonDeg = originLongitudeDeg - (hourAngleH * RAD_PER_HOUR) / RAD_PER_DEG;
  const [dec, far] = [declinationDeg * RAD_PER_DEG, zenithDistanceDeg * RAD_PER_DEG];
  const sinLat = Math.sin(dec) * Math.cos(far) + Math.cos(dec) * Math.sin(far) * Math.cos(side);
  const lat = Math.asin(Math.max(-1, Math.min(1, sinLat)));
  const lon = Math.atan2(Math.sin(side) * Math.sin(far) * Math.cos(dec), Math.cos(far) - Math.sin(dec) * sinLat);
  return { latitudeDeg: lat / RAD_PER_DEG, longitudeDeg: overLonDeg + lon / RAD_PER_DEG };
}

/** The geodesic between two places, in pieces on the ellipsoid. */
export function geodesicPoints(from: GeoPoint, to: GeoPoint): readonly GeoPoint[] {
  const { distanceM, azimuthADeg: azimuthDeg } = inverse(from.latitudeDeg, from.longitudeDeg, to.latitudeDeg, to.longitudeDeg);
  const pieces = Math.max(1, Math.ceil(distanceM / PIECE_M));
  return Array.from({ length: pieces + 1 }, (_, k) =>
    direct(from.latitudeDeg, from.longitudeDeg, azimuthDeg, (distanceM * k) / pieces),
  );
}

/**
 * A globe-wide array on the ellipsoid: stations, geodesics between them, coast, and the part of the Earth that sees the source.
 *
 * @param coast - Rings of [longitude, latitude] in degrees; empty until the coast is loaded.
 */
export function globeSpace(model: PlaceModel, source: SpaceSource, coast: readonly (readonly (readonly number[])[])[]): SpaceModel {
  const { longitudeDeg } = model.frame.origin;
  const graticule = new Segments();
  const meridian = (lon: number): void =>
    graticule.through(Array.from({ length: 61 }, (_, k) => globePoint({ latitudeDeg: -90 + 3 * k, longitudeDeg: lon }, LIFT)));
  const parallel = (lat: number): void =>
    graticule.through(Array.from({ length: 121 }, (_, k) => globePoint({ latitudeDeg: lat, longitudeDeg: 3 * k }, LIFT)));
  for (let lon = 0; lon < 360; lon += 30) meridian(lon);
  for (let lat = -60; lat <= 60; lat += 30) parallel(lat);

  const shore = new Segments();
  for (const ring of coast) shore.through(ring.map(([lon, lat]) => globePoint({ latitudeDeg: lat, longitudeDeg: lon }, LIFT)));

  const { selected, stations } = model;
  const pairs = (stations.length * (stations.length - 1)) / 2;
  const links = new Segments();
  const link = (a: PlaceStation, b: PlaceStation): void =>
    links.through(geodesicPoints(a, b).map((point) => globePoint(point, LIFT)));
  if (selected) for (const other of stations) if (other.id !== selected.id) link(selected, other);
  if (!selected && pairs <= MOST_LINKS) {
    for (const [i, a] of stations.entries()) for (const b of stations.slice(i + 1)) link(a, b);
  }

  const far = 90 - source.elevationLimitDeg;
  const ring = (k: number, j: number): Point =>
    globePoint(sightRing(source, longitudeDeg, (far * k) / 18, (j * Math.PI) / 48), 1.0025);
  const edge = new Segments();
  edge.through(Array.from({ length: 97 }, (_, j) => globePoint(sightRing(source, longitudeDeg, far, (j * Math.PI) / 48), LIFT)));

  const over = sightRing(source, longitudeDeg, 0, 0);
  const overAt = globePoint(over, 1.25);
  const ray = new Segments();
  ray.add(globePoint(over), overAt);
  const upward = normalAt(over);
  const sees = (station: PlaceStation): boolean => {
    const n = normalAt(station);
    return n[0] * upward[0] + n[1] * upward[1] + n[2] * upward[2] >= Math.sin(source.elevationLimitDeg * RAD_PER_DEG);
  };
  const seeing = stations.filter(sees).length;
  const marked = (kind: SceneMark["kind"], station: PlaceStation): SceneMark => ({
    kind,
    label: labelOf(station),
    at: globePoint(station, 1.005),
    outward: normalAt(station),
  });
  return {
    kind: "globe",
    radius: 1.25,
    aimUp: 0,
    faces: [
      {
        kind: "globe",
        triangles: fan(36, 72, (k, j) => globePoint({ latitudeDeg: 90 - 5 * k, longitudeDeg: 5 * j })),
      },
      { kind: "seen", triangles: fan(18, 96, ring) },
    ],
    lines: [
      ...graticule.line("graticule"),
      ...shore.line("coast"),
      ...links.line("link"),
      ...edge.line("seenEdge"),
      ...ray.line("ray"),
    ],
    marks: [
      ...(selected ? [marked("selected", selected)] : []),
      { kind: "target", label: "Target overhead", at: overAt, outward: upward },
      ...stations.filter((s) => s !== selected).map((s) => marked("station", s)),
      ...model.candidates.filter((s) => s !== selected).map((s) => marked("candidate", s)),
    ],
    text: `${seeing} of ${stations.length} stations of ${model.layoutLabel} see the target at hour angle ${plain(source.hourAngleH)}\u00a0h, ${plain(source.elevationLimitDeg)}° or more above their horizon. The tinted part of the Earth does.`,
    note: selected || pairs <= MOST_LINKS ? "Links are geodesics on the ellipsoid." : "Pick a station to see its links.",
  };
}
