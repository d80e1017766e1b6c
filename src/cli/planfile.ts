import { open } from "node:fs/promises";
import { faultLines, PlanFaults } from "../plan/faults.ts";
import { type ReadPlan, readPlan } from "../plan/read.ts";
import { MOST_BYTES } from "../plan/text.ts";
import { Fault, fileReason, named } from "./faults.ts";

const CHUNK = 1 << 20;

/**
 * Reads a plan. Its size is looked at first, so that a file that is too large is never read.
 *
 * @throws {@link Fault} with a line for each thing wrong, the file's name in front.
 */
export async function readPlanFile(path: string): Promise<ReadPlan> {
  const text = await readText(path);
  try {
    return readPlan(text);
  } catch (error) {
    if (!(error instanceof PlanFaults)) throw error;
    throw new Fault(
      faultLines(error.faults).map((line) => `${named(path)}: ${line}`),
      { cause: error },
    );
  }
}

async function readText(path: string): Promise<string> {
  const refuse = (why: string, cause?: unknown): Fault => new Fault(`${named(path)}: cannot be read: ${why}`, { cause });
  const tooLarge = (): Fault => refuse("it is larger than 64 MiB, the most a plan may have");
  let bytes: Uint8Array;
  try {
    const file = await open(path, "r");
    try {
      const found = await file.stat();
      if (found.isDirectory()) throw refuse("it is a folder");
      if (found.size > MOST_BYTES) throw tooLarge();
      // A pipe or device has no size to look at: it is read until it ends or is too large.
      const parts: Uint8Array[] = [];
      let length = 0;
      for (;;) {
        const part = new Uint8Array(CHUNK);
        const { bytesRead } = await file.read(part, 0, CHUNK);
        if (bytesRead === 0) break;
        length += bytesRead;
        if (length > MOST_BYTES) throw tooLarge();
        parts.push(part.subarray(0, bytesRead));
      }
      bytes = new Uint8Array(length);
      let at = 0;
      for (const part of parts) {
        bytes.set(part, at);
        at += part.length;
      }
    } finally {
      await file.close();
    }
  } catch (error) {
    if (error instanceof Fault) throw error;
    throw refuse(fileReason(error), error);
  }
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch (error) {
    throw refuse("it is not UTF-8 text", error);
  }
}
