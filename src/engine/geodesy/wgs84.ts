import { DomainError } from "../../base/errors.ts";
import type { Vec3 } from "./vec3.ts";

/** An ellipsoid of revolution. */
export interface Ellipsoid {
  /** Semi-major axis, metres. */
  readonly aM: number;
  /** Flattening. */
  readonly f: number;
}

/** World Geodetic System 1984: its two defining lengths (NGA.STND.0036, version 1.0.0, 2014). */
export const WGS84: Ellipsoid = { aM: 6_378_137, f: 1 / 298.257223563 };

/** Nearer than this to the Earth's centre several normals meet, and latitude has no one value. Metres. */
const CORE_M = 50_000;

/**
 * Geodetic to geocentric coordinates.
 *
 * @param latRad - Geodetic latitude, radians, [−π/2, π/2].
 * @param lonRad - Longitude, radians, east positive, any finite value.
 * @param heightM - Above the ellipsoid along its normal, metres, any finite value.
 * @returns Geocentric x (toward longitude 0), y (90° E), z (north pole), metres; EPSG:4978 for WGS84.
 * @throws {@link DomainError} for a latitude past a pole or a value that is not finite.
 *
 * Accuracy: rounding only, 2 nm near the surface. The same closed form serves ten metres and the diameter of the Earth.
 * At a pole x and y are of the order of a nanometre: the cosine of the nearest double to π/2 is not zero.
 */
export function geodeticToEcef(latRad: number, lonRad: number, heightM: number, ellipsoid: Ellipsoid = WGS84): Vec3 {
  if (!(Math.abs(latRad) <= Math.PI / 2)) throw new DomainError("latRad", latRad, "radians in [-π/2, π/2]", "Were degrees passed?");
  if (!Number.isFinite(lonRad)) throw new DomainError("lonRad", lonRad, "a finite angle in radians");
  if (!Number.isFinite(heightM)) throw new DomainError("heightM", heightM, "a finite height in metres");
  const e2 = ellipsoid.f * (2 - ellipsoid.f);
  const sinLat = Math.sin(latRad);
  const cosLat = Math.cos(latRad);
  const normal = ellipsoid.aM / Math.sqrt(1 - e2 * sinLat * sinLat);
  const axis = (normal + heightM) * cosLat;
  return [axis * Math.cos(lonRad), axis * Math.sin(lonRad), (normal * (1 - e2) + heightM) * sinLat];
}

/** A place on or near the ellipsoid. */
export interface Geodetic {
  readonly latRad: number;
  /** [−π, π]; 0 on the axis, where it has no meaning. */
  readonly lonRad: number;
  /** Along the ellipsoid normal. */
  readonly heightM: number;
}

/**
 * Geocentric to geodetic coordinates.
 *
 * @param xyzM - Geocentric, metres.
 * @returns Longitude −π only where y is −0 or rounds to it; +π on the antimeridian otherwise.
 * @throws {@link DomainError} for a value that is not finite, or within 50 km of the Earth's centre.
 *
 * Bowring's iteration on the parametric latitude (Survey Review 23 (1976) 323), run until it stands still: two or three
 * rounds near the surface, more toward the centre. Near the surface there and back is within 5e-16 rad and 4 nm. Everywhere
 * outside the core the forward conversion of the answer meets the given point within 4 nm or 4 ε of the distance from the
 * centre, whichever is larger.
 */
export function ecefToGeodetic(xyzM: Vec3, ellipsoid: Ellipsoid = WGS84): Geodetic {
  const [x, y, z] = xyzM;
  const p = Math.hypot(x, y);
  const radius = Math.hypot(p, z);
  if (!(radius > CORE_M && radius < Number.POSITIVE_INFINITY)) {
    throw new DomainError("xyzM", xyzM, "finite geocentric metres more than 50 km from the Earth's centre");
  }
  const { aM, f } = ellipsoid;
  const bM = aM * (1 - f);
  const e2 = f * (2 - f);
  const ep2 = e2 / (1 - e2);
  // Sine and cosine of the parametric latitude, not its tangent: the poles need no case.
  let sinB = z * aM;
  let cosB = p * bM;
  let latRad = 0;
  for (let round = 0; round < 50; round++) {
    const norm = Math.hypot(sinB, cosB);
    sinB /= norm;
    cosB /= norm;
    const last = latRad;
    latRad = Math.atan2(z + ep2 * bM * sinB ** 3, p - e2 * aM * cosB ** 3);
    // Near the surface an error shrinks more than a hundredfold a round, so one that small is gone with this step.
    if (round > 0 && Math.abs(latRad - last) < 1e-15) break;
    sinB = (1 - f) * Math.sin(latRad);
    cosB = Math.cos(latRad);
  }
  const sinLat = Math.sin(latRad);
  const cosLat = Math.cos(latRad);
  // From the foot on the ellipsoid, along the normal: p / cos φ − N would lose everything at the poles.
  const normal = aM / Math.sqrt(1 - e2 * sinLat * sinLat);
  const heightM = (p - normal * cosLat) * cosLat + (z - normal * (1 - e2) * sinLat) * sinLat;
  return { latRad, lonRad: p === 0 ? 0 : Math.atan2(y, x), heightM };
}
