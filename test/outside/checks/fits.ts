import { RAD_PER_DEG } from "../../../src/base/constants.ts";
import { SymmetricTransform } from "../../../src/engine/synthesis/transform.ts";
import { beamFits } from "../../../src/formats/beam-fits.ts";
import { readFits, sinSky } from "../../formats/fits-reader.ts";
import { parkMiller } from "../../support/random.ts";
import { checksOf, type Figure, type Left } from "../check.ts";
import rows from "../data/fits.json" with { type: "json" };

const size = 256;
/** The header the program writes for an image a minute of arc a pixel about (45°, 30°), read by a reader of the standard. */
const header = readFits(
  beamFits({
    values: new Float32Array(size * size),
    size,
    pixelRad: RAD_PER_DEG / 60,
    program: "Spanwright",
    title: "A",
    layout: "B",
    observation: "C",
    rightAscensionDeg: 45,
    declinationDeg: 30,
    startUtc: null,
    frequencyHz: 1.42e9,
    bandwidthHz: 1e6,
    fitted: { majorArcsec: 1.81, minorArcsec: 1.5, positionAngleDeg: 100.4 },
    remarks: [],
  }),
).values;
const cards = (...keys: readonly string[]): readonly Figure[] =>
  keys.map((key) => {
    const value = header.get(key);
    if (value === undefined || typeof value === "boolean") throw new Error(`no ${key}`);
    return value;
  });

/** Samples on cell centres: Σ over the grid as the transform has it against the sum over its samples. */
function cellCentres(): number {
  const n = 64;
  const random = parkMiller(5);
  const cells = new Float64Array(n * 33);
  const samples = Array.from({ length: 40 }, () => [1 + Math.floor(random() * 20), Math.floor(random() * 40) - 20, random()]);
  for (const [a, b, w] of samples) cells[n * a + ((b + n) % n)] += w;
  const image = new SymmetricTransform(n).image({ size: n, lastColumn: 32, cells, start: (a) => n * a }, n);
  const total = 2 * samples.reduce((sum, [, , w]) => sum + w, 0);
  let worst = 0;
  for (let y = 0; y < n; y++) {
    for (let x = 0; x < n; x++) {
      const sum = samples.reduce(
        (s, [a, b, w]) => s + 2 * w * Math.cos((2 * Math.PI * (a * (x - n / 2) + b * (y - n / 2))) / n),
        0,
      );
      worst = Math.max(worst, Math.abs(image[n * y + x] - sum) / total);
    }
  }
  return worst;
}

const answers: { [id: string]: () => readonly Figure[] } = {
  F02: () => [Math.sign(header.get("CDELT1") as number), Math.sign(header.get("CDELT2") as number)],
  F04: () => cards("BMAJ", "BMIN", "BPA"),
  F05: () => cards("CTYPE1", "CTYPE2", "CTYPE3", "CTYPE4"),
  F06: () => [cellCentres()],
};
for (const [x, y] of [
  [129, 129],
  [1, 129],
  [129, 257],
  [257, 257],
  [1, 1],
]) {
  answers[`F01(${x},${y})`] = () => {
    // The source's image has its centre at pixel 129; the program's stands where its header says.
    const dx = x - 129 + (header.get("CRPIX1") as number);
    const dy = y - 129 + (header.get("CRPIX2") as number);
    return sinSky(header, dx, dy);
  };
}

/** Section 11: FITS. */
export const fitsChecks = checksOf(rows, answers);

export const fitsLeft: Left = { F03: "the same identity as F01" };
