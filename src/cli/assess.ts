import { judge } from "../assess/requirements.ts";
import type { AssessResult } from "../assess/result.ts";
import { roundedJson } from "../base/json.ts";
import type { Layout, Observation, Pair, Plan } from "../plan/schema.ts";
import { type LedgerModel, ledgerModel } from "../view/ledger/ledger.ts";
import { resultTable } from "../view/tables.ts";
import { withAssessor } from "./assessor.ts";
import { someOf } from "./choice.ts";
import { DONE, NOT_MET } from "./faults.ts";
import type { Io } from "./io.ts";
import { readPlanFile } from "./planfile.ts";
import { part, progress } from "./progress.ts";
import { ledgerLines, tableLines } from "./text.ts";
import { warnOfPlan, warnOfResults } from "./warnings.ts";

export interface AssessCall {
  readonly layout: readonly string[];
  readonly observation: readonly string[];
  readonly json?: boolean;
  readonly require?: boolean;
  readonly pair?: Pair;
  readonly workers?: number;
}

/** `assess`: all results of every pair asked for, and with `--require` the ledger of each layout. */
export async function assessVerb(io: Io, path: string, call: AssessCall): Promise<number> {
  const { plan, warnings } = await readPlanFile(path);
  const { layouts, observations } = someOf(plan, call);
  warnOfPlan(io, path, warnings);
  let results: readonly AssessResult[];
  const ledgers: { readonly layout: string; readonly ledger: LedgerModel }[] = [];
  const pairs = observations.flatMap((observation) => layouts.map((layout) => ({ layout, observation })));
  const running = progress(io, "assessing");
  try {
    const options = { pair: call.pair ?? null };
    const jobs = pairs.map(({ layout, observation }) => ({ plan, layout: layout.id, observation: observation.id, options }));
    results = await withAssessor(io, call.workers, jobs.length, (run) => run(jobs, running.checkpoint));
  } finally {
    running.end();
  }
  if (call.require) {
    const judged = { ...plan, observations: [...observations], requirements: linesAbout(plan, observations) };
    const judging = progress(io, "judging");
    try {
      for (const [k, { id }] of layouts.entries()) {
        const settled = await judge(judged, id, results, part(judging.checkpoint, k / layouts.length, (k + 1) / layouts.length));
        ledgers.push({
          layout: id,
          ledger: ledgerModel({ plan: judged, layout: id, settled, live: [], working: false, dragging: false }),
        });
      }
    } finally {
      judging.end();
    }
  }
  warnOfResults(io, results);
  const ledgerText = ledgers.flatMap(({ layout, ledger }) => [...ledgerLines(layout, ledger), ""]);
  if (call.json) {
    if (call.require) io.err(`${ledgerText.join("\n")}`);
    await io.out(`${roundedJson(results, 2)}\n`);
  } else {
    const tables = observations.flatMap((observation) => {
      const ours = results.filter((result) => result.observation === observation.id);
      return [...tableLines(resultTable(plan, observation, ours, call.pair ?? null)), ""];
    });
    await io.out([...planLines(plan.title, layouts), ...tables, ...ledgerText].join("\n"));
  }
  return call.require ? verdict(io, plan, ledgers, observations) : DONE;
}

/** Title of the plan, and what the columns' ids stand for. */
function planLines(title: string, layouts: readonly Layout[]): readonly string[] {
  const widest = Math.max(...layouts.map(({ id }) => id.length));
  const named = layouts
    .filter(({ id, label }) => label !== "" && label !== id)
    .map(({ id, label }) => `  ${id.padEnd(widest)}  ${label}`);
  return [...(title === "" ? [] : [title]), ...named, ...(title !== "" || named.length > 0 ? [""] : [])];
}

/** Lines that can be judged from these observations. */
const linesAbout = (plan: Plan, observations: readonly Observation[]): Plan["requirements"] =>
  plan.requirements.filter(({ when }) => !when.observation || observations.some(({ id }) => id === when.observation));

/** Exit code of a ledger. A line that cannot be computed is neither met nor not met: it is warned of. */
function verdict(
  io: Io,
  plan: Plan,
  ledgers: readonly { readonly layout: string; readonly ledger: LedgerModel }[],
  observations: readonly Observation[],
): number {
  const judged = new Set(ledgers.flatMap(({ ledger }) => ledger.lines.map(({ id }) => id)));
  const left = plan.requirements.length - judged.size;
  if (plan.requirements.length === 0) io.err("warning: the plan has no requirements: there was nothing to judge\n");
  else if (left > 0) {
    const about = observations.length < plan.observations.length ? "layouts or observations" : "layouts";
    io.err(`warning: ${left} of ${plan.requirements.length} requirements speak of other ${about} and were not judged\n`);
  }
  const all = ledgers.flatMap(({ ledger }) => ledger.lines);
  const open = all.filter(({ state }) => state === "cannot be computed").length;
  if (open > 0) io.err(`warning: ${open} of ${all.length} judgements cannot be computed: nothing is known of them\n`);
  return all.some(({ state }) => state === "not met") ? NOT_MET : DONE;
}
