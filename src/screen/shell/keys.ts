import { isTask, TASKS, type TaskName } from "../session.ts";

/** What a key asks for. */
export type KeyCommand =
  | { readonly kind: "task"; readonly task: TaskName }
  | { readonly kind: "undo" | "redo" | "open" | "observation" | "keys" }
  | { readonly kind: "line"; readonly step: 1 | -1 };

/** The list a reader sees, in its order. */
export const KEY_LIST: readonly (readonly [key: string, does: string])[] = [
  ["1 2 3 4", "Place, Resolve, Compare, Report"],
  ["J", "Next line of the ledger"],
  ["I", "Line before"],
  ["S", "Change the observation"],
  ["O", "Open a plan file"],
  ["Z", "Undo, also Ctrl or Cmd with Z"],
  ["Shift Z", "Redo, also Ctrl or Cmd with Shift and Z"],
  ["?", "This list"],
  ["On the map: arrows", "Pick the nearest station that way"],
  ["On the map: Enter", "Lift the station, then put it down"],
  ["Lifted: arrows", "Move 10 m, with Shift 100 m, with Alt 1 m"],
  ["Lifted: Esc", "Put it back"],
  ["In a field: Up, Down", "Step the digit at the caret"],
  ["In a field: Enter, Esc", "Take the value, bring back the last one"],
];

type Pressed = Pick<KeyboardEvent, "key" | "ctrlKey" | "metaKey" | "altKey" | "shiftKey">;

/**
 * What a key press asks for, if anything.
 *
 * @param inField - The press went to something that takes text: only Ctrl and Cmd count then, and undo is the field's own.
 * @param letters - Single-letter keys are on.
 */
export function keyCommand(pressed: Pressed, inField: boolean, letters: boolean): KeyCommand | undefined {
  const key = pressed.key.toLowerCase();
  const control = pressed.ctrlKey || pressed.metaKey;
  if (control) {
    if (inField || pressed.altKey) return undefined;
    if (key === "z") return { kind: pressed.shiftKey ? "redo" : "undo" };
    if (key === "y") return { kind: "redo" };
    return undefined;
  }
  if (inField || pressed.altKey || !letters) return undefined;
  const task = TASKS[Number(pressed.key) - 1];
  if (task !== undefined && isTask(task)) return { kind: "task", task };
  switch (key) {
    case "z":
      return { kind: pressed.shiftKey ? "redo" : "undo" };
    case "o":
      return { kind: "open" };
    case "s":
      return { kind: "observation" };
    case "?":
      return { kind: "keys" };
    case "j":
      return { kind: "line", step: 1 };
    case "i":
      return { kind: "line", step: -1 };
    default:
      return undefined;
  }
}
