import type { Observation, Plan } from "../../plan/schema.ts";
import type { SpaceSource } from "./model.ts";

/** The source of an observation as the picture in space shows it; the limit is the highest that any antenna of the layout has. */
export function sourceOf(plan: Plan, layoutId: string, observation: Observation, hourAngleH: number): SpaceSource {
  const members = new Set(plan.layouts.find(({ id }) => id === layoutId)?.stations);
  const kinds = new Set(plan.stations.filter(({ id }) => members.has(id)).map(({ antenna }) => antenna));
  const limits = plan.antennas.filter(({ id }) => kinds.has(id)).map(({ elevationLimitDeg }) => elevationLimitDeg);
  const { fromH, toH } = observation.hourAngle;
  return {
    declinationDeg: observation.declinationDeg,
    fromH,
    toH,
    elevationLimitDeg: Math.max(observation.elevationLimitDeg, ...limits),
    hourAngleH: Math.min(toH, Math.max(fromH, hourAngleH)),
  };
}
