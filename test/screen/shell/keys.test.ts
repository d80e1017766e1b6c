import { describe, expect, it } from "vitest";
import { keyCommand } from "../../../src/screen/shell/keys.ts";

const press = (key: string, more: Partial<KeyboardEvent> = {}) => ({
  key,
  ctrlKey: false,
  metaKey: false,
  altKey: false,
  shiftKey: false,
  ...more,
});

describe("keyCommand", () => {
  it.each([
    ["1", { kind: "task", task: "place" }],
    ["4", { kind: "task", task: "report" }],
    ["z", { kind: "undo" }],
    ["s", { kind: "observation" }],
    ["j", { kind: "line", step: 1 }],
    ["i", { kind: "line", step: -1 }],
    ["?", { kind: "keys" }],
  ])("reads %s", (key, want) => expect(keyCommand(press(key), false, true)).toEqual(want));

  it("reads redo with Shift, and undo with Ctrl or Cmd", () => {
    expect(keyCommand(press("Z", { shiftKey: true }), false, true)).toEqual({ kind: "redo" });
    expect(keyCommand(press("z", { metaKey: true }), false, false)).toEqual({ kind: "undo" });
    expect(keyCommand(press("Z", { ctrlKey: true, shiftKey: true }), false, false)).toEqual({ kind: "redo" });
  });

  it("leaves fields alone, single letters and undo alike", () => {
    for (const pressed of [press("z"), press("1"), press("z", { ctrlKey: true })])
      expect(keyCommand(pressed, true, true)).toBeUndefined();
  });

  it("has no single-letter keys once they are turned off", () => {
    for (const key of ["1", "z", "s", "j", "?"]) expect(keyCommand(press(key), false, false)).toBeUndefined();
  });

  it("does not take what belongs to the browser or the map", () => {
    for (const pressed of [press("5"), press("0"), press("s", { ctrlKey: true }), press("ArrowUp"), press("1", { altKey: true })])
      expect(keyCommand(pressed, false, true)).toBeUndefined();
  });
});
