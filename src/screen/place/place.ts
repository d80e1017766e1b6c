import { css, html, LitElement, nothing } from "lit";
import type { Picture } from "../../assess/result.ts";
import type { Observation, Plan } from "../../plan/schema.ts";
import { ZOOM_STEP } from "../../view/ground/keys.ts";
import type { PlaceModel } from "../../view/ground/model.ts";
import { tally } from "../../view/ground/table.ts";
import { base, buttons, keys, panes } from "../shared.ts";
import type { Theme } from "../tokens.ts";
import "./ground-map.ts";
import type { SpaceView } from "../scene/scene.ts";
import type { GroundMap } from "./ground-map.ts";
import "./live-thumbnails.ts";
import "./station-edit.ts";
import "./station-table.ts";

/**
 * The Place task: tool strip, ground map, station panel. Data down, events up.
 *
 * @fires station-move - `{id, latitudeDeg, longitudeDeg, heightM, phase}`: a station dragged, put down, put back or typed elsewhere.
 * @fires station-pick - `{id}`: a station picked, null for none.
 */
export class Place extends LitElement {
  static override styles = [
    base,
    buttons,
    keys,
    panes,
    css`
      :host {
        display: grid;
        grid-template: 44px minmax(0, 1fr) / minmax(0, 1fr) var(--sw-station-panel, 304px);
        min-width: 0;
        min-height: 0;
        height: 100%;
        background: var(--sw-surface);
      }
      .tools {
        display: flex;
        align-items: center;
        gap: 4px;
        padding: 0 12px;
        border-bottom: 1px solid var(--sw-line);
        min-width: 0;
      }
      .tools .view {
        margin-left: auto;
        display: flex;
        gap: 4px;
      }
      sw-ground-map,
      sw-space,
      .loading {
        grid-area: 2 / 1;
      }
      .loading {
        place-self: center;
        color: var(--sw-ink-2);
      }
      .tools .why {
        margin-left: 8px;
        color: var(--sw-ink-2);
        white-space: nowrap;
        overflow: hidden;
        text-overflow: ellipsis;
      }
      aside {
        grid-area: 1 / 2 / 3 / 3;
        display: flex;
        flex-direction: column;
        min-height: 0;
        border-left: 1px solid var(--sw-line);
        background: var(--sw-surface);
      }
      aside > header {
        height: 44px;
        flex: none;
        display: flex;
        align-items: center;
        gap: 8px;
        padding: 0 16px;
        border-bottom: 1px solid var(--sw-line);
        white-space: nowrap;
        color: var(--sw-ink-2);
      }
      aside h2 {
        color: var(--sw-ink);
      }
      sw-station-edit {
        flex: none;
      }
      sw-station-table {
        flex: 1;
      }
      footer {
        flex: none;
        padding: 9px 16px 10px;
        border-top: 1px solid var(--sw-line);
      }
      @media (max-width: 1500px) {
        :host {
          --sw-station-panel: 280px;
        }
      }
      @media (max-width: 1360px), (max-height: 820px) {
        :host {
          --sw-station-panel: 264px;
        }
        footer {
          --sw-thumbnail: 84px;
        }
      }
      @media (max-width: 1100px) {
        :host {
          grid-template: 52px minmax(0, 1fr) 64px / minmax(0, 1fr);
        }
        aside {
          grid-area: 3 / 1;
          flex-direction: row;
          align-items: center;
          gap: 12px;
          padding: 0 14px;
          border-left: 0;
          border-top: 1px solid var(--sw-line);
        }
        sw-station-edit {
          flex: 1;
          min-width: 0;
        }
      }
      .sheet {
        position: fixed;
        inset: auto 12px 76px auto;
        width: 320px;
        height: min(640px, calc(100vh - 140px));
        padding: 0;
        overflow: hidden;
        color: inherit;
      }
      .sheet:popover-open {
        display: flex;
        flex-direction: column;
      }
    `,
  ];
  static override properties = {
    model: { attribute: false },
    picture: { attribute: false },
    theme: { attribute: false },
    plan: { attribute: false },
    observation: { attribute: false },
    space: { state: true },
    why: { state: true },
    strip: { state: true },
    narrow: { state: true },
  };
  declare model?: PlaceModel;
  declare picture: Picture | null;
  declare theme: Theme;
  declare plan?: Plan;
  declare observation?: Observation;
  /** The picture in space stands in the place of the map, or is on its way. */
  declare space: "off" | "loading" | "on";
  /** Why there is no picture in space. */
  declare why: string;
  /** The panel is one line under the map. */
  declare strip: boolean;
  declare narrow: boolean;
  readonly #stripMedia = matchMedia("(max-width: 1100px)");
  readonly #narrowMedia = matchMedia("(max-width: 1500px), (max-height: 820px)");
  readonly #measured = (): void => {
    this.strip = this.#stripMedia.matches;
    this.narrow = this.#narrowMedia.matches;
  };

  constructor() {
    super();
    this.picture = null;
    this.theme = "light";
    this.space = "off";
    this.why = "";
    this.#measured();
  }

  override connectedCallback(): void {
    super.connectedCallback();
    this.#stripMedia.addEventListener("change", this.#measured);
    this.#narrowMedia.addEventListener("change", this.#measured);
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#stripMedia.removeEventListener("change", this.#measured);
    this.#narrowMedia.removeEventListener("change", this.#measured);
  }

  get #map(): GroundMap | null {
    return this.renderRoot.querySelector("sw-ground-map");
  }

  get #view(): GroundMap | SpaceView | null {
    return this.space === "on" ? this.renderRoot.querySelector("sw-space") : this.#map;
  }

  /** Puts the keyboard on the map, where arrows pick and Enter lifts. */
  focusMap(): void {
    this.space = "off";
    void this.updateComplete.then(() => this.#map?.focus());
  }

  /** The picture in space and what it is drawn with come the first time they are asked for. */
  async #toSpace(): Promise<void> {
    if (!givesWebGl()) {
      this.why = "This browser gives no WebGL, so the flat map stays.";
      return;
    }
    this.space = "loading";
    try {
      await import("../scene/scene.ts");
      // Meanwhile the map may have been asked for again.
      if (this.space === "loading") this.space = "on";
    } catch {
      this.#stayFlat("The picture in space did not load, so the flat map stays.");
    }
  }

  #stayFlat(why: string): void {
    this.space = "off";
    this.why = why;
  }

  override render() {
    const { model, theme } = this;
    if (!model) return nothing;
    return html`
      <div class="tools" role="toolbar" aria-label="Map tools">
        <button
          class="button"
          type="button"
          aria-pressed=${this.space === "off" ? "true" : "false"}
          title="Drag a station, or pick it with the arrow keys and lift it with Enter"
          @click=${() => this.focusMap()}
        >Move</button>
        <button
          class="button"
          type="button"
          aria-pressed=${this.space === "off" ? "false" : "true"}
          title="The array in space, with the target over it"
          @click=${() => void this.#toSpace()}
        >In space</button>
        <span class="why" role="status">${this.why}</span>
        <span class="view">
          <button class="button" type="button" @click=${() => this.#view?.zoom(ZOOM_STEP)}>Closer <kbd>+</kbd></button>
          <button class="button" type="button" @click=${() => this.#view?.zoom(1 / ZOOM_STEP)}>Farther <kbd>−</kbd></button>
          <button class="button" type="button" @click=${() => this.#view?.fit()}>Whole layout <kbd>0</kbd></button>
        </span>
      </div>
      ${this.#picture(model, theme)}
      <aside aria-label="Stations">${this.strip ? this.#strip(model) : this.#panel(model)}</aside>
    `;
  }

  #picture(model: PlaceModel, theme: Theme) {
    if (this.space === "loading") return html`<p class="loading">Getting the picture in space</p>`;
    if (this.space === "off") return html`<sw-ground-map .model=${model} .theme=${theme}></sw-ground-map>`;
    return html`<sw-space
      .model=${model}
      .plan=${this.plan}
      .observation=${this.observation}
      .theme=${theme}
      @space-lost=${() => this.#stayFlat("The browser took the picture in space away, so the flat map is back.")}
    ></sw-space>`;
  }

  #panel(model: PlaceModel) {
    return html`<header><h2>Stations</h2>${tally(model)}</header>
      <sw-station-edit .model=${model} ?narrow=${this.narrow}></sw-station-edit>
      <sw-station-table .model=${model}></sw-station-table>
      <footer>${this.#thumbnails()}</footer>`;
  }

  #strip(model: PlaceModel) {
    return html`<sw-station-edit strip .model=${model}></sw-station-edit>
      <button class="button outlined" type="button" popovertarget="all">All ${model.stations.length} stations</button>
      <div class="sheet float" id="all" popover>
        <sw-station-table .model=${model}></sw-station-table>
        <footer>${this.#thumbnails()}</footer>
      </div>`;
  }

  #thumbnails() {
    return html`<sw-live-thumbnails .picture=${this.picture} .theme=${this.theme}></sw-live-thumbnails>`;
  }
}

const givesWebGl = (): boolean => document.createElement("canvas").getContext("webgl2") !== null;

customElements.define("sw-place", Place);

declare global {
  interface HTMLElementTagNameMap {
    "sw-place": Place;
  }
}
