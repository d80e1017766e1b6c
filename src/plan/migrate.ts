import { PlanFaults } from "./faults.ts";
import { FORMAT, VERSION } from "./schema.ts";

type Document = { readonly [key: string]: unknown };

/**
 * Steps from each version to the next, oldest first: `migrations[k]` turns version k + 1 into k + 2. Version 1 is the first,
 * so there are none yet. Once shipped a step is never edited, and each comes with a real old file in test/plan/old/.
 */
const migrations: readonly ((plan: Document) => Document)[] = [];

/**
 * Brings a document to the version this program reads.
 *
 * @throws {@link PlanFaults} for something that is no plan, a version that is not a whole number from 1, or a newer one.
 */
export function migrated(document: unknown): Document {
  if (document === null || typeof document !== "object" || Array.isArray(document)) {
    throw new PlanFaults([{ path: "", value: document, expected: `an object with "format": "${FORMAT}"` }]);
  }
  let plan = document as Document;
  if (plan.format !== FORMAT) throw new PlanFaults([{ path: "format", value: plan.format, expected: `"${FORMAT}"` }]);
  const { version } = plan;
  if (typeof version !== "number" || !Number.isInteger(version) || version < 1) {
    throw new PlanFaults([{ path: "version", value: version, expected: `a whole number from 1 to ${VERSION}` }]);
  }
  if (version > VERSION) {
    throw new PlanFaults([{ path: "version", value: version, expected: `at most ${VERSION}: a newer program wrote this plan` }]);
  }
  for (let from = version; from < VERSION; from++) plan = migrations[from - 1](plan);
  return plan;
}
