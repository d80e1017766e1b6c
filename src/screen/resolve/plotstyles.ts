import { css } from "lit";

/** Curves and marks of the plots. */
export const plotStyles = css`
  .curve {
    fill: none;
    stroke: var(--sw-ink);
    stroke-width: 1.75;
    stroke-linejoin: round;
  }
  .curve.second {
    stroke: var(--sw-layout-3);
    stroke-width: 1.5;
    stroke-dasharray: 3 2.5;
  }
  .curve.other {
    stroke: var(--sw-ink-3);
    stroke-width: 1.25;
    stroke-dasharray: 4 3;
  }
  svg text.name {
    fill: var(--sw-ink);
    font-size: 11px;
    font-weight: 520;
  }
  svg text.name.second {
    fill: var(--sw-layout-3);
  }
  svg text.name.other {
    fill: var(--sw-ink-2);
    font-weight: 400;
  }
  svg text.target {
    fill: var(--sw-accent);
    font-size: 11px;
    font-weight: 520;
  }
  svg text.halo {
    stroke: var(--sw-surface);
  }
  svg text.below {
    fill: var(--sw-ink-3);
  }
  .target-line {
    stroke: var(--sw-accent);
    stroke-width: 1.5;
  }
  .target-dot {
    fill: var(--sw-accent);
    stroke: var(--sw-surface);
    stroke-width: 1.5;
  }
  .hatch {
    stroke: var(--sw-edge);
    stroke-width: 1;
    opacity: 0.45;
  }
  .between {
    fill: var(--sw-ink);
    opacity: 0.09;
  }
  .band {
    fill: var(--sw-met);
    opacity: 0.14;
  }
  svg text.limit {
    fill: var(--sw-met);
    font-size: 11px;
    font-weight: 480;
  }
`;
