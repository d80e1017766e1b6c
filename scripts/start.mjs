/**
 * `npm start`: from a fresh copy to the page in a browser. Installs, builds, prints the worked plan's assessment, serves.
 * Only Node's own modules are imported until the packages are known to be there.
 */
import { dirname } from "node:path";
import { build, isStale, page, terminal } from "./built.mjs";
import { install, isInstalled } from "./installed.mjs";
import { runNode } from "./node.mjs";
import { openBrowser } from "./open.mjs";
import { portFrom } from "./port.mjs";

const workedPlan = "scenarios/thistledown.plan.json";

function stop(line, code) {
  console.error(line);
  process.exit(code);
}

const [major, minor] = process.versions.node.split(".").map(Number);
if (major < 20 || (major === 20 && minor < 19)) stop(`Node is ${process.versions.node}; expected 20.19 or newer.`, 2);

const port = portFrom(process.env.PORT);
if (port === undefined) {
  stop(`PORT is ${JSON.stringify(process.env.PORT)}; expected a whole number from 0 (any free port) to 65535.`, 2);
}

if (!isInstalled()) {
  console.log("Installing packages. This takes about a minute, once.");
  const code = await install();
  if (code !== 0) stop("npm ci did not finish; its message is above.", code);
}
for (const [name, part] of Object.entries({ page, terminal })) {
  if (!isStale(part)) continue;
  console.log(`Building the ${name}.`);
  const code = await build(part);
  if (code !== 0) stop(`The ${name} was not built; the reason is above.`, code);
}

console.log(`Assessing ${workedPlan}.\n`);
const code = await runNode([terminal.output, "assess", workedPlan], { stdio: ["ignore", "inherit", "inherit"] });
if (code !== 0) stop(`${workedPlan} could not be assessed; the reason is above.`, code);

const { serveFolder } = await import("./serve.mjs");
const served = await serveFolder({ folder: dirname(page.output), port }).catch((error) =>
  stop(`Port ${port} cannot be used (${error.code ?? error.message}). Set PORT to another one.`, 2),
);
if (port !== 0 && served.port !== port) console.log(`\nPort ${port} is taken.`);
console.log(`\nSpanwright is at ${served.url}\nPress Ctrl-C to stop.`);

for (const signal of ["SIGINT", "SIGTERM"]) {
  process.once(signal, async () => {
    await served.close();
    console.log("\nStopped.");
    process.exit(0);
  });
}
if (process.stdout.isTTY && !process.env.CI) openBrowser(served.url);
