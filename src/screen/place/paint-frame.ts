import { edgeTicks, graticuleStepDeg } from "../../view/ground/graticule.ts";
import { scaleBar } from "../../view/ground/scale-bar.ts";
import { tickStepM, ticks } from "../../view/ground/ticks.ts";
import { mapFont, type Scene } from "./scene.ts";

/** Ticks on the frame and the scale bar: drawn last, over the ground. */
export function paintFrame(ctx: CanvasRenderingContext2D, scene: Scene): void {
  const { sheet, palette } = scene;
  ctx.font = mapFont(palette, 400, 10.5);
  ctx.textBaseline = "middle";
  ctx.textAlign = "center";
  const { top, left } = frameTicks(scene);
  let free = 44;
  for (const { px, text } of top) {
    const width = ctx.measureText(text).width + 8;
    if (px - width / 2 < free || px + width / 2 > sheet.width - 4) continue;
    free = px + width / 2 + 6;
    chip(ctx, scene, px, 8, width, text);
  }
  for (const { px, text } of left) {
    if (px < 26 || px > sheet.height - 60) continue;
    const width = ctx.measureText(text).width + 8;
    chip(ctx, scene, width / 2 + 2, px, width, text);
  }
  paintScaleBar(ctx, scene);
}

interface FrameTick {
  readonly px: number;
  readonly text: string;
}

function frameTicks({ sheet }: Scene): { readonly top: readonly FrameTick[]; readonly left: readonly FrameTick[] } {
  const { window: seen, camera } = sheet;
  if (!seen) return edgeTicks(sheet, graticuleStepDeg(camera.metresPerPx), 8);
  const step = tickStepM(camera.metresPerPx);
  const scale = camera.metresPerPx;
  return {
    top: ticks(seen.westM, seen.eastM, step, "E").map(({ valueM, text }) => ({ px: (valueM - seen.westM) / scale, text })),
    left: ticks(seen.southM, seen.northM, step, "N").map(({ valueM, text }) => ({ px: (seen.northM - valueM) / scale, text })),
  };
}

function chip(ctx: CanvasRenderingContext2D, { palette }: Scene, x: number, y: number, width: number, text: string): void {
  ctx.fillStyle = palette.surface;
  ctx.globalAlpha = 0.86;
  ctx.beginPath();
  ctx.roundRect(x - width / 2, y - 7, width, 14, 2);
  ctx.fill();
  ctx.globalAlpha = 1;
  ctx.fillStyle = palette.ink3;
  ctx.fillText(text, x, y + 0.5);
}

function paintScaleBar(ctx: CanvasRenderingContext2D, { sheet, palette }: Scene): void {
  const { lengthPx, text } = scaleBar(sheet.camera.metresPerPx, Math.min(150, sheet.width / 4));
  const note = sheet.kind === "local" ? "" : " in the middle of the map";
  const x = 20.5;
  const y = sheet.height - 18.5;
  ctx.lineJoin = "miter";
  const draw = (): void => {
    ctx.beginPath();
    ctx.moveTo(x, y - 6);
    ctx.lineTo(x, y);
    ctx.lineTo(x + lengthPx, y);
    ctx.lineTo(x + lengthPx, y - 6);
    ctx.moveTo(x + lengthPx / 2, y - 4);
    ctx.lineTo(x + lengthPx / 2, y);
    ctx.stroke();
  };
  ctx.strokeStyle = palette.halo;
  ctx.lineWidth = 4;
  draw();
  ctx.strokeStyle = palette.ink;
  ctx.lineWidth = 1.25;
  draw();
  ctx.font = mapFont(palette, 420);
  ctx.textAlign = "left";
  ctx.lineJoin = "round";
  ctx.strokeStyle = palette.halo;
  ctx.lineWidth = 4;
  ctx.strokeText(text + note, x, y - 15);
  ctx.fillStyle = palette.ink;
  ctx.fillText(text + note, x, y - 15);
}
