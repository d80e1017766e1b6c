import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { planJsonSchema } from "../../scripts/plan-schema.ts";
import { read } from "./small.ts";

// biome-ignore lint/suspicious/noExplicitAny: JSON Schema nests without end
type Node = any;

const schema: Node = planJsonSchema();

/** Every place of a plan with the part of the schema that describes it. */
function walk(value: Node, node: Node, path: string, visit: (path: string, value: Node, node: Node) => void): void {
  visit(path, value, node);
  if (value === null || typeof value !== "object") return;
  const inner = node?.anyOf?.find((one: Node) => one.type !== "null") ?? node;
  for (const [key, item] of Object.entries(value)) {
    if (Array.isArray(value)) walk(item, inner?.items, `${path}[${key}]`, visit);
    else walk(item, inner?.properties?.[key], `${path}.${key}`, visit);
  }
}

describe("D9 assets/plan.schema.json", () => {
  it("is what `npm run schema` writes today", () => {
    expect(readFileSync("assets/plan.schema.json", "utf8")).toBe(`${JSON.stringify(schema, null, 2)}\n`);
  });

  it("asks for what the file format asks for, and for nothing else", () => {
    expect(schema.required).toEqual(["format", "version", "site", "antennas", "stations", "layouts", "observations"]);
    expect(schema.properties.site.required).toEqual(["origin"]);
    expect(schema.properties.stations.items.required).toEqual(["id", "latitudeDeg", "longitudeDeg", "antenna"]);
    expect(schema.properties.layouts.items.required).toEqual(["id", "stations"]);
    expect(schema.properties.observations.items.required).toEqual(["id", "declinationDeg", "hourAngle", "frequencyHz"]);
    expect(schema.properties.requirements.items.required).toEqual(["id", "quantity"]);
  });

  it("describes every field of a plan, with the default that reading fills in", () => {
    const { plan } = read(() => {});
    const unknown: string[] = [];
    const otherDefault: string[] = [];
    walk(plan, schema, "", (path, value, node) => {
      if (node === undefined) unknown.push(path);
      // The default of an object is {}: its fields have their own.
      else if (node.default !== undefined && (value === null || typeof value !== "object") && node.default !== value)
        otherDefault.push(path);
    });
    expect({ unknown, otherDefault }).toEqual({ unknown: [], otherDefault: [] });
  });

  it("lets unknown keys through, as reading does", () => {
    expect(JSON.stringify(schema)).not.toContain('"additionalProperties":false');
  });
});
