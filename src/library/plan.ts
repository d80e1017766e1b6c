/**
 * The plan file: read with all its faults, changed without a mutation, written as it was read.
 *
 * ```ts
 * {@includeCode ./examples/plan.ts}
 * ```
 *
 * @module plan
 */
export * from "../plan/edits.ts";
export { antennaById, layoutById, observationById, stationById } from "../plan/find.ts";
export { checkedPlan, type ReadPlan, readPlan } from "../plan/read.ts";
export type { Antenna, Geometry, Layout, Observation, Pair, Plan, Requirement, Site, Station } from "../plan/schema.ts";
export { writePlan } from "../plan/write.ts";
