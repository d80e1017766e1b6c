import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { planJsonSchema } from "../../scripts/plan-schema.ts";

it("D9 assets/plan.schema.json is what `npm run schema` writes today", () => {
  expect(readFileSync("assets/plan.schema.json", "utf8")).toBe(`${JSON.stringify(planJsonSchema(), null, 2)}\n`);
});
