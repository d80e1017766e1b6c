import { fileOf, type Source } from "./sources.ts";

/** Every project file reached from some files by imports of any kind, themselves included. */
export function reachedFrom(starts: readonly string[], sources: readonly Source[]): ReadonlySet<string> {
  const byPath = new Map(sources.map((source) => [source.path, source]));
  const reached = new Set<string>();
  const waiting = [...starts];
  for (let path = waiting.pop(); path !== undefined; path = waiting.pop()) {
    if (reached.has(path)) continue;
    reached.add(path);
    for (const { specifier } of byPath.get(path)?.imports ?? []) {
      const file = fileOf(path, specifier);
      if (file !== undefined) waiting.push(file);
    }
  }
  return reached;
}
