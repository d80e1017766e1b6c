import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { jsonFault } from "../../src/plan/jsonfault.ts";

const parses = (text: string): boolean => {
  try {
    JSON.parse(text);
    return true;
  } catch {
    return false;
  }
};

/** What JSON is made of, and what it must not have. */
const PIECES = [...'\\"{}[],:0123eE.+-/bfnrtu \n\u0007\u007f\u2028é'];

describe("D3 where a text stops being JSON", () => {
  it.each<[string, number, string]>([
    ["", 0, "a value"],
    ["  ", 2, "a value"],
    ["{", 1, "a key in double quotes"],
    ["{'a': 1}", 1, "a key in double quotes"],
    ['{"a" 1}', 5, "a colon"],
    ['{"a": }', 6, "a value"],
    ['{"a": 1 "b": 2}', 8, "a comma or }"],
    ['{"a": 1,}', 8, "a key in double quotes"],
    ["[1 2]", 3, "a comma or ]"],
    ["[1,]", 3, "a value"],
    ["[1", 2, "a comma or ]"],
    ["[01]", 2, "a comma or ]"],
    ["[.5]", 1, "a value"],
    ["[+5]", 1, "a value"],
    ["[5.]", 2, "a comma or ]"],
    ["[1e]", 2, "a comma or ]"],
    ["[Infinity]", 1, "a value"],
    ["[tru]", 1, "a value"],
    ['["a', 3, "the closing double quote"],
    ['["a\nb"]', 3, "a line break or control character written as"],
    ['["\\x"]', 2, "one of \\"],
    ['["\\u12g4"]', 2, "one of \\"],
    ["{} []", 3, "nothing more"],
    ["// note\n{}", 0, "a value"],
  ])("%j", (text, offset, expected) => {
    const fault = jsonFault(text);
    expect(fault?.offset).toBe(offset);
    expect(fault?.expected).toContain(expected);
    expect(parses(text)).toBe(false);
  });

  it("finds a fault in what JSON.parse refuses, and in nothing else", () => {
    // JSON with one piece cut out or put in: both kinds of text come about.
    const nearly = fc
      .tuple(fc.json(), fc.nat(), fc.nat(3), fc.string({ unit: fc.constantFrom(...PIECES), maxLength: 3 }))
      .map(([text, at, cut, more]) => text.slice(0, at % (text.length + 1)) + more + text.slice((at % (text.length + 1)) + cut));
    fc.assert(
      fc.property(fc.oneof(nearly, fc.json()), (text) => {
        expect(jsonFault(text) === undefined).toBe(parses(text));
      }),
      { seed: 20260101, numRuns: 3000 },
    );
  });
});
