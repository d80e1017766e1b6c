import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";
import { versionDefine } from "./scripts/version.mjs";

const apart = { outside: "test/outside/**/*.test.ts", browser: "test/browser/**/*.test.ts" };

/**
 * Three projects, run in turn by `npm test`: `unit`, the checks against `outside` sources, the built page in a `browser`.
 * A worker written in TypeScript does not start under vitest on Node 20: test the built worker, and the task in-process.
 */
export default defineConfig({
  define: versionDefine,
  // The examples import the library as a reader does.
  resolve: {
    alias: [{ find: /^spanwright\/(\w+)$/, replacement: fileURLToPath(new URL("./src/library/$1.ts", import.meta.url)) }],
  },
  test: {
    // Ends what hangs, judges nothing: a busy machine may take many times what a quiet one does.
    testTimeout: 300_000,
    hookTimeout: 300_000,
    projects: [
      {
        extends: true,
        test: { name: "unit", include: ["test/**/*.test.ts"], exclude: [...Object.values(apart), "test/bench/**"] },
      },
      { extends: true, test: { name: "outside", include: [apart.outside] } },
      {
        extends: true,
        // One browser at a time: drawing in software takes every core there is.
        test: { name: "browser", include: [apart.browser], fileParallelism: false },
      },
    ],
  },
});
