import { mkdirSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { describe, expect, it } from "vitest";
import { startPage } from "./harness.ts";
import { settled } from "./support.ts";

const folder = fileURLToPath(new URL("../../.cache/screens/", import.meta.url));
mkdirSync(folder, { recursive: true });

/** Pictures for a person to look at, and what a person would see first: nothing cut off, nothing pushed out of the page. */
describe.each(["light", "dark"] as const)("the %s page", (theme) => {
  it.each([
    [1600, 1000],
    [1440, 900],
    [1280, 720],
    [1024, 768],
  ] as const)("fits %d by %d", async (width, height) => {
    const started = await startPage({ theme, width, height });
    try {
      const { page } = started;
      await settled(started);
      for (const task of ["place", "resolve"]) {
        await page.goto(`${started.url}#${task}`);
        await settled(started);
        await page.waitForTimeout(300);
        await page.screenshot({ path: `${folder}${task}-${theme}-${width}x${height}.png` });
        const wide = await page.evaluate(() => [document.documentElement.scrollWidth, document.documentElement.scrollHeight]);
        expect(wide).toEqual([width, height]);
        const outside = await page.evaluate((limit) => {
          const found: string[] = [];
          const visit = (root: ParentNode): void => {
            for (const element of root.querySelectorAll("*")) {
              if (element.shadowRoot) visit(element.shadowRoot);
              const box = element.getBoundingClientRect();
              if (element.matches("button, input, select, a") && box.width > 0 && box.right > limit + 0.5)
                found.push(element.outerHTML.slice(0, 80));
            }
          };
          visit(document);
          return found;
        }, width);
        expect(outside).toEqual([]);
      }
    } finally {
      await started.close();
    }
  });
});
