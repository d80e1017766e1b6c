import { html, type SVGTemplateResult, svg, type TemplateResult } from "lit";

/** Three pegs and their three baselines. */
export const wordmark = html`<svg class="wordmark" width="30" height="18" viewBox="0 0 30 18" fill="none" stroke-width="1.5" stroke-linecap="round" aria-hidden="true">
  <path class="near" d="M3 14.5A4 4.6 0 0 1 11 14.5M11 14.5A8 8.4 0 0 1 27 14.5"></path>
  <path class="far" d="M3 14.5A12 12.8 0 0 1 27 14.5"></path>
  <circle cx="3" cy="14.5" r="2.3"></circle><circle cx="11" cy="14.5" r="2.3"></circle><circle cx="27" cy="14.5" r="2.3"></circle>
</svg>`;

type State = "met" | "at risk" | "not met" | "cannot be computed" | "working";

const shapes: { readonly [S in State]: SVGTemplateResult } = {
  met: svg`<path d="M1.5 2.8H15.5" stroke-width="2.6"></path><path d="M3.6 3V11M13.4 3V11" stroke-width="1.7"></path>`,
  "at risk": svg`<path d="M1.5 2.2Q8.5 10 15.5 2.2" stroke-width="2.1"></path><path d="M3.2 4.2V11M13.8 4.2V11" stroke-width="1.7"></path>`,
  "not met": svg`<path d="M1.5 2.8H5.6M11.4 2.8H15.5" stroke-width="2.6"></path><path d="M3.6 3V11M13.4 3V11" stroke-width="1.7"></path><path d="M7.2 8.2L9.8 10.8M9.8 8.2L7.2 10.8" stroke-width="1.4"></path>`,
  // The deck is not laid: two piers alone.
  "cannot be computed": svg`<path d="M3.6 3V11M13.4 3V11" stroke-width="1.7"></path>`,
  working: svg`<path d="M1.5 2.8H15.5" stroke-width="2" stroke-linecap="butt" stroke-dasharray="2.2 1.8"></path>`,
};

/** A deck on two piers: whole, sagging, or broken with a small cross. */
export const stateMark = (state: State): TemplateResult =>
  html`<svg class="mark" width="17" height="12" viewBox="0 0 17 12" fill="none" stroke="currentColor" stroke-linecap="round" aria-hidden="true">${shapes[state]}</svg>`;

/** Class of the colour a state is written in. */
export const stateClass = (state: State): string =>
  ({ met: "met", "at risk": "risk", "not met": "short", "cannot be computed": "dim", working: "dim" })[state];
