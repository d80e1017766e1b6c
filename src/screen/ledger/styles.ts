import { css } from "lit";

/** The ledger: header, lines, plumb line and the box at its foot; the rail below 1100 px. */
export const ledgerStyles = css`
  :host {
    position: relative;
    display: flex;
    flex-direction: column;
    min-height: 0;
    background: var(--sw-surface);
    border-right: 1px solid var(--sw-line);
    overflow: hidden;
    --row: 68px;
  }
  .head {
    position: relative;
    flex: none;
    height: 80px;
    padding: 26px 0 0 16px;
  }
  .head h2 {
    font-size: 15px;
    line-height: 18px;
  }
  .head .open {
    position: absolute;
    left: 76px;
    top: 27px;
    font-size: 11px;
    line-height: 18px;
    color: var(--sw-ink-3);
  }
  .tally {
    display: flex;
    gap: 9px;
    margin-top: 5px;
    font-size: 11.5px;
    line-height: 16px;
    font-weight: 440;
    letter-spacing: -0.01em;
    white-space: nowrap;
    color: var(--sw-ink-3);
  }
  .tally span {
    display: inline-flex;
    align-items: center;
    gap: 4px;
  }
  .scale {
    position: absolute;
    right: 0;
    bottom: 0;
    width: 128px;
    height: 32px;
    font-size: 10.5px;
    line-height: 13px;
    color: var(--sw-ink-3);
  }
  .scale span {
    position: absolute;
    white-space: nowrap;
  }
  .scale .short-side {
    right: 96px;
    bottom: 4px;
  }
  .scale .hand {
    left: 45px;
    bottom: 17px;
  }
  .scale .five {
    left: 61.5px;
    bottom: 4px;
  }
  .scale .twenty {
    left: 80px;
    bottom: 4px;
  }
  .scale i {
    position: absolute;
    left: 38px;
    top: 2px;
    bottom: 0;
    width: 1px;
    background: var(--sw-ink);
  }
  .lines {
    flex: 0 1 auto;
    min-height: 0;
    overflow: hidden auto;
    scrollbar-width: thin;
    list-style: none;
    padding: 0;
  }
  .line {
    display: grid;
    grid-template: minmax(0, 1fr) / minmax(0, 1fr) 128px;
    width: 100%;
    height: var(--row);
    padding: 0 0 0 16px;
    border: 0;
    border-top: 1px solid var(--sw-line);
    background: none;
    text-align: left;
    cursor: pointer;
  }
  .line:focus-visible {
    outline-offset: -2px;
  }
  .line[aria-pressed="true"] {
    background: var(--sw-accent-wash);
  }
  .words {
    display: grid;
    grid-template-columns: minmax(0, 1fr) auto;
    align-content: center;
    row-gap: 1px;
    column-gap: 8px;
    padding-right: 11px;
    min-width: 0;
  }
  .words span {
    white-space: nowrap;
    overflow: hidden;
    text-overflow: ellipsis;
  }
  .title {
    font-weight: 500;
    letter-spacing: -0.005em;
  }
  .value {
    font-size: 17px;
    line-height: 18px;
    font-weight: 540;
    text-align: right;
  }
  .value small {
    font-size: 12px;
    font-weight: 420;
    margin-left: 2px;
  }
  .condition,
  .limit {
    font-size: 11px;
    line-height: 15px;
    color: var(--sw-ink-3);
  }
  .limit {
    text-align: right;
  }
  .words .state {
    grid-column: 1 / 3;
    display: flex;
    align-items: center;
    gap: 5px;
    font-size: 11.5px;
    line-height: 16px;
    font-weight: 480;
  }
  .state .brief,
  .rail-title {
    display: none;
  }
  .mark {
    flex: none;
  }
  .is-working .value,
  .is-working .state {
    color: var(--sw-ink-3);
  }
  .gauge {
    height: 100%;
    overflow: visible;
  }
  .gauge .guide {
    stroke: var(--sw-edge);
    stroke-dasharray: 1 4;
    opacity: 0.75;
  }
  .plumb {
    stroke: var(--sw-ink);
    stroke-width: 1.25;
  }
  .gauge .solid {
    fill: currentColor;
  }
  .gauge .hollow {
    fill: var(--sw-risk-wash);
    stroke: currentColor;
    stroke-width: 1.5;
  }
  .gauge .broken {
    stroke: currentColor;
    stroke-width: 9;
    stroke-dasharray: 3.6 1.8;
  }
  .gauge .pier {
    stroke: currentColor;
    stroke-width: 1.75;
  }
  .gauge .chevron {
    fill: none;
    stroke: currentColor;
    stroke-width: 1.5;
  }
  .gauge .working {
    fill: none;
    stroke: var(--sw-ink-3);
    stroke-dasharray: 2 2;
  }
  .gauge .was {
    stroke: var(--sw-ink-2);
    stroke-width: 1.25;
    stroke-dasharray: 2 2;
  }
  .bob {
    position: relative;
    flex: 1 0 36px;
    border-top: 1px solid var(--sw-line);
  }
  .bob svg {
    position: absolute;
    right: 0;
    top: 0;
  }
  .bob path {
    fill: var(--sw-ink);
  }
  .none {
    padding: 12px 16px;
    border-top: 1px solid var(--sw-line);
    color: var(--sw-ink-2);
  }
  .foot {
    flex: none;
    max-height: 45%;
    overflow: auto;
    padding: 10px 16px 12px;
    border-top: 1px solid var(--sw-line);
    background: var(--sw-sunken);
  }
  .foot header {
    display: flex;
    align-items: baseline;
    gap: 8px;
    min-height: 24px;
  }
  .foot header .button {
    margin-left: auto;
    margin-right: -8px;
    height: 24px;
    padding: 0 8px;
    align-self: center;
  }
  .foot header select.field {
    height: 24px;
    min-width: 0;
    flex: 1;
    margin-left: -8px;
    padding-left: 8px;
    border-color: transparent;
    background-color: transparent;
    font-size: 13px;
    font-weight: 560;
    text-overflow: ellipsis;
  }
  .foot header select.field:hover {
    border-color: var(--sw-edge);
  }
  .foot h3 {
    white-space: nowrap;
    overflow: hidden;
    text-overflow: ellipsis;
  }
  .foot p {
    font-size: 11.5px;
    line-height: 16px;
    color: var(--sw-ink-2);
  }
  .foot p + p {
    margin-top: 4px;
  }
  .foot .aside {
    color: var(--sw-ink-3);
    font-size: 11.5px;
    white-space: nowrap;
  }
  dl {
    display: grid;
    grid-template-columns: 84px 1fr;
    row-gap: 1px;
    margin-top: 2px;
    font-size: 11.5px;
    line-height: 16px;
  }
  dt {
    color: var(--sw-ink-3);
  }
  dd {
    margin: 0;
  }

  @media (max-width: 1500px) {
    :host {
      --row: 65px;
    }
  }
  @media (max-width: 1360px), (max-height: 820px) {
    :host {
      --row: 56px;
    }
    .head {
      height: 76px;
      padding-top: 24px;
    }
    .head .open {
      top: 25px;
    }
    .condition {
      display: none;
    }
    .words {
      row-gap: 2px;
      column-gap: 3px;
    }
    .words .state {
      grid-column: 1;
      grid-row: 2;
    }
    .limit {
      grid-column: 2;
      grid-row: 2;
    }
    .state .full {
      display: none;
    }
    .state .brief {
      display: inline;
    }
    .foot dl {
      display: none;
    }
  }
  @media (max-width: 1100px) {
    :host {
      --row: 60px;
    }
    .head {
      height: 44px;
      padding: 13px 0 0 12px;
    }
    .head h2 {
      font-size: 13px;
    }
    .tally,
    .head .open,
    .scale span,
    .state .brief {
      display: none;
    }
    /* Out of sight for want of room, still part of the line's name. */
    .line .words .title,
    .line .words .limit,
    .line .words .state .full {
      display: inline;
      position: absolute;
      width: 1px;
      height: 1px;
      clip-path: inset(50%);
    }
    .line {
      position: relative;
    }
    .scale {
      width: 56px;
      height: 8px;
    }
    .scale i {
      left: 11px;
      top: 0;
    }
    .line {
      grid-template-columns: minmax(0, 1fr) 56px;
      padding-left: 12px;
    }
    .words {
      grid-template-columns: minmax(0, 1fr);
      padding-right: 0;
      row-gap: 0;
    }
    .rail-title {
      display: block;
      font-size: 11px;
      line-height: 15px;
      color: var(--sw-ink-2);
    }
    .value {
      grid-row: 2;
      text-align: left;
      font-size: 13px;
    }
    .value small {
      font-size: 12px;
      margin-left: 1px;
    }
    .words .state {
      grid-row: 3;
    }
    .foot {
      padding: 8px 12px;
    }
    .foot header {
      flex-wrap: wrap;
    }
    .foot .aside {
      display: none;
    }
    .foot header .button {
      height: 44px;
      margin: 0 0 0 -8px;
    }
  }
`;
