import type { Box, LabelWish } from "./labels.ts";
import { labelOf, type PlaceModel } from "./model.ts";
import type { ScreenPoints } from "./pick.ts";

/** Radius of a station's disc in pixels, and where its neighbours stand close. */
export const DISC_PX = 4.5;
export const CROWDED_DISC_PX = 3;
const CROWDED_WITHIN_PX = 13;
export const SELECTED_RING_PX = 14;
export const HUB_PX = 10;

/** Radii of the discs: smaller where another station stands within a few pixels. */
export function discRadii(points: ScreenPoints): Float32Array {
  const side = CROWDED_WITHIN_PX;
  const cells = new Map<number, number[]>();
  const key = (cx: number, cy: number): number => cy * 65_536 + cx;
  for (let i = 0; i < points.count; i++) {
    if (!Number.isFinite(points.x[i])) continue;
    const k = key(Math.floor(points.x[i] / side), Math.floor(points.y[i] / side));
    const cell = cells.get(k);
    if (cell) cell.push(i);
    else cells.set(k, [i]);
  }
  const radii = new Float32Array(points.count).fill(DISC_PX);
  for (let i = 0; i < points.count; i++) {
    const cx = Math.floor(points.x[i] / side);
    const cy = Math.floor(points.y[i] / side);
    search: for (let y = cy - 1; y <= cy + 1; y++) {
      for (let x = cx - 1; x <= cx + 1; x++) {
        for (const j of cells.get(key(x, y)) ?? []) {
          if (j !== i && Math.hypot(points.x[j] - points.x[i], points.y[j] - points.y[i]) < CROWDED_WITHIN_PX) {
            radii[i] = CROWDED_DISC_PX;
            break search;
          }
        }
      }
    }
  }
  return radii;
}

/** One label to draw. */
export interface Named {
  readonly text: string;
  readonly role: "station" | "candidate" | "selected" | "hub" | "keepOut";
  readonly wish: LabelWish;
}

/** What may have to be named, in order of right to room: selection, hub, then stations from the outside in, then candidates. */
export function namedMarks(
  model: PlaceModel,
  points: ScreenPoints,
  hub: { readonly x: number; readonly y: number } | null,
  widthOf: (text: string, strong: boolean) => number,
  lineHeight: number,
): readonly Named[] {
  const all = [...model.stations, ...model.candidates];
  const named: Named[] = [];
  const add = (text: string, role: Named["role"], x: number, y: number, clearance: number): void => {
    const strong = role === "selected" || role === "hub";
    named.push({
      text,
      role,
      wish: { x, y, width: widthOf(text, strong), height: lineHeight, clearance, always: role === "selected" },
    });
  };
  const selected = all.findIndex(({ id }) => id === model.selected?.id);
  if (selected >= 0 && Number.isFinite(points.x[selected])) {
    add(labelOf(all[selected]), "selected", points.x[selected], points.y[selected], SELECTED_RING_PX + 3);
  }
  if (hub && Number.isFinite(hub.x)) add("Hub house", "hub", hub.x, hub.y, HUB_PX);
  for (const i of outsideIn(points, model.stations.length)) {
    if (i !== selected) add(labelOf(all[i]), "station", points.x[i], points.y[i], DISC_PX + 5);
  }
  for (let i = model.stations.length; i < all.length; i++) {
    if (i !== selected && Number.isFinite(points.x[i])) add(labelOf(all[i]), "candidate", points.x[i], points.y[i], DISC_PX + 5);
  }
  return named;
}

/** Stations in sight, the farthest from their middle first: names collide in the core, not out on the arms. */
function outsideIn(points: ScreenPoints, count: number): readonly number[] {
  const seen = Array.from({ length: count }, (_, i) => i).filter((i) => Number.isFinite(points.x[i]));
  const x = seen.reduce((sum, i) => sum + points.x[i], 0) / seen.length;
  const y = seen.reduce((sum, i) => sum + points.y[i], 0) / seen.length;
  const away = (i: number): number => (points.x[i] - x) ** 2 + (points.y[i] - y) ** 2;
  return seen.sort((i, j) => away(j) - away(i));
}

/** The boxes no label may cover. */
export function markBoxes(
  points: ScreenPoints,
  radii: Float32Array,
  hub: { readonly x: number; readonly y: number } | null,
): Box[] {
  const boxes: Box[] = [];
  const add = (x: number, y: number, r: number): void => {
    if (Number.isFinite(x)) boxes.push({ x: x - r, y: y - r, width: 2 * r, height: 2 * r });
  };
  for (let i = 0; i < points.count; i++) add(points.x[i], points.y[i], radii[i] + 1);
  if (hub) add(hub.x, hub.y, HUB_PX / 2 + 1);
  return boxes;
}
