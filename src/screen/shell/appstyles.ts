import { css } from "lit";

/** The frame of the page and what floats over it. */
export const appStyles = css`
      :host {
        height: 100%;
        display: grid;
        grid-template: var(--sw-bar-height) minmax(0, 1fr) / var(--sw-ledger-width) minmax(0, 1fr);
      }
      sw-top-bar {
        grid-column: 1 / 3;
      }
      main {
        position: relative;
        min-width: 0;
        min-height: 0;
        background: var(--sw-desk);
      }
      .unbuilt {
        height: 100%;
        background: var(--sw-sunken);
        display: grid;
        place-content: center;
        padding: 24px;
      }
      .unbuilt h2 {
        font-size: 20px;
        line-height: 26px;
      }
      .unbuilt p {
        max-width: 52ch;
        margin-top: 6px;
        color: var(--sw-ink-2);
        font-size: 13px;
        line-height: 20px;
      }
      .notice {
        position: absolute;
        top: 12px;
        left: 50%;
        transform: translateX(-50%);
        z-index: 10;
        max-width: min(720px, calc(100% - 32px));
        max-height: calc(100% - 24px);
        overflow: auto;
        padding: 10px 14px;
      }
      .notice header {
        display: flex;
        align-items: center;
        gap: 16px;
      }
      .notice header .button {
        margin-left: auto;
      }
      .notice ul {
        padding-left: 16px;
        margin-top: 4px;
        font-size: 12px;
        line-height: 18px;
        color: var(--sw-ink-2);
        overflow-wrap: anywhere;
      }
      .sheet {
        inset: 56px 16px auto auto;
        position: fixed;
        margin: 0;
        width: 380px;
        max-width: calc(100vw - 32px);
        max-height: calc(100vh - 72px);
        overflow: auto;
        padding: 12px 16px 16px;
        color: inherit;
      }
      .sheet .top {
        display: flex;
        align-items: center;
      }
      .sheet .top .button {
        margin-left: auto;
      }
      .keys dl {
        display: grid;
        grid-template-columns: max-content 1fr;
        gap: 4px 16px;
        margin: 6px 0 12px;
      }
      .keys dt {
        color: var(--sw-ink-2);
      }
      .keys dd {
        margin: 0;
      }
      .keys label {
        display: flex;
        align-items: center;
        gap: 8px;
        min-height: 24px;
      }
      .keys input {
        accent-color: var(--sw-ink);
        width: 16px;
        height: 16px;
      }
      .cautions ul {
        margin: 8px 0 0;
        padding-left: 16px;
        color: var(--sw-ink-2);
        line-height: 18px;
      }
      .cautions li + li {
        margin-top: 6px;
      }
      .drop {
        position: absolute;
        inset: 12px;
        z-index: 15;
        display: grid;
        place-content: center;
        border: 2px dashed var(--sw-accent);
        border-radius: var(--sw-radius-float);
        background: var(--sw-accent-wash);
        color: var(--sw-accent);
        font-size: 15px;
        font-weight: 560;
        pointer-events: none;
      }
    `;
