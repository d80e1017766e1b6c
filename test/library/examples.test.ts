import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it, vi } from "vitest";

const names = readdirSync("src/library/examples").map((name) => name.slice(0, -3));
const modules = import.meta.glob<unknown>("../../src/library/examples/*.ts");

describe("the examples of the library", () => {
  it("are one for each entry point, shown on its page", () => {
    const entries = readdirSync("src/library")
      .filter((name) => name.endsWith(".ts"))
      .map((name) => name.slice(0, -3));
    expect(names.sort()).toEqual(entries.sort());
    for (const name of entries) {
      expect(readFileSync(`src/library/${name}.ts`, "utf8")).toContain(`{@includeCode ./examples/${name}.ts}`);
    }
  });

  it.each(names)("%s prints what stands at its end", async (name) => {
    const said: string[] = [];
    const log = vi.spyOn(console, "log").mockImplementation((text: unknown) => void said.push(String(text)));
    try {
      await modules[`../../src/library/examples/${name}.ts`]();
    } finally {
      log.mockRestore();
    }
    const text = readFileSync(`src/library/examples/${name}.ts`, "utf8");
    const wanted = text
      .split("\n")
      .filter((line) => line.startsWith("// prints: "))
      .map((line) => line.slice(11));
    expect(said).toEqual(wanted);
  });
});
