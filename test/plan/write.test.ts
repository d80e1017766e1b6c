import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { DomainError } from "../../src/base/errors.ts";
import { moveStation } from "../../src/plan/edits.ts";
import { readPlan } from "../../src/plan/read.ts";
import type { Plan } from "../../src/plan/schema.ts";
import { writePlan } from "../../src/plan/write.ts";
import { type Loose, read } from "./small.ts";

/** The same values, every object's keys in reverse. */
function reversed(value: Loose): Loose {
  if (value === null || typeof value !== "object") return value;
  if (Array.isArray(value)) return value.map(reversed);
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, inner]) => [key, reversed(inner)]),
  );
}

describe("D6 writing a plan and reading it again changes nothing", () => {
  it.each(["thistledown", "sallow-flat", "long-meridian"])("%s, whose file is as it would be written", (name) => {
    const text = readFileSync(`scenarios/${name}.plan.json`, "utf8");
    const { plan } = readPlan(text);
    expect(writePlan(plan)).toBe(text);
    expect(readPlan(writePlan(plan)).plan).toEqual(plan);
  });

  it("gives equal plans equal bytes, whatever order their keys came in", () => {
    const { plan } = read((p) => {
      p.site.allowed = {
        type: "Polygon",
        coordinates: [
          [
            [0, 0],
            [1, 0],
            [1, 1],
            [0, 0],
          ],
        ],
      };
      p.requirements = [{ id: "R1", quantity: "pair.dip", atLeast: 0.1, when: { pair: { separationArcsec: 2 } } }];
    });
    expect(writePlan(reversed(plan))).toBe(writePlan(plan));
    expect(writePlan(plan)).toMatch(/^\{\n {2}"format": "spanwright-plan",\n {2}"version": 1,\n {2}"title": "",[\s\S]*\n\}\n$/);
  });

  it("D4 puts unknown keys after the known ones, in their own order", () => {
    const { plan } = read((p) => {
      p.stations[0] = { zebra: 1, aardvark: { b: 1, a: 2 }, ...p.stations[0] };
    });
    const keys = ["id", "name", "latitudeDeg", "longitudeDeg", "heightM", "antenna", "locked", "zebra", "aardvark"];
    const again = JSON.parse(writePlan(plan));
    expect(Object.keys(again.stations[0])).toEqual(keys);
    expect(Object.keys(again.stations[0].aardvark)).toEqual(["b", "a"]);
    expect(writePlan(readPlan(writePlan(plan)).plan)).toBe(writePlan(plan));
  });

  it("keeps every digit of a number", () => {
    const latitudeDeg = -31.622345678901233;
    const moved = moveStation(read(() => {}).plan, "K1", { latitudeDeg, longitudeDeg: 0.1 + 0.2 });
    const { plan } = readPlan(writePlan(moved));
    expect(plan.stations[0]).toMatchObject({ latitudeDeg, longitudeDeg: 0.1 + 0.2 });
  });

  it("refuses a number that JSON would make null", () => {
    const plan = moveStation(read(() => {}).plan, "K2", { latitudeDeg: Number.NaN, longitudeDeg: 0 });
    expect(() => writePlan(plan)).toThrow(DomainError);
    expect(() => writePlan(plan)).toThrow("stations[1].latitudeDeg is NaN; expected a finite number.");
  });

  it("leaves out what is undefined", () => {
    const plan: Plan = { ...read(() => {}).plan, title: undefined as unknown as string };
    expect(readPlan(writePlan(plan)).plan.title).toBe("");
  });
});
