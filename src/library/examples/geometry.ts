import { inverse, toHorizontal } from "spanwright/geometry";

// How far apart, and in which direction?
const { distanceM, azimuthADeg } = inverse(-31.6, -66.9, -31.5, -66.8);
console.log(`${(distanceM / 1000).toFixed(3)} km toward ${azimuthADeg.toFixed(1)}°`);

// How high stands a source at declination −30° three hours past transit?
const RAD = Math.PI / 180;
const { elevationRad } = toHorizontal(3 * 15 * RAD, -30 * RAD, -31.6 * RAD);
console.log(`${(elevationRad / RAD).toFixed(2)}°`);
// prints: 14.598 km toward 40.6°
// prints: 51.59°
