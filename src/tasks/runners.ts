import { picture } from "../assess/picture.ts";
import { PreviewSession } from "../assess/preview.ts";
import { judge } from "../assess/requirements.ts";
import { sweep } from "../assess/sweep.ts";
import type { Runners } from "./run.ts";

/** What a worker can do. A preview session is kept from call to call, so each worker makes its own set. */
export function runners(): Runners {
  const preview = new PreviewSession();
  return {
    picture: { run: (request, checkpoint) => picture(request, checkpoint), transfer: true },
    preview: { run: (request) => preview.picture(request), transfer: false },
    ledger: { run: ({ plan, layout, known }, checkpoint) => judge(plan, layout, known, checkpoint), transfer: false },
    sweep: {
      run: ({ plan, layout, observation, spec }, checkpoint) => sweep(plan, layout, observation, spec, checkpoint),
      transfer: false,
    },
  };
}
