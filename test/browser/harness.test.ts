import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type StartedPage, startPage } from "./harness.ts";

let started: StartedPage;

beforeAll(async () => {
  started = await startPage({ theme: "dark", width: 1024, height: 768 });
});

afterAll(() => started?.close());

describe("the browser the page is tested in", () => {
  it("has the size and theme asked for", async () => {
    const seen = await started.page.evaluate(() => ({
      size: [innerWidth, innerHeight, devicePixelRatio],
      dark: matchMedia("(prefers-color-scheme: dark)").matches,
      still: matchMedia("(prefers-reduced-motion: reduce)").matches,
    }));
    expect(seen).toEqual({ size: [1024, 768, 1], dark: true, still: true });
  });

  it("draws WebGL 2, in software", async () => {
    const seen = await started.page.evaluate(() => {
      const gl = document.createElement("canvas").getContext("webgl2");
      if (!gl) return undefined;
      gl.clearColor(0, 0.5, 1, 1);
      gl.clear(gl.COLOR_BUFFER_BIT);
      const pixel = new Uint8Array(4);
      gl.readPixels(0, 0, 1, 1, gl.RGBA, gl.UNSIGNED_BYTE, pixel);
      const names = gl.getExtension("WEBGL_debug_renderer_info");
      return { pixel: Array.from(pixel), renderer: String(names && gl.getParameter(names.UNMASKED_RENDERER_WEBGL)) };
    });
    expect(seen?.renderer).toContain("SwiftShader");
    // Half of 255 lies between two levels; either is right.
    expect(seen?.pixel.toSpliced(1, 1)).toEqual([0, 255, 255]);
    expect(seen?.pixel[1]).toBeGreaterThanOrEqual(127);
    expect(seen?.pixel[1]).toBeLessThanOrEqual(128);
  });

  it("notes what goes elsewhere", async () => {
    await started.page.evaluate(() => {
      document.body.append(Object.assign(document.createElement("a"), { href: "http://elsewhere.invalid/page", id: "away" }));
      document.getElementById("away")?.click();
    });
    await expect.poll(() => started.outsideRequests()).toEqual(["http://elsewhere.invalid/page"]);
  });
});
