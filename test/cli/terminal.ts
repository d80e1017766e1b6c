import { mkdirSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { type Io, ReaderGone } from "../../src/cli/io.ts";
import { run } from "../../src/cli/run.ts";

export interface Ran {
  readonly code: number;
  readonly out: string;
  readonly err: string;
}

export interface Conditions {
  /** A terminal behind stderr. */
  readonly terminal?: boolean;
  /** Milliseconds the clock moves at each look. */
  readonly tickMs?: number;
  /** Stop as Ctrl-C does, once this many looks at the clock have been taken. */
  readonly stopAfter?: number;
  /** The reader of stdout goes away after so many characters. */
  readonly readerLeavesAfter?: number;
}

/** Runs the program in this process, with its streams and clock in hand. */
export async function ranWith(conditions: Conditions, ...argv: readonly string[]): Promise<Ran> {
  const stop = new AbortController();
  let out = "";
  let err = "";
  let looks = 0;
  const io: Io = {
    out: async (text) => {
      if (out.length >= (conditions.readerLeavesAfter ?? Number.POSITIVE_INFINITY)) throw new ReaderGone();
      out += text;
    },
    err: (text) => {
      err += text;
    },
    errIsTerminal: conditions.terminal ?? false,
    nowMs: () => {
      if (++looks === conditions.stopAfter) stop.abort();
      return looks * (conditions.tickMs ?? 0);
    },
    signal: stop.signal,
    cores: 1,
  };
  const code = await run(argv, io);
  return { code, out, err };
}

export const ran = (...argv: readonly string[]): Promise<Ran> => ranWith({}, ...argv);

/** A folder of its own for files of a test, and what is in it by name. */
export class Desk {
  readonly folder = mkdtempSync(join(tmpdir(), "spanwright-cli-"));

  path(name: string): string {
    return join(this.folder, name);
  }

  put(name: string, content: unknown): string {
    const path = this.path(name);
    writeFileSync(path, typeof content === "string" || content instanceof Uint8Array ? content : JSON.stringify(content));
    return path;
  }

  mkdir(name: string): string {
    mkdirSync(this.path(name));
    return this.path(name);
  }

  list(): string[] {
    return readdirSync(this.folder).sort();
  }

  clear(): void {
    rmSync(this.folder, { recursive: true });
  }
}
