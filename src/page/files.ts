import { faultLines, PlanFaults } from "../plan/faults.ts";
import { readPlan } from "../plan/read.ts";
import type { Plan } from "../plan/schema.ts";
import { writePlan } from "../plan/write.ts";
import { fileNameOf } from "../view/shell.ts";

/** Plan files are JSON; past this size one is not read at all. */
const LARGEST_BYTES = 64 * 1024 * 1024;

/** A plan from a file, or why it cannot be opened. */
export type Opened =
  | { readonly plan: Plan; readonly warnings: readonly string[] }
  | { readonly title: string; readonly lines: readonly string[] };

/** Asks for a plan file; undefined when none was chosen. */
export function chosenFile(): Promise<File | undefined> {
  return new Promise((resolve) => {
    const input = document.createElement("input");
    input.type = "file";
    input.accept = ".json,application/json";
    input.addEventListener("change", () => resolve(input.files?.[0]));
    input.addEventListener("cancel", () => resolve(undefined));
    input.click();
  });
}

export async function opened(file: File): Promise<Opened> {
  const title = `${file.name} cannot be opened`;
  if (file.size > LARGEST_BYTES) return { title, lines: ["A plan file holds at most 64 MiB."] };
  try {
    return readPlan(await file.text());
  } catch (error) {
    if (error instanceof PlanFaults) return { title, lines: faultLines(error.faults) };
    if (error instanceof Error) return { title, lines: [error.message] };
    throw error;
  }
}

/** Hands the plan to the browser as a download. */
export function saved(plan: Plan, utc: string): string {
  const name = fileNameOf(plan.title);
  const url = URL.createObjectURL(new Blob([writePlan({ ...plan, savedUtc: utc })], { type: "application/json" }));
  const link = document.createElement("a");
  link.href = url;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(url), 60_000);
  return name;
}
