import type { WorkerLike } from "../tasks/protocol.ts";

/** Everything the terminal reaches besides files, as arguments: tests run the program without a process. */
export interface Io {
  /** Results. Resolves when more may be written. @throws {@link ReaderGone} when nobody reads any more. */
  readonly out: (text: string) => Promise<void>;
  /** Progress and warnings. */
  readonly err: (text: string) => void;
  /** Whether `err` is a terminal, where a line can be drawn over. */
  readonly errIsTerminal: boolean;
  readonly nowMs: () => number;
  /** Aborted when the person stops the program. */
  readonly signal: AbortSignal;
  /** Processors the program may use. */
  readonly cores: number;
  /** Starts a thread that runs tasks; left out where there is no built program to start one from. */
  readonly spawn?: () => WorkerLike;
}

/** The reader of stdout has closed it, as `head` does: there is nothing more to do, and nothing went wrong. */
export class ReaderGone extends Error {
  override readonly name = "ReaderGone";
}
