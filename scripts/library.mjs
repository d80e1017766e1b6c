import { readdirSync } from "node:fs";
import { join } from "node:path";
import { root } from "./node.mjs";

/** Names of the library's entry points: the files of src/library. */
export const entryPoints = () =>
  readdirSync(join(root, "src/library"))
    .filter((name) => name.endsWith(".ts"))
    .map((name) => name.slice(0, -3));
