import { entryOf, planShape, type Shape, shapeOf } from "./shape.ts";

/** Keys named in a warning; the rest are counted. */
const NAMED = 20;

/** Keys that no object of a plan keeps: a program that sets them on an object changes what the object is. */
const DROPPED: ReadonlySet<string> = new Set(["__proto__", "prototype", "constructor"]);

/** Warnings that name the keys of a document which the plan's schema does not know; none when there are none. */
export function unknownKeys(document: unknown): string[] {
  const [kept, dropped] = [new Found(), new Found()];
  walk(document, planShape, "", (path, key) => (DROPPED.has(key) ? dropped : kept).add(path));
  return [
    ...(kept.count > 0 ? [`keys that are not known are kept as they are: ${kept.text()}`] : []),
    ...(dropped.count > 0 ? [`keys that no plan can have are left out: ${dropped.text()}`] : []),
  ];
}

/** The first few paths, and a count of all: a large file may have millions. */
class Found {
  count = 0;
  private readonly named: string[] = [];

  add(path: string): void {
    if (this.count++ < NAMED) this.named.push(oneLine(path));
  }

  text(): string {
    return this.named.join(", ") + (this.count > NAMED ? ` and ${this.count - NAMED} more` : "");
  }
}

/** A key may hold anything at all: on one line, and cut short. */
function oneLine(path: string): string {
  const text = /[\p{C}\p{Z}"]/u.test(path) ? JSON.stringify(path) : path;
  return text.length > 120 ? `${text.slice(0, 117)}…` : text;
}

function walk(value: unknown, schema: Shape | undefined, path: string, found: (path: string, key: string) => void): void {
  if (value === null || typeof value !== "object") return;
  const shape = shapeOf(value, schema);
  if (Array.isArray(value)) {
    // Positions of a polygon have no keys, and there may be many.
    if (!shape?.item || shape.item.type === "number") return;
    for (const [k, item] of value.entries()) walk(item, shape.item, `${path}[${k}]`, found);
    return;
  }
  if (!shape?.entries) return;
  for (const [key, inner] of Object.entries(value)) {
    const known = entryOf(shape, key);
    const at = path === "" ? key : `${path}.${key}`;
    if (known) walk(inner, known, at, found);
    else found(at, key);
  }
}
