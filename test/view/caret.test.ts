import { describe, expect, it } from "vitest";
import { caretStep } from "../../src/view/caret.ts";

describe("caretStep", () => {
  it.each([
    ["21.12", 1, [0.01], 0.1],
    ["21.12", 2, [0.01], 0.01],
    ["21.12", 3, [0.01], 0.001],
    ["21.12", 4, [0.01], 0.001],
    ["21.12", 5, [0.01], 0.0001],
    ["21.12", 0, [1], 10],
    ["160", 2, [1e6], 1e7],
  ])("of %s after %d characters", (text, caret, sizes, want) => {
    expect(caretStep(text, caret, sizes)).toBeCloseTo(want, 12);
  });

  it("steps degrees, minutes and seconds each by their own worth", () => {
    const text = "\u221230° 15′ 20″";
    const sizes = [1, 1 / 60, 1 / 3600];
    const past = (part: string): number => text.indexOf(part) + part.length;
    expect(caretStep(text, past("30"), sizes)).toBe(1);
    expect(caretStep(text, past("3"), sizes)).toBe(10);
    expect(caretStep(text, past("15"), sizes)).toBeCloseTo(1 / 60, 12);
    expect(caretStep(text, past("20"), sizes)).toBeCloseTo(1 / 3600, 12);
  });

  it("has nothing to step where there is no digit", () => {
    expect(caretStep("natural", 3, [1])).toBeUndefined();
    expect(caretStep("", 0, [1])).toBeUndefined();
  });
});
