import type { Checkpoint } from "../base/checkpoint.ts";
import type { Plan } from "../plan/schema.ts";
import { type AssessOptions, assess } from "./assess.ts";
import type { AssessResult } from "./result.ts";

/** One layout and observation to be assessed. */
export interface AssessJob {
  readonly plan: Plan;
  readonly layout: string;
  readonly observation: string;
  readonly options: AssessOptions;
}

/** Assesses jobs, each by itself, and hands the results back in the order of the jobs. */
export type Assessor = (jobs: readonly AssessJob[], checkpoint?: Checkpoint) => Promise<readonly AssessResult[]>;

/** One after the other, where it is called. */
export const inTurn: Assessor = async (jobs, checkpoint) => {
  const results: AssessResult[] = [];
  for (const [k, { plan, layout, observation, options }] of jobs.entries()) {
    results.push(await assess(plan, layout, observation, options, (done) => checkpoint?.((k + done) / jobs.length)));
  }
  return results;
};
