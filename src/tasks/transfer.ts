/**
 * Every array buffer inside a result, once each, so that a worker hands them over instead of copying.
 * Whoever transfers them must not keep them.
 */
export function buffersOf(value: unknown, found = new Set<ArrayBuffer>()): ArrayBuffer[] {
  if (ArrayBuffer.isView(value)) {
    if (value.buffer instanceof ArrayBuffer) found.add(value.buffer);
  } else if (Array.isArray(value)) {
    for (const item of value) buffersOf(item, found);
  } else if (value !== null && typeof value === "object") {
    for (const item of Object.values(value)) buffersOf(item, found);
  }
  return [...found];
}
