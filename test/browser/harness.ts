import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";
import type { Page } from "playwright-core";
import { launchBrowser } from "../../scripts/browser.mjs";
import { serveFolder } from "../../scripts/serve.mjs";

export interface PageOptions {
  readonly theme?: "light" | "dark";
  /** Pixels; one CSS pixel is one device pixel. */
  readonly width?: number;
  readonly height?: number;
  /** More of Chromium's own switches. */
  readonly args?: readonly string[];
  /** What to open, relative to the page's address: a query, a fragment. */
  readonly path?: string;
}

export interface StartedPage {
  readonly page: Page;
  /** The page's address, ending in a slash. */
  readonly url: string;
  /** Every address asked for so far, web sockets too, in order. */
  readonly requests: readonly string[];
  readonly consoleErrors: readonly string[];
  readonly pageErrors: readonly string[];
  /** What the security policy refused so far, as `directive: blocked address`. */
  readonly violations: readonly string[];
  /** Those requests that went anywhere but the page's own server. data: and blob: addresses go nowhere. */
  outsideRequests(): readonly string[];
  close(): Promise<void>;
}

const built = fileURLToPath(new URL("../../dist/page/", import.meta.url));

/**
 * Opens the built page in a fresh browser, served as `npm start` serves it.
 *
 * @returns The page after its load event. Close it when done: it holds a browser and a server.
 */
export async function startPage(options: PageOptions = {}): Promise<StartedPage> {
  const { theme = "light", width = 1440, height = 900, args = [], path = "" } = options;
  if (!existsSync(`${built}index.html`)) throw new Error("dist/page is not built; run npm run build first.");
  const served = await serveFolder({ folder: built, port: 0 });
  const browser = await launchBrowser(args).catch(async (error) => {
    await served.close();
    throw error;
  });
  const close = async (): Promise<void> => {
    await browser.close();
    await served.close();
  };
  try {
    const context = await browser.newContext({
      viewport: { width, height },
      deviceScaleFactor: 1,
      colorScheme: theme,
      reducedMotion: "reduce",
      locale: "en-GB",
      timezoneId: "UTC",
    });
    const requests: string[] = [];
    const consoleErrors: string[] = [];
    const pageErrors: string[] = [];
    const violations: string[] = [];
    context.on("request", (request) => requests.push(request.url()));
    const page = await context.newPage();
    page.on("websocket", (socket) => requests.push(socket.url()));
    page.on("console", (message) => {
      if (message.type() === "error") consoleErrors.push(message.text());
    });
    page.on("pageerror", (error) => pageErrors.push(error.stack ?? error.message));
    await page.exposeFunction("noteViolation", (text: string) => violations.push(text));
    await page.addInitScript(() => {
      const { noteViolation } = globalThis as unknown as { noteViolation(text: string): void };
      document.addEventListener("securitypolicyviolation", (event) =>
        noteViolation(`${event.effectiveDirective}: ${event.blockedURI}`),
      );
    });
    await page.goto(served.url + path, { waitUntil: "load" });
    return {
      page,
      url: served.url,
      requests,
      consoleErrors,
      pageErrors,
      violations,
      outsideRequests: () => requests.filter((url) => !url.startsWith(served.url) && !/^(data|blob):/.test(url)),
      close,
    };
  } catch (error) {
    await close();
    throw error;
  }
}
