import { css, html, LitElement, nothing } from "lit";
import type { SliderModel } from "../../view/controls.ts";
import { base } from "../shared.ts";
import { props } from "./props.ts";

/**
 * One or two handles on a scale with ticks.
 *
 * @fires slider-move - `detail`: `index` of the handle, `at` 0 to 1, `phase` "drag", "drop", or "step" for a key.
 */
export class Slider extends LitElement {
  static override properties = { model: { attribute: false } };
  declare model?: SliderModel;
  #held: number | null = null;

  static override styles = [
    base,
    css`
      :host {
        padding: 0 7px;
        touch-action: none;
      }
      .scale {
        position: relative;
        height: 24px;
        cursor: pointer;
      }
      .track,
      .dots,
      .fill {
        position: absolute;
        top: 11.25px;
        height: 1.5px;
      }
      .dots {
        left: 0;
        right: 0;
        background-image: radial-gradient(circle, var(--sw-edge) 0.75px, transparent 0.95px);
        background-size: 5px 1.5px;
      }
      .track {
        background: var(--sw-edge);
      }
      .fill {
        top: 10.5px;
        height: 3px;
        background: var(--sw-ink);
      }
      .tick {
        position: absolute;
        top: 8px;
        width: 1px;
        height: 8px;
        background: var(--sw-edge);
      }
      .handle {
        position: absolute;
        top: 0;
        width: 24px;
        height: 24px;
        margin-left: -12px;
        border-radius: 50%;
        cursor: grab;
      }
      .handle::after {
        content: "";
        position: absolute;
        inset: 5.5px;
        border: 2px solid var(--sw-ink);
        border-radius: 50%;
        background: var(--sw-surface);
      }
      .handle:focus-visible {
        outline-offset: -3px;
      }
      .labels {
        position: relative;
        height: 13px;
        font-size: 10.5px;
        line-height: 13px;
        color: var(--sw-ink-2);
      }
      .labels span {
        position: absolute;
        transform: translateX(-50%);
        white-space: nowrap;
      }
      .labels span:first-child {
        transform: none;
        margin-left: -7px;
      }
      .labels span:last-child {
        transform: translateX(-100%);
        margin-left: 7px;
      }
      @media (pointer: coarse) {
        .scale {
          height: 44px;
        }
        .handle {
          width: 44px;
          height: 44px;
          margin-left: -22px;
        }
        .handle::after {
          inset: 15.5px;
        }
        .track,
        .dots {
          top: 21.25px;
        }
        .fill {
          top: 20.5px;
        }
        .tick {
          top: 18px;
        }
      }
    `,
  ];

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const percent = (at: number): string => `${(100 * at).toFixed(3)}%`;
    const span = (a: number, b: number) => props({ left: percent(Math.min(a, b)), right: percent(1 - Math.max(a, b)) });
    const ats = model.handles.map((h) => h.at);
    return html`<div class="scale" @pointerdown=${this.#down} @pointermove=${this.#move} @pointerup=${this.#up} @pointercancel=${this.#up}>
        <div class="dots"></div>
        ${model.reach.map(([from, to]) => html`<div class="track" ${span(from, to)}></div>`)}
        ${model.ticks.map((t) => html`<div class="tick" ${props({ left: percent(t.at) })}></div>`)}
        ${model.filled ? html`<div class="fill" ${span(ats[0], ats[1])}></div>` : nothing}
        ${model.handles.map(
          (h, index) =>
            html`<div
              class="handle"
              role="slider"
              tabindex="0"
              aria-label=${h.label}
              aria-valuemin="0"
              aria-valuemax="1"
              aria-valuenow=${h.at.toFixed(4)}
              aria-valuetext=${h.text}
              ${props({ left: percent(h.at) })}
              @keydown=${(event: KeyboardEvent) => this.#key(event, index)}
            ></div>`,
        )}
      </div>
      <div class="labels" aria-hidden="true">${model.ticks.filter((t) => t.label !== "").map((t) => html`<span ${props({ left: percent(t.at) })}>${t.label}</span>`)}</div>`;
  }

  #at(event: PointerEvent): number {
    const box = (this.renderRoot.querySelector(".scale") as HTMLElement).getBoundingClientRect();
    return Math.max(0, Math.min(1, (event.clientX - box.left) / box.width));
  }

  #down(event: PointerEvent): void {
    if (event.button !== 0 || !this.model) return;
    const at = this.#at(event);
    const distances = this.model.handles.map((h) => Math.abs(h.at - at));
    this.#held = distances.indexOf(Math.min(...distances));
    (event.currentTarget as Element).setPointerCapture(event.pointerId);
    (this.renderRoot.querySelectorAll(".handle")[this.#held] as HTMLElement).focus();
    event.preventDefault();
    this.#send(this.#held, at, "drag");
  }

  #move(event: PointerEvent): void {
    if (this.#held !== null) this.#send(this.#held, this.#at(event), "drag");
  }

  #up(event: PointerEvent): void {
    if (this.#held === null) return;
    const held = this.#held;
    this.#held = null;
    this.#send(held, this.#at(event), "drop");
  }

  #key(event: KeyboardEvent, index: number): void {
    const handle = this.model?.handles[index];
    if (!handle) return;
    const steps: { readonly [key: string]: number } = {
      ArrowRight: 1,
      ArrowUp: 1,
      ArrowLeft: -1,
      ArrowDown: -1,
      PageUp: 10,
      PageDown: -10,
    };
    let at: number | undefined;
    if (event.key in steps) at = handle.at + steps[event.key] * handle.step;
    else if (event.key === "Home") at = 0;
    else if (event.key === "End") at = 1;
    if (at === undefined) return;
    event.preventDefault();
    this.#send(index, Math.max(0, Math.min(1, at)), "step");
  }

  #send(index: number, at: number, phase: "drag" | "drop" | "step"): void {
    this.dispatchEvent(new CustomEvent("slider-move", { detail: { index, at, phase }, bubbles: true, composed: true }));
  }
}

customElements.define("sw-slider", Slider);
