/**
 * A value the caller can put right. The message names the field as its owner knows it, the value received,
 * the values wanted and, when one is known, a remedy; `field` and `value` stay on the error so that a screen
 * can mark its input and the terminal can choose its exit code.
 */
export class DomainError extends RangeError {
  override readonly name: string = "DomainError";
  readonly field: string;
  readonly value: unknown;

  constructor(field: string, value: unknown, expected: string, remedy?: string) {
    super(`${field} is ${shown(value)}; expected ${expected}.${remedy ? ` ${remedy}` : ""}`);
    this.field = field;
    this.value = value;
  }
}

/** A value on one line, cut short, for error messages: control characters are escaped, so nothing is injected. */
export function shown(value: unknown): string {
  if (value === undefined) return "missing";
  if (typeof value === "number" || typeof value === "bigint") return String(value);
  const text = typeof value === "string" ? JSON.stringify(value) : (JSON.stringify(value) ?? String(value));
  return text.length > 80 ? `${text.slice(0, 77)}…` : text;
}
