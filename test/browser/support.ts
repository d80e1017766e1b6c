import { decode } from "fast-png";
import type { Locator, Page } from "playwright-core";
import type { App } from "../../src/screen/shell/app.ts";
import type { StartedPage } from "./harness.ts";

/** Settled answers take as long as they take; this only ends a hang. */
const PATIENCE = { timeout: 100_000 };

/** Waits until picture and ledger are settled. */
export async function settled({ page }: StartedPage): Promise<void> {
  await page.waitForFunction(
    () => {
      const shown = (document.querySelector("sw-app") as App | null)?.store?.shown;
      return shown && !shown.behind && !shown.working && !shown.dragging && shown.outcomes.length > 0 && shown.live.length === 0;
    },
    undefined,
    PATIENCE,
  );
}

/** What an element shows, spaces and breaks made one space. */
export async function read(locator: Locator): Promise<string> {
  return (await locator.allInnerTexts()).join(" ").replace(/\s+/g, " ").trim();
}

/** A line of the ledger as it reads. */
export const line = (page: Page, id: string): Promise<string> => read(page.locator(`[data-line="${id}"]`));

/** The figure a line shows. */
export async function figure(page: Page, id: string): Promise<number> {
  return Number.parseFloat((await read(page.locator(`[data-line="${id}"] .value`))).replace("\u2212", "-"));
}

/**
 * Where the picked station stands on the page, px: the densest spot of the colour that marks it on the map.
 *
 * @param colour - The selection's colour in the theme that is on, red, green, blue.
 */
export async function pickedPoint(page: Page, colour: readonly [number, number, number]): Promise<{ x: number; y: number }> {
  const map = page.locator("sw-ground-map");
  const box = await map.boundingBox();
  if (!box) throw new Error("the map is not shown");
  const { width, height, channels, data } = decode(await map.screenshot());
  const marked = new Uint8Array(width * height);
  for (let k = 0; k < marked.length; k++) marked[k] = colour.every((c, i) => Math.abs(data[channels * k + i] - c) <= 2) ? 1 : 0;
  const reach = 5;
  let best = { count: 0, x: 0, y: 0 };
  for (let y = reach; y < height - reach; y++) {
    for (let x = reach; x < width - reach; x++) {
      if (!marked[width * y + x]) continue;
      let count = 0;
      for (let j = -reach; j <= reach; j++) for (let i = -reach; i <= reach; i++) count += marked[width * (y + j) + x + i];
      if (count > best.count) best = { count, x, y };
    }
  }
  if (best.count < 40) throw new Error("no picked station on the map");
  return { x: box.x + best.x, y: box.y + best.y };
}
