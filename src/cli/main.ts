import { availableParallelism } from "node:os";
import { workerData } from "node:worker_threads";
import { STOPPED } from "./faults.ts";
import { type Io, ReaderGone } from "./io.ts";
import { removeBegun } from "./output.ts";
import { run } from "./run.ts";
import { isTaskThread, serveThread, thread } from "./threads.ts";

if (isTaskThread(workerData)) serveThread();
else await program();

async function program(): Promise<void> {
  const stop = new AbortController();
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"] as const) {
    process.on(signal, () => {
      // Asked a second time, the program leaves at once.
      if (stop.signal.aborted) process.exit(STOPPED);
      stop.abort();
    });
  }
  process.on("exit", removeBegun);

  let readerGone = false;
  process.stdout.on("error", (error: NodeJS.ErrnoException) => {
    if (error.code !== "EPIPE") throw error;
    readerGone = true;
  });
  // Nobody is left to tell.
  process.stderr.on("error", () => undefined);

  const io: Io = {
    out: (text) =>
      new Promise((resolve, reject) => {
        if (readerGone) reject(new ReaderGone());
        else process.stdout.write(text, (error) => (error ? reject(readerGoneOr(error)) : resolve()));
      }),
    err: (text) => process.stderr.write(text),
    errIsTerminal: process.stderr.isTTY === true,
    nowMs: () => performance.now(),
    signal: stop.signal,
    cores: availableParallelism(),
    spawn: () => thread(new URL(import.meta.url)),
  };

  const readerGoneOr = (error: NodeJS.ErrnoException): Error => (error.code === "EPIPE" ? new ReaderGone() : error);

  process.exitCode = await run(process.argv.slice(2), io);
}
