import { fileURLToPath } from "node:url";
import { defineConfig } from "vite";
import { entryPoints } from "./scripts/library.mjs";

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** The library: src/library/*.ts → dist/library/*.js, one module a subject, dependencies left to the importer. */
export default defineConfig({
  root: here("."),
  publicDir: false,
  cacheDir: here(".cache/vite"),
  build: {
    outDir: here("dist/library"),
    emptyOutDir: true,
    target: "es2023",
    minify: false,
    lib: { entry: Object.fromEntries(entryPoints().map((name) => [name, here(`src/library/${name}.ts`)])), formats: ["es"] },
    rolldownOptions: { external: /^[^./]/, output: { entryFileNames: "[name].js", chunkFileNames: "shared/[name]-[hash].js" } },
  },
});
