import { readFileSync } from "node:fs";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { App } from "../../src/screen/shell/app.ts";
import { type StartedPage, startPage } from "./harness.ts";
import { figure, line, pickedPoint, read, settled } from "./support.ts";

const IRIS_LIGHT = [0x4a, 0x3f, 0xc4] as const;

describe("the page at work", () => {
  let started: StartedPage;
  beforeAll(async () => {
    started = await startPage({ width: 1440, height: 900 });
    await settled(started);
  });
  afterAll(() => started?.close());

  it("opens the worked plan with its ledger judged", async () => {
    const { page } = started;
    expect(await page.title()).toBe("Thistledown Array, Spanwright");
    expect(await page.locator("[data-line]").count()).toBe(9);
    expect(await line(page, "R1")).toMatch(/^Beam, major axis .*1\.\d\d ?″ .*≤ 1\.85″ (Met|At risk|Not met), /);
  });

  it("follows a dragged station live, settles on release, and takes it back", async () => {
    const { page } = started;
    const before = await line(page, "R1");
    await page.locator("sw-station-table").getByText("High Latch").click();
    const at = await pickedPoint(page, IRIS_LIGHT);
    await page.mouse.move(at.x, at.y);
    await page.mouse.down();
    for (let k = 1; k <= 12; k++) await page.mouse.move(at.x - 8 * k, at.y + 6 * k);
    await page.waitForFunction(() => (document.querySelector("sw-app") as App).store?.shown.live.length);
    const held = await line(page, "R1");
    expect(held).toContain(", was 1.");
    expect(await line(page, "R5")).toContain("Working, last value shown");
    await page.mouse.up();
    await page.locator("sw-toast .toast").waitFor();
    expect(await read(page.locator("sw-toast .toast"))).toMatch(/^Moved High Latch \d+(\.\d+)? km\./);
    await settled(started);
    const after = await line(page, "R1");
    expect(after).not.toContain("was");
    expect(after).not.toBe(before);
    await page.locator("sw-toast").getByRole("button", { name: "Undo" }).click();
    await settled(started);
    expect(await line(page, "R1")).toBe(before);
    await page.keyboard.press("Shift+Z");
    await settled(started);
    expect(await line(page, "R1")).toBe(after);
    await page.keyboard.press("z");
    await settled(started);
  });

  it("puts a held station back with Escape", async () => {
    const { page } = started;
    const before = await line(page, "R1");
    const at = await pickedPoint(page, IRIS_LIGHT);
    await page.mouse.move(at.x, at.y);
    await page.mouse.down();
    for (let k = 1; k <= 6; k++) await page.mouse.move(at.x - 8 * k, at.y);
    await page.keyboard.press("Escape");
    await page.mouse.up();
    await settled(started);
    expect(await line(page, "R1")).toBe(before);
  });

  it("changes the beam with a typed declination", async () => {
    const { page } = started;
    const before = await figure(page, "R2");
    await page.keyboard.press("s");
    await page.locator('[data-part="declination"] input:focus').waitFor();
    await page.keyboard.type("+10d");
    await page.keyboard.press("Enter");
    await settled(started);
    expect(await page.locator('[data-part="declination"] input').inputValue()).toBe("+10° 00′ 00″");
    expect(await figure(page, "R2")).not.toBe(before);
    expect(await line(page, "R1")).toContain("δ 10°");
  });

  it("keeps the last good value when something else is typed, with a sentence beside it", async () => {
    const { page } = started;
    const declination = page.locator('[data-part="declination"]');
    const field = declination.locator("input");
    await field.fill("190");
    await field.press("Enter");
    expect(await read(declination.getByRole("alert"))).toMatch(/^declination is "190"; expected /);
    expect(await field.getAttribute("aria-invalid")).toBe("true");
    expect(await page.evaluate(() => (document.querySelector("sw-app") as App).store?.plan.observations[0].declinationDeg)).toBe(
      10,
    );
    await field.press("Escape");
    expect(await field.inputValue()).toBe("+10° 00′ 00″");
    expect(await declination.getByRole("alert").count()).toBe(0);
  });

  it("steps the digit at the caret, several steps being one of undo", async () => {
    const { page } = started;
    const field = page.locator('[data-part="declination"] input');
    await field.focus();
    await field.evaluate((input: HTMLInputElement) => input.setSelectionRange(3, 3));
    for (let k = 0; k < 3; k++) await field.press("ArrowDown");
    expect(await field.inputValue()).toBe("+07° 00′ 00″");
    await field.blur();
    await page.keyboard.press("z");
    expect(await field.inputValue()).toBe("+10° 00′ 00″");
    await page.keyboard.press("z");
    await settled(started);
    expect(await field.inputValue()).toBe("\u221230° 00′ 00″");
  });

  it("shows wavelength and frequency as one value", async () => {
    const { page } = started;
    const [wavelength, frequency] = await page.locator('[data-part="wavelength"] input').all();
    await wavelength.fill("1.5 GHz");
    await wavelength.press("Enter");
    expect(await frequency.inputValue()).toBe("1.500");
    expect(await wavelength.inputValue()).toBe("19.99");
    await wavelength.blur();
    await page.keyboard.press("z");
    await settled(started);
  });

  it("moves a slider with the keyboard, and follows it while it is dragged", async () => {
    const { page } = started;
    const handle = page.getByRole("slider", { name: "Declination" });
    await handle.focus();
    await page.keyboard.press("ArrowRight");
    expect(await handle.getAttribute("aria-valuetext")).toBe("\u221229° 00′");
    await page.keyboard.press("z");
    await settled(started);
    const box = await handle.boundingBox();
    if (!box) throw new Error("the slider is shown");
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
    await page.mouse.move(x, y);
    await page.mouse.down();
    await page.mouse.move(x - 12, y, { steps: 4 });
    await page.waitForFunction(() => (document.querySelector("sw-app") as App).store?.shown.picture?.settled === false);
    await page.mouse.up();
    await settled(started);
    expect(await page.evaluate(() => (document.querySelector("sw-app") as App).store?.shown.undoLabel)).toMatch(/^declination /);
    await page.keyboard.press("z");
    await settled(started);
  });

  it("gives the verdict of another pair", async () => {
    const { page } = started;
    const panel = page.locator("sw-pair-panel");
    await panel.getByLabel("Separation").fill("0.8");
    await panel.getByLabel("Separation").press("Enter");
    await settled(started);
    expect(await read(panel.locator(".verdict"))).toContain("Blended");
    await panel.getByLabel("Separation").fill("6");
    await panel.getByLabel("Separation").press("Enter");
    await settled(started);
    expect(await read(panel.locator(".verdict"))).toContain("Resolved");
  });

  it("reads what lies under the pointer", async () => {
    const { page } = started;
    await page.locator("sw-beam-panel .square").hover();
    expect(await read(page.locator("sw-beam-panel header .aside"))).toMatch(/″ [EW], .*″ [NS]: \S+ % of peak$/);
    await page.locator("sw-uv-panel .square").hover({ position: { x: 40, y: 40 } });
    expect(await read(page.locator("sw-uv-panel header .aside:not([hidden])"))).toMatch(/^u \u2212.* kλ is a .* spacing$/);
  });

  it("sees another layout and another observation", async () => {
    const { page } = started;
    await page.locator("h1").click();
    await page.keyboard.press("2");
    const before = await line(page, "R1");
    await page.getByLabel("Layout", { exact: true }).selectOption({ label: "Ring and core" });
    await settled(started);
    expect(await line(page, "R1")).not.toBe(before);
    await page.locator("sw-ledger").getByLabel("Observation", { exact: true }).selectOption({ index: 1 });
    await settled(started);
    expect(await page.locator('[data-part="declination"] input').inputValue()).toBe("+15° 00′ 00″");
  });

  it("says plainly what is not built", async () => {
    const { page } = started;
    await page.keyboard.press("Escape");
    await page.locator("h1").click();
    await page.keyboard.press("3");
    expect(await read(page.locator("main h2"))).toBe("Compare is not built yet");
    await page.keyboard.press("4");
    expect(await read(page.locator("main h2"))).toBe("Report is not built yet");
    await page.keyboard.press("1");
    expect(await page.locator("sw-place").count()).toBe(1);
  });

  it("makes no request but to its own server, breaks no rule of its policy and throws nothing", () => {
    expect(started.outsideRequests()).toEqual([]);
    expect(started.violations).toEqual([]);
    expect(started.consoleErrors).toEqual([]);
    expect(started.pageErrors).toEqual([]);
  });
});

