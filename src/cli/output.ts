import { constants, unlinkSync } from "node:fs";
import { access, chmod, type FileHandle, open, realpath, rename, stat, unlink } from "node:fs/promises";
import { basename, dirname, join, resolve } from "node:path";
import { Fault, fileReason, named } from "./faults.ts";

/** Temporary files that stand at this moment. */
const standing = new Set<string>();

/** Removes what an interrupted run has begun, for an exit that cannot wait. */
export function removeBegun(): void {
  for (const path of standing) {
    try {
      unlinkSync(path);
    } catch {
      // It was renamed or removed a moment ago.
    }
  }
  standing.clear();
}

interface Target {
  /** As typed. */
  readonly shown: string;
  /** With links followed. */
  readonly path: string;
  readonly temporary: string;
  /** Permissions of the file that is replaced. */
  readonly mode: number | undefined;
  /** A device or a pipe, which is written to and never replaced. */
  readonly special: boolean;
}

/**
 * The files a verb writes, all or none: each is written beside its place under another name, and all are renamed at the end.
 * Whether that will work is tried before the work starts.
 */
export class OutputFiles {
  readonly #targets: ReadonlyMap<string, Target>;
  readonly #finished: Target[] = [];

  private constructor(targets: ReadonlyMap<string, Target>) {
    this.#targets = targets;
  }

  /**
   * @param wanted - Option → path as typed.
   * @throws {@link Fault} for a place that cannot be written to, the plan's own file, or one place named twice.
   */
  static async at(wanted: { readonly [option: string]: string | undefined }, planPath: string): Promise<OutputFiles> {
    const targets = new Map<string, Target>();
    const taken = new Map<string, string>();
    const plan = await identity(planPath);
    for (const [option, shown] of Object.entries(wanted)) {
      if (shown === undefined) continue;
      const target = await targetOf(option, shown);
      const same = await identity(target.path);
      if (same === plan) throw new Fault(`${option} ${named(shown)}: this is the plan itself; name another file`);
      const other = taken.get(same);
      if (other !== undefined && !target.special) throw new Fault(`${option} ${named(shown)}: ${other} names the same file`);
      taken.set(same, option);
      targets.set(option, target);
    }
    return new OutputFiles(targets);
  }

  has(option: string): boolean {
    return this.#targets.has(option);
  }

  /** Writes one of the files, not yet in its place. */
  async write(option: string, chunks: Iterable<string | Uint8Array> | AsyncIterable<string | Uint8Array>): Promise<void> {
    const target = this.#targets.get(option) as Target;
    try {
      const file = await open(target.special ? target.path : target.temporary, target.special ? "w" : "wx");
      if (!target.special) standing.add(target.temporary);
      try {
        for await (const chunk of chunks) await writeAll(file, chunk);
        if (!target.special) await file.sync();
      } finally {
        await file.close();
      }
      if (target.mode !== undefined) await chmod(target.temporary, target.mode);
      if (!target.special) this.#finished.push(target);
    } catch (error) {
      await this.discard();
      if (isFileError(error)) throw new Fault(`cannot write ${named(target.shown)}: ${fileReason(error)}`, { cause: error });
      throw error;
    }
  }

  /** Puts every file in its place. */
  async commit(): Promise<void> {
    for (const target of this.#finished) {
      try {
        await rename(target.temporary, target.path);
        standing.delete(target.temporary);
      } catch (error) {
        await this.discard();
        throw new Fault(`cannot write ${named(target.shown)}: ${fileReason(error)}`, { cause: error });
      }
    }
  }

  /** Removes what is written and not in its place. */
  async discard(): Promise<void> {
    for (const { temporary } of this.#targets.values()) {
      if (!standing.delete(temporary)) continue;
      await unlink(temporary).catch(() => undefined);
    }
  }
}

const isFileError = (error: unknown): boolean => error instanceof Error && "syscall" in error && "code" in error;

async function writeAll(file: FileHandle, chunk: string | Uint8Array): Promise<void> {
  const bytes = typeof chunk === "string" ? new TextEncoder().encode(chunk) : chunk;
  for (let from = 0; from < bytes.length; ) from += (await file.write(bytes, from)).bytesWritten;
}

/** Looks at a place and tries it out: a file is made beside it and removed again. */
async function targetOf(option: string, shown: string): Promise<Target> {
  const refuse = (why: string, cause?: unknown): Fault =>
    new Fault(`${option} ${named(shown)}: cannot be written: ${why}`, { cause });
  if (shown === "" || /[\\/]$/.test(shown)) throw refuse("a file name is needed");
  const path = await realpath(shown).catch(() => resolve(shown));
  const found = await stat(path).catch((error: NodeJS.ErrnoException) => {
    if (error.code === "ENOENT") return undefined;
    throw refuse(fileReason(error), error);
  });
  if (found?.isDirectory()) throw refuse("it is a folder");
  const special = found !== undefined && !found.isFile();
  const temporary = join(dirname(path), `.${basename(path).slice(0, 100)}.${process.pid}.part`);
  try {
    if (found) await access(path, constants.W_OK);
    if (!special) {
      await (await open(temporary, "wx")).close();
      await unlink(temporary);
    }
  } catch (error) {
    throw refuse(fileReason(error), error);
  }
  return { shown, path, temporary, mode: found?.isFile() ? found.mode & 0o7777 : undefined, special };
}

/** The same for two names of one file. */
async function identity(path: string): Promise<string> {
  const found = await stat(path, { bigint: true }).catch(() => undefined);
  return found ? `${found.dev}:${found.ino}` : resolve(path);
}
