import { css, html, LitElement, nothing } from "lit";
import { LAYOUT_DASHES, type TopBarModel } from "../../view/shell.ts";
import { wordmark } from "../parts/marks.ts";
import { TASKS, type TaskName } from "../session.ts";
import { base, buttons, fields, keys } from "../shared.ts";

const names: { readonly [T in TaskName]: string } = { place: "Place", resolve: "Resolve", compare: "Compare", report: "Report" };

/**
 * Wordmark, plan, task switch and the actions that hold everywhere.
 *
 * @fires layout-choose - `detail.id`.
 * @fires command - `detail.name`: "open", "save", "undo", "redo", "theme", "keys" or "cautions".
 */
export class TopBar extends LitElement {
  static override properties = { model: { attribute: false } };
  declare model?: TopBarModel;

  static override styles = [
    base,
    keys,
    buttons,
    fields,
    css`
      :host {
        display: grid;
        grid-template-columns: var(--sw-ledger-width) minmax(0, 1fr) auto;
        height: var(--sw-bar-height);
        background: var(--sw-surface);
        border-bottom: 1px solid var(--sw-line);
      }
      .brand {
        display: flex;
        align-items: center;
        gap: 10px;
        padding: 0 16px;
        border-right: 1px solid var(--sw-line);
        min-width: 0;
      }
      .brand h1 {
        font-size: 14px;
        font-weight: 600;
        line-height: 18px;
        letter-spacing: -0.01em;
      }
      .brand .plan {
        margin-left: auto;
        color: var(--sw-ink-2);
        white-space: nowrap;
        overflow: hidden;
        text-overflow: ellipsis;
      }
      .wordmark {
        flex: none;
      }
      .near {
        stroke: var(--sw-ink);
      }
      .far {
        stroke: var(--sw-accent);
      }
      circle {
        fill: var(--sw-ink);
      }
      nav {
        display: flex;
        align-items: stretch;
        padding-left: 8px;
      }
      nav a {
        position: relative;
        display: flex;
        align-items: center;
        gap: 8px;
        padding: 0 18px;
        color: var(--sw-ink-2);
        text-decoration: none;
        font-weight: 440;
        font-size: 13px;
      }
      nav a:hover {
        color: var(--sw-ink);
      }
      nav a:focus-visible {
        outline-offset: -4px;
      }
      nav a::after {
        content: "";
        position: absolute;
        left: 0;
        right: 0;
        bottom: 8px;
        height: 1px;
        background: var(--sw-edge);
        opacity: 0.7;
      }
      nav a::before,
      nav .end {
        content: "";
        position: absolute;
        left: 0;
        bottom: 5px;
        width: 1px;
        height: 7px;
        background: var(--sw-edge);
      }
      nav .end {
        position: static;
        align-self: flex-end;
        margin-bottom: 5px;
      }
      nav a[aria-current] {
        color: var(--sw-ink);
        font-weight: 600;
      }
      nav a[aria-current]::after {
        height: 3px;
        bottom: 7px;
        background: var(--sw-ink);
        opacity: 1;
      }
      .tools {
        display: flex;
        align-items: center;
        gap: 2px;
        padding: 0 12px;
      }
      .layout {
        position: relative;
        display: flex;
        align-items: center;
        margin-right: 6px;
      }
      .layout svg {
        position: absolute;
        left: 10px;
        pointer-events: none;
      }
      .layout select {
        height: var(--sw-control-height);
        padding-left: 44px;
        max-width: 240px;
        border-radius: var(--sw-radius);
        font-weight: 480;
        background-color: var(--sw-surface);
        text-overflow: ellipsis;
      }
      .layout line {
        stroke-width: 2;
      }
      .style-0 {
        stroke: var(--sw-layout-1);
      }
      .style-1 {
        stroke: var(--sw-layout-2);
      }
      .style-2 {
        stroke: var(--sw-layout-3);
      }
      .style-3 {
        stroke: var(--sw-layout-4);
      }
      @media (max-width: 1360px) {
        nav a {
          padding: 0 13px;
        }
        .tools kbd {
          display: none;
        }
        .layout select {
          max-width: 200px;
        }
      }
      @media (max-width: 1100px) {
        .brand {
          padding: 0 12px;
          gap: 8px;
        }
        .brand .plan,
        .tools .wide {
          display: none;
        }
        .brand h1 {
          font-size: 13px;
        }
        nav a {
          padding: 0 13px;
        }
        .tools {
          padding: 0 8px;
        }
        .layout select {
          max-width: 200px;
        }
      }
    `,
  ];

  override render() {
    const { model } = this;
    if (!model) return nothing;
    return html`<div class="brand">${wordmark}<h1>Spanwright</h1><span class="plan" title=${model.title}>${model.title}</span></div>
      <nav aria-label="Tasks">
        ${TASKS.map(
          (task, k) =>
            html`<a href="#${task}" aria-current=${task === model.task ? "page" : nothing}>${names[task]} <kbd>${k + 1}</kbd></a>`,
        )}<i class="end"></i>
      </nav>
      <div class="tools">
        <span class="layout">
          <svg width="26" height="4" aria-hidden="true"><line class="style-${model.layout.style}" x1="0" x2="26" y1="2" y2="2" stroke-dasharray=${LAYOUT_DASHES[model.layout.style]}></line></svg>
          <select class="field" aria-label="Layout" @change=${this.#layout}>
            ${model.layouts.map(({ id, label }) => html`<option value=${id} ?selected=${id === model.layout.id}>${label}</option>`)}
          </select>
        </span>
        ${this.#button("open", "Open", "O", "Open a plan file")} ${this.#button("save", "Save", "", "Save the plan as a file")}
        ${this.#button("undo", "Undo", "Z", model.undo ? `Undo: ${model.undo}` : null, "Nothing to undo")}
        ${this.#button("redo", "Redo", "⇧Z", model.redo ? `Redo: ${model.redo}` : null, "Nothing to redo", "wide")}
        ${this.#button("keys", "Keys", "?", "List of keys", undefined, "wide")}
        ${this.#button("cautions", "Cautions", "", "What a plan does not settle")}
        ${this.#button("theme", model.otherTheme, "", `Change to the ${model.otherTheme.toLowerCase()} look`)}
      </div>`;
  }

  /** @param title - What it does; null: it is unavailable, and `why` says so. */
  #button(name: string, word: string, key: string, title: string | null, why = "", extra = "") {
    return html`<button
      class="button ${extra}"
      data-command=${name}
      aria-disabled=${title === null ? "true" : nothing}
      title=${title ?? why}
      @click=${() => title !== null && this.#command(name)}
    >${word}${key ? html` <kbd>${key}</kbd>` : nothing}</button>`;
  }

  #layout(event: Event): void {
    const id = (event.target as HTMLSelectElement).value;
    this.dispatchEvent(new CustomEvent("layout-choose", { detail: { id }, bubbles: true, composed: true }));
  }

  #command(name: string): void {
    this.dispatchEvent(new CustomEvent("command", { detail: { name }, bubbles: true, composed: true }));
  }
}

customElements.define("sw-top-bar", TopBar);
