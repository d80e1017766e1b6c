import { css, html, nothing, svg } from "lit";
import type { BeamImage } from "../../assess/result.ts";
import { beamColour, stretch } from "../../view/colour.ts";
import { plain } from "../../view/numbers.ts";
import { paintBeam } from "../../view/paint.ts";
import { axisEnds, BAR_LEVELS, type BeamModel, beamModel, beamReadout } from "../../view/resolve/beam.ts";
import { resampled } from "../../view/resolve/sample.ts";
import { props } from "../parts/props.ts";
import { SizeController } from "../parts/size.ts";
import type { Theme } from "../tokens.ts";
import { canvasSide, put } from "./paint.ts";
import { Panel } from "./panel.ts";

/** The colour bar runs from −10 % to 100 % of the peak, on the map's own stretch. */
const BAR = { low: -0.1, high: 1, cells: 256 };
const barPlace = (v: number): number => (stretch(v) - stretch(BAR.low)) / (stretch(BAR.high) - stretch(BAR.low));

/** The synthesized beam, north up and east to the left, with its fitted ellipse. */
export class BeamPanel extends Panel {
  static override properties = { ...Panel.properties, readout: { state: true } };
  declare readout: string;
  readonly #area = new SizeController(this, ".area");
  #beam: BeamModel | undefined;
  #painted: { image: BeamImage; half: number; side: number; theme: Theme } | undefined;
  #barTheme: Theme | undefined;

  static override styles = [
    ...Panel.styles,
    css`
      .bar {
        position: relative;
        align-self: center;
        width: 100%;
        height: 26px;
        margin-top: 10px;
        flex: none;
      }
      .bar canvas {
        width: 100%;
        height: 10px;
        display: block;
        border-radius: var(--sw-radius-image);
      }
      .bar svg {
        position: absolute;
        inset: 0;
        width: 100%;
        height: 100%;
        overflow: visible;
      }
      .ellipse-casing {
        fill: none;
        stroke: var(--sw-beam-zero);
        stroke-width: 3.5;
      }
      .ellipse {
        fill: none;
        stroke: var(--sw-ellipse);
        stroke-width: 1.25;
      }
      .dashes {
        stroke: var(--sw-ink-2);
        stroke-width: 1;
      }
      .mark-line {
        stroke: var(--sw-ink);
        stroke-width: 1.25;
        fill: none;
      }
      svg .ink {
        fill: var(--sw-ink);
        font-size: 11px;
      }
      svg .halo {
        stroke: var(--sw-beam-zero);
      }
    `,
  ];

