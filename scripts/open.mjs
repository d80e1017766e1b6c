import { spawn } from "node:child_process";

const openers = { darwin: ["open"], win32: ["cmd", "/c", "start", ""] };

/** Opens an address in the person's own browser. Where there is none, nothing happens: the address is printed anyway. */
export function openBrowser(url, { platform = process.platform, env = process.env } = {}) {
  if (!openers[platform] && !env.DISPLAY && !env.WAYLAND_DISPLAY) return;
  const [command, ...args] = openers[platform] ?? ["xdg-open"];
  const child = spawn(command, [...args, url], { stdio: "ignore", detached: true });
  child.once("error", () => {});
  child.unref();
}
