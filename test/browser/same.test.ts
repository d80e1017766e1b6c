import { describe, expect, it } from "vitest";
import { assess } from "../../src/assess/assess.ts";
import { roundedJson } from "../../src/base/json.ts";
import type { App } from "../../src/screen/shell/app.ts";
import { scenario } from "../support/scenario.ts";
import { startPage } from "./harness.ts";
import { settled } from "./support.ts";

describe("the same plan", () => {
  it("has the same figures in the page and in Node, to the byte", async () => {
    const plan = scenario("thistledown");
    const started = await startPage({ path: "#resolve" });
    try {
      const { page } = started;
      await settled(started);
      // The declinations come from the pool of workers, the picture from a worker of its own.
      await page.waitForFunction(
        () => {
          const { declinations, sweeping } = (document.querySelector("sw-app") as App).store?.shown ?? {};
          return declinations && sweeping === null;
        },
        undefined,
        { timeout: 200_000 },
      );
      const { result, points, layout, observation, pair } = await page.evaluate(() => {
        const shown = (document.querySelector("sw-app") as App).store?.shown;
        return {
          result: shown?.picture?.result,
          points: shown?.declinations?.points.slice(0, 40),
          layout: shown?.session.layout ?? "",
          observation: shown?.session.observation ?? "",
          pair: shown?.session.pair ?? null,
        };
      });
      expect(roundedJson(result, 2)).toBe(roundedJson(await assess(plan, layout, observation, { pair }), 2));
      const some = (points ?? []).filter((_, k) => k % 9 === 0);
      expect(some.length).toBeGreaterThan(2);
      for (const { at, result: there } of some) {
        const here = {
          ...plan,
          observations: plan.observations.map((o) => (o.id === observation ? { ...o, declinationDeg: at } : o)),
        };
        expect(roundedJson(there, 2)).toBe(roundedJson(await assess(here, layout, observation), 2));
      }
    } finally {
      await started.close();
    }
  });
});
