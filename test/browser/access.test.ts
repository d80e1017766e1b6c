import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import type { AxeResults } from "axe-core";
import { describe, expect, it } from "vitest";
import { type StartedPage, startPage } from "./harness.ts";
import { read, settled } from "./support.ts";

const axe = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

/** What axe-core finds wrong: the rule and where. */
async function violations({ page }: StartedPage): Promise<readonly string[]> {
  await page.evaluate(axe);
  const results = await page.evaluate(() => (globalThis as unknown as { axe: { run(): Promise<AxeResults> } }).axe.run());
  return results.violations.map((v) => `${v.id}: ${v.nodes.map((n) => n.target.join(" ")).join("; ")}`);
}

describe.each(["light", "dark"] as const)("axe-core finds nothing wrong with the %s page", (theme) => {
  it.each([
    ["place", 1440, 900],
    ["resolve", 1440, 900],
    ["compare", 1280, 720],
    ["report", 1280, 720],
    ["place", 1024, 768],
    ["resolve", 1024, 768],
  ] as const)("at #%s, %d by %d", async (task, width, height) => {
    const started = await startPage({ theme, width, height, path: `#${task}` });
    try {
      await settled(started);
      expect(await violations(started)).toEqual([]);
      if (task === "resolve") {
        const { page } = started;
        await page.locator("sw-figures-button .open").click();
        expect(await violations(started)).toEqual([]);
        await page.keyboard.press("Escape");
        await page.locator("[data-line=R6]").click();
        const field = page.locator('[data-part="declination"] input');
        await field.fill("north");
        await field.press("Enter");
        expect(await violations(started)).toEqual([]);
      }
    } finally {
      await started.close();
    }
  });
});

describe("the keyboard", () => {
  it("turns single-letter keys off and on", async () => {
    const started = await startPage();
    try {
      const { page } = started;
      await settled(started);
      await page.keyboard.press("?");
      const keys = page.getByRole("dialog", { name: "Keys" });
      await keys.getByLabel("Single-letter keys").uncheck();
      await keys.getByRole("button", { name: "Close" }).click();
      await page.keyboard.press("2");
      expect(await page.locator("sw-resolve").count()).toBe(0);
      await page.reload();
      await settled(started);
      await page.keyboard.press("2");
      expect(await page.locator("sw-resolve").count()).toBe(0);
    } finally {
      await started.close();
    }
  });

  it("shows the cautions", async () => {
    const started = await startPage();
    try {
      const { page } = started;
      await settled(started);
      await page.getByRole("button", { name: "Cautions" }).click();
      const cautions = page.getByRole("dialog", { name: "Cautions" });
      expect(await cautions.textContent()).toContain("licensed practice and local codes");
      expect(await violations(started)).toEqual([]);
    } finally {
      await started.close();
    }
  });

  it("walks the ledger with J and I, and shows the line that is picked", async () => {
    const started = await startPage();
    try {
      const { page } = started;
      await settled(started);
      const picked = (): Promise<string | null> => page.locator('[data-line][aria-pressed="true"]').getAttribute("data-line");
      await page.keyboard.press("j");
      expect(await picked()).toBe("R1");
      await page.keyboard.press("j");
      expect(await picked()).toBe("R2");
      await page.keyboard.press("i");
      await page.keyboard.press("i");
      expect(await picked()).toBe("R9");
      expect(await read(page.locator("sw-ledger .foot h3"))).toBe("Trench");
    } finally {
      await started.close();
    }
  });

  it("shows a focus ring of two pixels on what it stands on", async () => {
    const started = await startPage({ path: "#resolve" });
    try {
      const { page } = started;
      await settled(started);
      const seen = new Set<string>();
      for (let k = 0; k < 30; k++) {
        await page.keyboard.press("Tab");
        const ring = await page.evaluate(() => {
          let at: Element | null = document.activeElement;
          while (at?.shadowRoot?.activeElement) at = at.shadowRoot.activeElement;
          const shown = at?.closest(".field") && !at.matches("select") ? at.closest(".field") : at;
          if (!shown || !at) return null;
          const { outlineWidth, outlineStyle } = getComputedStyle(shown);
          return {
            what: `${at.tagName} ${at.getAttribute("aria-label") ?? at.textContent?.trim().slice(0, 20)}`,
            outlineWidth,
            outlineStyle,
          };
        });
        if (!ring) continue;
        seen.add(ring.what);
        expect(ring, ring.what).toMatchObject({ outlineWidth: "2px", outlineStyle: "solid" });
      }
      expect(seen.size).toBeGreaterThan(20);
    } finally {
      await started.close();
    }
  });
});