  constructor() {
    super();
    this.readout = "";
  }

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const beam = model.picture ? beamModel(model.picture, model.beamHalfArcsec) : undefined;
    this.#beam = beam;
    const side = Math.min(this.#area.size.width, this.#area.size.height);
    return html`<section class="pane" aria-label="Synthesized beam">
      <header>
        <h2>Synthesized beam</h2>
        <span class="aside ${this.readout ? "" : "strong"}">${this.readout || beam?.title || ""}</span>
      </header>
      <div class="area">
        ${
          beam?.image
            ? html`<div class="square" ${props({ width: `${side}px`, height: `${side}px` })} @pointermove=${this.#point} @pointerleave=${this.#leave}>
                <canvas role="img" aria-label=${beam.text.summary}></canvas>${side > 0 ? this.#overlay(beam, side) : nothing}
              </div>`
            : this.waiting()
        }
      </div>
      <div class="bar" ${props({ "max-width": `${side}px` })}>
        <canvas class="scale" width=${BAR.cells} height="1" aria-hidden="true"></canvas>
        <svg aria-hidden="true">
          ${BAR_LEVELS.map((v) => {
            const x = `${(100 * barPlace(v)).toFixed(2)}%`;
            const anchor = v === BAR.low ? "start" : v === BAR.high ? "end" : "middle";
            return svg`<line class="axis" x1=${x} x2=${x} y1="0" y2="13"></line>
              <text x=${x} y="24" text-anchor=${anchor}>${v === BAR.high ? "100\u00a0%" : plain(100 * v)}</text>`;
          })}
        </svg>
      </div>
      ${beam ? this.words("Synthesized beam", beam.text) : nothing}
    </section>`;
  }

  #overlay(beam: BeamModel, side: number) {
    const c = side / 2;
    const { ellipse, bar } = beam;
    const dash = (angle: number, from: number, to: number, pattern: string) => {
      const [x1, y1, x2, y2] = axisEnds(angle, from, to);
      return svg`<line class="dashes" stroke-dasharray=${pattern} x1=${c + x1 * c} y1=${c - y1 * c} x2=${c + x2 * c} y2=${c - y2 * c}></line>`;
    };
    const near = ellipse ? Math.min(0.45, Math.max(0.22, 1.4 * ellipse.major)) : 0.22;
    return html`<svg viewBox="0 0 ${side} ${side}" aria-hidden="true">
      ${
        ellipse
          ? svg`${[near, -near].map((from) => dash(ellipse.positionAngleDeg, from, Math.sign(from) * 0.94, "7 4"))}
              ${[near, -near].map((from) => dash(ellipse.positionAngleDeg + 90, from, Math.sign(from) * 0.94, "2.5 3"))}
              ${["ellipse-casing", "ellipse"].map(
                (name) => svg`<ellipse class=${name} cx=${c} cy=${c} rx=${ellipse.minor * c} ry=${ellipse.major * c}
                  transform=${`rotate(${-ellipse.positionAngleDeg} ${c} ${c})`}></ellipse>`,
              )}`
          : nothing
      }
      <path class="mark-line" d=${`M${side - 16} 20V46H${side - 42}`}></path>
      <text class="ink halo" x=${side - 16} y="15" text-anchor="middle">N</text>
      <text class="ink halo" x=${side - 50} y="50" text-anchor="middle">E</text>
      <path class="mark-line" d=${`M16 ${side - 20}V${side - 12}M16 ${side - 16}H${16 + bar.length * c}M${16 + bar.length * c} ${side - 20}V${side - 12}`}></path>
      <text class="ink halo" x=${16 + (bar.length * c) / 2} y=${side - 25} text-anchor="middle">${bar.label}</text>
      <text class="ink halo" x=${side - 14} y=${side - 12} text-anchor="end">${beam.across}</text>
    </svg>`;
  }

  override updated(): void {
    super.updated();
    this.#paintBar();
    const canvas = this.renderRoot.querySelector<HTMLCanvasElement>(".square canvas");
    const side = Math.min(this.#area.size.width, this.#area.size.height);
    const beam = this.#beam;
    if (!canvas || !beam?.image || !this.model || side < 2) {
      this.#painted = undefined;
      return;
    }
    const now = { image: beam.image, half: beam.halfWidthArcsec, side, theme: this.model.theme };
    const before = this.#painted;
    if (before && before.image === now.image && before.half === now.half && before.side === side && before.theme === now.theme)
      return;
    this.#painted = now;
    const pixels = canvasSide(side);
    put(
      canvas,
      paintBeam(resampled(beam.image, beam.halfWidthArcsec, pixels), pixels, now.theme, { stretch: "stretched" }),
      pixels,
    );
  }

  #paintBar(): void {
    const canvas = this.renderRoot.querySelector<HTMLCanvasElement>("canvas.scale");
    const theme = this.model?.theme;
    if (!canvas || !theme || this.#barTheme === theme) return;
    this.#barTheme = theme;
    const row = new ImageData(BAR.cells, 1);
    const low = stretch(BAR.low);
    for (let k = 0; k < BAR.cells; k++) {
      const [r, g, b] = beamColour(low + ((1 - low) * (k + 0.5)) / BAR.cells, theme);
      row.data.set([r, g, b, 255], 4 * k);
    }
    canvas.getContext("2d")?.putImageData(row, 0, 0);
  }

  #point(event: PointerEvent): void {
    const box = (event.currentTarget as Element).getBoundingClientRect();
    if (!this.#beam) return;
    const x = (2 * (event.clientX - box.left)) / box.width - 1;
    const y = 1 - (2 * (event.clientY - box.top)) / box.height;
    this.readout = beamReadout(this.#beam, x, y);
  }

  #leave(): void {
    this.readout = "";
  }
}

customElements.define("sw-beam-panel", BeamPanel);
