import type { Checkpoint } from "../base/checkpoint.ts";
import { Cancelled } from "../tasks/protocol.ts";
import type { Io } from "./io.ts";

/** Work shorter than this shows nothing. */
const QUIET_MS = 1000;
const REDRAW_MS = 100;
const LINE_MS = 5000;
/** Signals are only heard between turns of the event loop. */
const TURN_MS = 20;
const WIDTH = 30;

export interface Progress {
  readonly checkpoint: Checkpoint;
  /** Clears the bar. Call before anything else is written to the terminal. */
  readonly end: () => void;
}

/** Shows how far a job is: a bar on a terminal, else a line now and then. Its checkpoint throws when the person stops the program. */
export function progress(io: Io, label: string): Progress {
  const startMs = io.nowMs();
  let turnMs = startMs;
  let shownMs = Number.NEGATIVE_INFINITY;
  let drawn = false;
  const show = (done: number, now: number): void => {
    if (now - startMs < QUIET_MS || now - shownMs < (io.errIsTerminal ? REDRAW_MS : LINE_MS)) return;
    shownMs = now;
    const percent = `${Math.floor(100 * Math.min(1, Math.max(0, done)))} %`.padStart(5);
    if (io.errIsTerminal) {
      const full = Math.round(WIDTH * Math.min(1, Math.max(0, done)));
      io.err(`\r${label} ${"━".repeat(full)}${"┄".repeat(WIDTH - full)}${percent}\u001b[K`);
      drawn = true;
    } else io.err(`${label}${percent}\n`);
  };
  return {
    checkpoint: async (done) => {
      const now = io.nowMs();
      show(done, now);
      if (now - turnMs >= TURN_MS) {
        await new Promise<void>((resolve) => setImmediate(resolve));
        turnMs = io.nowMs();
      }
      if (io.signal.aborted) throw new Cancelled();
    },
    end: () => {
      if (drawn) io.err("\r\u001b[K");
      drawn = false;
    },
  };
}

/** The part of a longer job from one fraction to another. */
export const part =
  (checkpoint: Checkpoint, from: number, to: number): Checkpoint =>
  (done) =>
    checkpoint(from + (to - from) * done);
