import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { rawRequest } from "../structure/rawrequest.ts";
import { type StartedPage, startPage } from "./harness.ts";

let started: StartedPage;

beforeAll(async () => {
  started = await startPage();
  await started.page.waitForLoadState("networkidle");
});

afterAll(() => started?.close());

describe("the page's security", () => {
  it("asks nobody but its own server for anything", () => {
    expect(started.requests.length).toBeGreaterThan(1);
    expect(started.outsideRequests()).toEqual([]);
  });

  it("starts without an error and within its policy", () => {
    expect(started.violations).toEqual([]);
    expect(started.pageErrors).toEqual([]);
    expect(started.consoleErrors).toEqual([]);
  });

  it("states its policy in the page as well as in the header", async () => {
    const { headers, body } = await rawRequest(started.url, "/");
    const header = String(headers["content-security-policy"]);
    const meta = await started.page.locator('meta[http-equiv="Content-Security-Policy"]').getAttribute("content");
    expect(header).toBe(`${meta}; frame-ancestors 'none'`);
    // The policy binds what follows it, so nothing that loads may stand before it.
    const before = body.slice(0, body.indexOf("Content-Security-Policy"));
    expect(before).not.toMatch(/<(script|link|style|base)\b/);
  });

  it("is held to it: script from elsewhere, inline script and style elements are refused, and noted here", async () => {
    const intruder = await startPage();
    try {
      const ran = await intruder.page.evaluate(async () => {
        const done = (element: HTMLScriptElement): Promise<string> =>
          new Promise((settle) => {
            element.onload = () => settle("ran");
            element.onerror = () => settle("refused");
            document.head.append(element);
          });
        const elsewhere = Object.assign(document.createElement("script"), { src: "https://elsewhere.invalid/a.js" });
        const inline = Object.assign(document.createElement("script"), { textContent: "globalThis.inlineRan = true" });
        document.head.append(inline, Object.assign(document.createElement("style"), { textContent: "body { color: red }" }));
        return { elsewhere: await done(elsewhere), inline: "inlineRan" in globalThis };
      });
      expect(ran).toEqual({ elsewhere: "refused", inline: false });
      await expect
        .poll(() => intruder.violations)
        .toEqual(
          expect.arrayContaining([
            "script-src-elem: https://elsewhere.invalid/a.js",
            "script-src-elem: inline",
            "style-src-elem: inline",
          ]),
        );
    } finally {
      await intruder.close();
    }
  });

  it.each(["/../package.json", "/%2e%2e/%2e%2e/package.json", "/..%2f..%2fpackage.json", "/assets/", "/nowhere.html"])(
    "answers 404 to %s",
    async (path) => {
      expect((await rawRequest(started.url, path)).status).toBe(404);
    },
  );
});
