import { assess } from "../assess/assess.ts";
import { picture } from "../assess/picture.ts";
import { PreviewSession } from "../assess/preview.ts";
import { judge } from "../assess/requirements.ts";
import type { Runners } from "./run.ts";

/** What a worker can do. A preview session is kept from call to call, so each worker makes its own set. */
export function runners(): Runners {
  const preview = new PreviewSession();
  return {
    picture: { run: (request, checkpoint) => picture(request, checkpoint), transfer: true },
    preview: { run: (request) => preview.picture(request), transfer: false },
    ledger: { run: ({ plan, layout, known }, checkpoint) => judge(plan, layout, known, checkpoint), transfer: false },
    assess: {
      run: ({ plan, layout, observation, options }, checkpoint) => assess(plan, layout, observation, options, checkpoint),
      transfer: false,
    },
  };
}
