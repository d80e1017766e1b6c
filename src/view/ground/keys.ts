import type { Direction } from "./pick.ts";

/** What a key asks of the map. */
export type MapCommand =
  | { readonly do: "pick"; readonly direction: Direction }
  | { readonly do: "step"; readonly eastM: number; readonly northM: number }
  | { readonly do: "zoom"; readonly factor: number }
  | { readonly do: "lift" | "drop" | "putBack" | "clear" | "fit" };

export interface KeyPress {
  readonly key: string;
  readonly shiftKey: boolean;
  readonly altKey: boolean;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
}

const ARROWS: { readonly [key: string]: readonly [Direction, east: number, north: number] } = {
  ArrowLeft: ["left", -1, 0],
  ArrowRight: ["right", 1, 0],
  ArrowUp: ["up", 0, 1],
  ArrowDown: ["down", 0, -1],
};

/** One key press zooms by this much. */
export const ZOOM_STEP = 1.5;

/** The command of a key, with a station lifted or none; undefined leaves the key to the page. */
export function mapCommand({ key, shiftKey, altKey, ctrlKey, metaKey }: KeyPress, isLifted: boolean): MapCommand | undefined {
  if (ctrlKey || metaKey) return undefined;
  const arrow = ARROWS[key];
  if (arrow) {
    const [direction, east, north] = arrow;
    if (!isLifted) return { do: "pick", direction };
    const metres = shiftKey ? 100 : altKey ? 1 : 10;
    return { do: "step", eastM: east * metres, northM: north * metres };
  }
  switch (key) {
    case "Enter":
      return { do: isLifted ? "drop" : "lift" };
    case "Escape":
      return { do: isLifted ? "putBack" : "clear" };
    case "+":
    case "=":
      return { do: "zoom", factor: ZOOM_STEP };
    case "-":
    case "_":
      return { do: "zoom", factor: 1 / ZOOM_STEP };
    case "0":
      return { do: "fit" };
    default:
      return undefined;
  }
}
