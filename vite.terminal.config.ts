import { chmod } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import { defineConfig, type Plugin } from "vite";
import { versionDefine } from "./scripts/version.mjs";

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));
const program = "spanwright.js";

const executable: Plugin = {
  name: "executable",
  async closeBundle() {
    await chmod(here(`dist/terminal/${program}`), 0o755);
  },
};

/** The terminal: src/cli/main.ts → dist/terminal/spanwright.js, one file that runs on Node alone, without node_modules. */
export default defineConfig({
  root: here("."),
  publicDir: false,
  cacheDir: here(".cache/vite"),
  define: versionDefine,
  plugins: [executable],
  ssr: { noExternal: true },
  build: {
    ssr: here("src/cli/main.ts"),
    outDir: here("dist/terminal"),
    emptyOutDir: true,
    target: "node20.19",
    license: { fileName: "licenses.md" },
    rolldownOptions: { output: { entryFileNames: program, codeSplitting: false, banner: "#!/usr/bin/env node" } },
  },
});
