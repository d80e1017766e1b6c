import { css, html, LitElement, type PropertyValues } from "lit";
import type { Picture } from "../../assess/result.ts";
import { beamLine, beamThumbnail, type Thumbnail, uvThumbnail } from "../../view/ground/thumbnails.ts";
import { paintBeam, paintDensity } from "../../view/paint.ts";
import { base } from "../shared.ts";
import type { Theme } from "../tokens.ts";

/** The uv coverage and the beam, small, following the station that moves. */
export class LiveThumbnails extends LitElement {
  static override styles = [
    base,
    css`
      .pair {
        display: grid;
        grid-template-columns: 1fr 1fr;
        gap: 0 12px;
        font-size: 11px;
        line-height: 15px;
      }
      h3 {
        font-size: 11px;
        line-height: 15px;
        font-weight: 540;
        margin-bottom: 4px;
        white-space: nowrap;
      }
      canvas,
      .empty {
        display: block;
        width: 100%;
        max-width: var(--sw-thumbnail, 132px);
        aspect-ratio: 1;
        border-radius: var(--sw-radius-image);
        background: var(--sw-beam-zero);
      }
      .uv {
        background: var(--sw-density-zero);
      }
      p {
        margin-top: 2px;
        white-space: nowrap;
        color: var(--sw-ink-2);
      }
      .line {
        color: var(--sw-ink);
        grid-column: 1 / 3;
      }
    `,
  ];
  static override properties = { picture: { attribute: false }, theme: { attribute: false } };
  declare picture: Picture | null;
  declare theme: Theme;
  #uv: Thumbnail | null = null;
  #beam: Thumbnail | null = null;

  constructor() {
    super();
    this.picture = null;
    this.theme = "light";
  }

  override willUpdate(changed: PropertyValues): void {
    if (!changed.has("picture")) return;
    const side = Math.round(132 * (window.devicePixelRatio || 1));
    // A preview keeps the scale of what was settled: while a station moves, only what it changes may change.
    const held = this.picture?.settled === false;
    this.#uv = this.picture && uvThumbnail(this.picture, side, held ? this.#uv?.span : undefined);
    this.#beam = this.picture && beamThumbnail(this.picture, side, held ? this.#beam?.span : undefined);
  }

  override render() {
    const line = this.picture ? beamLine(this.picture) : "Working";
    return html`<div class="pair">
      <div>
        <h3>uv coverage</h3>
        <canvas class="uv" role="img" aria-label=${this.#uv ? `uv coverage, samples to ${this.#uv.caption}` : "uv coverage, none yet"}></canvas>
        <p>${this.#uv?.caption ?? (this.picture ? "no samples" : "\u00a0")}</p>
      </div>
      <div>
        <h3>Synthesized beam</h3>
        <canvas class="beam" role="img" aria-label=${this.#beam ? `Synthesized beam, ${line}, ${this.#beam.caption}` : "Synthesized beam, none yet"}></canvas>
        <p>${this.#beam?.caption ?? (this.picture ? "no beam" : "\u00a0")}</p>
      </div>
      <p class="line">${line}</p>
    </div>`;
  }

  override updated(): void {
    const { theme } = this;
    this.#paint("canvas.uv", this.#uv, ({ values, size }) => paintDensity(values, size, theme));
    this.#paint("canvas.beam", this.#beam, ({ values, size }) => paintBeam(values, size, theme, { stretch: "stretched" }));
  }

  #paint(selector: string, thumbnail: Thumbnail | null, colours: (thumbnail: Thumbnail) => Uint8ClampedArray<ArrayBuffer>): void {
    const canvas = this.renderRoot.querySelector<HTMLCanvasElement>(selector);
    const ctx = canvas?.getContext("2d");
    if (!canvas || !ctx) return;
    const size = thumbnail?.size ?? 1;
    if (canvas.width !== size) canvas.width = canvas.height = size;
    if (!thumbnail) {
      ctx.clearRect(0, 0, 1, 1);
      return;
    }
    ctx.putImageData(new ImageData(colours(thumbnail), size, size), 0, 0);
  }
}

customElements.define("sw-live-thumbnails", LiveThumbnails);

declare global {
  interface HTMLElementTagNameMap {
    "sw-live-thumbnails": LiveThumbnails;
  }
}
