import { html, LitElement, nothing } from "lit";
import { DomainError } from "../../base/errors.ts";
import { inverse } from "../../engine/geodesy/geodesic.ts";
import { changeObservation, moveStation } from "../../plan/edits.ts";
import { observationById, stationById } from "../../plan/find.ts";
import type { Pair } from "../../plan/schema.ts";
import { CAUTIONS } from "../../view/cautions.ts";
import { type PlaceModel, placeModel } from "../../view/ground/model.ts";
import { topBarModel, unbuilt } from "../../view/shell.ts";
import { shownAs } from "../../view/units.ts";
import "../ledger/ledger.ts";
import type { StationMove, StationPick } from "../place/events.ts";
import "../place/place.ts";
import type { ObservationChangeDetail } from "../resolve/observation-bar.ts";
import type { Resolve } from "../resolve/resolve.ts";
import "../resolve/resolve.ts";
import { base, buttons, keys, panes } from "../shared.ts";
import type { Shown, Store } from "../store.ts";
import { appStyles } from "./appstyles.ts";
import { KEY_LIST, keyCommand } from "./keys.ts";
import { ledgerPanel, resolveModel } from "./models.ts";
import "./toast.ts";
import "./topbar.ts";

/** What the page around the elements does: files, and what it keeps between visits. */
export interface PageActions {
  readonly open: () => void;
  readonly save: () => void;
}

/** The whole page: top bar, ledger, and the task that is on. */
export class App extends LitElement {
  static override properties = {
    store: { attribute: false },
    actions: { attribute: false },
    faults: { attribute: false },
    over: { state: true },
  };
  declare store?: Store;
  declare actions?: PageActions;
  /** Faults of a file that could not be opened: a sentence, then one line a fault. */
  declare faults: { readonly title: string; readonly lines: readonly string[] } | null;
  /** A file is held over the page. */
  declare over: boolean;
  #leave: (() => void) | undefined;
  #place: PlaceModel | undefined;

  static override styles = [base, keys, buttons, panes, appStyles];

  constructor() {
    super();
    this.faults = null;
    this.over = false;
  }

  override connectedCallback(): void {
    super.connectedCallback();
    window.addEventListener("keydown", this.#key);
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    window.removeEventListener("keydown", this.#key);
    this.#leave?.();
    this.#leave = undefined;
  }

  override willUpdate(changed: Map<string, unknown>): void {
    if (!changed.has("store")) return;
    this.#leave?.();
    this.#leave = this.store?.subscribe(() => this.requestUpdate());
  }

  override render() {
    const { store } = this;
    if (!store) return nothing;
    const { shown } = store;
    const { session, plan } = shown;
    return html`<sw-top-bar
        role="banner"
        .model=${topBarModel(plan, session.task, session.layout, session.theme, shown.undoLabel, shown.redoLabel)}
        @layout-choose=${(event: CustomEvent<{ id: string }>) => store.look({ layout: event.detail.id })}
        @command=${(event: CustomEvent<{ name: string }>) => this.#command(event.detail.name)}
      ></sw-top-bar>
      <sw-ledger
        role="region"
        aria-label="Ledger"
        .model=${ledgerPanel(shown)}
        @line-pick=${(event: CustomEvent<{ id: string | null }>) => store.look({ line: event.detail.id })}
        @observation-edit=${() => this.#editObservation()}
        @observation-choose=${(event: CustomEvent<{ id: string }>) => store.look({ observation: event.detail.id })}
      ></sw-ledger>
      <main @station-move=${this.#move} @station-pick=${this.#pick} @observation-change=${this.#observation} @pair-change=${this.#pair}>
        ${this.#task(shown)}
        ${shown.fault ? html`<div class="notice float" role="alert"><header><span>${shown.fault}</span><button class="button" @click=${() => store.complain(null)}>Close</button></header></div>` : nothing}
        ${this.#faultList()} ${this.over ? html`<div class="drop">Drop to open the plan</div>` : nothing}
      </main>
      <sw-toast
        .toast=${shown.toast}
        @toast-over=${() => store.hush()}
        @toast-action=${(event: CustomEvent<{ action: "undo" | "redo" }>) => (event.detail.action === "undo" ? store.undo() : store.redo())}
      ></sw-toast>
      ${this.#keyList(session.keys)} ${cautionList}
      <div class="unseen" aria-live="polite">${shown.announced}</div>`;
  }

  #task(shown: Shown) {
    const { session, plan } = shown;
    switch (session.task) {
      case "place":
        this.#place = placeModel(plan, session.layout, session.station, shown.dragging, this.#place);
        return html`<sw-place .model=${this.#place} .plan=${plan} .observation=${observationById(plan, session.observation)} .picture=${shown.picture} .theme=${session.theme}></sw-place>`;
      case "resolve":
        return html`<sw-resolve .model=${resolveModel(shown)}></sw-resolve>`;
      default: {
        const { title, will } = unbuilt[session.task];
        return html`<section class="unbuilt"><h2>${title}</h2><p>${will}</p></section>`;
      }
    }
  }

  #faultList() {
    if (!this.faults) return nothing;
    const { title, lines } = this.faults;
    return html`<div class="notice float" role="alert">
      <header><h2>${title}</h2><button class="button" @click=${() => {
        this.faults = null;
      }}>Close</button></header>
      <ul>${lines.map((line) => html`<li>${line}</li>`)}</ul>
    </div>`;
  }

