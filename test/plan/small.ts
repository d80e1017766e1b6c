import { PlanFaults } from "../../src/plan/faults.ts";
import { type ReadPlan, readPlan } from "../../src/plan/read.ts";

// biome-ignore lint/suspicious/noExplicitAny: broken documents are what is tested
export type Loose = any;

/** The smallest plan there is, with two stations. */
export const small = (): Loose => ({
  format: "spanwright-plan",
  version: 1,
  site: { origin: { latitudeDeg: -31, longitudeDeg: 24 } },
  antennas: [{ id: "d12", diameterM: 12 }],
  stations: [
    { id: "K1", latitudeDeg: -31, longitudeDeg: 24, antenna: "d12" },
    { id: "K2", latitudeDeg: -31.01, longitudeDeg: 24.01, antenna: "d12" },
  ],
  layouts: [{ id: "wide", stations: ["K1", "K2"] }],
  observations: [{ id: "south", declinationDeg: -45, hourAngle: { fromH: -5, toH: 3 }, frequencyHz: 1.42e9 }],
});

/** The smallest plan with a change, as it is read. */
export function read(change: (plan: Loose) => void): ReadPlan {
  const plan = small();
  change(plan);
  return readPlan(JSON.stringify(plan));
}

/** The faults a text is refused with. */
export function refused(text: string): PlanFaults {
  try {
    readPlan(text);
  } catch (error) {
    if (error instanceof PlanFaults) return error;
    throw error;
  }
  throw new Error("it was read");
}

/** The lines the smallest plan is refused with after a change. */
export function faults(change: (plan: Loose) => void): string[] {
  const plan = small();
  change(plan);
  return refused(JSON.stringify(plan)).message.split("\n");
}
