import { css, html, LitElement, nothing } from "lit";
import type { AssessResult } from "../../assess/result.ts";
import type { Observation } from "../../plan/schema.ts";
import { allFigures } from "../../view/resolve/allfigures.ts";
import { base, buttons, panes } from "../shared.ts";

/** A button that opens every figure of the result, with its notes, over the page. */
export class FiguresButton extends LitElement {
  static override properties = { result: { attribute: false }, observation: { attribute: false } };
  declare result?: AssessResult;
  declare observation?: Observation;

  static override styles = [
    base,
    buttons,
    panes,
    css`
      :host {
        margin-left: auto;
      }
      .button {
        height: 24px;
        padding: 0 8px;
      }
      .open {
        height: 20px;
        margin: -3px -8px;
        padding: 0 8px;
        gap: 0;
        font-size: 11.5px;
        color: var(--sw-ink-2);
        text-decoration: underline;
        text-underline-offset: 3px;
        text-decoration-color: var(--sw-edge);
      }
      .sheet {
        position: fixed;
        inset: 56px 16px 16px auto;
        width: min(680px, calc(100vw - 32px));
        height: auto;
        max-height: calc(100vh - 72px);
        margin: 0;
        padding: 12px 16px 16px;
        overflow: auto;
        color: inherit;
      }
      header {
        display: flex;
        align-items: center;
        margin-bottom: 4px;
      }
      header .button {
        margin-left: auto;
      }
      table {
        width: 100%;
        border-collapse: collapse;
        font-size: 11.5px;
        line-height: 16px;
      }
      caption {
        text-align: left;
        font-size: 12.5px;
        font-weight: 500;
        padding: 10px 0 3px;
      }
      th,
      td {
        padding: 3px 12px 3px 0;
        text-align: left;
        vertical-align: baseline;
        border-top: 1px solid var(--sw-line);
        font-weight: 380;
      }
      th {
        width: 27%;
        color: var(--sw-ink-2);
      }
      td:nth-child(2) {
        width: 27%;
        font-weight: 500;
      }
      td:nth-child(3) {
        color: var(--sw-ink-3);
        padding-right: 0;
      }
      ul {
        padding-left: 16px;
        font-size: 11.5px;
        line-height: 16px;
        color: var(--sw-ink-2);
      }
      @media (max-width: 1100px), (pointer: coarse) {
        .button {
          height: 44px;
        }
        .open {
          margin: -14px -8px;
        }
      }
    `,
  ];

  override render() {
    const { result, observation } = this;
    if (!result || !observation) return nothing;
    const { warnings } = result;
    const notes = warnings.length === 0 ? "" : `, ${warnings.length} ${warnings.length === 1 ? "note" : "notes"}`;
    return html`<button class="button open" popovertarget="sheet">All figures<span>${notes}</span></button>
      <div class="sheet float" id="sheet" popover role="dialog" aria-label="All figures">
        <header>
          <h2>All figures</h2>
          <button class="button" popovertarget="sheet" popovertargetaction="hide">Close</button>
        </header>
        ${
          warnings.length > 0
            ? html`<ul>
                ${warnings.map((w) => html`<li>${w.charAt(0).toUpperCase() + w.slice(1)}.</li>`)}
              </ul>`
            : nothing
        }
        ${allFigures(result, observation).map(
          (group) => html`<table>
            <caption>${group.title}</caption>
            <tbody>${group.rows.map(([name, value, meaning]) => html`<tr><th scope="row">${name}</th><td>${value}</td><td>${meaning}</td></tr>`)}</tbody>
          </table>`,
        )}
      </div>`;
  }
}

customElements.define("sw-figures-button", FiguresButton);
