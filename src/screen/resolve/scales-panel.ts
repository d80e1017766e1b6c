import { css, html, nothing, svg } from "lit";
import { type ScalesModel, scalesModel } from "../../view/resolve/scales.ts";
import { SizeController } from "../parts/size.ts";
import { axes } from "./axes.ts";
import { Panel } from "./panel.ts";
import { plotStyles } from "./plotstyles.ts";

const kinds = { "primary beam": "other", "largest scale": "second", "beam, major axis": "" } as const;

/** Beam, largest scale and primary beam against wavelength, with the receivers' bands. */
export class ScalesPanel extends Panel {
  readonly #area = new SizeController(this, ".area");
  static override styles = [
    ...Panel.styles,
    plotStyles,
    css`
      .seen {
        fill: var(--sw-layout-3);
        opacity: 0.13;
      }
      .curve.second {
        stroke-dasharray: none;
      }
      .receiver {
        fill: var(--sw-ink-2);
      }
    `,
  ];

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const { picture, observation, antennas } = model;
    const scales = picture ? scalesModel(picture, observation.frequencyHz, antennas, this.#area.size) : null;
    return html`<section class="pane" aria-label="Scales seen against wavelength">
      <header><h2>Scales seen against wavelength</h2><span class="aside extra">both axes logarithmic</span></header>
      <div class="area">${picture ? (scales ? this.#figure(scales) : nothing) : this.waiting()}</div>
      ${scales ? this.words("Scales seen against wavelength", scales.text) : nothing}
    </section>`;
  }

  #figure(scales: ScalesModel) {
    const { box, targetX } = scales;
    const bottom = box.y + box.height;
    return html`<svg role="img" aria-label=${scales.text.summary}>
      ${axes(box, scales.xTicks, scales.yTicks)}
      ${scales.seen ? svg`<path class="seen" d=${scales.seen}></path>` : nothing}
      ${scales.lines.map((l) => svg`<line class="curve ${kinds[l.name]}" x1=${l.x1} y1=${l.y1} x2=${l.x2} y2=${l.y2}></line>`)}
      ${scales.bands.map(
        (b) => svg`<rect class="receiver" x=${b.x} y=${bottom - 6} width=${Math.max(2, b.width)} height="6"></rect>
          <text class="halo" x=${b.x + b.width / 2} y=${bottom - 11} text-anchor="middle">${b.label}</text>`,
      )}
      ${scales.bands.length > 0 ? svg`<text class="halo" x=${box.x + 4} y=${bottom - 11}>GHz</text>` : nothing}
      <line class="target-line" x1=${targetX} x2=${targetX} y1=${box.y} y2=${bottom}></line>
      ${scales.lines.map(
        (l) =>
          svg`<text class="name halo ${kinds[l.name]}" x=${l.label.x} y=${l.label.y - 6} transform=${`rotate(${l.label.angleDeg.toFixed(1)} ${l.label.x} ${l.label.y})`}>${l.name}</text>`,
      )}
      ${scales.lines
        .filter((l) => l.name !== "primary beam")
        .map((l) => {
          const left = l.name === "largest scale";
          return svg`<circle class="target-dot" cx=${l.at.x} cy=${l.at.y} r="4.5"></circle>
            <text class="target halo" x=${l.at.x + (left ? -7 : 9)} y=${l.at.y + (left ? -8 : 15)} text-anchor=${left ? "end" : "start"}>${l.at.text}</text>`;
        })}
    </svg>`;
  }
}

customElements.define("sw-scales-panel", ScalesPanel);
