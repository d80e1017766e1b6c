import { css, html, LitElement, nothing, type PropertyValues } from "lit";
import { guard } from "lit/directives/guard.js";
import { repeat } from "lit/directives/repeat.js";
import type { PlaceModel, PlaceStation } from "../../view/ground/model.ts";
import { nextSorting, type Sorting, type SortKey, sortedStations } from "../../view/ground/sorted.ts";
import { type Column, columns, idLength, isNamed } from "../../view/ground/table.ts";
import { props } from "../parts/props.ts";
import { base } from "../shared.ts";
import { stationPick } from "./events.ts";

/**
 * Stations of the layout, then the candidates. Click or Enter picks a row, arrows walk the rows, headers sort.
 *
 * @fires station-pick - The station of a row.
 */
export class StationTable extends LitElement {
  static override styles = [
    base,
    css`
      :host {
        overflow: auto;
        min-height: 0;
        scrollbar-width: thin;
        scrollbar-color: var(--sw-edge) transparent;
      }
      table {
        width: 100%;
        border-collapse: separate;
        border-spacing: 0;
        table-layout: fixed;
      }
      th {
        position: sticky;
        top: 0;
        z-index: 1;
        height: 28px;
        padding: 0;
        background: var(--sw-surface);
        border-bottom: 1px solid var(--sw-line);
        color: var(--sw-ink-2);
        font-size: 11px;
        font-weight: 400;
        text-align: right;
      }
      th button {
        width: 100%;
        height: 27px;
        padding: 0 2px;
        border: 0;
        background: none;
        text-align: inherit;
        white-space: nowrap;
        cursor: pointer;
        outline-offset: -2px;
      }
      th[aria-sort="ascending"] button,
      th[aria-sort="descending"] button {
        color: var(--sw-ink);
        font-weight: 540;
      }
      th.word,
      td.word {
        text-align: left;
      }
      td {
        height: 25px;
        padding: 0 2px;
        text-align: right;
        white-space: nowrap;
        overflow: hidden;
        text-overflow: ellipsis;
      }
      th:first-child button,
      td:first-child {
        padding-left: 16px;
      }
      td:first-child {
        color: var(--sw-ink-3);
      }
      th:last-child button,
      td:last-child {
        padding-right: 16px;
      }
      .id {
        width: calc(20px + var(--sw-id-length) * 8.4px);
      }
      .figure {
        width: 50px;
      }
      .height {
        width: 70px;
      }
      @media (max-width: 1500px), (max-height: 820px) {
        th:first-child button,
        td:first-child {
          padding-left: 12px;
        }
        th:last-child button,
        td:last-child {
          padding-right: 12px;
        }
        .id {
          width: calc(15px + var(--sw-id-length) * 8.4px);
        }
        .figure {
          width: 46px;
        }
        .height {
          width: 62px;
        }
        td.word + td.word {
          padding: 0;
        }
      }
      .wide .figure {
        width: 53px;
      }
      tbody tr {
        cursor: pointer;
        outline-offset: -2px;
      }
      tbody tr:hover {
        background: var(--sw-sunken);
      }
      tr[aria-selected="true"] {
        background: var(--sw-accent-wash);
        box-shadow: inset 3px 0 var(--sw-accent);
      }
      tr.candidate {
        color: var(--sw-ink-3);
      }
      tr.divider td {
        padding: 8px 16px 2px;
        text-align: left;
        color: var(--sw-ink-3);
        font-size: 11px;
        cursor: default;
      }
      @media (max-width: 1100px), (pointer: coarse) {
        td,
        th,
        th button {
          height: 44px;
        }
      }
    `,
  ];
  static override properties = { model: { attribute: false }, sorting: { state: true }, walked: { state: true } };
  declare model?: PlaceModel;
  declare sorting: Sorting | null;
  /** Row that holds the keyboard, by station. */
  declare walked: string | null;

