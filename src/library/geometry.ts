/**
 * Frames, geodesics, directions and time: WGS84 and the sky, in radians, metres and Julian dates.
 *
 * ```ts
 * {@includeCode ./examples/geometry.ts}
 * ```
 *
 * @module geometry
 */
export { baselineCount, baselineIndex, baselineLengthsM, baselineStations, baselineXyzM } from "../engine/array/baselines.ts";
export { type EnuFrame, ecefToEnu, enuFrame, enuToEcef } from "../engine/geodesy/enu.ts";
export { direct, type GeodesicEnd, type GeodesicLine, inverse, polygonArea, type RingSize } from "../engine/geodesy/geodesic.ts";
export { stationNormals, stationXyzM } from "../engine/geodesy/originframe.ts";
export type { Vec3 } from "../engine/geodesy/vec3.ts";
export { type Ellipsoid, ecefToGeodetic, type Geodetic, geodeticToEcef, WGS84 } from "../engine/geodesy/wgs84.ts";
export { isoToJulian, type JulianDate, julianToIso } from "../engine/sky/calendar.ts";
export { fromHorizontal, type Horizontal, parallacticAngle, sourceDirection, toHorizontal } from "../engine/sky/direction.ts";
export { type Equatorial, precessFromJ2000 } from "../engine/sky/precession.ts";
export { type HalfArc, halfArcAbove } from "../engine/sky/riseset.ts";
export { earthRotationAngle, greenwichMeanSiderealTime, hourAngleAt } from "../engine/sky/rotation.ts";
