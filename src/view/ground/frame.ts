import { RAD_PER_DEG } from "../../base/constants.ts";
import { ecefToEnu, enuFrame, enuToEcef } from "../../engine/geodesy/enu.ts";
import { ecefToGeodetic, geodeticToEcef } from "../../engine/geodesy/wgs84.ts";

/** A place on the ellipsoid in degrees. */
export interface GeoPoint {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
}

/** The same place in metres east and north of the plan's origin, in the plane that touches the ellipsoid there. */
export interface GroundPoint extends GeoPoint {
  readonly eastM: number;
  readonly northM: number;
}

export interface Origin extends GeoPoint {
  readonly heightM: number;
}

/** East and north about the plan's origin: exact, at any distance, both ways. */
export interface LocalFrame {
  readonly origin: Origin;
  /** A place at an ellipsoidal height, with its east and north. */
  point(latitudeDeg: number, longitudeDeg: number, heightM: number): GroundPoint;
  /** The place at this height that stands at these east and north; undefined past the Earth's limb. */
  at(eastM: number, northM: number, heightM: number): GroundPoint | undefined;
}

/** Where the ground stands steeper than this against the origin's plane, east and north no longer tell a place. */
const LEAST_COSINE = 0.02;
const SEA_RADIUS_M = 6_371_000;

export function localFrame(origin: Origin): LocalFrame {
  const enu = enuFrame(origin.latitudeDeg * RAD_PER_DEG, origin.longitudeDeg * RAD_PER_DEG, origin.heightM);
  return {
    origin,
    point(latitudeDeg, longitudeDeg, heightM) {
      const xyzM = geodeticToEcef(latitudeDeg * RAD_PER_DEG, longitudeDeg * RAD_PER_DEG, heightM);
      const [eastM, northM] = ecefToEnu(enu, xyzM);
      return { latitudeDeg, longitudeDeg, eastM, northM };
    },
    at(eastM, northM, heightM) {
      const reach = SEA_RADIUS_M + heightM;
      const across2 = eastM * eastM + northM * northM;
      if (!(across2 < reach * reach)) return undefined;
      // Newton along the origin's vertical from the place on a sphere: the slope is the cosine between the two verticals.
      let upM = heightM - origin.heightM - across2 / (reach + Math.sqrt(reach * reach - across2));
      for (let round = 0; round < 30; round++) {
        const { latRad, lonRad, heightM: reached } = ecefToGeodetic(enuToEcef(enu, [eastM, northM, upM]));
        const cosLat = Math.cos(latRad);
        const cosine = cosLat * Math.cos(lonRad) * enu.up[0] + cosLat * Math.sin(lonRad) * enu.up[1] + Math.sin(latRad) * enu.up[2];
        if (!(cosine > LEAST_COSINE)) return undefined;
        const miss = reached - heightM;
        if (Math.abs(miss) < 1e-6) return { latitudeDeg: latRad / RAD_PER_DEG, longitudeDeg: lonRad / RAD_PER_DEG, eastM, northM };
        upM -= miss / cosine;
      }
      return undefined;
    },
  };
}
