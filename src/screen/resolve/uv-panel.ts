import { css, html, nothing, svg } from "lit";
import type { UvDensity } from "../../assess/result.ts";
import { paintDensity } from "../../view/paint.ts";
import { type UvModel, uvModel, uvReadout } from "../../view/resolve/uv.ts";
import { windowed } from "../../view/resolve/uvwindow.ts";
import { props } from "../parts/props.ts";
import { SizeController } from "../parts/size.ts";
import type { Theme } from "../tokens.ts";
import { put } from "./paint.ts";
import { Panel } from "./panel.ts";

/** The uv coverage: how often each cell is sampled, rings of baseline length, and what lies under the pointer. */
export class UvPanel extends Panel {
  static override properties = { ...Panel.properties, readout: { state: true } };
  declare readout: string;
  readonly #area = new SizeController(this, ".area");
  static override styles = [
    ...Panel.styles,
    css`
      .ring {
        fill: none;
        stroke: var(--sw-ink-3);
        stroke-width: 1;
        stroke-dasharray: 1.5 3.5;
      }
      .faint {
        opacity: 0.55;
      }
      svg .halo {
        stroke: var(--sw-density-zero);
      }
    `,
  ];
  #uv: UvModel | undefined;
  #painted: { density: UvDensity; half: number; theme: Theme } | undefined;

  constructor() {
    super();
    this.readout = "";
  }

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const { picture, observation, uvHalfWavelengths } = model;
    const uv = picture ? uvModel(picture, observation.frequencyHz, uvHalfWavelengths) : undefined;
    this.#uv = uv;
    const side = Math.min(this.#area.size.width, this.#area.size.height);
    return html`<section class="pane" aria-label="uv coverage">
      <header>
        <h2>uv coverage</h2>
        <span class="aside" ?hidden=${this.readout === ""}>${this.readout}</span><slot ?hidden=${this.readout !== ""}></slot>
      </header>
      <div class="area">
        ${
          uv?.density
            ? html`<div class="square" ${props({ width: `${side}px`, height: `${side}px` })} @pointermove=${this.#point} @pointerleave=${this.#leave}>
                <canvas role="img" aria-label=${uv.text.summary}></canvas>${side > 0 ? this.#overlay(uv, side) : nothing}
              </div>`
            : this.waiting()
        }
      </div>
      <div class="keys">
        ${uv?.keys.map(({ label, value }) => html`<span>${label} <b>${value}</b></span>`)}
      </div>
      ${uv ? this.words("uv coverage", uv.text) : nothing}
    </section>`;
  }

  #overlay(uv: UvModel, side: number) {
    const c = side / 2;
    const diagonal = Math.SQRT1_2;
    return html`<svg viewBox="0 0 ${side} ${side}" aria-hidden="true">
      <line class="axis faint" x1="0" x2=${side} y1=${c} y2=${c}></line>
      <line class="axis faint" x1=${c} x2=${c} y1="0" y2=${side}></line>
      ${uv.rings.map(
        (r) => svg`<circle class="ring" cx=${c} cy=${c} r=${r.radius * c}></circle>
          <text class="halo" x=${c + r.radius * c * diagonal} y=${c + r.radius * c * diagonal + 4} text-anchor="middle">${r.label}</text>`,
      )}
      ${uv.ticks.map(
        (t) => svg`<text class="halo" x=${c + t.at * c} y=${side - 7} text-anchor="middle">${t.label}</text>
          <line class="axis" x1=${c + t.at * c} x2=${c + t.at * c} y1=${side - 22} y2=${side - 18}></line>
          <text class="halo" x="6" y=${c - t.at * c + 4}>${t.label}</text>`,
      )}
      <text class="halo" x="6" y="16">v, ${uv.unit}</text>
      <text class="halo" x=${side - 6} y=${side - 7} text-anchor="end">u, ${uv.unit}</text>
    </svg>`;
  }

  override updated(): void {
    super.updated();
    const canvas = this.renderRoot.querySelector("canvas");
    const uv = this.#uv;
    if (!canvas || !uv?.density || !this.model) {
      this.#painted = undefined;
      return;
    }
    const now = { density: uv.density, half: uv.halfWavelengths, theme: this.model.theme };
    const before = this.#painted;
    if (before && before.density === now.density && before.half === now.half && before.theme === now.theme) return;
    this.#painted = now;
    const { counts, size } = windowed(uv.density, uv.halfWavelengths);
    put(canvas, paintDensity(counts, size, this.model.theme), size);
  }

  #point(event: PointerEvent): void {
    const box = (event.currentTarget as Element).getBoundingClientRect();
    if (!this.#uv) return;
    const x = (2 * (event.clientX - box.left)) / box.width - 1;
    const y = 1 - (2 * (event.clientY - box.top)) / box.height;
    this.readout = uvReadout(this.#uv, x, y);
  }

  #leave(): void {
    this.readout = "";
  }
}

customElements.define("sw-uv-panel", UvPanel);
