import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";
import { delimiter, join } from "node:path";
import { chromium } from "playwright-core";
import { shippedBrowser } from "./shipped.mjs";

const names = ["google-chrome-stable", "google-chrome", "chromium", "chromium-browser", "chrome", "microsoft-edge"];

/** Where installers put Chrome and its kin when they put it on no path. */
function usualPlaces({ platform, env }) {
  if (platform === "darwin") {
    return ["Google Chrome", "Chromium", "Microsoft Edge"].flatMap((name) =>
      ["/Applications", join(env.HOME ?? "", "Applications")].map((folder) => `${folder}/${name}.app/Contents/MacOS/${name}`),
    );
  }
  if (platform === "win32") {
    const folders = [env.PROGRAMFILES, env["PROGRAMFILES(X86)"], env.LOCALAPPDATA].filter(Boolean);
    const programs = [
      "Google\\Chrome\\Application\\chrome.exe",
      "Chromium\\Application\\chrome.exe",
      "Microsoft\\Edge\\Application\\msedge.exe",
    ];
    return programs.flatMap((program) => folders.map((folder) => `${folder}\\${program}`));
  }
  return ["/opt/google/chrome/chrome", "/usr/lib/chromium/chromium", "/snap/bin/chromium"];
}

/** A file of that name may be a note to install something else: only one that states a version counts. */
function answers(path) {
  if (!existsSync(path)) return false;
  // On Windows the question would open a window.
  if (process.platform === "win32") return true;
  const { status, stdout } = spawnSync(path, ["--version"], {
    encoding: "utf8",
    timeout: 30_000,
    stdio: ["ignore", "pipe", "ignore"],
  });
  return status === 0 && /\d+\.\d+/.test(stdout);
}

function installedPath() {
  const onPath = (process.env.PATH ?? "").split(delimiter).flatMap((folder) => names.map((name) => join(folder, name)));
  return [...onPath, ...usualPlaces(process)].find(answers);
}

/**
 * Which browser the tests drive: `CHROME_PATH` if set, else an installed Chrome or Chromium, else the one that comes with
 * the development packages (64-bit Linux). `SPANWRIGHT_BROWSER` = `installed` or `shipped` asks for one of the last two.
 *
 * @returns {Promise<{ executablePath: string, env: NodeJS.ProcessEnv }>}
 */
export async function findBrowser() {
  const { CHROME_PATH: named, SPANWRIGHT_BROWSER: wanted = "" } = process.env;
  if (!["", "installed", "shipped"].includes(wanted)) {
    throw new RangeError(`SPANWRIGHT_BROWSER is ${JSON.stringify(wanted)}; expected installed or shipped, or nothing for either.`);
  }
  if (wanted === "shipped") return shippedBrowser();
  if (named) {
    if (!answers(named))
      throw new RangeError(`CHROME_PATH is ${JSON.stringify(named)}; expected the path of a Chrome or Chromium that starts.`);
    return { executablePath: named, env: process.env };
  }
  const executablePath = installedPath();
  if (executablePath) return { executablePath, env: process.env };
  if (wanted === "installed") throw new Error("No installed Chrome or Chromium was found; CHROME_PATH can name one.");
  return shippedBrowser();
}

/**
 * Starts it without a window. It draws WebGL in software, so that pictures do not depend on the machine's graphics,
 * and finds no host but this machine, so that a test passes or fails the same with and without a network.
 *
 * @param {readonly string[]} [args] - More of Chromium's own switches.
 */
export async function launchBrowser(args = []) {
  const { executablePath, env } = await findBrowser();
  return chromium.launch({
    executablePath,
    env,
    // Containers give root, or no namespaces, and the sandbox starts under neither; only our own page is opened in it.
    chromiumSandbox: false,
    args: [
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
      "--no-first-run",
      "--disable-quic",
      "--host-resolver-rules=MAP * ~NOTFOUND, EXCLUDE 127.0.0.1, EXCLUDE localhost",
      "--use-angle=swiftshader",
      "--enable-unsafe-swiftshader",
      "--ignore-gpu-blocklist",
      "--font-render-hinting=none",
      ...args,
    ],
  });
}
