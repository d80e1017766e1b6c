/** `npm run --silent spanwright -- VERB …`: the terminal from today's sources, rebuilt first when they have changed. */
import { build, isStale, terminal } from "./built.mjs";
import { runNode } from "./node.mjs";

// The builder's own lines go to stderr: stdout is for results.
const code = isStale(terminal) ? await build(terminal, ["ignore", 2, "inherit"]) : 0;
// Paths on the command line are relative to where the person typed them, not to the folder npm moved to.
process.exitCode =
  code || (await runNode([terminal.output, ...process.argv.slice(2)], { cwd: process.env.INIT_CWD ?? process.cwd() }));
