import type { Area } from "../../view/ground/areas.ts";
import { clippedRing } from "../../view/ground/clip.ts";
import type { Sheet } from "../../view/ground/sheet.ts";
import { tickStepM } from "../../view/ground/ticks.ts";
import type { Scene } from "./scene.ts";

const HATCH_PX = 7;
/** Rings are cut this far outside the canvas, so that the cut never shows. */
const OUTSIDE_PX = 24;

/** Ground, crosses, land and keep-outs of a local sheet. */
export function paintGround(ctx: CanvasRenderingContext2D, { sheet, model, palette }: Scene): void {
  const { width, height } = sheet;
  ctx.fillStyle = palette.desk;
  ctx.fillRect(0, 0, width, height);
  const land = model.land ? areaPath(model.land, sheet) : null;
  if (land) {
    ctx.fillStyle = palette.sunken;
    ctx.fill(land.path, "evenodd");
  }
  paintCrosses(ctx, sheet, palette.edge);
  paintAreas(ctx, { sheet, model, palette });
}

/** Boundary and keep-outs, on any sheet. */
export function paintAreas(
  ctx: CanvasRenderingContext2D,
  { sheet, model, palette }: Pick<Scene, "sheet" | "model" | "palette">,
): void {
  for (const keepOut of model.keepOuts) {
    const area = areaPath(keepOut, sheet);
    if (!area) continue;
    hatch(ctx, area, palette.ink3);
    ctx.strokeStyle = palette.ink2;
    ctx.lineWidth = 1;
    ctx.stroke(area.path);
  }
  const land = model.land ? areaPath(model.land, sheet) : null;
  if (!land) return;
  ctx.strokeStyle = palette.ink2;
  ctx.lineWidth = 1.25;
  ctx.setLineDash([9, 3, 1.5, 3]);
  ctx.stroke(land.path);
  ctx.setLineDash([]);
}

interface AreaPath {
  readonly path: Path2D;
  readonly box: { readonly x0: number; readonly y0: number; readonly x1: number; readonly y1: number };
  /** A corner the hatch hangs on, so that it moves with the ground. */
  readonly corner: { readonly x: number; readonly y: number };
}

function areaPath(area: Area, sheet: Sheet): AreaPath | null {
  const path = new Path2D();
  const box = { x0: Infinity, y0: Infinity, x1: -Infinity, y1: -Infinity };
  const around = { x: -OUTSIDE_PX, y: -OUTSIDE_PX, width: sheet.width + 2 * OUTSIDE_PX, height: sheet.height + 2 * OUTSIDE_PX };
  const at = { x: 0, y: 0 };
  let corner: { x: number; y: number } | undefined;
  for (const ring of area.rings) {
    const pixels: number[] = [];
    for (const point of ring) {
      sheet.draw(point, at);
      if (!Number.isFinite(at.x)) break;
      corner ??= { x: at.x, y: at.y };
      pixels.push(at.x, at.y);
    }
    // A ring that runs over the edge of the globe is left out whole: half an area would be a wrong one.
    if (pixels.length !== 2 * ring.length) continue;
    const seen = clippedRing(pixels, around);
    for (let i = 0; i < seen.length; i += 2) {
      if (i === 0) path.moveTo(seen[i], seen[i + 1]);
      else path.lineTo(seen[i], seen[i + 1]);
      box.x0 = Math.min(box.x0, seen[i]);
      box.x1 = Math.max(box.x1, seen[i]);
      box.y0 = Math.min(box.y0, seen[i + 1]);
      box.y1 = Math.max(box.y1, seen[i + 1]);
    }
    path.closePath();
  }
  return corner && box.x0 < box.x1 ? { path, box, corner } : null;
}

/** Fine strokes rising to the right at 60°, as on a survey sheet. */
function hatch(ctx: CanvasRenderingContext2D, { path, box, corner }: AreaPath, ink: string): void {
  const lean = Math.tan(Math.PI / 6);
  const tall = box.y1 - box.y0;
  const step = HATCH_PX / Math.cos(Math.PI / 6);
  const hang = corner.x + (corner.y - box.y1) * lean;
  ctx.save();
  ctx.clip(path, "evenodd");
  ctx.strokeStyle = ink;
  ctx.globalAlpha = 0.75;
  ctx.lineWidth = 0.75;
  ctx.beginPath();
  for (let x = hang + Math.floor((box.x0 - tall * lean - hang) / step) * step; x < box.x1; x += step) {
    ctx.moveTo(x, box.y1);
    ctx.lineTo(x + tall * lean, box.y0);
  }
  ctx.stroke();
  ctx.restore();
}

function paintCrosses(ctx: CanvasRenderingContext2D, { window: seen, camera }: Sheet, ink: string): void {
  if (!seen) return;
  const step = tickStepM(camera.metresPerPx);
  const scale = camera.metresPerPx;
  ctx.strokeStyle = ink;
  ctx.lineWidth = 1;
  ctx.beginPath();
  for (let i = Math.ceil(seen.westM / step); i * step <= seen.eastM; i++) {
    const x = Math.round((i * step - seen.westM) / scale) + 0.5;
    // Clear of the ticks on the frame.
    if (x < 44) continue;
    for (let j = Math.ceil(seen.southM / step); j * step <= seen.northM; j++) {
      const y = Math.round((seen.northM - j * step) / scale) + 0.5;
      if (y < 22) continue;
      ctx.moveTo(x - 3, y);
      ctx.lineTo(x + 3, y);
      ctx.moveTo(x, y - 3);
      ctx.lineTo(x, y + 3);
    }
  }
  ctx.stroke();
}
