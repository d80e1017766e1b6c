import type { GeoPoint } from "./frame.ts";
import type { Camera, Sheet } from "./sheet.ts";

/** From 5 mm to 60 km a pixel: a 10 m patch to the whole Earth fit any screen. */
const CLOSEST = 0.005;
const FARTHEST = 60_000;

/** The camera after the ground was pulled by (dx, dy) pixels. */
export function pannedCamera(sheet: Sheet, dxPx: number, dyPx: number): Camera {
  const middle = sheet.place(sheet.width / 2 - dxPx, sheet.height / 2 - dyPx);
  return middle ? looking(middle, sheet.camera.metresPerPx) : sheet.camera;
}

/** The camera `factor` times closer (> 1) or farther (< 1), keeping what is under (x, y) in its place. */
export function zoomedCamera(sheet: Sheet, factor: number, x: number, y: number): Camera {
  const metresPerPx = Math.min(FARTHEST, Math.max(CLOSEST, sheet.camera.metresPerPx / factor));
  const ratio = metresPerPx / sheet.camera.metresPerPx;
  // The new middle lies on the old screen where the zoom carries it to the middle; off the globe, the old one stays.
  const middle = sheet.place(x + (sheet.width / 2 - x) * ratio, y + (sheet.height / 2 - y) * ratio);
  return looking(middle ?? sheet.camera, metresPerPx);
}

const looking = ({ latitudeDeg, longitudeDeg }: GeoPoint, metresPerPx: number): Camera => ({
  latitudeDeg,
  longitudeDeg,
  metresPerPx,
});