  constructor() {
    super();
    this.sorting = null;
    this.walked = null;
  }

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const figures = columns(model);
    const named = isNamed(model);
    const stations = sortedStations(model.stations, this.sorting);
    const candidates = sortedStations(model.candidates, this.sorting);
    const all = [...stations, ...candidates];
    const stop = [this.walked, model.selected?.id].find((id) => all.some((station) => station.id === id)) ?? all[0]?.id;
    const row = (station: PlaceStation) =>
      this.#row(station, figures, named, station.id === model.selected?.id, station.id === stop);
    return html`<table ${props({ "--sw-id-length": String(idLength(model)) })} class=${model.local ? "" : "wide"} role="grid" aria-label="Stations of ${model.layoutLabel}" @keydown=${this.#onKey}>
      <thead>
        <tr>
          ${this.#header("id", "Id", named ? "word id" : "word")}${named ? this.#header("name", "Name", "word") : nothing}${figures.map(
            ({ key, title }) => this.#header(key, title, key === "heightM" ? "height" : "figure"),
          )}
        </tr>
      </thead>
      <tbody>
        ${repeat(stations, ({ id }) => id, row)}
        ${
          candidates.length > 0
            ? html`<tr class="divider">
                  <td colspan=${named ? 5 : 4}>In no layout</td>
                </tr>
                ${repeat(candidates, ({ id }) => id, row)}`
            : nothing
        }
      </tbody>
    </table>`;
  }

  override updated(changed: PropertyValues): void {
    const before = changed.get("model") as PlaceModel | undefined;
    if (!changed.has("model") || before?.selected?.id === this.model?.selected?.id) return;
    this.walked = null;
    this.#rowOf(this.model?.selected?.id)?.scrollIntoView({ block: "nearest" });
  }

  #header(key: SortKey, title: string, classes: string) {
    const order = this.sorting?.key === key ? (this.sorting.descending ? "descending" : "ascending") : "none";
    const arrow = order === "none" ? "" : order === "ascending" ? " ↑" : " ↓";
    return html`<th class=${classes} scope="col" aria-sort=${order}>
      <button
        type="button"
        @click=${() => {
          this.sorting = nextSorting(this.sorting, key);
        }}
      >${title}${arrow}</button>
    </th>`;
  }

  #row(station: PlaceStation, figures: readonly Column[], named: boolean, selected: boolean, stop: boolean) {
    const decimals = figures.map(({ title, text }) => title + text(station)).join();
    return guard(
      [station, named, selected, stop, decimals],
      () => html`<tr
        class=${station.inLayout ? "" : "candidate"}
        data-id=${station.id}
        tabindex=${stop ? 0 : -1}
        aria-selected=${selected ? "true" : "false"}
        @click=${this.#onClick}
      >
        <td class="word" title=${station.id}>${station.id}</td>
        ${named ? html`<td class="word" title=${station.name}>${station.name}</td>` : nothing}
        ${figures.map(({ text }) => html`<td>${text(station)}</td>`)}
      </tr>`,
    );
  }

  #rowOf(id: string | undefined): HTMLTableRowElement | undefined {
    if (id === undefined) return undefined;
    return [...this.renderRoot.querySelectorAll<HTMLTableRowElement>("tr[data-id]")].find((row) => row.dataset.id === id);
  }

  #pick(row: HTMLElement | null | undefined): void {
    if (row?.dataset.id !== undefined) this.dispatchEvent(stationPick(row.dataset.id));
  }

  readonly #onClick = (event: Event): void => this.#pick(event.currentTarget as HTMLElement);

  readonly #onKey = (event: KeyboardEvent): void => {
    const row = (event.target as HTMLElement).closest<HTMLTableRowElement>("tr[data-id]");
    if (!row || event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.key === "Enter" || event.key === " ") this.#pick(row);
    else if (!this.#walk(row, event.key)) return;
    event.preventDefault();
    event.stopPropagation();
  };

  #walk(from: HTMLTableRowElement, key: string): boolean {
    const rows = [...this.renderRoot.querySelectorAll<HTMLTableRowElement>("tr[data-id]")];
    const at = rows.indexOf(from);
    const to = { ArrowUp: at - 1, ArrowDown: at + 1, Home: 0, End: rows.length - 1 }[key];
    if (to === undefined) return false;
    const row = rows[Math.min(rows.length - 1, Math.max(0, to))];
    this.walked = row.dataset.id ?? null;
    row.focus();
    return true;
  }
}

customElements.define("sw-station-table", StationTable);

declare global {
  interface HTMLElementTagNameMap {
    "sw-station-table": StationTable;
  }
}
