import { planSchema } from "./schema.ts";

/** Keys named in a warning; the rest are counted. */
const NAMED = 20;

/** What this walk needs to know of a schema node. */
interface Node {
  readonly type: string;
  readonly entries?: { readonly [key: string]: Node };
  readonly item?: Node;
  readonly wrapped?: Node;
  readonly pipe?: readonly Node[];
  readonly options?: readonly Node[];
}

/** A warning that names the keys of a document which the plan's schema does not know; none when there are none. */
export function unknownKeys(document: unknown): string[] {
  const found: string[] = [];
  walk(document, planSchema as unknown as Node, "", found);
  if (found.length === 0) return [];
  const rest = found.length > NAMED ? ` and ${found.length - NAMED} more` : "";
  return [`keys that are not known are kept as they are: ${found.slice(0, NAMED).join(", ")}${rest}`];
}

function walk(value: unknown, schema: Node | undefined, path: string, found: string[]): void {
  const node = bare(schema);
  if (!node || value === null || typeof value !== "object") return;
  if (Array.isArray(value)) {
    // Positions of a polygon have no keys, and there may be many.
    if (bare(node.item)?.type === "number") return;
    for (const [k, item] of value.entries()) walk(item, node.item, `${path}[${k}]`, found);
    return;
  }
  if (node.options) return;
  for (const [key, inner] of Object.entries(value)) {
    const known = node.entries && Object.hasOwn(node.entries, key) ? node.entries[key] : undefined;
    const at = path === "" ? key : `${path}.${key}`;
    if (known) walk(inner, known, at, found);
    else if (node.entries) found.push(at);
  }
}

/** A node without its optional, nullable and pipe wrappings. */
function bare(node: Node | undefined): Node | undefined {
  if (!node) return undefined;
  if (node.wrapped) return bare(node.wrapped);
  if (node.pipe && node.pipe[0] !== node) return bare(node.pipe[0]);
  return node;
}
