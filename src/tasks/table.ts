import type { AssessJob } from "../assess/jobs.ts";
import type { RequirementOutcome } from "../assess/requirements.ts";
import type { AssessResult, Picture, PictureRequest, PreviewRequest } from "../assess/result.ts";
import type { SweepPoint, SweepSpec } from "../assess/sweep.ts";
import type { Plan } from "../plan/schema.ts";

/** Every message to a worker: name → [request, result]. Page, worker and terminal read this one table. */
export interface Tasks {
  /** One layout and observation, settled, with what a page draws. */
  picture: [PictureRequest, Picture];
  /** Nearest-cell picture while a station moves. The worker keeps counts between calls; a new `key` rebuilds them. */
  preview: [PreviewRequest, Picture | undefined];
  /** Every requirement of the plan for one layout. Results already at hand are not computed again. */
  ledger: [
    { readonly plan: Plan; readonly layout: string; readonly known: readonly AssessResult[] },
    readonly RequirementOutcome[],
  ];
  /** One layout and observation, figures alone: a point of a sweep. */
  assess: [AssessJob, AssessResult];
  /** One quantity set along one axis. Its points go to workers as `assess`. */
  sweep: [
    { readonly plan: Plan; readonly layout: string; readonly observation: string; readonly spec: SweepSpec },
    readonly SweepPoint[],
  ];
}
