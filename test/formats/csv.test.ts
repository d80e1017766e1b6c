import Papa from "papaparse";
import { describe, expect, it } from "vitest";
import { csvLines } from "../../src/formats/csv.ts";

describe("CSV", () => {
  it("ends every line, quotes what needs it and leaves an absent value empty", () => {
    expect(csvLines([["a", "b,c", 'd"e', null, true]])).toBe('a,"b,c","d""e",,true\n');
    expect(csvLines([])).toBe("");
    expect(csvLines([["x"], [1]])).toBe("x\n1\n");
  });

  it("writes numbers with 9 significant digits, negative ones too", () => {
    expect(csvLines([[1 / 3, -1 / 3, -0, 1.42e9, 1e-12, 6.02214076e23]])).toBe(
      "0.333333333,-0.333333333,0,1420000000,1e-12,6.02214076e+23\n",
    );
  });

  it("keeps a text from being taken for a formula", () => {
    const texts = ["=1+1", "+1", "-1", "@x", "\tx"];
    const [row] = Papa.parse<string[]>(csvLines([texts])).data;
    expect(row).toEqual(texts.map((text) => `'${text}`));
  });

  it("comes back from a reader", () => {
    const rows = [
      ["line\nbreak", "ü ″", ""],
      ["a", "b", "c"],
    ];
    expect(Papa.parse(csvLines(rows).trimEnd()).data).toEqual(rows);
  });
});
