import { html, LitElement, nothing } from "lit";
import type { LedgerLine, LedgerModel } from "../../view/ledger/ledger.ts";
import type { ObservationBoxModel } from "../../view/observation.ts";
import { stateClass, stateMark } from "../parts/marks.ts";
import { base, buttons, fields, keys } from "../shared.ts";
import { fullGauge, type GaugeShape, gauge, railGauge } from "./gauge.ts";
import { ledgerStyles } from "./styles.ts";

/** What the ledger shows beside its lines. */
export interface LedgerPanelModel {
  readonly ledger: LedgerModel;
  readonly selected: string | null;
  readonly observation: ObservationBoxModel | null;
  /** All observations of the plan, to choose from. */
  readonly observations: readonly { readonly id: string; readonly label: string }[];
}

/**
 * One column of written requirements hung from a plumb line.
 *
 * @fires line-pick - `detail.id`: the line, or null when it was picked already.
 * @fires observation-choose - `detail.id`.
 * @fires observation-edit - The reader wants to change the observation.
 */
export class Ledger extends LitElement {
  static override properties = { model: { attribute: false }, rail: { state: true } };
  declare model?: LedgerPanelModel;
  declare rail: boolean;
  readonly #narrow = matchMedia("(max-width: 1100px)");
  readonly #narrowed = (): void => {
    this.rail = this.#narrow.matches;
  };

  static override styles = [base, keys, buttons, fields, ledgerStyles];

  constructor() {
    super();
    this.rail = this.#narrow.matches;
  }

  override connectedCallback(): void {
    super.connectedCallback();
    this.#narrow.addEventListener("change", this.#narrowed);
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#narrow.removeEventListener("change", this.#narrowed);
  }

  override render() {
    if (!this.model) return nothing;
    const { ledger, selected, observation, observations } = this.model;
    const shape = this.rail ? railGauge : fullGauge;
    const picked = ledger.lines.find((line) => line.id === selected);
    return html`<div class="head">
        <h2>Ledger</h2>
        ${ledger.open > 0 ? html`<span class="open" title="The lines say why">${ledger.open} not computed</span>` : nothing}
        <div class="tally">${this.#tally(ledger)}</div>
        <div class="scale" aria-hidden="true">
          <i></i><span class="short-side">short</span><span class="hand">in hand</span><span class="five">5</span
          ><span class="twenty">20&nbsp;%</span>
        </div>
      </div>
      ${
        ledger.lines.length === 0
          ? html`<p class="none">No lines yet. A line is one written requirement; a plan file holds them under “requirements”.</p>`
          : html`<ol class="lines" aria-label="Requirements">
              ${ledger.lines.map((line) => html`<li>${this.#line(line, line.id === selected, shape)}</li>`)}
            </ol>`
      }
      <div class="bob">${this.#bob(shape)}</div>
      ${picked ? this.#detail(picked) : observation ? this.#observation(observation, observations) : nothing}`;
  }

  #tally({ tally, lines, open }: LedgerModel) {
    if (lines.length === 0) return html`no lines yet`;
    const settled = tally.some((t) => t.count > 0) || open > 0;
    if (!settled) return html`working`;
    return html`${tally.map(({ state, count }) => html`<span class=${stateClass(state)}>${stateMark(state)}${count} ${state}</span>`)}`;
  }

  #line(line: LedgerLine, selected: boolean, shape: GaugeShape) {
    const colour = stateClass(line.state);
    const reason = line.state === "cannot be computed" && line.note ? line.note : null;
    return html`<button
      class="line ${line.state === "working" ? "is-working" : ""}"
      aria-pressed=${selected ? "true" : "false"}
      title=${line.note ?? nothing}
      data-line=${line.id}
      @click=${() => this.#pick(selected ? null : line.id)}
    >
      <span class="words">
        <span class="title">${line.title}</span>
        <span class="rail-title" aria-hidden="true">${line.short}</span>
        <span class="value">${line.value ? html`${line.value.figure}<small>${line.value.unit}</small>` : nothing}</span>
        <span class="condition">${line.condition}</span>
        <span class="limit">${line.limit}</span>
        <span class="state ${colour}"
          >${stateMark(line.state)}<span class="full">${reason ? sentence(reason, "") : line.words}</span><span class="brief">${reason ? sentence(reason, "") : line.shortWords}</span></span
        >
      </span>
      ${gauge(line, shape)}
    </button>`;
  }

  #bob({ width, plumb }: GaugeShape) {
    return html`<svg width=${width} height="34" aria-hidden="true">
      <line class="plumb" x1=${plumb} x2=${plumb} y1="0" y2="14"></line>
      <path d=${`M${plumb - 4.5} 13H${plumb + 4.5}L${plumb} 31Z`}></path>
    </svg>`;
  }

  #detail(line: LedgerLine) {
    return html`<section class="foot" aria-label=${line.title}>
      <header>
        <h3>${line.title}</h3>
        <button class="button" @click=${() => this.#pick(null)}>Close</button>
      </header>
      ${line.text ? html`<p>${line.text}</p>` : nothing}
      <p>${line.condition ? `${line.condition}: ` : nothing}${line.limit}</p>
      <p class=${stateClass(line.state)}>${line.words}</p>
      ${line.note ? html`<p>${sentence(line.note)}</p>` : nothing}
    </section>`;
  }

  #observation(box: ObservationBoxModel, observations: LedgerPanelModel["observations"]) {
    return html`<section class="foot" aria-label=${`Observation ${box.title}`}>
      <header>
        ${
          observations.length > 1
            ? html`<select class="field" aria-label="Observation" @change=${this.#choose}>
                ${observations.map(({ id, label }) => html`<option value=${id} ?selected=${id === box.id}>${label}</option>`)}
              </select>`
            : html`<h3>${box.title}</h3>`
        }
        <button class="button" @click=${this.#edit}>Edit <kbd>S</kbd></button>
      </header>
      <dl>${box.rows.map(([label, value]) => html`<dt>${label}</dt><dd>${value}</dd>`)}</dl>
    </section>`;
  }

  #pick(id: string | null): void {
    this.dispatchEvent(new CustomEvent("line-pick", { detail: { id }, bubbles: true, composed: true }));
  }

  #choose(event: Event): void {
    const id = (event.target as HTMLSelectElement).value;
    this.dispatchEvent(new CustomEvent("observation-choose", { detail: { id }, bubbles: true, composed: true }));
  }

  #edit(): void {
    this.dispatchEvent(new CustomEvent("observation-edit", { bubbles: true, composed: true }));
  }
}

const sentence = (text: string, stop = "."): string =>
  `${text.charAt(0).toUpperCase()}${text.slice(1)}${text.endsWith(".") ? "" : stop}`;

customElements.define("sw-ledger", Ledger);
