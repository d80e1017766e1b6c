import { geoPath } from "d3-geo";
import { placeLabels } from "../../view/ground/labels.ts";
import { discRadii, HUB_PX, markBoxes, type Named, namedMarks, SELECTED_RING_PX } from "../../view/ground/marks.ts";
import { mapFont, type Scene } from "./scene.ts";

const LABEL_HEIGHT_PX = 14;

/** Baselines of the selection, marks and names. `widths` keeps the measured width of each name. */
export function paintStations(ctx: CanvasRenderingContext2D, scene: Scene, widths: Map<string, number>): void {
  const { model, points, sheet, palette } = scene;
  const { stations, candidates } = model;
  const at = { x: 0, y: 0 };
  let hub: { x: number; y: number } | null = null;
  if (model.hub) {
    sheet.draw(model.hub, at);
    hub = { ...at };
  }
  const radii = discRadii(points);
  const picked =
    stations.length + candidates.length === 0 ? -1 : [...stations, ...candidates].findIndex(({ id }) => id === model.selected?.id);
  if (picked >= 0 && picked < stations.length) paintBaselines(ctx, scene, picked);
  paintTrail(ctx, scene);

  // Candidates first: rings, so that what is used stands above what might be.
  ctx.lineWidth = 1.75;
  for (let i = stations.length; i < points.count; i++) {
    if (i === picked || !inSight(scene, i)) continue;
    disc(ctx, points.x[i], points.y[i], 5.5, palette.halo);
    ctx.strokeStyle = palette.ink;
    circle(ctx, points.x[i], points.y[i], 4);
    ctx.stroke();
  }
  for (let i = 0; i < stations.length; i++) {
    if (i !== picked && inSight(scene, i)) disc(ctx, points.x[i], points.y[i], radii[i] + 1.5, palette.halo);
  }
  for (let i = 0; i < stations.length; i++) {
    if (i !== picked && inSight(scene, i)) disc(ctx, points.x[i], points.y[i], radii[i], palette.ink);
  }
  if (hub && Number.isFinite(hub.x)) paintHub(ctx, hub.x, hub.y, palette.surface, palette.ink);
  if (picked >= 0 && Number.isFinite(points.x[picked])) paintSelected(ctx, scene, picked);
  paintNames(
    ctx,
    scene,
    namedMarks(model, points, hub, measure(ctx, scene, widths), LABEL_HEIGHT_PX),
    markBoxes(points, radii, hub),
  );
}

const inSight = ({ points, sheet }: Scene, i: number): boolean =>
  points.x[i] > -20 && points.x[i] < sheet.width + 20 && points.y[i] > -20 && points.y[i] < sheet.height + 20;

function circle(ctx: CanvasRenderingContext2D, x: number, y: number, r: number): void {
  ctx.beginPath();
  ctx.arc(x, y, r, 0, 2 * Math.PI);
}

function disc(ctx: CanvasRenderingContext2D, x: number, y: number, r: number, fill: string): void {
  circle(ctx, x, y, r);
  ctx.fillStyle = fill;
  ctx.fill();
}

/** One path, so that lines which share their end do not darken it. Straight on the ground and on the globe; on the flat world along the great circle. */
function paintBaselines(ctx: CanvasRenderingContext2D, { model, points, sheet, palette, lift }: Scene, picked: number): void {
  const x = points.x[picked];
  const y = points.y[picked];
  if (!Number.isFinite(x)) return;
  ctx.beginPath();
  if (sheet.kind === "world" && sheet.projection) {
    const path = geoPath(sheet.projection, ctx);
    const from = lift?.to ?? model.stations[picked];
    for (const to of model.stations) {
      path({
        type: "LineString",
        coordinates: [
          [from.longitudeDeg, from.latitudeDeg],
          [to.longitudeDeg, to.latitudeDeg],
        ],
      });
    }
  } else {
    for (let i = 0; i < model.stations.length; i++) {
      if (!Number.isFinite(points.x[i])) continue;
      ctx.moveTo(x, y);
      ctx.lineTo(points.x[i], points.y[i]);
    }
  }
  ctx.strokeStyle = palette.accent;
  // Fainter where there are many: a fan of a thousand lines would hide the ground.
  ctx.globalAlpha = 0.32 * Math.sqrt(Math.min(1, 60 / model.stations.length));
  ctx.lineWidth = 1;
  ctx.stroke();
  ctx.globalAlpha = 1;
}

