import { css, html, LitElement, nothing } from "lit";
import { DomainError } from "../../base/errors.ts";
import type { FieldModel, SliderModel } from "../../view/controls.ts";
import { bandwidthAxis, type ObservationBarModel, waveAxis } from "../../view/resolve/bar.ts";
import { change, type HourValue, type ObservationChange, slid } from "../../view/resolve/change.ts";
import "../parts/field.ts";
import "../parts/slider.ts";
import { base, fields } from "../shared.ts";

type Typed<T> = CustomEvent<{ value: T; step: boolean; fault?: string }>;
type Slid = CustomEvent<{ index: number; at: number; phase: ChangePhase }>;

/** Held, let go, or one press of a key. */
export type ChangePhase = "drag" | "drop" | "step";

/** `observation-change`: what is wanted; the page puts a sentence in `fault` where it does not take it. */
export interface ObservationChangeDetail extends ObservationChange {
  readonly phase: ChangePhase;
  fault?: string;
}

/**
 * What is observed, when, and how it is weighted: a field for each value and a slider under it.
 *
 * @fires observation-change - `detail`: {@link ObservationChangeDetail}.
 */
export class ObservationBar extends LitElement {
  static override properties = { model: { attribute: false } };
  declare model?: ObservationBarModel;

  static override styles = [
    base,
    fields,
    css`
      :host {
        background: var(--sw-surface);
        border-bottom: 1px solid var(--sw-line);
      }
      .bar {
        display: grid;
        grid-template-columns:
          minmax(max-content, 196fr) minmax(max-content, 236fr) minmax(max-content, 280fr) minmax(max-content, 160fr)
          minmax(max-content, 212fr);
        gap: 8px 28px;
        height: 100%;
        padding: 13px 18px 0;
      }
      .part > div {
        display: flex;
        align-items: center;
        gap: 7px;
        height: var(--sw-field-height);
        white-space: nowrap;
      }
      .part {
        min-width: 0;
      }
      h2 {
        margin-right: auto;
      }
      .joint {
        color: var(--sw-ink-2);
      }
      sw-slider {
        margin-top: 3px;
      }
      .brief {
        display: none;
      }
      select.field {
        padding-left: 8px;
        width: 80px;
      }
      @media (max-width: 1500px) {
        .bar {
          gap: 8px 13px;
          padding: 11px 16px 0;
          --sw-field-padding: 6px;
          --sw-field-gap: 3px;
        }
        .part > div {
          gap: 5px;
        }
        select.field {
          width: 74px;
        }
      }
      @media (max-width: 1360px), (max-height: 820px) {
        .bar {
          gap: 8px 13px;
          --sw-field-padding: 5px;
          --sw-field-gap: 2px;
          padding: 9px 14px 0;
        }
        .part > div {
          gap: 4px;
        }
        select.field {
          width: 68px;
          padding-left: 6px;
          background-position:
            right 9px center,
            right 5px center;
        }
        .long {
          display: none;
        }
        .brief {
          display: inline;
        }
        sw-slider {
          margin-top: 0;
        }
      }
      @media (max-width: 1100px) {
        .bar {
          grid-template-columns: minmax(max-content, 1fr) minmax(max-content, 1.2fr) minmax(max-content, 1.3fr);
          gap: 10px 20px;
          height: auto;
          padding: 8px 14px 10px;
        }
      }
    `,
  ];

  /** Puts the keyboard on the declination, once it is there. */
  override focus(): void {
    void this.updateComplete.then(() => this.renderRoot.querySelector<HTMLElement>("sw-field")?.focus());
  }

