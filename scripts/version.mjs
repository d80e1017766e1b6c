import { readFileSync } from "node:fs";

const { version } = JSON.parse(readFileSync(new URL("../package.json", import.meta.url), "utf8"));

/** For vite's `define`: the program's version, from package.json, as `__SPANWRIGHT_VERSION__` in the sources. */
export const versionDefine = { __SPANWRIGHT_VERSION__: JSON.stringify(version) };
