import { css } from "lit";

/**
 * The page's design tokens, adopted once by the document; custom properties reach every shadow root.
 * First the primitives (a colour and its two theme values), then the roles that elements use. Elements never name a primitive.
 */
export const tokens = css`
  :root {
    --sw-paper-0: #ffffff;
    --sw-paper-1: #fafbf9;
    --sw-paper-2: #f0f3f0;
    --sw-paper-3: #e6ebe7;
    --sw-paper-line: #d6ddd8;
    --sw-slate-9: #090e0d;
    --sw-slate-8: #0d1412;
    --sw-slate-7: #111816;
    --sw-slate-6: #19221f;
    --sw-slate-line: #25302c;
    --sw-moss-9: #14201d;
    --sw-moss-7: #43514c;
    --sw-moss-6: #5c6964;
    --sw-moss-4: #7c8984;
    --sw-mist-1: #e8eeea;
    --sw-mist-3: #b3beb9;
    --sw-mist-5: #8f9b96;
    --sw-mist-6: #6b7873;
    --sw-iris-6: #4a3fc4;
    --sw-iris-1: #ebeafa;
    --sw-iris-3: #aba4ff;
    --sw-iris-9: #25244a;
    --sw-teal-7: #0a7272;
    --sw-teal-1: #d5ebe7;
    --sw-teal-3: #68dedb;
    --sw-teal-9: #123b36;
    --sw-ochre-7: #885800;
    --sw-ochre-1: #f8e6c4;
    --sw-ochre-3: #f6be52;
    --sw-ochre-9: #40300f;
    --sw-wine-7: #8f0b30;
    --sw-wine-1: #fadfe3;
    --sw-wine-3: #f3657d;
    --sw-wine-9: #4a1b24;
    --sw-rust-6: #b4501c;
    --sw-rust-3: #f0935e;
    --sw-sky-6: #1f74b8;
    --sw-sky-3: #6db6f2;
    --sw-earth-7: #7b4e24;
    --sw-earth-3: #ddae78;

    --sw-font: "Geologica Variable", "Segoe UI", system-ui, "DejaVu Sans", sans-serif;
    --sw-space-1: 4px;
    --sw-space-2: 8px;
    --sw-space-3: 12px;
    --sw-space-4: 16px;
    --sw-space-5: 24px;
    --sw-space-6: 32px;
    --sw-radius: 6px;
    --sw-radius-float: 8px;
    --sw-radius-image: 2px;
    --sw-ease: cubic-bezier(0.2, 0.7, 0.2, 1);
    --sw-state-time: 120ms;
    --sw-pane-time: 180ms;
    --sw-control-height: 28px;
    --sw-field-height: 26px;
    --sw-ledger-width: 356px;
    --sw-bar-height: 48px;
  }

  :root,
  [data-theme="light"] {
    color-scheme: light;
    --sw-desk: var(--sw-paper-3);
    --sw-surface: var(--sw-paper-1);
    --sw-raised: var(--sw-paper-0);
    --sw-sunken: var(--sw-paper-2);
    --sw-ink: var(--sw-moss-9);
    --sw-ink-2: var(--sw-moss-7);
    --sw-ink-3: var(--sw-moss-6);
    --sw-line: var(--sw-paper-line);
    --sw-edge: var(--sw-moss-4);
    --sw-accent: var(--sw-iris-6);
    --sw-accent-wash: var(--sw-iris-1);
    --sw-met: var(--sw-teal-7);
    --sw-met-wash: var(--sw-teal-1);
    --sw-risk: var(--sw-ochre-7);
    --sw-risk-wash: var(--sw-ochre-1);
    --sw-short: var(--sw-wine-7);
    --sw-short-wash: var(--sw-wine-1);
    --sw-layout-1: var(--sw-moss-9);
    --sw-layout-2: var(--sw-rust-6);
    --sw-layout-3: var(--sw-sky-6);
    --sw-layout-4: var(--sw-moss-4);
    --sw-trench: var(--sw-earth-7);
    --sw-halo: var(--sw-paper-1);
    --sw-veil: var(--sw-paper-3);
    --sw-ellipse: var(--sw-moss-9);
    --sw-beam-zero: #f9fbf6;
    --sw-density-zero: #f6fbfc;
    --sw-shadow: 0 1px 2px #14201d14, 0 8px 28px #14201d1f;
  }

  [data-theme="dark"] {
    color-scheme: dark;
    --sw-desk: var(--sw-slate-9);
    --sw-surface: var(--sw-slate-7);
    --sw-raised: var(--sw-slate-6);
    --sw-sunken: var(--sw-slate-8);
    --sw-ink: var(--sw-mist-1);
    --sw-ink-2: var(--sw-mist-3);
    --sw-ink-3: var(--sw-mist-5);
    --sw-line: var(--sw-slate-line);
    --sw-edge: var(--sw-mist-6);
    --sw-accent: var(--sw-iris-3);
    --sw-accent-wash: var(--sw-iris-9);
    --sw-met: var(--sw-teal-3);
    --sw-met-wash: var(--sw-teal-9);
    --sw-risk: var(--sw-ochre-3);
    --sw-risk-wash: var(--sw-ochre-9);
    --sw-short: var(--sw-wine-3);
    --sw-short-wash: var(--sw-wine-9);
    --sw-layout-1: var(--sw-mist-1);
    --sw-layout-2: var(--sw-rust-3);
    --sw-layout-3: var(--sw-sky-3);
    --sw-layout-4: var(--sw-mist-5);
    --sw-trench: var(--sw-earth-3);
    --sw-halo: var(--sw-slate-8);
    --sw-veil: var(--sw-slate-9);
    --sw-ellipse: #ffffff;
    --sw-beam-zero: #0d1412;
    --sw-density-zero: #0d1414;
    --sw-shadow: 0 1px 2px #0008, 0 10px 30px #0009;
  }

  @media (max-width: 1500px) {
    :root {
      --sw-ledger-width: 340px;
    }
  }
  @media (max-width: 1360px), (max-height: 820px) {
    :root {
      --sw-ledger-width: 318px;
    }
  }
  /* The rail: a tablet, or a screen magnified until it is as narrow as one. */
  @media (max-width: 1100px) {
    :root {
      --sw-ledger-width: 148px;
      --sw-control-height: 44px;
      --sw-field-height: 44px;
    }
  }
  @media (pointer: coarse) {
    :root {
      --sw-control-height: 44px;
      --sw-field-height: 44px;
    }
  }
  @media (prefers-reduced-motion: reduce) {
    :root {
      --sw-state-time: 0ms;
      --sw-pane-time: 0ms;
    }
  }
`;

export type { Theme } from "../view/colour.ts";
