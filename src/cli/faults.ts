import { CommanderError } from "commander";
import { DomainError } from "../base/errors.ts";
import { Cancelled } from "../tasks/protocol.ts";
import { ReaderGone } from "./io.ts";

/** Exit codes. */
export const DONE = 0;
export const NOT_MET = 1;
export const WRONG_INPUT = 2;
/** A defect of the program itself (sysexits: EX_SOFTWARE). */
export const DEFECT = 70;
export const STOPPED = 130;

/** Something wrong with the input or the call, in one or more lines: exit 2. */
export class Fault extends Error {
  override readonly name = "Fault";
  readonly lines: readonly string[];

  constructor(lines: string | readonly string[], options?: ErrorOptions) {
    const all = typeof lines === "string" ? [lines] : lines;
    super(all.join("\n"), options);
    this.lines = all;
  }
}

/** How a verb ended that threw: the exit code and what to say, a line each. */
export function ending(error: unknown): { readonly code: number; readonly lines: readonly string[] } {
  if (error instanceof Cancelled) return { code: STOPPED, lines: ["stopped; nothing was written"] };
  if (error instanceof ReaderGone) return { code: DONE, lines: [] };
  if (error instanceof Fault) return { code: WRONG_INPUT, lines: error.lines };
  if (error instanceof DomainError) return { code: WRONG_INPUT, lines: [error.message] };
  // Commander has said what is wrong by then; help and version end with 0.
  if (error instanceof CommanderError) return { code: error.exitCode === 0 ? DONE : WRONG_INPUT, lines: [] };
  const text = error instanceof Error ? (error.stack ?? error.message) : String(error);
  return { code: DEFECT, lines: [`a defect of the program, not of the input: ${text}`] };
}

const reasons: { readonly [code: string]: string } = {
  ENOENT: "there is no such file or folder",
  ENOTDIR: "a part of the path is not a folder",
  EISDIR: "it is a folder",
  EACCES: "permission is denied",
  EPERM: "permission is denied",
  EROFS: "the file system is read-only",
  ENOSPC: "no space is left",
  EDQUOT: "the quota is used up",
  ENAMETOOLONG: "the name is too long",
  ELOOP: "links lead round in a circle",
  EMFILE: "too many files are open",
  EFBIG: "it is too large",
  EIO: "the device reports a failure",
  ETXTBSY: "it is in use",
  EBUSY: "it is in use",
};

/** Why a file operation did not work, in words. */
export function fileReason(error: unknown): string {
  const code = (error as NodeJS.ErrnoException)?.code;
  return (code && reasons[code]) || code || String(error);
}

/** A file name for a message: as it was typed, or quoted and escaped where it holds control characters. */
export const named = (path: string): string => (/\p{C}/u.test(path) || path === "" ? JSON.stringify(path) : path);