describe("plan files", () => {
  let started: StartedPage;
  beforeAll(async () => {
    started = await startPage({ path: "#resolve" });
    await settled(started);
  });
  afterAll(() => started?.close());

  const open = async (name: string, text: string): Promise<void> => {
    const { page } = started;
    const chooser = page.waitForEvent("filechooser");
    await page.getByRole("button", { name: /^Open/ }).click();
    await (await chooser).setFiles({ name, mimeType: "application/json", buffer: Buffer.from(text) });
  };

  it("saves the plan as a file that opens again as it was", async () => {
    const { page } = started;
    const download = page.waitForEvent("download");
    await page.getByRole("button", { name: "Save" }).click();
    const file = await download;
    expect(file.suggestedFilename()).toBe("thistledown-array.plan.json");
    const text = readFileSync(await file.path(), "utf8");
    const saved = JSON.parse(text) as { stations: unknown[]; savedUtc: string };
    expect(saved.stations).toHaveLength(120);
    expect(saved.savedUtc).toMatch(/^\d{4}-\d\d-\d\dT.*Z$/);
    await open("again.plan.json", text);
    await settled(started);
    expect(await read(page.locator("sw-toast .toast"))).toContain("Opened Thistledown Array.");
  });

  it("lists every fault of a file that cannot be opened, and keeps the plan that is open", async () => {
    const { page } = started;
    const plan = JSON.parse(readFileSync(new URL("../../scenarios/thistledown.plan.json", import.meta.url), "utf8"));
    plan.stations[3].latitudeDeg = 533.2;
    plan.observations[0].frequencyHz = "fast";
    await open("broken.plan.json", JSON.stringify(plan));
    const notice = page.getByRole("alert").filter({ hasText: "broken.plan.json cannot be opened" });
    await notice.waitFor();
    const lines = await notice.locator("li").allInnerTexts();
    expect(lines).toHaveLength(2);
    expect(lines.join("\n")).toMatch(/stations\[3\]\.latitudeDeg is 533\.2; expected a latitude/);
    expect(await page.locator("[data-line]").count()).toBe(9);
    await notice.getByRole("button", { name: "Close" }).click();
    expect(await notice.count()).toBe(0);
  });
});

describe("the look of the page", () => {
  it("follows the system, and keeps the look that was chosen instead", async () => {
    const started = await startPage({ theme: "dark" });
    try {
      const { page } = started;
      const theme = (): Promise<string | undefined> => page.evaluate(() => document.documentElement.dataset.theme);
      expect(await theme()).toBe("dark");
      await page.emulateMedia({ colorScheme: "light" });
      await page.waitForFunction(() => document.documentElement.dataset.theme === "light");
      await page.locator('[data-command="theme"]').click();
      expect(await theme()).toBe("dark");
      await page.reload();
      expect(await theme()).toBe("dark");
    } finally {
      await started.close();
    }
  });
});

describe("without WebGL", () => {
  it("does all the same", async () => {
    const started = await startPage({ path: "#resolve", args: ["--disable-gpu", "--disable-3d-apis"] });
    try {
      expect(await started.page.evaluate(() => document.createElement("canvas").getContext("webgl2"))).toBeNull();
      await settled(started);
      expect(await read(started.page.locator("sw-beam-panel header"))).toMatch(/1\.\d\d″ × 1\.\d\d″/);
      expect([...started.consoleErrors, ...started.pageErrors]).toEqual([]);
    } finally {
      await started.close();
    }
  });
});
