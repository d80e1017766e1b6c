import { type Box, type LabelWish, placeLabels } from "../../view/ground/labels.ts";
import type { MarkKind, SceneMark } from "../../view/scene/model.ts";
import type { Palette } from "../place/palette.ts";
import { mapFont } from "../place/scene.ts";
import type { Seen } from "./stage.ts";

/** Half the size of a mark, pixels. */
const REACH: { readonly [K in MarkKind]: number } = {
  station: 4,
  candidate: 4,
  selected: 9,
  hub: 5,
  target: 6,
  compass: 0,
};

/** Draws marks and names over the picture; a name that finds no room is left out, the picked station's never. */
export function paintMarks(
  ctx: CanvasRenderingContext2D,
  marks: readonly SceneMark[],
  seen: readonly Seen[],
  palette: Palette,
  width: number,
  height: number,
): void {
  const shown = marks.flatMap((mark, k) => {
    const at = seen[k];
    return at ? [{ mark, at }] : [];
  });
  for (const { mark, at } of [...shown].reverse()) paintMark(ctx, mark.kind, at.x, at.y, palette);
  const font = (kind: MarkKind): string =>
    mapFont(palette, kind === "selected" || kind === "target" || kind === "compass" ? 560 : 420);
  const wishes: LabelWish[] = shown.map(({ mark: { kind, label }, at }) => {
    ctx.font = font(kind);
    const size = { width: ctx.measureText(label).width + 4, height: 15 };
    return {
      ...at,
      ...size,
      clearance: kind === "compass" ? "centre" : REACH[kind] + 5,
      always: kind === "selected" || kind === "target",
    };
  });
  const covered = shown.flatMap(({ mark: { kind }, at }): Box[] => {
    const reach = REACH[kind];
    return reach === 0 ? [] : [{ x: at.x - reach, y: at.y - reach, width: 2 * reach, height: 2 * reach }];
  });
  const boxes = placeLabels(wishes, covered, { x: 4, y: 4, width: width - 8, height: height - 8 });
  ctx.textBaseline = "middle";
  ctx.lineJoin = "round";
  boxes.forEach((box, k) => {
    if (!box) return;
    const { kind, label } = shown[k].mark;
    ctx.font = font(kind);
    ctx.strokeStyle = palette.halo;
    ctx.lineWidth = 4;
    const [x, y] = [box.x + 2, box.y + box.height / 2 + 0.5];
    ctx.strokeText(label, x, y);
    ctx.fillStyle =
      kind === "selected" || kind === "target"
        ? palette.accent
        : kind === "candidate" || kind === "compass"
          ? palette.ink2
          : palette.ink;
    ctx.fillText(label, x, y);
  });
}

function paintMark(ctx: CanvasRenderingContext2D, kind: MarkKind, x: number, y: number, palette: Palette): void {
  ctx.beginPath();
  if (kind === "hub") ctx.rect(x - 4.5, y - 4.5, 9, 9);
  else ctx.arc(x, y, kind === "selected" ? 9 : kind === "target" ? 5.5 : 4, 0, 2 * Math.PI);
  switch (kind) {
    case "station":
      ctx.fillStyle = palette.ink;
      ctx.fill();
      break;
    case "candidate":
    case "hub":
      ctx.fillStyle = palette.halo;
      ctx.strokeStyle = palette.ink;
      ctx.lineWidth = 1.6;
      ctx.fill();
      ctx.stroke();
      break;
    case "selected":
      ctx.strokeStyle = palette.accent;
      ctx.lineWidth = 1.75;
      ctx.stroke();
      ctx.beginPath();
      ctx.arc(x, y, 5, 0, 2 * Math.PI);
      ctx.fillStyle = palette.accent;
      ctx.fill();
      break;
    case "target":
      ctx.fillStyle = palette.halo;
      ctx.strokeStyle = palette.accent;
      ctx.lineWidth = 2;
      ctx.fill();
      ctx.stroke();
      break;
    default:
  }
}
