import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type Served, serveFolder } from "../../scripts/serve.mjs";
import { rawRequest } from "./rawrequest.ts";

const outside = mkdtempSync(join(tmpdir(), "spanwright-server-"));
const folder = join(outside, "page");
let served: Served;

beforeAll(async () => {
  mkdirSync(join(folder, "assets"), { recursive: true });
  writeFileSync(join(outside, "secret.txt"), "secret");
  writeFileSync(join(folder, ".hidden"), "secret");
  writeFileSync(join(folder, "index.html"), "<!doctype html><title>Page</title>");
  writeFileSync(join(folder, "assets/code.js"), "export {};");
  served = await serveFolder({ folder, port: 0 });
});

afterAll(async () => {
  await served.close();
  rmSync(outside, { recursive: true });
});

describe("the server of the page", () => {
  it("serves the page and its files with their types", async () => {
    const page = await rawRequest(served.url, "/");
    expect([page.status, page.headers["content-type"], page.body]).toEqual([
      200,
      "text/html;charset=utf-8",
      "<!doctype html><title>Page</title>",
    ]);
    const code = await rawRequest(served.url, "/assets/code.js?v=1");
    expect([code.status, code.headers["content-type"]]).toEqual([200, "text/javascript"]);
  });

  it.each([
    "/secret.txt",
    "/../secret.txt",
    "/assets/../../secret.txt",
    "/%2e%2e/secret.txt",
    "/..%2fsecret.txt",
    "/%252e%252e/secret.txt",
    "/..\\secret.txt",
    "/..%5csecret.txt",
    "//secret.txt",
    "/.hidden",
    "/nowhere",
    "/%",
    "/%00",
    "/__proto__",
    `${"/..".repeat(20)}/etc/passwd`,
  ])("answers 404 to %s", async (path) => {
    const { status, body } = await rawRequest(served.url, path);
    expect([status, body]).toEqual([404, "Not found\n"]);
  });

  it.each(["/", "/assets/code.js", "/nowhere"])("sends the security headers with %s", async (path) => {
    const { headers } = await rawRequest(served.url, path);
    expect(headers).toMatchObject({
      "x-content-type-options": "nosniff",
      "referrer-policy": "no-referrer",
      "cross-origin-opener-policy": "same-origin",
    });
    const policy = String(headers["content-security-policy"]).split("; ");
    expect(policy).toEqual(expect.arrayContaining(["default-src 'none'", "script-src 'self'", "frame-ancestors 'none'"]));
    expect(policy.filter((directive) => /unsafe|\*|https?:/.test(directive))).toEqual(["style-src-attr 'unsafe-inline'"]);
  });

  it("outlives ranges it cannot read, and answers only reading", async () => {
    expect((await rawRequest(served.url, "/", { range: "bytes=9-2" })).status).toBe(200);
    expect((await rawRequest(served.url, "/", {}, "POST")).status).toBe(405);
    expect((await rawRequest(served.url, "/", {}, "HEAD")).body).toBe("");
  });

  it("moves on by one where a port is taken, and listens on this machine alone", async () => {
    const next = await serveFolder({ folder, port: served.port });
    expect(next.port).toBeGreaterThan(served.port);
    expect(next.url).toBe(`http://127.0.0.1:${next.port}/`);
    await next.close();
  });
});
