import { css, html, LitElement, nothing } from "lit";
import { keyed } from "lit/directives/keyed.js";
import { DomainError } from "../../base/errors.ts";
import { type PlaceKey, placedTo, placeFields, placeKeys } from "../../view/ground/fields.ts";
import { type PlaceModel, type PlaceStation, titleOf } from "../../view/ground/model.ts";
import "../parts/field.ts";
import { base } from "../shared.ts";
import { stationMove } from "./events.ts";

const WORDS: { readonly [K in PlaceKey]: string } = {
  east: "East",
  north: "North",
  latitude: "Latitude",
  longitude: "Longitude",
  height: "Height",
};

/**
 * The picked station in figures that can be typed over: the equivalent of dragging it.
 *
 * @fires station-move - With phase `drop`, once a value is typed.
 */
export class StationEdit extends LitElement {
  static override styles = [
    base,
    css`
      .block {
        padding: 12px 16px 13px;
        border-bottom: 1px solid var(--sw-line);
        min-height: 186px;
      }
      .block.picked {
        background: var(--sw-accent-wash);
        box-shadow: inset 3px 0 var(--sw-accent);
      }
      :host([far]) .block {
        min-height: 138px;
      }
      h3 {
        white-space: nowrap;
        overflow: hidden;
        text-overflow: ellipsis;
        margin-bottom: 5px;
      }
      .fields {
        display: grid;
        grid-template-columns: 1fr 1fr;
        gap: 4px 8px;
      }
      .fields span {
        display: block;
        font-size: 11.5px;
        line-height: 17px;
        color: var(--sw-ink-2);
      }
      p {
        color: var(--sw-ink-2);
      }
      .aside {
        align-self: end;
        font-size: 11px;
        line-height: 14px;
        color: var(--sw-ink-2);
        padding-bottom: 1px;
      }
      .strip {
        display: flex;
        align-items: center;
        gap: 8px;
        white-space: nowrap;
        min-width: 0;
        height: 100%;
      }
      .strip b {
        font-size: 13px;
        font-weight: 560;
        overflow: hidden;
        text-overflow: ellipsis;
        margin-right: 8px;
      }
      .strip span {
        margin-left: 8px;
        color: var(--sw-ink-2);
      }
    `,
  ];
  static override properties = { model: { attribute: false }, strip: { type: Boolean }, narrow: { type: Boolean } };
  declare model?: PlaceModel;
  /** In one line, for a narrow page. */
  declare strip: boolean;
  declare narrow: boolean;

  constructor() {
    super();
    this.strip = false;
    this.narrow = false;
  }

  override willUpdate(): void {
    this.toggleAttribute("far", this.model?.local === false);
  }

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const { selected } = model;
    if (this.strip)
      return selected ? keyed(selected.id, this.#strip(model, selected)) : html`<div class="strip">No station picked</div>`;
    if (!selected) {
      return html`<div class="block">
        <h3>No station picked</h3>
        <p>Click a station on the map or in the table to move it or type its place.</p>
      </div>`;
    }
    return keyed(selected.id, this.#block(model, selected));
  }

  #block(model: PlaceModel, station: PlaceStation) {
    return html`<div class="block picked">
      <h3 title=${titleOf(station)}>${titleOf(station)}</h3>
      <div class="fields">
        ${placeKeys(model).map((key) => html`<div><span>${WORDS[key]}</span>${this.#field(model, station, key)}</div>`)}
        <p class="aside">${this.#aside(station)}</p>
      </div>
    </div>`;
  }

  #aside(station: PlaceStation) {
    if (station.locked) return "Locked in the plan: stays where it is";
    return station.inLayout ? "above the ellipsoid, kept when moved" : "Candidate: in no layout";
  }

  #strip(model: PlaceModel, station: PlaceStation) {
    const [first, second] = placeKeys(model);
    const short = { east: "E", north: "N", latitude: "Lat", longitude: "Lon", height: "" };
    return html`<div class="strip">
      <b>${titleOf(station)}</b>
      ${[first, second].map((key) => html`<span>${short[key]}</span>${this.#field(model, station, key)}`)}
      <span>Height</span>${this.#field(model, station, "height")}
    </div>`;
  }

  #field(model: PlaceModel, station: PlaceStation, key: PlaceKey) {
    const field = placeFields(station, model.unit, this.narrow || this.strip)[key];
    if (station.locked) return html`<div>${field.text} <span class="dim">${field.unit}</span></div>`;
    return html`<sw-field
      .model=${this.strip ? { ...field, width: 7 } : field}
      @field-change=${(event: CustomEvent<{ value: number; fault?: string }>) => this.#typed(event, model, station, key)}
    ></sw-field>`;
  }

  #typed(event: CustomEvent<{ value: number; fault?: string }>, model: PlaceModel, station: PlaceStation, key: PlaceKey): void {
    event.stopPropagation();
    try {
      const to = placedTo(model, station, key, event.detail.value);
      this.dispatchEvent(stationMove({ id: station.id, ...to, phase: "drop" }));
    } catch (error) {
      if (!(error instanceof DomainError)) throw error;
      event.detail.fault = error.message;
    }
  }
}

customElements.define("sw-station-edit", StationEdit);

declare global {
  interface HTMLElementTagNameMap {
    "sw-station-edit": StationEdit;
  }
}
