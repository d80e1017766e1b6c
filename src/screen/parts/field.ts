import { css, html, LitElement, nothing } from "lit";
import { DomainError } from "../../base/errors.ts";
import { caretStep } from "../../view/caret.ts";
import type { FieldModel } from "../../view/controls.ts";
import { base, fields } from "../shared.ts";

/**
 * One number with its unit. Enter and leaving commit, Escape restores, arrows step the digit at the caret.
 * What cannot be read stays in the box with a sentence beside it; the last good value holds.
 *
 * @fires field-change - `detail.value`: the new value; `detail.step`: it came from an arrow key. A listener that does not take it
 *   puts a sentence in `detail.fault`.
 */
export class Field extends LitElement {
  static override properties = { model: { attribute: false }, fault: { state: true }, typed: { state: true } };
  declare model?: FieldModel<unknown>;
  declare fault: string | null;
  declare typed: string | null;

  constructor() {
    super();
    this.fault = null;
    this.typed = null;
  }

  static override styles = [
    base,
    fields,
    css`
      :host {
        display: inline-block;
        position: relative;
      }
      input {
        width: calc(var(--sw-width, 6) * 1ch);
      }
      .fault {
        position: absolute;
        top: calc(100% + 4px);
        right: 0;
        z-index: 5;
        width: max-content;
        max-width: 260px;
        padding: 4px 8px;
        background: var(--sw-raised);
        border: 1px solid var(--sw-short);
        border-radius: var(--sw-radius);
        white-space: normal;
      }
    `,
  ];

  /** Puts the keyboard on the field, once it is there. */
  override focus(): void {
    void this.updateComplete.then(() => this.#input?.focus());
  }

  /** Where the caret goes when the stepped value comes back, characters from the end. */
  #caretFromEnd: number | null = null;

  get #input(): HTMLInputElement | null {
    return this.renderRoot.querySelector("input");
  }

  override willUpdate(changed: Map<string, unknown>): void {
    // A value that changed elsewhere (a slider, an undo) overtakes what was typed.
    const before = changed.get("model") as FieldModel<unknown> | undefined;
    if (before && this.model && before.value !== this.model.value && before.label === this.model.label) {
      this.typed = null;
      this.fault = null;
    }
  }

  override render() {
    const { model } = this;
    if (!model) return nothing;
    return html`<span class="field ${this.fault ? "wrong" : ""}">
        <input
          type="text"
          inputmode="text"
          autocomplete="off"
          spellcheck="false"
          aria-label=${model.label}
          aria-invalid=${this.fault ? "true" : "false"}
          aria-describedby=${this.fault ? "fault" : nothing}
          .value=${this.typed ?? model.text}
          @input=${this.#typing}
          @keydown=${this.#key}
          @focus=${this.#focused}
          @blur=${this.#commit}
        />${model.unit ? html`<span class="unit">${model.unit}</span>` : nothing}
      </span>
      ${this.fault ? html`<span class="fault" id="fault" role="alert">${this.fault}</span>` : nothing}`;
  }

  override updated(changed: Map<string, unknown>): void {
    const before = changed.get("model") as FieldModel<unknown> | undefined;
    if (before && before.text !== this.model?.text) this.#keepCaret();
    this.style.setProperty("--sw-width", String(this.model?.width ?? 6));
  }

  #focused(): void {
    if (this.typed === null) this.#input?.select();
  }

  #typing(event: Event): void {
    this.typed = (event.target as HTMLInputElement).value;
  }

  #key(event: KeyboardEvent): void {
    if (event.key === "Enter") {
      this.#commit();
      this.#input?.select();
    } else if (event.key === "Escape" && this.typed !== null) {
      event.stopPropagation();
      this.typed = null;
      this.fault = null;
    } else if (event.key === "ArrowUp" || event.key === "ArrowDown") this.#step(event);
  }

  #step(event: KeyboardEvent): void {
    const input = this.#input;
    if (!input || !this.model) return;
    event.preventDefault();
    const caret = input.selectionStart ?? input.value.length;
    const size = caretStep(input.value, caret, this.model.sizes);
    if (size === undefined) return;
    const fromEnd = input.value.length - caret;
    const next = this.model.value + (event.key === "ArrowUp" ? size : -size);
    this.#caretFromEnd = fromEnd;
    // Rounded so that repeated steps do not gather the rest of a binary fraction.
    if (!this.#send(Number(next.toPrecision(12)), true)) this.#caretFromEnd = null;
  }

  /** The new text would put the caret at its end; it stays at the digit that is stepped. */
  #keepCaret(): void {
    const input = this.#input;
    if (!input || this.#caretFromEnd === null) return;
    const place = Math.max(0, input.value.length - this.#caretFromEnd);
    this.#caretFromEnd = null;
    input.setSelectionRange(place, place);
  }

  #commit(): void {
    if (this.typed === null || !this.model) return;
    if (this.typed.trim() === this.model.text) {
      this.typed = null;
      this.fault = null;
      return;
    }
    try {
      const value = this.model.parse(this.typed);
      if (this.#send(value, false)) this.typed = null;
    } catch (error) {
      if (!(error instanceof DomainError)) throw error;
      this.fault = error.message;
    }
  }

  /** @returns false where the page does not take the value; then it says why through the fault. */
  #send(value: unknown, step: boolean): boolean {
    const detail: { value: unknown; step: boolean; fault?: string } = { value, step };
    this.dispatchEvent(new CustomEvent("field-change", { detail, bubbles: true, composed: true }));
    this.fault = detail.fault ?? null;
    return detail.fault === undefined;
  }
}

customElements.define("sw-field", Field);
