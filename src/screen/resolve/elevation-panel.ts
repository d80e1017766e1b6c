import { css, html, nothing, svg } from "lit";
import { type ElevationModel, elevationModel } from "../../view/resolve/elevation.ts";
import { SizeController } from "../parts/size.ts";
import { axes, hatch } from "./axes.ts";
import { Panel } from "./panel.ts";
import { plotStyles } from "./plotstyles.ts";

/** Elevation of the source at the plan's origin, and the window inside it. */
export class ElevationPanel extends Panel {
  readonly #area = new SizeController(this, ".area");
  static override styles = [
    ...Panel.styles,
    plotStyles,
    css`
      .window {
        fill: var(--sw-accent);
        opacity: 0.1;
      }
    `,
  ];

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const figure = elevationModel(model.plan.site, model.observation, model.antennas, this.#area.size);
    return html`<section class="pane" aria-label="Elevation through the window">
      <header><h2>Elevation through the window</h2><span class="aside extra">${figure?.aside}</span></header>
      <div class="area">${figure ? this.#figure(figure) : nothing}</div>
      ${figure ? this.words("Elevation through the window", figure.text) : nothing}
    </section>`;
  }

  override updated(): void {
    // Elevation needs no worker: it is never behind.
  }

  #figure(figure: ElevationModel) {
    const { box, window, limit } = figure;
    const bottom = box.y + box.height;
    return html`<svg role="img" aria-label=${figure.text.summary}>
      <defs>${hatch("low")}</defs>
      <rect class="window" x=${window.x} width=${Math.max(1, window.width)} y=${box.y} height=${box.height}></rect>
      ${axes(box, figure.xTicks, figure.yTicks)}
      <rect fill="url(#low)" x=${box.x} width=${box.width} y=${limit.y} height=${limit.height}></rect>
      ${figure.curves.map((c) => svg`<path class="curve ${c.target ? "" : "other"}" d=${c.d}></path>`)}
      ${[window.x, window.x + window.width].map((x) => svg`<line class="target-line" x1=${x} x2=${x} y1=${box.y} y2=${bottom}></line>`)}
      ${figure.curves.map((c) => svg`<text class="name halo ${c.target ? "" : "other"}" x=${c.x + (c.target ? 8 : 0)} y=${c.y} text-anchor=${c.target ? "start" : "middle"}>${c.label}</text>`)}
      <text class="target halo" x=${window.x + window.width / 2} y=${bottom - 8} text-anchor="middle">${window.label}</text>
    </svg>`;
  }
}

customElements.define("sw-elevation-panel", ElevationPanel);
