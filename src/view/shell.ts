import type { Plan } from "../plan/schema.ts";

/** How the layouts of a plan are told apart beside their names, in plan order; from the fifth on they begin again. */
export const LAYOUT_DASHES = ["", "10 4", "3 3", "1.5 3.5"] as const;

export interface LayoutChoice {
  readonly id: string;
  readonly label: string;
  /** Index into the four dashes and colours. */
  readonly style: number;
}

/** What the top bar says. */
export interface TopBarModel {
  readonly title: string;
  readonly task: string;
  readonly layouts: readonly LayoutChoice[];
  readonly layout: LayoutChoice;
  /** What undo would take back; null: nothing. */
  readonly undo: string | null;
  readonly redo: string | null;
  /** The look the theme button changes to. */
  readonly otherTheme: "Light" | "Dark";
}

export function topBarModel(
  plan: Plan,
  task: string,
  layoutId: string,
  theme: "light" | "dark",
  undo: string | null,
  redo: string | null,
): TopBarModel {
  const layouts = plan.layouts.map(({ id, label }, k) => ({ id, label: label || id, style: k % LAYOUT_DASHES.length }));
  return {
    title: plan.title || "Untitled plan",
    task,
    layouts,
    layout: layouts.find(({ id }) => id === layoutId) ?? layouts[0],
    undo,
    redo,
    otherTheme: theme === "light" ? "Dark" : "Light",
  };
}

/** Words for a task that is not built. */
export const unbuilt: { readonly [task: string]: { readonly title: string; readonly will: string } } = {
  compare: {
    title: "Compare is not built yet",
    will: "It will stand the plan’s layouts side by side, row by row with the ledger, with their coverage, beams and cuts.",
  },
  report: {
    title: "Report is not built yet",
    will: "It will set the map, the ledger and the figures of this plan on printable sheets, with notes on method.",
  },
};

/** A file name for a plan: its title, without what file systems refuse. */
export function fileNameOf(title: string): string {
  const bare = title
    .replace(/[^\p{L}\p{N} _-]+/gu, "")
    .trim()
    .replace(/\s+/g, "-")
    .toLowerCase();
  return `${bare || "untitled"}.plan.json`;
}
