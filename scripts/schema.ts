import { writeFileSync } from "node:fs";
import { planJsonSchema } from "./plan-schema.ts";

/** `npm run schema`: writes the plan file's JSON Schema. A test fails while the file differs from what this would write. */
writeFileSync("assets/plan.schema.json", `${JSON.stringify(planJsonSchema(), null, 2)}\n`);
