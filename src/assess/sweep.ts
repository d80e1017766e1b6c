import type { Checkpoint } from "../base/checkpoint.ts";
import { SPEED_OF_LIGHT } from "../base/constants.ts";
import { DomainError } from "../base/errors.ts";
import { observationById } from "../plan/find.ts";
import type { Observation, Plan } from "../plan/schema.ts";
import type { AssessOptions } from "./assess.ts";
import { type Assessor, inTurn } from "./jobs.ts";
import type { AssessResult } from "./result.ts";

export type SweepAxis = "declination" | "wavelength" | "frequency" | "hours";

/** Points of one axis. Units: declination in degrees, wavelength in metres, frequency in hertz, hours = length of the window in hours. */
export interface SweepSpec {
  readonly axis: SweepAxis;
  readonly values: readonly number[];
}

export interface SweepPoint {
  readonly at: number;
  readonly result: AssessResult;
}

/** More points than this are a mistake in the step, not a question. */
const MOST_POINTS = 10_000;

/**
 * From … to in equal steps, both ends included when the step divides the range (to a billionth of a step).
 *
 * @throws {@link DomainError} for a step that is zero or leads away, or more than 10 000 points.
 */
export function sweepValues(from: number, to: number, step: number): number[] {
  const count = Math.floor((to - from) / step + 1e-9) + 1;
  if (!(step !== 0 && count >= 1)) throw new DomainError("step", step, `a step that leads from ${from} to ${to}`);
  if (count > MOST_POINTS) throw new DomainError("step", step, `at most ${MOST_POINTS} points from ${from} to ${to}`);
  return Array.from({ length: count }, (_, k) => from + k * step);
}

/** An observation with one thing changed. A window of other length keeps its middle. */
export function varied(observation: Observation, axis: SweepAxis, at: number): Observation {
  switch (axis) {
    case "declination":
      if (!(Math.abs(at) <= 90)) throw new DomainError("declination", at, "a declination in [-90, 90] degrees");
      return { ...observation, declinationDeg: at };
    case "frequency":
    case "wavelength": {
      const frequencyHz = axis === "frequency" ? at : SPEED_OF_LIGHT / at;
      if (!(frequencyHz >= 1e3 && frequencyHz <= 1e13)) throw new DomainError(axis, at, "a frequency in [1000, 1e13] hertz");
      // The relative bandwidth is kept, so that a sweep over decades stays an observation that can be made.
      return { ...observation, frequencyHz, bandwidthHz: (observation.bandwidthHz * frequencyHz) / observation.frequencyHz };
    }
    case "hours": {
      const { fromH, toH } = observation.hourAngle;
      const middle = (fromH + toH) / 2;
      if (!(at >= 0 && at <= 24 && middle - at / 2 >= -12 && middle + at / 2 <= 12)) {
        throw new DomainError("hours", at, `a window about ${middle} h that stays in [-12, 12] hours`);
      }
      return { ...observation, hourAngle: { ...observation.hourAngle, fromH: middle - at / 2, toH: middle + at / 2 } };
    }
  }
}

/** The plan with one observation replaced by a varied copy of itself. */
export function variedPlan(plan: Plan, observationId: string, axis: SweepAxis, at: number): Plan {
  const wanted = varied(observationById(plan, observationId), axis, at);
  return { ...plan, observations: plan.observations.map((o) => (o.id === observationId ? wanted : o)) };
}

/**
 * Results along one axis, in the order of its points.
 *
 * @param run - Who does the work: one after the other here, or a pool of workers; the results are the same.
 */
export async function sweep(
  plan: Plan,
  layoutId: string,
  observationId: string,
  spec: SweepSpec,
  checkpoint?: Checkpoint,
  options: AssessOptions = {},
  run: Assessor = inTurn,
): Promise<readonly SweepPoint[]> {
  const jobs = spec.values.map((at) => ({
    plan: variedPlan(plan, observationId, spec.axis, at),
    layout: layoutId,
    observation: observationId,
    options,
  }));
  const results = await run(jobs, checkpoint);
  return results.map((result, k) => ({ at: spec.values[k], result }));
}
