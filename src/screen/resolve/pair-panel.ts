import { css, html, nothing, svg } from "lit";
import type { BeamImage } from "../../assess/result.ts";
import { DomainError } from "../../base/errors.ts";
import type { Pair } from "../../plan/schema.ts";
import type { FieldModel } from "../../view/controls.ts";
import { paintBeam } from "../../view/paint.ts";
import { type PairModel, pairImage, pairModel } from "../../view/resolve/pair.ts";
import { pairFields } from "../../view/resolve/pairfields.ts";
import "../parts/field.ts";
import { stateClass, stateMark } from "../parts/marks.ts";
import { props } from "../parts/props.ts";
import { SizeController } from "../parts/size.ts";
import type { Theme } from "../tokens.ts";
import { canvasSide, put } from "./paint.ts";
import { Panel } from "./panel.ts";
import { plotStyles } from "./plotstyles.ts";

/**
 * Two point sources through the beam: image, profile along both, and the verdict.
 *
 * @fires pair-change - `detail.pair`: separation, position angle and flux ratio wanted.
 */
export class PairPanel extends Panel {
  readonly #area = new SizeController(this, ".profile");
  readonly #image = new SizeController(this, ".image");
  #pair: PairModel | undefined;
  #painted: { image: BeamImage; pair: Pair; half: number; side: number; theme: Theme } | undefined;

  static override styles = [
    ...Panel.styles,
    plotStyles,
    css`
      .area.both {
        place-items: stretch;
        grid-template-columns: minmax(0, 0.72fr) minmax(0, 1fr);
        gap: 12px;
      }
      .image,
      .profile {
        position: relative;
        min-width: 0;
        min-height: 0;
        overflow: hidden;
      }
      .profile svg {
        position: absolute;
        inset: 0;
        width: 100%;
        height: 100%;
      }
      .image figcaption {
        position: absolute;
        left: 0;
        color: var(--sw-ink-3);
        font-size: 11px;
        line-height: 18px;
      }
      .controls {
        display: flex;
        align-items: center;
        flex-wrap: wrap;
        gap: 6px 7px;
        margin-top: 8px;
        color: var(--sw-ink-2);
        font-size: 11.5px;
      }
      @media (max-width: 1360px), (max-height: 820px) {
        .controls {
          gap: 4px;
          --sw-field-padding: 5px;
          --sw-field-gap: 2px;
        }
        .flux {
          display: none;
        }
      }
      .verdict {
        display: inline-flex;
        align-items: center;
        gap: 6px;
        min-width: 0;
        font-weight: 480;
        overflow: hidden;
      }
      .verdict span {
        overflow: hidden;
        text-overflow: ellipsis;
      }
      .mark {
        flex: none;
      }
      .dip {
        stroke: currentColor;
        stroke-width: 1.75;
        fill: none;
      }
      .level {
        stroke: var(--sw-ink-3);
        stroke-dasharray: 2 2;
      }
      svg text.dip-name {
        fill: currentColor;
        font-size: 11px;
        font-weight: 520;
      }
    `,
  ];

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const { picture, pair } = model;
    const shown = picture?.beam ? pairModel(picture, pair, this.#area.size) : undefined;
    this.#pair = shown;
    const side = Math.max(0, Math.min(this.#image.size.width, this.#image.size.height - 18));
    const square = { width: `${side}px`, height: `${side}px` };
    const fields = pairFields(pair);
    return html`<section class="pane" aria-label="Two sources">
      <header>
        <h2>Two sources</h2>
        ${shown ? html`<span class="verdict ${stateClass(shown.verdict.state)}" title=${shown.verdict.why}>${stateMark(shown.verdict.state)}<span>${shown.verdict.words}</span></span>` : nothing}
      </header>
      <div class="both area">
        <figure class="image">
          ${shown ? html`<div class="square" ${props(square)}><canvas role="img" aria-label=${shown.text.summary}></canvas></div><figcaption ${props({ top: `${side}px` })}>${shown.across}</figcaption>` : this.waiting()}
        </figure>
        <div class="profile">${shown?.profile ? this.#profile(shown) : nothing}</div>
      </div>
      <div class="controls">
        <span>apart</span>${this.#field(fields.separation, "separationArcsec")}<span>at PA</span>${this.#field(fields.angle, "positionAngleDeg")}<span
          ><span class="flux">flux </span>ratio</span
        >${this.#field(fields.ratio, "fluxRatio")}
      </div>
      ${shown ? this.words("Two sources", shown.text) : nothing}
    </section>`;
  }

  #field(field: FieldModel, name: keyof Pair & ("separationArcsec" | "positionAngleDeg" | "fluxRatio")) {
    return html`<sw-field .model=${field} @field-change=${(event: CustomEvent<{ value: number; fault?: string }>) => this.#changed(event, name)}></sw-field>`;
  }

  #changed(
    event: CustomEvent<{ value: number; fault?: string }>,
    name: "separationArcsec" | "positionAngleDeg" | "fluxRatio",
  ): void {
    event.stopPropagation();
    if (!this.model) return;
    const { value } = event.detail;
    try {
      checked(name, value);
      const pair = { ...this.model.pair, [name]: value };
      this.dispatchEvent(new CustomEvent("pair-change", { detail: { pair }, bubbles: true, composed: true }));
    } catch (error) {
      if (!(error instanceof DomainError)) throw error;
      event.detail.fault = error.message;
    }
  }

