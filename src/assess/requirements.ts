import type { Checkpoint } from "../base/checkpoint.ts";
import type { Plan, Requirement } from "../plan/schema.ts";
import { type AssessOptions, assess } from "./assess.ts";
import type { AssessResult } from "./result.ts";
import { sweepValues, variedPlan } from "./sweep.ts";

/** What became of one requirement for one layout. */
export interface RequirementOutcome {
  readonly id: string;
  readonly layout: string;
  /** Where the value is from: the worst of those the requirement speaks of. */
  readonly observation: string | null;
  readonly state: "met" | "at risk" | "not met" | "cannot be computed";
  readonly value: number | null;
  readonly limit: number;
  readonly sense: "atMost" | "atLeast";
  /** (limit − value)/|limit| for at most, the reverse for at least; absolute where the limit is 0. */
  readonly margin: number | null;
  /** Why it cannot be computed, or at which point of a range it is worst. */
  readonly note: string | null;
}

/**
 * Judges every requirement that speaks of a layout.
 *
 * Where it names no observation, all of the plan's count; with a range, every point; the worst value counts and is named.
 *
 * @param known - Results already at hand; what they do not hold is computed.
 */
export async function judge(
  plan: Plan,
  layoutId: string,
  known: readonly AssessResult[],
  checkpoint?: Checkpoint,
): Promise<readonly RequirementOutcome[]> {
  const bench = new Bench(plan, layoutId, known);
  const lines = plan.requirements.filter((r) => !r.when.layouts || r.when.layouts.includes(layoutId));
  const outcomes: RequirementOutcome[] = [];
  for (const [k, line] of lines.entries()) {
    const part = (done: number): Promise<void> | void => checkpoint?.((k + done) / lines.length);
    outcomes.push(await judgeOne(line, bench, part));
    await checkpoint?.((k + 1) / lines.length);
  }
  return outcomes;
}

/** Results by what was asked, so that no two requirements compute the same thing. */
class Bench {
  readonly plan: Plan;
  readonly layoutId: string;
  private readonly results = new Map<string, AssessResult>();

  constructor(plan: Plan, layoutId: string, known: readonly AssessResult[]) {
    this.plan = plan;
    this.layoutId = layoutId;
    for (const result of known) {
      if (result.layout === layoutId && !result.pair) this.results.set(key(result.observation, null, {}), result);
    }
  }

  async result(observation: string, point: Point | null, options: AssessOptions, checkpoint?: Checkpoint): Promise<AssessResult> {
    const name = key(observation, point, options);
    let result = this.results.get(name);
    if (!result) {
      const plan = point ? variedPlan(this.plan, observation, point.axis, point.at) : this.plan;
      result = await assess(plan, this.layoutId, observation, options, checkpoint);
      this.results.set(name, result);
    }
    return result;
  }
}

interface Point {
  readonly axis: "declination" | "wavelength";
  readonly at: number;
}

const key = (observation: string, point: Point | null, options: AssessOptions): string =>
  JSON.stringify([observation, point, options.pair ?? null, options.sidelobeRadiusArcsec ?? null]);

