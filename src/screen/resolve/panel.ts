import { css, html, LitElement, type TemplateResult } from "lit";
import type { TextEquivalent } from "../../view/resolve/figure.ts";
import { base, buttons, fields, figures, keys, panes } from "../shared.ts";
import type { ResolveModel } from "./model.ts";

const panelStyles = css`
  :host {
    min-width: 0;
    min-height: 0;
    background: var(--sw-surface);
  }
  .pane {
    height: 100%;
  }
  .pane > header {
    min-height: 20px;
    overflow: hidden;
  }
  .pane > header h2 {
    flex: none;
  }
  .pane > header .aside {
    overflow: hidden;
    text-overflow: ellipsis;
  }
  .area {
    position: relative;
    flex: 1;
    min-width: 0;
    min-height: 0;
    display: grid;
    place-items: start center;
    overflow: hidden;
  }
  .square {
    position: relative;
    border-radius: var(--sw-radius-image);
    overflow: hidden;
  }
  .square canvas,
  .square svg,
  .area > svg {
    position: absolute;
    inset: 0;
    width: 100%;
    height: 100%;
    display: block;
  }
  .keys {
    display: flex;
    align-items: center;
    gap: 4px 10px;
    flex-wrap: wrap;
    margin-top: 8px;
    min-height: 20px;
    font-size: 11.5px;
    line-height: 16px;
    color: var(--sw-ink-2);
  }
  .keys b {
    color: var(--sw-ink);
    font-weight: 520;
  }
  .waiting {
    color: var(--sw-ink-3);
    align-self: start;
    justify-self: start;
  }
  :host([behind]) .area :is(canvas, svg) {
    opacity: 0.55;
    transition: opacity var(--sw-state-time) var(--sw-ease);
  }
  .pane > header .strong {
    color: var(--sw-ink);
    font-weight: 560;
    font-size: 12.5px;
  }
  .pane > header .small {
    height: 20px;
    margin: -3px 0;
    padding: 0 6px;
    font-size: 11.5px;
  }
  [hidden] {
    display: none;
  }
  @media (max-width: 1360px), (max-height: 820px) {
    .pane {
      padding: 10px 12px 8px;
    }
    .pane > header .extra {
      display: none;
    }
  }
`;

/** One panel of the Resolve task: a header, a figure and the same figure in words and numbers. */
export abstract class Panel extends LitElement {
  static override properties = { model: { attribute: false } };
  declare model?: ResolveModel;
  static override styles = [base, keys, buttons, fields, panes, figures, panelStyles];

  override updated(): void {
    this.toggleAttribute("behind", this.model?.working ?? false);
  }

  /** In place of a figure that is not there yet, or cannot be. */
  protected waiting(): TemplateResult {
    const picture = this.model?.picture;
    if (!picture) return html`<p class="waiting">Working</p>`;
    return html`<p class="waiting">Cannot be drawn: ${picture.result.warnings[0] ?? "there are no samples"}.</p>`;
  }

  protected words(name: string, text: TextEquivalent): TemplateResult {
    return html`<div class="unseen">
      <table>
        <caption>${name}: ${text.summary}</caption>
        <thead><tr>${text.columns.map((c) => html`<th scope="col">${c}</th>`)}</tr></thead>
        <tbody>${text.rows.map((row) => html`<tr>${row.map((cell, k) => (k === 0 ? html`<th scope="row">${cell}</th>` : html`<td>${cell}</td>`))}</tr>`)}</tbody>
      </table>
    </div>`;
  }
}
