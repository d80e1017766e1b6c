import { css, html, LitElement, nothing } from "lit";
import { observationBar } from "../../view/resolve/bar.ts";
import { base } from "../shared.ts";
import "./beam-panel.ts";
import "./cuts-panel.ts";
import "./declination-panel.ts";
import "./elevation-panel.ts";
import "./figures-button.ts";
import type { ResolveModel } from "./model.ts";
import type { ObservationBar } from "./observation-bar.ts";
import "./observation-bar.ts";
import "./pair-panel.ts";
import "./scales-panel.ts";
import "./uv-panel.ts";

/** The Resolve task: the observation above, coverage and beam under it, then how they change. */
export class Resolve extends LitElement {
  static override properties = { model: { attribute: false }, compact: { state: true } };
  declare model?: ResolveModel;
  declare compact: boolean;
  readonly #media = matchMedia("(max-width: 1360px), (max-height: 820px)");
  readonly #measured = (): void => {
    this.compact = this.#media.matches;
  };

  static override styles = [
    base,
    css`
      :host {
        display: grid;
        grid-template: 92px minmax(0, 1fr) 352px / minmax(0, 1fr);
        height: 100%;
        min-height: 0;
        background: var(--sw-line);
      }
      .row {
        display: grid;
        gap: 1px;
        min-height: 0;
        min-width: 0;
      }
      .first {
        grid-template-columns: 1.12fr 1.12fr 1fr;
      }
      .second {
        grid-template-columns: 1.14fr 1fr 1fr;
        border-top: 1px solid var(--sw-line);
      }
      .stack {
        display: grid;
        grid-template-rows: minmax(0, 1fr) minmax(0, 1.17fr);
        gap: 1px;
        min-height: 0;
        min-width: 0;
      }
      @media (max-width: 1500px) {
        :host {
          grid-template-rows: 84px minmax(0, 1fr) 296px;
        }
      }
      @media (max-width: 1360px), (max-height: 820px) {
        :host {
          grid-template-rows: 76px minmax(0, 1fr) 232px;
        }
      }
      @media (max-width: 1100px), (max-height: 640px) {
        :host {
          display: block;
          /* What is out of sight but read aloud scrolls along. */
          position: relative;
          overflow: auto;
        }
        .first,
        .second {
          grid-template-columns: 1fr 1fr;
        }
        .first > * {
          height: 480px;
        }
        .first .stack {
          grid-column: 1 / 3;
          grid-template: minmax(0, 1fr) / 1fr 1fr;
          height: 320px;
        }
        .second > * {
          height: 320px;
        }
      }
    `,
  ];

  constructor() {
    super();
    this.compact = this.#media.matches;
  }

  override connectedCallback(): void {
    super.connectedCallback();
    this.#media.addEventListener("change", this.#measured);
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#media.removeEventListener("change", this.#measured);
  }

  /** Puts the keyboard on the first field of the observation. */
  focusObservation(): void {
    this.renderRoot.querySelector<ObservationBar>("sw-observation-bar")?.focus();
  }

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const { plan, observation, antennas, picture } = model;
    return html`<sw-observation-bar .model=${observationBar(plan.site, observation, antennas, this.compact)}></sw-observation-bar>
      <div class="row first">
        <sw-uv-panel .model=${model}>
          ${picture ? html`<sw-figures-button .result=${picture.result} .observation=${observation}></sw-figures-button>` : nothing}
        </sw-uv-panel>
        <sw-beam-panel .model=${model}></sw-beam-panel>
        <div class="stack">
          <sw-cuts-panel .model=${model}></sw-cuts-panel>
          <sw-pair-panel .model=${model}></sw-pair-panel>
        </div>
      </div>
      <div class="row second">
        <sw-scales-panel .model=${model}></sw-scales-panel>
        <sw-declination-panel .model=${model}></sw-declination-panel>
        <sw-elevation-panel .model=${model}></sw-elevation-panel>
      </div>`;
  }
}

customElements.define("sw-resolve", Resolve);