async function judgeOne(line: Requirement, bench: Bench, checkpoint: Checkpoint): Promise<RequirementOutcome> {
  const { when } = line;
  const sense = line.atMost === null ? "atLeast" : "atMost";
  const limit = (line.atMost ?? line.atLeast) as number;
  const cannot = (note: string, observation: string | null = null): RequirementOutcome => ({
    id: line.id,
    layout: bench.layoutId,
    observation,
    state: "cannot be computed",
    value: null,
    limit,
    sense,
    margin: null,
    note,
  });
  if (line.atMost !== null && line.atLeast !== null) return cannot("not judged yet with both limits: write two lines");
  if (when.without) return cannot("not computed yet: the loss of stations");
  if (when.aboveElevationDeg !== undefined) return cannot("not computed yet: hours above an elevation");
  const observations = bench.plan.observations.map((o) => o.id).filter((id) => !when.observation || id === when.observation);
  if (observations.length === 0) return cannot(`the plan has no observation ${when.observation}`);
  const points = rangePoints(line);
  const options: AssessOptions = { pair: when.pair ?? null, sidelobeRadiusArcsec: when.sidelobeRadiusArcsec ?? null };
  let worst: { value: number; observation: string; point: Point | null } | undefined;
  let done = 0;
  for (const observation of observations) {
    for (const point of points) {
      const result = await bench.result(observation, point, options, (part) =>
        checkpoint((done + part) / (observations.length * points.length)),
      );
      done++;
      const value = judgedValue(result, line.quantity);
      if (value === undefined) return cannot(`not computed yet: ${line.quantity}`, observation);
      if (value === null) return cannot(reasonFor(result, line.quantity, point), observation);
      if (!worst || (sense === "atMost" ? value > worst.value : value < worst.value)) worst = { value, observation, point };
    }
  }
  if (!worst) return cannot("its range has no points");
  const margin = marginOf(worst.value, limit, sense);
  return {
    id: line.id,
    layout: bench.layoutId,
    observation: worst.observation,
    state: margin < 0 ? "not met" : margin < line.margin ? "at risk" : "met",
    value: worst.value,
    limit,
    sense,
    margin,
    note: worst.point ? `worst at ${worst.point.axis} ${pointText(worst.point)}` : null,
  };
}

function rangePoints(line: Requirement): readonly (Point | null)[] {
  const { declinationDeg, wavelengthM } = line.when;
  if (declinationDeg) {
    return sweepValues(declinationDeg.from, declinationDeg.to, declinationDeg.step).map((at) => ({ axis: "declination", at }));
  }
  if (wavelengthM) {
    return sweepValues(wavelengthM.from, wavelengthM.to, wavelengthM.step).map((at) => ({ axis: "wavelength", at }));
  }
  return [null];
}

const pointText = (point: Point): string => (point.axis === "declination" ? `${point.at}°` : `${point.at} m`);

/** A blended pair has no dip, which falls short of any: a line about the dip is not met, rather than not computable. */
function judgedValue(result: AssessResult, quantity: string): number | null | undefined {
  return quantity === "pair.dip" && result.pair?.verdict === "blended" ? 0 : quantityOf(result, quantity);
}

/** Which warning explains that a quantity is null: the first pair whose parts both match. */
const REASONS: readonly (readonly [quantity: RegExp, warning: RegExp])[] = [
  [/./, /no samples|has one station/],
  [/^(noiseJy|brightnessNoiseK)$/, /has no receiver/],
  [/^(beam\.(major|minor|axis|position)|smearing|brightness)/, /no fitted ellipse/],
  [/^beam\.firstZero/, /fall to zero/],
  [/^beam\.firstMinimum/, /no first minimum/],
  [/Sidelobe$/, /beyond the main lobe|one place|uv samples/],
  [/^(largestScale|recoverable)/, /projected baseline has no length/],
  [/^pair/, /apart, which the image does not cover/],
];

function reasonFor(result: AssessResult, quantity: string, point: Point | null): string {
  const explains = (warning: string): boolean => REASONS.some(([q, w]) => q.test(quantity) && w.test(warning));
  const reason = result.warnings.find(explains) ?? "this quantity cannot be had here";
  return point ? `at ${point.axis} ${pointText(point)}: ${reason}` : reason;
}

/**
 * A number in a result by its path, such as `beam.majorArcsec`.
 *
 * @returns null where the result has none, undefined where the path names no quantity.
 */
export function quantityOf(result: AssessResult, path: string): number | null | undefined {
  let value: unknown = result;
  for (const part of path.split(".")) {
    if (value === null || typeof value !== "object" || !Object.hasOwn(value, part)) return undefined;
    value = (value as { readonly [key: string]: unknown })[part];
  }
  if (value === null || typeof value === "number") return value;
  return undefined;
}

/** How much of the limit is in hand: negative when it is not met. */
export function marginOf(value: number, limit: number, sense: "atMost" | "atLeast"): number {
  const spare = sense === "atMost" ? limit - value : value - limit;
  return limit === 0 ? spare : spare / Math.abs(limit);
}
