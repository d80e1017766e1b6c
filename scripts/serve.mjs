import { createServer } from "node:http";
import { resolve } from "node:path";
import sirv from "sirv";
import { securityHeaders } from "./policy.mjs";

/** A port taken by someone else is passed over this many times before giving up. */
const portsTried = 100;

/**
 * Serves a built folder on this machine alone, with the page's security headers on every answer.
 * The folder's files are listed once, at the start: a path outside that list, however it is written, is a 404.
 *
 * @param {{ folder: string, port: number }} options - `port` 0 takes any free one; a taken port moves on by one.
 * @returns {Promise<{ url: string, port: number, close: () => Promise<void> }>}
 */
export async function serveFolder({ folder, port }) {
  const files = sirv(resolve(folder), { etag: true, maxAge: 0 });
  const server = createServer((request, response) => {
    for (const [name, value] of Object.entries(securityHeaders)) response.setHeader(name, value);
    if (request.method !== "GET" && request.method !== "HEAD") {
      response.writeHead(405, { Allow: "GET, HEAD" }).end();
      return;
    }
    // Whole files only: a malformed range would throw inside the file reader, and nothing here needs one.
    delete request.headers.range;
    files(request, response, () => response.writeHead(404, { "Content-Type": "text/plain;charset=utf-8" }).end("Not found\n"));
  });
  const taken = await listenFrom(server, port);
  return {
    url: `http://127.0.0.1:${taken}/`,
    port: taken,
    close: () =>
      new Promise((done) => {
        server.close(() => done());
        server.closeAllConnections();
      }),
  };
}

async function listenFrom(server, first) {
  const last = first === 0 ? 0 : Math.min(first + portsTried - 1, 65535);
  for (let port = first; ; port++) {
    try {
      return await listen(server, port);
    } catch (error) {
      if (error.code !== "EADDRINUSE" || port >= last) throw error;
    }
  }
}

function listen(server, port) {
  return new Promise((done, fail) => {
    server.once("error", fail);
    server.listen(port, "127.0.0.1", () => {
      server.off("error", fail);
      done(server.address().port);
    });
  });
}
