import { css } from "lit";

/** Start of every element: box sizes, type and the focus ring. The host is a block. */
export const base = css`
  *,
  *::before,
  *::after {
    box-sizing: border-box;
    margin: 0;
  }
  :host {
    display: block;
    font: 360 12.5px/18px var(--sw-font);
    font-variant-numeric: tabular-nums lining-nums;
    color: var(--sw-ink);
  }
  :host([hidden]) {
    display: none;
  }
  button,
  input,
  select {
    font: inherit;
    color: inherit;
    font-variant-numeric: inherit;
  }
  h2,
  h3 {
    font-size: 13px;
    font-weight: 560;
    line-height: 18px;
  }
  :focus-visible {
    outline: 2px solid var(--sw-accent);
    outline-offset: 2px;
  }
  .dim {
    color: var(--sw-ink-3);
  }
  .met {
    color: var(--sw-met);
  }
  .risk {
    color: var(--sw-risk);
  }
  .short {
    color: var(--sw-short);
  }
  .unseen {
    position: absolute;
    width: 1px;
    height: 1px;
    overflow: hidden;
    clip-path: inset(50%);
    white-space: nowrap;
  }
`;

/** Keys shown beside a word. */
export const keys = css`
  kbd {
    font: 400 10.5px var(--sw-font);
    color: var(--sw-ink-3);
  }
  @media (max-width: 1100px), (pointer: coarse) {
    kbd {
      display: none;
    }
  }
`;

/** `.button`, with `.outlined`, `.primary` or `[aria-pressed=true]`; unavailable with `aria-disabled` and a title that says why. */
export const buttons = css`
  .button {
    display: inline-flex;
    align-items: center;
    justify-content: center;
    gap: 6px;
    height: var(--sw-control-height);
    min-width: 24px;
    padding: 0 10px;
    border: 1px solid transparent;
    border-radius: var(--sw-radius);
    background: none;
    white-space: nowrap;
    font-weight: 420;
    text-decoration: none;
    color: inherit;
    cursor: pointer;
    transition: background-color var(--sw-state-time) var(--sw-ease);
  }
  .button:hover {
    background: var(--sw-sunken);
  }
  .button.outlined {
    border-color: var(--sw-edge);
  }
  .button.primary {
    background: var(--sw-ink);
    color: var(--sw-surface);
    font-weight: 480;
  }
  .button.primary kbd {
    color: inherit;
  }
  .button[aria-pressed="true"] {
    background: var(--sw-accent-wash);
    color: var(--sw-accent);
    font-weight: 520;
  }
  .button[aria-disabled="true"] {
    color: var(--sw-ink-3);
    cursor: default;
    background: none;
  }
  .button.outlined[aria-disabled="true"] {
    border-color: var(--sw-line);
  }
`;

/** `.field`: one box holding an input and its unit; `.wrong` adds the short border, the sentence goes beside it as `.fault`. */
export const fields = css`
  .field {
    display: inline-flex;
    align-items: center;
    height: var(--sw-field-height);
    border: 1px solid var(--sw-edge);
    border-radius: 5px;
    background: var(--sw-raised);
    padding: 0 var(--sw-field-padding, 8px);
    gap: var(--sw-field-gap, 4px);
  }
  .field input {
    border: 0;
    padding: 0;
    background: none;
    outline: none;
    font-weight: 500;
    min-width: 0;
    height: 100%;
    text-align: right;
  }
  .field .unit {
    color: var(--sw-ink-3);
    font-size: 11.5px;
    white-space: nowrap;
  }
  .field:focus-within {
    outline: 2px solid var(--sw-accent);
    outline-offset: 2px;
  }
  .field.wrong {
    border-color: var(--sw-short);
  }
  .fault {
    color: var(--sw-short);
    font-size: 11.5px;
    line-height: 16px;
  }
  select.field {
    appearance: none;
    padding-right: 22px;
    background-image: linear-gradient(45deg, transparent 50%, currentColor 50%), linear-gradient(135deg, currentColor 50%, transparent 50%);
    background-size: 4px 4px;
    background-position:
      right 11px center,
      right 7px center;
    background-repeat: no-repeat;
  }
`;

/** `.pane`: a flat panel with a header line; `.float`: what lies above the page. */
export const panes = css`
  .pane {
    background: var(--sw-surface);
    min-width: 0;
    min-height: 0;
    display: flex;
    flex-direction: column;
    padding: 12px 16px 10px;
  }
  .pane > header {
    display: flex;
    align-items: baseline;
    gap: 8px;
    margin-bottom: 8px;
    white-space: nowrap;
  }
  .pane > header .aside {
    margin-left: auto;
    color: var(--sw-ink-3);
    font-size: 11.5px;
  }
  .float {
    background: var(--sw-raised);
    border: 1px solid var(--sw-line);
    border-radius: var(--sw-radius-float);
    box-shadow: var(--sw-shadow);
  }
`;

/** Text and lines of figures drawn as SVG. */
export const figures = css`
  svg text {
    font-family: var(--sw-font);
    fill: var(--sw-ink-2);
    font-size: 10.5px;
    font-weight: 380;
    font-variant-numeric: tabular-nums;
  }
  svg .grid {
    stroke: var(--sw-line);
    stroke-width: 1;
    fill: none;
  }
  svg .axis {
    stroke: var(--sw-edge);
    stroke-width: 1;
    fill: none;
  }
  svg .halo {
    paint-order: stroke;
    stroke: var(--sw-halo);
    stroke-width: 4px;
    stroke-linejoin: round;
  }
`;