  override render() {
    if (!this.model) return nothing;
    const { observation, declination, window, wavelength, bandwidth, weighting } = this.model;
    return html`<div class="bar" role="group" aria-label="Observation">
      <div class="part" data-part="declination">
        <div><h2><span class="long">Declination</span><span class="brief">Dec</span></h2>${this.#field(declination.field, change.declination)}</div>
        ${this.#slider(declination.slider, (at) => change.declination(slid.declination(at)))}
      </div>
      <div class="part" data-part="window">
        <div>
          <h2>Hour angle</h2>
          ${this.#field<HourValue>(window.from, (value) => change.window(observation, "fromH", value))}<span class="joint">to</span>
          ${this.#field<HourValue>(window.to, (value) => change.window(observation, "toH", value))}
        </div>
        ${this.#slider(window.slider, (at, index) => this.#slidWindow(at, index))}
      </div>
      <div class="part" data-part="wavelength">
        <div>
          <h2>Wavelength</h2>
          ${this.#field(wavelength.field, change.wavelength)}<span class="joint">is</span>${this.#field(wavelength.frequency, change.frequency)}
        </div>
        ${this.#slider(wavelength.slider, (at) => change.wavelength(slid.wavelength(at, waveAxis(observation))))}
      </div>
      <div class="part" data-part="bandwidth">
        <div><h2>Bandwidth</h2>${this.#field(bandwidth.field, (hz: number) => change.bandwidth(observation, hz))}</div>
        ${this.#slider(bandwidth.slider, (at) => change.bandwidth(observation, slid.bandwidth(at, bandwidthAxis(observation), observation.frequencyHz)))}
      </div>
      <div class="part" data-part="weighting">
        <div>
          <h2><span class="long">Weighting</span><span class="brief">Weight</span></h2>
          <select class="field" aria-label="Weighting scheme" @change=${this.#scheme}>
            ${(["robust", "natural", "uniform"] as const).map((s) => html`<option value=${s} ?selected=${s === weighting.scheme}>${s}</option>`)}
          </select>
          ${weighting.scheme === "robust" ? this.#field(weighting.field, (r: number) => change.robustness(observation, r)) : nothing}
        </div>
        ${this.#slider(weighting.slider, (at) => change.robustness(observation, slid.robustness(at)))}
      </div>
    </div>`;
  }

  #field<T>(model: FieldModel<T>, changed: (value: T) => ObservationChange) {
    return html`<sw-field
      .model=${model}
      @field-change=${(event: Typed<T>) => {
        event.stopPropagation();
        const { value, step } = event.detail;
        const fault = this.#send(() => changed(value), step ? "step" : "drop");
        if (fault) event.detail.fault = fault;
      }}
    ></sw-field>`;
  }

  #slider(model: SliderModel, changed: (at: number, index: number) => ObservationChange) {
    return html`<sw-slider
      .model=${model}
      @slider-move=${(event: Slid) => {
        event.stopPropagation();
        const { at, index, phase } = event.detail;
        this.#send(() => changed(at, index), phase);
      }}
    ></sw-slider>`;
  }

  /** A handle stops at the other one. */
  #slidWindow(at: number, index: number): ObservationChange {
    const { observation } = this.model as ObservationBarModel;
    const { fromH, toH } = observation.hourAngle;
    const hours = slid.hours(at);
    return index === 0
      ? change.window(observation, "fromH", Math.min(hours, toH))
      : change.window(observation, "toH", Math.max(hours, fromH));
  }

  #scheme(event: Event): void {
    if (!this.model) return;
    const scheme = (event.target as HTMLSelectElement).value as ObservationBarModel["weighting"]["scheme"];
    const { observation } = this.model;
    this.#send(() => change.scheme(observation, scheme), "drop");
  }

  /** @returns A sentence where the change is not taken. */
  #send(wanted: () => ObservationChange, phase: ChangePhase): string | undefined {
    try {
      const detail: ObservationChangeDetail = { ...wanted(), phase };
      this.dispatchEvent(new CustomEvent("observation-change", { detail, bubbles: true, composed: true }));
      return detail.fault;
    } catch (error) {
      if (!(error instanceof DomainError)) throw error;
      return error.message;
    }
  }
}

customElements.define("sw-observation-bar", ObservationBar);
