import Papa from "papaparse";
import { rounded } from "../base/json.ts";

/** A cell; null is an empty one. */
export type Cell = string | number | boolean | null;

/**
 * Rows of a CSV file (RFC 4180, with line feeds), each line ended. Numbers have 9 significant digits, as in JSON output;
 * texts a spreadsheet would take for a formula get an apostrophe in front.
 */
export function csvLines(rows: readonly (readonly Cell[])[]): string {
  if (rows.length === 0) return "";
  const data = rows.map((row) => row.map((cell) => (typeof cell === "number" ? rounded(cell) : cell)));
  return `${Papa.unparse(data, { escapeFormulae: true, newline: "\n" })}\n`;
}
