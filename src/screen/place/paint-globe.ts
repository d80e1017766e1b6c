import { geoPath } from "d3-geo";
import { graticule, graticuleStepDeg } from "../../view/ground/graticule.ts";
import { paintAreas } from "./paint-ground.ts";
import type { Scene } from "./scene.ts";

/** The Earth from far off: sea, land with its coast, graticule, then what the plan draws on the ground. */
export function paintGlobe(ctx: CanvasRenderingContext2D, scene: Scene): void {
  const { sheet, palette, coast } = scene;
  const { projection, width, height } = sheet;
  if (!projection) return;
  const path = geoPath(projection, ctx);
  ctx.fillStyle = palette.sunken;
  ctx.fillRect(0, 0, width, height);
  ctx.beginPath();
  path({ type: "Sphere" });
  ctx.fillStyle = palette.desk;
  ctx.fill();
  if (coast) {
    ctx.beginPath();
    path(coast);
    ctx.fillStyle = palette.surface;
    ctx.fill();
    ctx.strokeStyle = palette.edge;
    ctx.lineWidth = 1;
    ctx.stroke();
  }
  ctx.beginPath();
  path(graticule(sheet, graticuleStepDeg(sheet.camera.metresPerPx)));
  ctx.strokeStyle = palette.edge;
  ctx.globalAlpha = 0.35;
  ctx.lineWidth = 1;
  ctx.stroke();
  ctx.globalAlpha = 1;
  ctx.beginPath();
  path({ type: "Sphere" });
  ctx.strokeStyle = palette.edge;
  ctx.stroke();
  paintAreas(ctx, scene);
}
