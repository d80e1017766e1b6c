import { spawn, spawnSync } from "node:child_process";
import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { smallPlan } from "./small-plan.ts";
import { Desk } from "./terminal.ts";

const program = fileURLToPath(new URL("../../dist/terminal/spanwright.js", import.meta.url));
const isBuilt = existsSync(program);
const note = isBuilt ? "" : " (skipped: dist/terminal is not built)";

let desk: Desk;
let plan: string;
beforeEach(() => {
  desk = new Desk();
  plan = desk.put("ridge.plan.json", smallPlan());
});
afterEach(() => desk.clear());

const spawned = (...argv: readonly string[]) => spawnSync(process.execPath, [program, ...argv], { encoding: "utf8" });

describe("the built program", () => {
  it.skipIf(!isBuilt)(`starts, keeps results and messages apart, and exits as it should${note}`, () => {
    const good = spawned("assess", plan, "--json");
    expect(good.status).toBe(0);
    expect(JSON.parse(good.stdout)).toHaveLength(4);
    const bad = spawned("assess", desk.path("none.json"));
    expect([bad.status, bad.stdout]).toEqual([2, ""]);
    expect(bad.stderr).toMatch(/^spanwright: .*none\.json: cannot be read: there is no such file or folder\n$/);
  });

  it.skipIf(!isBuilt)(`ends quietly when the reader leaves${note}`, () => {
    const run = spawnSync(
      "sh",
      ["-c", '"$1" "$2" tracks "$3" --layout wide --observation south | head -n 1', "sh", process.execPath, program, plan],
      {
        encoding: "utf8",
      },
    );
    expect([run.status, run.stderr]).toEqual([0, ""]);
    expect(run.stdout).toMatch(/^stationA/);
  });

  it.skipIf(!isBuilt).each(["SIGINT", "SIGTERM"] as const)(`leaves nothing behind when stopped by %s${note}`, async (signal) => {
    // Work for minutes, so that the signal comes in the middle of it.
    const child = spawn(process.execPath, [
      program,
      "sweep",
      plan,
      "--vary",
      "declination=-89:-10:0.01",
      "--out",
      desk.path("s.csv"),
    ]);
    let said = "";
    child.stderr.on("data", (data) => {
      said += data;
      if (said.includes("the first of the plan")) child.kill(signal);
    });
    const code = await new Promise((resolve) => child.on("close", resolve));
    expect(code).toBe(130);
    expect(said).toContain("spanwright: stopped; nothing was written\n");
    expect(desk.list()).toEqual(["ridge.plan.json"]);
  });

  it.skipIf(!isBuilt)(`gives the same bytes on one thread, two and eight${note}`, () => {
    const swept = (workers: string) =>
      spawned(
        "sweep",
        plan,
        "--layout",
        "wide",
        "--observation",
        "south",
        "--vary",
        "declination=-40:0:10",
        "--workers",
        workers,
        "--json",
      );
    const [one, two, eight] = ["1", "2", "8"].map(swept);
    expect([one.status, two.status, eight.status]).toEqual([0, 0, 0]);
    expect(JSON.parse(one.stdout)).toHaveLength(5);
    expect(two.stdout).toBe(one.stdout);
    expect(eight.stdout).toBe(one.stdout);
    const assessed = (workers: string) => spawned("assess", plan, "--json", "--workers", workers).stdout;
    expect(assessed("4")).toBe(assessed("1"));
  });
});
