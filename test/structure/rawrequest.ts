import { type IncomingHttpHeaders, request } from "node:http";

export interface RawAnswer {
  readonly status: number;
  readonly headers: IncomingHttpHeaders;
  readonly body: string;
}

/** One request with the path exactly as written: fetch and browsers would tidy `/../` away before it left. */
export function rawRequest(url: string, path: string, headers: Record<string, string> = {}, method = "GET"): Promise<RawAnswer> {
  const { hostname, port } = new URL(url);
  return new Promise((done, fail) => {
    const sent = request({ hostname, port, path, headers, method, agent: false }, (answer) => {
      let body = "";
      answer.setEncoding("utf8");
      answer.on("data", (text: string) => {
        body += text;
      });
      answer.on("end", () => done({ status: answer.statusCode ?? 0, headers: answer.headers, body }));
      answer.on("error", fail);
    });
    sent.on("error", fail);
    sent.end();
  });
}
