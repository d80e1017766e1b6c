import { fileURLToPath } from "node:url";
import { defineConfig, type Plugin } from "vite";
import { metaPolicy } from "./scripts/policy.mjs";
import { versionDefine } from "./scripts/version.mjs";

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** Writes the security policy into the built page, first in its head. Not while developing: hot reload needs inline scripts. */
const policyInPage: Plugin = {
  name: "policy-in-page",
  apply: "build",
  transformIndexHtml: {
    order: "post",
    handler: () => [
      { tag: "meta", attrs: { "http-equiv": "Content-Security-Policy", content: metaPolicy }, injectTo: "head-prepend" },
    ],
  },
};

/** The page: src/page/index.html → dist/page, addressed relative to itself so that any folder of any server can hold it. */
export default defineConfig({
  root: here("src/page"),
  base: "./",
  publicDir: false,
  cacheDir: here(".cache/vite"),
  define: versionDefine,
  plugins: [policyInPage],
  worker: { format: "es" },
  server: { host: "127.0.0.1", fs: { allow: [here(".")] } },
  build: {
    outDir: here("dist/page"),
    emptyOutDir: true,
    // No data: URLs for fonts and workers, which the policy refuses.
    assetsInlineLimit: 0,
    license: { fileName: "licenses.md" },
    // three alone is larger than the default limit; it sits in a chunk of its own, loaded when the 3-D view opens.
    chunkSizeWarningLimit: 1000,
  },
});