  #profile({ profile, text, verdict }: PairModel) {
    if (!profile) return nothing;
    const { box, dip } = profile;
    const bottom = box.y + box.height;
    return html`<svg class=${stateClass(verdict.state)} role="img" aria-label=${text.summary}>
      ${profile.xTicks.map(
        (t, k) => svg`<line class="grid" x1=${t.at} x2=${t.at} y1=${box.y} y2=${bottom}></line>
          <text x=${t.at} y=${bottom + 15} text-anchor=${(["start", "middle", "end"] as const)[k]}>${t.label}</text>`,
      )}
      <path class="axis" d=${`M${box.x} ${box.y}V${bottom}H${box.x + box.width}`}></path>
      <line class="grid" x1=${box.x} x2=${box.x + box.width} y1=${profile.zeroY} y2=${profile.zeroY}></line>
      ${profile.each.map((d) => svg`<path class="curve other" d=${d}></path>`)}
      <path class="curve" d=${profile.sum}></path>
      ${
        dip
          ? svg`<line class="level" x1=${dip.left} x2=${dip.right} y1=${dip.top} y2=${dip.top}></line>
              <path class="dip" d=${`M${dip.x - 5} ${dip.top}H${dip.x + 5}M${dip.x} ${dip.top}V${dip.bottom}M${dip.x - 5} ${dip.bottom}H${dip.x + 5}`}></path>
              <text class="dip-name" x=${dip.x} y=${Math.max(11, dip.top - 8)} text-anchor="middle">${dip.label}</text>`
          : nothing
      }
    </svg>`;
  }

  override updated(): void {
    super.updated();
    const canvas = this.renderRoot.querySelector("canvas");
    const { model } = this;
    const side = Math.max(0, Math.min(this.#image.size.width, this.#image.size.height - 18));
    const image = model?.picture?.beam;
    if (!canvas || !model || !image || !this.#pair || side < 2) {
      this.#painted = undefined;
      return;
    }
    const now = { image, pair: model.pair, half: this.#pair.halfWidthArcsec, side, theme: model.theme };
    const before = this.#painted;
    if (
      before &&
      before.image === image &&
      before.pair === now.pair &&
      before.half === now.half &&
      before.side === side &&
      before.theme === now.theme
    )
      return;
    this.#painted = now;
    const pixels = canvasSide(side);
    put(canvas, paintBeam(pairImage(image, model.pair, now.half, pixels), pixels, model.theme, { stretch: "stretched" }), pixels);
  }
}

function checked(name: string, value: number): void {
  if (name === "separationArcsec" && !(value > 0)) throw new DomainError("separation", value, "an angle above 0");
  if (name === "positionAngleDeg" && !(Math.abs(value) <= 360))
    throw new DomainError("position angle", value, "an angle from −360° to 360°");
  if (name === "fluxRatio" && !(value > 0 && value <= 1)) throw new DomainError("flux ratio", value, "a ratio above 0, at most 1");
}

customElements.define("sw-pair-panel", PairPanel);
