import { css, html, nothing, svg } from "lit";
import { fixed } from "../../view/numbers.ts";
import { beamHalfWidth } from "../../view/resolve/beam.ts";
import { type CutsModel, cutsModel, sidelobeLimit } from "../../view/resolve/cuts.ts";
import { SizeController } from "../parts/size.ts";
import { axes, clip } from "./axes.ts";
import { Panel } from "./panel.ts";
import { plotStyles } from "./plotstyles.ts";

/** Profiles along the two axes of the beam, with the ledger's sidelobe limit. */
export class CutsPanel extends Panel {
  static override properties = { ...Panel.properties, magnified: { state: true } };
  declare magnified: boolean;
  readonly #area = new SizeController(this, ".area");
  static override styles = [
    ...Panel.styles,
    plotStyles,
    css`
      @media (max-width: 1500px), (max-height: 820px) {
        .long {
          display: none;
        }
      }
    `,
  ];

  constructor() {
    super();
    this.magnified = false;
  }

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const { picture, plan, layout, observation, beamHalfArcsec } = model;
    const limit = sidelobeLimit(plan, layout, observation.id);
    const half = picture ? (beamHalfArcsec ?? beamHalfWidth(picture.result.beam, picture.beam)) : 1;
    const cuts = picture ? cutsModel(picture, half, this.magnified, limit, this.#area.size) : null;
    const peak = picture?.result.beam.peakAbsoluteSidelobe ?? null;
    return html`<section class="pane" aria-label="Cuts through the beam">
      <header>
        <h2>Cuts through the beam</h2>
        <button
          class="button small"
          aria-pressed=${this.magnified ? "true" : "false"}
          title="Show −10 % to 10 % of the peak"
          @click=${this.#toggle}
        >±10&nbsp;%</button>
        ${peak === null ? nothing : html`<span class="aside"><span class="long">peak sidelobe</span> <b class=${limit && peak > limit.limit ? "short" : "strong"}>${fixed(100 * peak, 1)}&nbsp;%</b></span>`}
      </header>
      <div class="area">${picture?.cuts ? (cuts ? this.#figure(cuts) : nothing) : this.waiting()}</div>
      ${cuts ? this.words("Cuts through the beam", cuts.text) : nothing}
    </section>`;
  }

  #figure(cuts: CutsModel) {
    const { box, band } = cuts;
    const right = box.x + box.width;
    return html`<svg role="img" aria-label=${cuts.text.summary}>
      <defs>${clip("plot", box)}</defs>
      ${axes(box, cuts.xTicks, cuts.yTicks)}
      ${band ? svg`<rect class="band" x=${box.x} width=${box.width} y=${band.top} height=${Math.max(1, band.bottom - band.top)}></rect>` : nothing}
      <g clip-path="url(#plot)"><path class="curve second" d=${cuts.minor}></path><path class="curve" d=${cuts.major}></path></g>
      ${band ? svg`<text class="limit halo" x=${box.x + 5} y=${band.top - 6}>${band.label}</text>` : nothing}
      <text class="halo" x=${box.x + 4} y=${box.y + 9}>% of peak</text>
      <text class="name halo" x=${right - 6} y=${box.y + 26} text-anchor="end">${cuts.labels[0]}</text>
      <text class="name second halo" x=${right - 6} y=${box.y + 44} text-anchor="end">${cuts.labels[1]}</text>
    </svg>`;
  }

  #toggle(): void {
    this.magnified = !this.magnified;
  }
}

customElements.define("sw-cuts-panel", CutsPanel);
