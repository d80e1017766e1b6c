import { html, nothing, svg, type TemplateResult } from "lit";
import { barEnd, GUIDES, type Room } from "../../view/ledger/bar.ts";
import type { LedgerLine } from "../../view/ledger/ledger.ts";

/** Width of the gauge, place of the plumb line in it and room to either side, px. */
export interface GaugeShape {
  readonly width: number;
  readonly plumb: number;
  readonly room: Room;
}

export const fullGauge: GaugeShape = { width: 128, plumb: 38.5, room: { left: 30, right: 75 } };
export const railGauge: GaugeShape = { width: 56, plumb: 11.5, room: { left: 7, right: 31 } };

/** The bar of one line, hung from the plumb line. */
export function gauge(line: LedgerLine, { width, plumb, room }: GaugeShape): TemplateResult {
  return html`<svg class="gauge" width=${width} aria-hidden="true">
    ${GUIDES.map((g) => {
      const x = plumb + barEnd(g, room).x;
      return svg`<line class="guide" x1=${x} x2=${x} y1="0" y2="100%"></line>`;
    })}
    <svg x=${plumb} y="50%" overflow="visible">${line.margin === null ? nothing : bar(line, room)}${was(line, room)}</svg>
    <line class="plumb" x1=${plumb} x2=${plumb} y1="0" y2="100%"></line>
  </svg>`;
}

function bar(line: LedgerLine, room: Room) {
  const { x, off } = barEnd(line.margin as number, room);
  const left = Math.min(0, x);
  const width = Math.abs(x);
  if (line.state === "working") {
    return svg`<rect class="working" x=${left + 0.5} y="-4" width=${Math.max(1, width - 1)} height="8"></rect>`;
  }
  const kind = line.state === "not met" ? "short" : line.state === "at risk" ? "risk" : "met";
  const shape =
    kind === "short"
      ? svg`<line class="broken" x1="0" x2=${x} y1="0" y2="0"></line>`
      : kind === "risk"
        ? svg`<rect class="hollow" x="0.75" y="-3.75" width=${Math.max(1, width - 1)} height="7.5"></rect>`
        : svg`<rect class="solid" x="0" y="-4.5" width=${width} height="9"></rect>`;
  const away = Math.sign(x);
  const chevron = off ? svg`<path class="chevron" d=${`M${x + 4 * away} -5L${x + 8 * away} 0L${x + 4 * away} 5`}></path>` : nothing;
  return svg`<g class=${kind}>${shape}<line class="pier" x1=${x} x2=${x} y1="-9.5" y2="9.5"></line>${chevron}</g>`;
}

function was(line: LedgerLine, room: Room) {
  if (line.wasMargin === null) return nothing;
  const { x } = barEnd(line.wasMargin, room);
  return svg`<line class="was" x1=${x} x2=${x} y1="-13" y2="13"></line>`;
}
