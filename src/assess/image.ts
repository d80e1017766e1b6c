import type { Checkpoint } from "../base/checkpoint.ts";
import { DomainError } from "../base/errors.ts";
import type { Plan } from "../plan/schema.ts";
import { assessment } from "./assess.ts";
import { axisCuts } from "./cuts.ts";
import type { AssessResult, BeamCut } from "./result.ts";

/** The settled beam at full precision, with the figures read from it. */
export interface FullBeam {
  readonly result: AssessResult;
  readonly size: number;
  readonly pixelRad: number;
  /** (size, size): l east = (x − size/2)·pixelRad, m north = (y − size/2)·pixelRad at `size * y + x`; 1 at the centre. */
  readonly values: Float64Array;
  readonly cuts: { readonly major: BeamCut; readonly minor: BeamCut } | null;
}

/** @throws {@link DomainError} for an id the plan does not have, and where there is no beam to show. */
export async function beamImage(plan: Plan, layoutId: string, observationId: string, checkpoint?: Checkpoint): Promise<FullBeam> {
  const { result, beam } = await assessment(plan, layoutId, observationId, {}, checkpoint);
  if (!beam) {
    throw new DomainError(
      "beam",
      `of layout ${layoutId}, observation ${observationId}`,
      "at least one sample away from the uv centre",
      result.warnings[0],
    );
  }
  return { result, size: beam.image.size, pixelRad: beam.image.xl, values: beam.image.values, cuts: axisCuts(beam) };
}
