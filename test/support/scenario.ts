import { readFileSync } from "node:fs";
import { readPlan } from "../../src/plan/read.ts";
import type { Plan } from "../../src/plan/schema.ts";

/** A worked plan by the name of its file. */
export const scenario = (name: string): Plan => readPlan(readFileSync(`scenarios/${name}.plan.json`, "utf8")).plan;
