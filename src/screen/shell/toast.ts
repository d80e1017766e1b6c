import { css, html, LitElement, nothing } from "lit";
import { base, buttons, keys } from "../shared.ts";
import type { Toast } from "../store.ts";

/** How long a toast stays, ms; the clock stands while it is hovered or holds the focus. */
const STAYS = 8000;

/**
 * One short message at a time, with the way back.
 *
 * @fires toast-action - `detail.action`: "undo" or "redo".
 * @fires toast-over - It has been seen long enough.
 */
export class ToastBox extends LitElement {
  static override properties = { toast: { attribute: false } };
  declare toast: Toast | null;
  #timer: ReturnType<typeof setTimeout> | undefined;
  #shownId = 0;

  static override styles = [
    base,
    keys,
    buttons,
    css`
      :host {
        position: fixed;
        left: 50%;
        bottom: 16px;
        transform: translateX(-50%);
        z-index: 20;
        pointer-events: none;
      }
      .toast {
        pointer-events: auto;
        display: flex;
        align-items: center;
        gap: 12px;
        min-height: 38px;
        padding: 4px 6px 4px 14px;
        border-radius: var(--sw-radius-float);
        background: var(--sw-ink);
        color: var(--sw-surface);
        box-shadow: var(--sw-shadow);
        white-space: nowrap;
      }
      .toast.bare {
        padding-right: 14px;
      }
      .button {
        color: inherit;
        border-color: currentColor;
        font-weight: 520;
      }
      .button:hover {
        background: none;
        text-decoration: underline;
      }
      .button:focus-visible {
        outline-color: currentColor;
        outline-offset: -4px;
      }
      kbd {
        color: inherit;
      }
    `,
  ];

  constructor() {
    super();
    this.toast = null;
  }

  override render() {
    const { toast } = this;
    return html`<div role="status">
      ${
        toast
          ? html`<div class="toast ${toast.action ? "" : "bare"}" @pointerenter=${this.#hold} @pointerleave=${this.#run} @focusin=${this.#hold} @focusout=${this.#run}>
              <span>${toast.text}</span>
              ${
                toast.action === "undo"
                  ? html`<button class="button outlined" @click=${this.#act}>Undo <kbd>Z</kbd></button>`
                  : toast.action === "redo"
                    ? html`<button class="button outlined" @click=${this.#act}>Redo <kbd>⇧Z</kbd></button>`
                    : nothing
              }
            </div>`
          : nothing
      }
    </div>`;
  }

  override updated(): void {
    const id = this.toast?.id ?? 0;
    if (id === this.#shownId) return;
    this.#shownId = id;
    this.#run();
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#hold();
  }

  readonly #hold = (): void => clearTimeout(this.#timer);

  readonly #run = (): void => {
    this.#hold();
    if (this.toast)
      this.#timer = setTimeout(() => this.dispatchEvent(new CustomEvent("toast-over", { bubbles: true, composed: true })), STAYS);
  };

  #act(): void {
    const action = this.toast?.action;
    if (action) this.dispatchEvent(new CustomEvent("toast-action", { detail: { action }, bubbles: true, composed: true }));
  }
}

customElements.define("sw-toast", ToastBox);
