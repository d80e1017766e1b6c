import { marginOf, quantityOf, type RequirementOutcome } from "../../assess/requirements.ts";
import type { AssessResult } from "../../assess/result.ts";
import type { Plan, Requirement } from "../../plan/schema.ts";
import { observationsOf } from "./condition.ts";

/** Quantities that follow a moving station in a preview; every other figure of a preview is the last settled one. */
const FOLLOWS = new Set([
  "beam.majorArcsec",
  "beam.minorArcsec",
  "beam.axisRatio",
  "beam.positionAngleDeg",
  "beam.halfPowerMajorArcsec",
  "beam.halfPowerMinorArcsec",
  "beam.firstMinimumMinArcsec",
  "beam.firstMinimumMaxArcsec",
  "beam.firstZeroMinArcsec",
  "beam.firstZeroMaxArcsec",
  "beam.peakSidelobe",
  "beam.deepestSidelobe",
  "beam.peakAbsoluteSidelobe",
  "beam.rmsSidelobe",
  "largestScaleArcsec",
  "recoverable.gaussianArcsec",
  "recoverable.discArcsec",
  "longestBaselineM",
  "shortestBaselineM",
  "longestProjectedM",
  "shortestProjectedM",
]);

const SIDELOBES = /sidelobe/i;

/** A preview knows the sidelobes within one radius: that of the first line that names one, else the observation's own. */
export function previewRadius(plan: Plan, layout: string, settled: AssessResult): number | null {
  const line = plan.requirements.find(
    (r) =>
      SIDELOBES.test(r.quantity) &&
      r.when.sidelobeRadiusArcsec !== undefined &&
      (!r.when.layouts || r.when.layouts.includes(layout)) &&
      observationsOf(plan, r).some((o) => o.id === settled.observation),
  );
  return line?.when.sidelobeRadiusArcsec ?? settled.beam.sidelobeRadiusArcsec;
}

const isPlain = ({ when }: Requirement): boolean =>
  !when.pair && !when.declinationDeg && !when.wavelengthM && !when.without && when.aboveElevationDeg === undefined;

/** The radius a line asks for is the one the preview looked within. */
function sameRadius({ quantity, when }: Requirement, found: number | null, own: number | null): boolean {
  const wanted = when.sidelobeRadiusArcsec ?? own;
  return !SIDELOBES.test(quantity) || (wanted !== null && found !== null && Math.abs(found / wanted - 1) < 0.01);
}

/**
 * The lines a preview can answer while a station moves: those of its one observation, without a range, of a quantity that follows.
 * The others keep their last value until the drop.
 *
 * @param ownRadius - Sidelobe radius of the settled result, arcsec.
 */
export function liveOutcomes(plan: Plan, result: AssessResult, ownRadius: number | null): readonly RequirementOutcome[] {
  return plan.requirements.flatMap((line) => {
    const observations = observationsOf(plan, line);
    const only = observations.length === 1 && observations[0].id === result.observation;
    if (line.when.layouts && !line.when.layouts.includes(result.layout)) return [];
    if (!sameRadius(line, result.beam.sidelobeRadiusArcsec, ownRadius)) return [];
    if (!only || !isPlain(line) || !FOLLOWS.has(line.quantity) || (line.atMost !== null && line.atLeast !== null)) return [];
    const value = quantityOf(result, line.quantity);
    const limit = line.atMost ?? line.atLeast;
    if (value === undefined || value === null || limit === null) return [];
    const sense = line.atMost === null ? "atLeast" : "atMost";
    const margin = marginOf(value, limit, sense);
    const state = margin < 0 ? "not met" : margin < line.margin ? "at risk" : "met";
    return [
      { id: line.id, layout: result.layout, observation: result.observation, state, value, limit, sense, margin, note: null },
    ];
  });
}