/** Where a lifted station stood, and the way from there. */
function paintTrail(ctx: CanvasRenderingContext2D, { lift, sheet, palette }: Scene): void {
  if (!lift) return;
  const from = { x: 0, y: 0 };
  const to = { x: 0, y: 0 };
  sheet.draw(lift.station, from);
  sheet.draw(lift.to, to);
  if (!Number.isFinite(from.x) || !Number.isFinite(to.x)) return;
  ctx.strokeStyle = palette.accent;
  ctx.lineWidth = 1.5;
  ctx.setLineDash([4, 3]);
  ctx.beginPath();
  ctx.moveTo(from.x, from.y);
  ctx.lineTo(to.x, to.y);
  ctx.stroke();
  ctx.setLineDash([2.5, 2.5]);
  circle(ctx, from.x, from.y, 6);
  ctx.stroke();
  ctx.setLineDash([]);
}

function paintHub(ctx: CanvasRenderingContext2D, x: number, y: number, fill: string, ink: string): void {
  ctx.fillStyle = fill;
  ctx.strokeStyle = ink;
  ctx.lineWidth = 1.75;
  ctx.beginPath();
  ctx.rect(x - HUB_PX / 2, y - HUB_PX / 2, HUB_PX, HUB_PX);
  ctx.fill();
  ctx.stroke();
}

function paintSelected(ctx: CanvasRenderingContext2D, { points, palette, model }: Scene, i: number): void {
  const [x, y] = [points.x[i], points.y[i]];
  ctx.globalAlpha = 0.8;
  disc(ctx, x, y, SELECTED_RING_PX, palette.accentWash);
  ctx.globalAlpha = 1;
  ctx.strokeStyle = palette.accent;
  ctx.lineWidth = 1.75;
  circle(ctx, x, y, SELECTED_RING_PX);
  ctx.stroke();
  if (model.selected?.inLayout) disc(ctx, x, y, 6, palette.accent);
  else {
    circle(ctx, x, y, 5);
    ctx.stroke();
  }
}

const measure =
  (ctx: CanvasRenderingContext2D, { palette }: Scene, widths: Map<string, number>) =>
  (text: string, strong: boolean): number => {
    const key = strong ? `!${text}` : text;
    const known = widths.get(key);
    if (known !== undefined) return known;
    ctx.font = mapFont(palette, strong ? 560 : 420);
    const width = ctx.measureText(text).width;
    widths.set(key, width);
    return width;
  };

function paintNames(
  ctx: CanvasRenderingContext2D,
  scene: Scene,
  named: readonly Named[],
  marks: Parameters<typeof placeLabels>[1],
): void {
  const { sheet, palette } = scene;
  const areas = areaNames(ctx, scene);
  // Room for the ticks on the frame: no name runs under them.
  const bounds = { x: 4, y: 16, width: sheet.width - 8, height: sheet.height - 20 };
  const all = [...named.slice(0, 2), ...areas, ...named.slice(2)];
  const boxes = placeLabels(
    all.map(({ wish }) => wish),
    marks,
    bounds,
  );
  ctx.textBaseline = "middle";
  ctx.textAlign = "left";
  ctx.lineJoin = "round";
  all.forEach(({ text, role }, i) => {
    const box = boxes[i];
    if (!box) return;
    ctx.font = mapFont(palette, role === "selected" || role === "hub" ? 560 : 420);
    const y = box.y + box.height / 2 + 0.5;
    ctx.strokeStyle = palette.halo;
    ctx.lineWidth = 4;
    ctx.strokeText(text, box.x, y);
    ctx.fillStyle = role === "selected" ? palette.accent : role === "candidate" ? palette.ink3 : palette.ink;
    ctx.fillText(text, box.x, y);
  });
}

/** Names of keep-outs, in the middle of those large enough to hold them. */
function areaNames(ctx: CanvasRenderingContext2D, { model, sheet, palette }: Scene): readonly Named[] {
  ctx.font = mapFont(palette, 420);
  const at = { x: 0, y: 0 };
  return model.keepOuts.flatMap(({ label, rings }) => {
    const ring = rings[0] ?? [];
    let [x0, x1, y0, y1, x, y, area] = [Infinity, -Infinity, Infinity, -Infinity, 0, 0, 0];
    let before: { x: number; y: number } | undefined;
    for (const point of [...ring, ring[0]]) {
      sheet.draw(point, at);
      if (!Number.isFinite(at.x)) return [];
      x0 = Math.min(x0, at.x);
      x1 = Math.max(x1, at.x);
      y0 = Math.min(y0, at.y);
      y1 = Math.max(y1, at.y);
      if (before) {
        const cross = before.x * at.y - at.x * before.y;
        area += cross;
        x += (before.x + at.x) * cross;
        y += (before.y + at.y) * cross;
      }
      before = { x: at.x, y: at.y };
    }
    const width = ctx.measureText(label).width;
    if (x1 - x0 < 0.6 * width || y1 - y0 < LABEL_HEIGHT_PX || area === 0) return [];
    return [
      {
        text: label,
        role: "keepOut" as const,
        wish: { x: x / (3 * area), y: y / (3 * area), width, height: LABEL_HEIGHT_PX, clearance: "centre" as const },
      },
    ];
  });
}
