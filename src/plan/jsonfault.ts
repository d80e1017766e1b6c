/** Where a text stops being JSON. */
export interface JsonFault {
  /** Index of the first character that cannot stand there; the length of the text where it ends too early. */
  readonly offset: number;
  /** What could stand there. */
  readonly expected: string;
}

/**
 * The first place where a text is not JSON (RFC 8259), undefined where it is. The parsers of page and terminal word their errors
 * each in its own way, and some tell no place; this one is asked only once they have refused.
 *
 * @param text - Nested no deeper than the caller's stack can bear: one call a level.
 */
export function jsonFault(text: string): JsonFault | undefined {
  const scan = new Scan(text);
  try {
    scan.value();
    scan.space();
    if (scan.at < text.length) scan.refuse("nothing more");
    return undefined;
  } catch (stop) {
    if (stop instanceof Stop) return stop.fault;
    throw stop;
  }
}

class Stop extends Error {
  readonly fault: JsonFault;
  constructor(fault: JsonFault) {
    super(fault.expected);
    this.fault = fault;
  }
}

class Scan {
  readonly text: string;
  at = 0;

  constructor(text: string) {
    this.text = text;
  }

  refuse(expected: string): never {
    throw new Stop({ offset: this.at, expected });
  }

  space(): void {
    this.take(/[ \t\n\r]*/y);
  }

  /** Moves past a match of a sticky pattern, if there is one here. */
  private take(pattern: RegExp): boolean {
    pattern.lastIndex = this.at;
    if (!pattern.test(this.text)) return false;
    this.at = pattern.lastIndex;
    return true;
  }

  value(): void {
    this.space();
    const c = this.text[this.at];
    if (c === "{") this.members("}", () => this.member());
    else if (c === "[") this.members("]", () => this.value());
    else if (c === '"') this.string();
    else if (!this.take(/-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?|true|false|null/y)) {
      this.refuse("a value: a number, a text in double quotes, true, false, null, [ or {");
    }
  }

  private members(close: string, member: () => void): void {
    this.at++;
    this.space();
    if (this.text[this.at] === close) {
      this.at++;
      return;
    }
    for (;;) {
      member();
      this.space();
      const c = this.text[this.at];
      if (c !== "," && c !== close) this.refuse(`a comma or ${close}`);
      this.at++;
      if (c === close) return;
    }
  }

  private member(): void {
    this.space();
    if (this.text[this.at] !== '"') this.refuse("a key in double quotes");
    this.string();
    this.space();
    if (this.text[this.at] !== ":") this.refuse("a colon");
    this.at++;
    this.value();
  }

  private string(): void {
    this.at++;
    for (;;) {
      this.take(/[^"\\\p{Cc}]*/uy);
      const c = this.text[this.at];
      if (c === '"') break;
      if (c === "\\") {
        if (!this.take(/\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4})/y))
          this.refuse('one of \\" \\\\ \\/ \\b \\f \\n \\r \\t or \\u and four hexadecimal digits');
      } else if (c !== undefined && c >= " ") this.at++;
      else
        this.refuse(
          c === undefined ? "the closing double quote" : "a line break or control character written as \\n, \\t or \\u000a",
        );
    }
    this.at++;
  }
}
