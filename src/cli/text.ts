import { barEnd } from "../view/ledger/bar.ts";
import type { LedgerLine, LedgerModel } from "../view/ledger/ledger.ts";
import type { ResultTable, TableRow } from "../view/tables.ts";

/** Columns of a page that is pasted into a letter. */
const PAGE = 100;
/** The line everything hangs from. */
const PLUMB = "│";
const LABEL = 34;
const UNIT = 4;
const LEAST_COLUMN = 10;
const MOST_COLUMN = 16;
/** Characters each side of the plumb line of a ledger has for its bars. */
const ROOM = { left: 8, right: 12 } as const;

/** A table of results as lines, units left of the plumb line and figures right of it; too many layouts go below one another. */
export function tableLines(table: ResultTable): readonly string[] {
  const width = Math.min(MOST_COLUMN, Math.max(LEAST_COLUMN, ...table.columns.map((id) => id.length + 2)));
  const across = Math.floor((PAGE - LABEL - UNIT - 5) / width);
  const lines = [table.title, ...table.settings.map((text) => `  ${text}`)];
  for (let from = 0; from < table.columns.length; from += across) {
    const cells = (all: readonly string[]): string =>
      all
        .slice(from, from + across)
        .map((cell) => cut(cell, width - 1).padStart(width))
        .join("");
    const line = (row: TableRow): string => `  ${row.label.padEnd(LABEL)} ${row.unit.padStart(UNIT)} ${PLUMB}${cells(row.cells)}`;
    lines.push("", line({ label: "", unit: "", cells: table.columns }));
    for (const [k, group] of table.groups.entries()) {
      if (k > 0) lines.push(line({ label: "", unit: "", cells: [] }).trimEnd());
      lines.push(...group.map(line));
    }
  }
  return lines.map(spaced);
}

/** The ledger of one layout as lines: every bar starts on the plumb line, right of it is in hand, left is short. */
export function ledgerLines(layout: string, ledger: LedgerModel): readonly string[] {
  const { lines } = ledger;
  const open = ledger.open > 0 ? [`${ledger.open} cannot be computed`] : [];
  const tally = [...ledger.tally.filter(({ count }) => count > 0).map(({ state, count }) => `${count} ${state}`), ...open];
  const widest = (text: (line: LedgerLine) => string): number => Math.max(0, ...lines.map((line) => text(line).length));
  const value = (line: LedgerLine): string => (line.value ? joinedValue(line.value) : "");
  const [ids, titles, values, limits] = [widest((l) => l.id), widest((l) => l.title), widest(value), widest((l) => l.limit)];
  const body = lines.flatMap((line) => {
    const columns = [line.id.padEnd(ids), line.title.padEnd(titles), value(line).padStart(values), line.limit.padEnd(limits)];
    const about = [line.condition, line.text, line.note ?? ""].filter((text) => text !== "");
    const head = `  ${columns.join("  ")}  ${barText(line)}  ${line.words}`;
    return [head.trimEnd(), ...about.map((text) => `  ${" ".repeat(ids)}  ${text}`)];
  });
  return [`ledger of ${layout}: ${tally.join(", ")}`, "", ...body].map(spaced);
}

/** Met: a solid bar with its pier; at risk: a thin one; not met: a broken one left of the line; a chevron where it goes on. */
function barText({ margin, state }: LedgerLine): string {
  if (margin === null) return `${" ".repeat(ROOM.left)}${PLUMB}${" ".repeat(ROOM.right)}`;
  const { x, off } = barEnd(margin, ROOM);
  const length = Math.max(1, Math.round(Math.abs(x)));
  if (margin < 0) return `${`${off ? "«" : "┏"}${"╍".repeat(length - 1)}`.padStart(ROOM.left)}${PLUMB}${" ".repeat(ROOM.right)}`;
  const thin = state === "at risk";
  const bar = `${(thin ? "─" : "━").repeat(length - 1)}${off ? "»" : thin ? "┐" : "┓"}`;
  return `${" ".repeat(ROOM.left)}${PLUMB}${bar.padEnd(ROOM.right)}`;
}

const joinedValue = ({ figure, unit }: { readonly figure: string; readonly unit: string }): string =>
  unit === "" || /^[″′°]/.test(unit) ? `${figure}${unit}` : `${figure} ${unit}`;

const cut = (text: string, width: number): string => (text.length > width ? `${text.slice(0, width - 1)}…` : text);

/** With ordinary spaces, so that what is pasted can be searched and split, and none at the end. */
const spaced = (text: string): string => text.replaceAll("\u00a0", " ").trimEnd();
