import { nothing, svg } from "lit";
import type { Box, Tick } from "../../view/resolve/figure.ts";

/** Grid, axis lines and numbers of a plot. */
export function axes(box: Box, xTicks: readonly Tick[], yTicks: readonly Tick[], lineX = true) {
  const bottom = box.y + box.height;
  const right = box.x + box.width;
  return svg`
    ${yTicks.map(
      (t) => svg`<line class="grid" x1=${box.x} x2=${right} y1=${t.at} y2=${t.at}></line>
        <text x=${box.x - 6} y=${t.at + 4} text-anchor="end">${t.label}</text>`,
    )}
    ${xTicks.map(
      (t) => svg`${lineX ? svg`<line class="grid" x1=${t.at} x2=${t.at} y1=${box.y} y2=${bottom}></line>` : nothing}
        <text x=${t.at} y=${bottom + 16} text-anchor="middle">${t.label}</text>
        ${t.below ? svg`<text class="below" x=${t.at} y=${bottom + 31} text-anchor="middle">${t.below}</text>` : nothing}`,
    )}
    <path class="axis" d=${`M${box.x} ${box.y}V${bottom}H${right}`}></path>`;
}

/** A clip path for curves that leave the plot; each shadow root defines its own. */
export const clip = (id: string, box: Box) =>
  svg`<clipPath id=${id}><rect x=${box.x} y=${box.y} width=${box.width} height=${box.height}></rect></clipPath>`;

/** Diagonal lines for what cannot be reached. */
export const hatch = (id: string) =>
  svg`<pattern id=${id} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(-45)">
    <line class="hatch" x1="0" x2="7" y1="0" y2="0"></line>
  </pattern>`;
