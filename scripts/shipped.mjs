import { createReadStream, createWriteStream, existsSync, readFileSync } from "node:fs";
import { mkdir, mkdtemp, rename, rm, writeFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { delimiter, dirname, join } from "node:path";
import { pipeline } from "node:stream/promises";
import { createBrotliDecompress } from "node:zlib";
import tar from "tar-fs";
import { root } from "./node.mjs";

/**
 * The Chromium that comes packed inside a development package: unpacked once into .cache, one folder a version, with the
 * libraries and fonts it needs, so that nothing is asked of the system or the network. The package's own start-up is
 * passed by: it shares one temporary file between versions and switches web security off.
 *
 * @returns {Promise<{ executablePath: string, env: NodeJS.ProcessEnv }>}
 */
export async function shippedBrowser() {
  if (process.platform !== "linux" || process.arch !== "x64") {
    throw new Error(
      "No Chrome or Chromium was found and the packed one runs on 64-bit Linux only. Install one, or name it in CHROME_PATH.",
    );
  }
  // The package keeps its package.json to itself, so its folder is found from its entry, build/cjs/index.cjs.
  const folder = dirname(dirname(dirname(createRequire(import.meta.url).resolve("@sparticuz/chromium"))));
  const { version } = JSON.parse(readFileSync(join(folder, "package.json"), "utf8"));
  const unpacked = join(root, ".cache/browser", version);
  if (!existsSync(unpacked)) await unpack(join(folder, "bin"), unpacked);
  const libraries = [join(unpacked, "lib"), unpacked, process.env.LD_LIBRARY_PATH].filter(Boolean).join(delimiter);
  return {
    executablePath: join(unpacked, "chromium"),
    env: { ...process.env, LD_LIBRARY_PATH: libraries, FONTCONFIG_PATH: unpacked },
  };
}

/** Unpacks beside the place and moves there when whole: two runs at once, or one cut short, leave no half browser behind. */
async function unpack(packed, unpacked) {
  await mkdir(dirname(unpacked), { recursive: true });
  const beside = await mkdtemp(`${unpacked}-`);
  const archive = (name) =>
    pipeline(createReadStream(join(packed, name)), createBrotliDecompress(), tar.extract(beside, { chown: false }));
  try {
    await Promise.all([
      pipeline(
        createReadStream(join(packed, "chromium.br")),
        createBrotliDecompress(),
        createWriteStream(join(beside, "chromium"), { mode: 0o755 }),
      ),
      archive("al2023.tar.br"), // lib/
      archive("swiftshader.tar.br"), // beside the program, where it looks for its graphics libraries
      archive("fonts.tar.br"), // fonts/ and fonts.conf
    ]);
    // The packed fonts.conf names folders of another machine.
    await writeFile(join(beside, "fonts.conf"), fontsConf(join(unpacked, "fonts")));
    await rename(beside, unpacked);
  } catch (error) {
    await rm(beside, { recursive: true, force: true });
    // Someone else was first: theirs is the same.
    if (!existsSync(join(unpacked, "chromium"))) throw error;
  }
}

function fontsConf(folder) {
  const text = folder.replaceAll("&", "&amp;").replaceAll("<", "&lt;");
  return `<?xml version="1.0"?>
<!DOCTYPE fontconfig SYSTEM "urn:fontconfig:fonts.dtd">
<fontconfig>
  <dir>${text}</dir>
  <cachedir>${text}/cache</cachedir>
</fontconfig>
`;
}
