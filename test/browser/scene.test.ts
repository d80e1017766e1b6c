import { readFileSync } from "node:fs";
import { decode } from "fast-png";
import { describe, expect, it } from "vitest";
import { type StartedPage, startPage } from "./harness.ts";
import { read, settled } from "./support.ts";

/** How many colours the picture has in its middle, and a sum that tells two pictures apart. */
async function looked({ page }: StartedPage): Promise<{ colours: number; data: Uint8Array }> {
  const { data, channels } = decode(await page.locator("sw-space").screenshot());
  const colours = new Set<number>();
  for (let k = 0; k < data.length; k += channels) colours.add((data[k] << 16) | (data[k + 1] << 8) | data[k + 2]);
  return { colours: colours.size, data: Uint8Array.from(data) };
}

const toSpace = async ({ page }: StartedPage): Promise<void> => {
  await page.getByRole("button", { name: "In space" }).click();
  await page.locator("sw-space canvas.over").waitFor();
  await page.waitForTimeout(500);
};

describe("the array in space", () => {
  it("is drawn in software, turns, and gives the map back", async () => {
    const started = await startPage();
    try {
      const { page } = started;
      await settled(started);
      expect(started.requests.some((url) => /\/scene-/.test(url))).toBe(false);
      await toSpace(started);
      expect(started.requests.some((url) => /\/scene-/.test(url))).toBe(true);
      const before = await looked(started);
      expect(before.colours).toBeGreaterThan(50);
      await page.locator("sw-space canvas.over").focus();
      await page.keyboard.press("ArrowRight");
      await page.waitForTimeout(300);
      const turned = await looked(started);
      expect(turned.data).not.toEqual(before.data);
      await page.keyboard.press("0");
      await page.waitForTimeout(300);
      expect((await looked(started)).data).not.toEqual(turned.data);
      expect(await read(page.locator("sw-space .say p"))).toContain("at hour angle 0 h");
      await page.getByRole("slider", { name: "Hour angle" }).fill("3");
      expect(await read(page.locator("sw-space .say p"))).toContain("at hour angle 3 h");
      await page.getByRole("button", { name: "Move" }).click();
      expect(await page.locator("sw-ground-map").count()).toBe(1);
      expect([...started.consoleErrors, ...started.pageErrors, ...started.violations]).toEqual([]);
    } finally {
      await started.close();
    }
  });

  it("is a globe for a network round the Earth", async () => {
    const started = await startPage();
    try {
      const { page } = started;
      await settled(started);
      const chooser = page.waitForEvent("filechooser");
      await page.getByRole("button", { name: /^Open/ }).click();
      const buffer = readFileSync(new URL("../../scenarios/long-meridian.plan.json", import.meta.url));
      await (await chooser).setFiles({ name: "long-meridian.plan.json", mimeType: "application/json", buffer });
      await page.locator("sw-toast .toast").waitFor();
      await toSpace(started);
      expect(await read(page.locator("sw-space .say p"))).toMatch(/\d+ of 12 stations of .* see the target/);
      expect((await looked(started)).colours).toBeGreaterThan(50);
      expect([...started.consoleErrors, ...started.pageErrors]).toEqual([]);
    } finally {
      await started.close();
    }
  });

  it("says in one sentence why the flat map stays without WebGL", async () => {
    const started = await startPage({ args: ["--disable-gpu", "--disable-3d-apis"] });
    try {
      const { page } = started;
      await settled(started);
      await page.getByRole("button", { name: "In space" }).click();
      expect(await read(page.locator("sw-place .why"))).toBe("This browser gives no WebGL, so the flat map stays.");
      expect(await page.locator("sw-ground-map").count()).toBe(1);
      expect(await page.locator("sw-space").count()).toBe(0);
    } finally {
      await started.close();
    }
  });
});