  #keyList(on: boolean) {
    return html`<div class="sheet keys float" id="keys" popover role="dialog" aria-label="Keys">
      <div class="top"><h2>Keys</h2><button class="button" popovertarget="keys" popovertargetaction="hide">Close</button></div>
      <dl>${KEY_LIST.map(([key, does]) => html`<dt>${key}</dt><dd>${does}</dd>`)}</dl>
      <label><input type="checkbox" .checked=${on} @change=${(event: Event) => this.store?.look({ keys: (event.target as HTMLInputElement).checked })} />Single-letter keys</label>
    </div>`;
  }

  #command(name: string): void {
    const { store, actions } = this;
    if (!store || !actions) return;
    if (name === "open") actions.open();
    else if (name === "save") actions.save();
    else if (name === "undo") store.undo();
    else if (name === "redo") store.redo();
    else if (name === "theme") store.look({ theme: store.shown.session.theme === "light" ? "dark" : "light" });
    else if (name === "keys" || name === "cautions") this.renderRoot.querySelector<HTMLElement>(`#${name}`)?.togglePopover();
  }

  readonly #key = (event: KeyboardEvent): void => {
    const { store } = this;
    if (!store || event.defaultPrevented) return;
    const command = keyCommand(event, takesText(event), store.shown.session.keys);
    if (!command) return;
    event.preventDefault();
    switch (command.kind) {
      case "task":
        store.look({ task: command.task });
        break;
      case "observation":
        this.#editObservation();
        break;
      case "line":
        this.#nextLine(command.step);
        break;
      default:
        this.#command(command.kind);
    }
  };

  #nextLine(step: 1 | -1): void {
    const { store } = this;
    if (!store) return;
    const { lines } = ledgerPanel(store.shown).ledger;
    if (lines.length === 0) return;
    const now = lines.findIndex((line) => line.id === store.shown.session.line);
    const next = now < 0 ? (step === 1 ? 0 : lines.length - 1) : (now + step + lines.length) % lines.length;
    store.look({ line: lines[next].id });
  }

  #editObservation(): void {
    this.store?.look({ task: "resolve" });
    void this.updateComplete.then(async () => {
      const resolve = this.renderRoot.querySelector<Resolve>("sw-resolve");
      await resolve?.updateComplete;
      resolve?.focusObservation();
    });
  }

  #pick(event: CustomEvent<StationPick>): void {
    this.store?.look({ station: event.detail.id });
  }

  #move(event: CustomEvent<StationMove>): void {
    const { store } = this;
    if (!store) return;
    const { id, latitudeDeg, longitudeDeg, heightM, phase } = event.detail;
    if (phase === "cancel") {
      store.release();
      return;
    }
    const before = stationById(store.plan, id);
    const plan = moveStation(store.plan, id, { latitudeDeg, longitudeDeg, heightM });
    if (phase === "drag") {
      store.drag(plan, "move");
      return;
    }
    const name = before.name || id;
    const { distanceM } = inverse(before.latitudeDeg, before.longitudeDeg, latitudeDeg, longitudeDeg);
    if (distanceM === 0 && heightM === before.heightM) {
      store.release();
      return;
    }
    store.edit(`move ${name}`, plan);
    store.say(
      distanceM > 0 ? `Moved ${name} ${shownAs("length", distanceM)}.` : `Moved ${name} to ${heightM.toFixed(1)}\u00a0m.`,
      "undo",
    );
  }

  #observation(event: CustomEvent<ObservationChangeDetail>): void {
    const { store } = this;
    if (!store) return;
    const { patch, phase, label, squash, previews } = event.detail;
    try {
      const plan = changeObservation(store.plan, store.shown.session.observation, patch);
      if (phase === "drag") store.drag(plan, previews ? "rebuild" : "settle");
      else store.edit(label, plan, phase === "step" ? squash : undefined);
    } catch (error) {
      if (!(error instanceof DomainError)) throw error;
      event.detail.fault = error.message;
    }
  }

  #pair(event: CustomEvent<{ pair: Pair }>): void {
    this.store?.look({ pair: event.detail.pair });
  }
}

const cautionList = html`<div class="sheet cautions float" id="cautions" popover role="dialog" aria-label="Cautions">
  <div class="top"><h2>Cautions</h2><button class="button" popovertarget="cautions" popovertargetaction="hide">Close</button></div>
  <ul>${CAUTIONS.map((caution) => html`<li>${caution}</li>`)}</ul>
</div>`;

/** A key press that belongs to a field, a list or a slider. */
function takesText(event: KeyboardEvent): boolean {
  const target = event.composedPath()[0];
  return (
    target instanceof HTMLElement && (target.matches("input:not([type=checkbox]), textarea, select") || target.isContentEditable)
  );
}

customElements.define("sw-app", App);
