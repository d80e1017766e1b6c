import { type GeoProjection, geoNaturalEarth1, geoOrthographic } from "d3-geo";
import type { GeoPoint, GroundPoint, LocalFrame } from "./frame.ts";
import type { ScreenPoints } from "./pick.ts";

/** Where the map looks: the place in its middle, and metres on the ground a CSS pixel there. */
export interface Camera extends GeoPoint {
  readonly metresPerPx: number;
}

/**
 * How the ground lies on the screen for one camera and canvas size.
 * - `local`: east and north about the plan's origin, straight; up to some hundred kilometres.
 * - `globe`: the Earth seen from far above the camera's place.
 * - `world`: the whole Earth on a flat sheet, for arrays that no one side of the globe shows.
 */
export interface Sheet {
  readonly kind: "local" | "globe" | "world";
  readonly camera: Camera;
  readonly width: number;
  readonly height: number;
  /** Ground seen along the top edge and left edge, metres from the origin; local only. */
  readonly window: { readonly westM: number; readonly eastM: number; readonly southM: number; readonly northM: number } | null;
  /** For coast and graticule; null where the sheet is local. */
  readonly projection: GeoProjection | null;
  /** Writes the pixels of a point; NaN where it is out of sight. */
  draw(point: GroundPoint, out: { x: number; y: number }): void;
  /** The place under a pixel at a height (default the origin's); undefined off the globe. */
  place(x: number, y: number, heightM?: number): GroundPoint | undefined;
}

/** Local sheets reach this far from the origin: there the plane is 20 km above the ground and lengths are 0.3 % short. */
const LOCAL_REACH_M = 500_000;
/** A wide array turns to the flat world where the view spans more than this. */
const WORLD_SPAN_M = 8_000_000;
/** IUGG mean radius, metres (Moritz 2000, Geodetic Reference System 1980): the sphere the wide sheets are drawn on. */
export const EARTH_RADIUS_M = 6_371_008.8;

/**
 * The sheet for a camera: local as long as the view stays near the origin, else the globe, or for a `wide` array the world.
 */
export function sheetFor(camera: Camera, frame: LocalFrame, width: number, height: number, wide: boolean): Sheet {
  const middle = frame.point(camera.latitudeDeg, camera.longitudeDeg, frame.origin.heightM);
  const reachM = Math.hypot(middle.eastM, middle.northM) + (camera.metresPerPx * Math.hypot(width, height)) / 2;
  const nearSide = angleBetween(camera, frame.origin) < Math.PI / 4;
  if (reachM < LOCAL_REACH_M && nearSide) return localSheet(camera, middle, frame, width, height);
  const flat = wide && camera.metresPerPx * Math.max(width, height) > WORLD_SPAN_M;
  return globeSheet(camera, frame, width, height, flat);
}

function localSheet(camera: Camera, middle: GroundPoint, frame: LocalFrame, width: number, height: number): Sheet {
  const scale = camera.metresPerPx;
  const westM = middle.eastM - (width / 2) * scale;
  const northM = middle.northM + (height / 2) * scale;
  return {
    kind: "local",
    camera,
    width,
    height,
    window: { westM, eastM: westM + width * scale, southM: northM - height * scale, northM },
    projection: null,
    draw(point, out) {
      out.x = (point.eastM - westM) / scale;
      out.y = (northM - point.northM) / scale;
    },
    place: (x, y, heightM = frame.origin.heightM) => frame.at(westM + x * scale, northM - y * scale, heightM),
  };
}

function globeSheet(camera: Camera, frame: LocalFrame, width: number, height: number, flat: boolean): Sheet {
  const scale = EARTH_RADIUS_M / camera.metresPerPx;
  const projection = flat ? geoNaturalEarth1() : geoOrthographic();
  projection
    .scale(scale)
    .translate([width / 2, height / 2])
    .clipExtent([
      [-1, -1],
      [width + 1, height + 1],
    ]);
  if (flat) projection.rotate([-camera.longitudeDeg, 0]).center([0, camera.latitudeDeg]);
  else {
    projection.rotate([-camera.longitudeDeg, -camera.latitudeDeg]);
    // A clip circle no larger than the view keeps the coast cheap when the camera is close.
    const seen = Math.hypot(width, height) / 2 / scale;
    projection.clipAngle(seen >= 1 ? 90 : Math.min(90, (Math.asin(seen) * 180) / Math.PI + 0.5));
  }
  return {
    kind: flat ? "world" : "globe",
    camera,
    width,
    height,
    window: null,
    projection,
    draw(point, out) {
      const seen = flat || angleBetween(camera, point) < Math.PI / 2;
      const at = seen ? projection([point.longitudeDeg, point.latitudeDeg]) : null;
      out.x = at ? at[0] : Number.NaN;
      out.y = at ? at[1] : Number.NaN;
    },
    place(x, y, heightM = frame.origin.heightM) {
      const at = projection.invert?.([x, y]);
      if (!at || !(Math.abs(at[0]) <= 180 && Math.abs(at[1]) <= 90)) return undefined;
      // Inverses answer for any pixel: one off the globe comes back as a place that is drawn elsewhere.
      const again = projection(at);
      if (!again || Math.hypot(again[0] - x, again[1] - y) > 0.5) return undefined;
      return frame.point(at[1], at[0], heightM);
    },
  };
}

const RAD = Math.PI / 180;

/** Angle between two places on a sphere, radians; by the chord, so small angles keep their figures. */
export function angleBetween(a: GeoPoint, b: GeoPoint): number {
  const s = Math.sin(((b.latitudeDeg - a.latitudeDeg) * RAD) / 2);
  const t = Math.sin(((b.longitudeDeg - a.longitudeDeg) * RAD) / 2);
  return 2 * Math.asin(Math.min(1, Math.sqrt(s * s + Math.cos(a.latitudeDeg * RAD) * Math.cos(b.latitudeDeg * RAD) * t * t)));
}

/** Pixels of many points, into arrays that are reused while they are long enough. */
export function drawnPoints(sheet: Sheet, points: readonly GroundPoint[], reuse?: ScreenPoints): ScreenPoints {
  const enough = reuse && reuse.x.length >= points.length;
  const x = enough ? reuse.x : new Float64Array(points.length);
  const y = enough ? reuse.y : new Float64Array(points.length);
  const at = { x: 0, y: 0 };
  points.forEach((point, i) => {
    sheet.draw(point, at);
    x[i] = at.x;
    y[i] = at.y;
  });
  return { x, y, count: points.length };
}
