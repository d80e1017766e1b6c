/** A FITS reader written apart from the writer, from FITS Standard 4.0: primary HDU, floating-point images. For tests only. */
export interface ReadFits {
  /** The header as it stands, in 80-character cards, END left out. */
  readonly cards: readonly string[];
  readonly values: ReadonlyMap<string, string | number | boolean>;
  readonly comments: readonly string[];
  readonly axes: readonly number[];
  readonly dataStart: number;
  readonly pixels: Float64Array;
}

export function readFits(bytes: Uint8Array): ReadFits {
  if (bytes.length % 2880 !== 0) throw new Error(`length ${bytes.length} is not in blocks of 2880`);
  const cards: string[] = [];
  let at = 0;
  for (;;) {
    const card = String.fromCharCode(...bytes.subarray(at, at + 80));
    at += 80;
    if (card === "END".padEnd(80)) break;
    if (at >= bytes.length) throw new Error("no END");
    cards.push(card);
  }
  const dataStart = 2880 * Math.ceil(at / 2880);
  for (let k = at; k < dataStart; k++) if (bytes[k] !== 0x20) throw new Error("header is not filled with spaces");
  const values = new Map<string, string | number | boolean>();
  const comments: string[] = [];
  let open = "";
  for (const card of cards) {
    const key = card.slice(0, 8).trimEnd();
    if (key === "COMMENT") comments.push(card.slice(8).trimEnd());
    else if (key === "CONTINUE") {
      const before = values.get(open) as string;
      if (!before.endsWith("&")) throw new Error(`CONTINUE after ${open}, which does not go on`);
      values.set(open, before.slice(0, -1) + stringIn(card));
    } else {
      if (card.slice(8, 10) !== "= ") throw new Error(`no value indicator: ${card}`);
      if (values.has(key)) throw new Error(`${key} stands twice`);
      values.set(key, card[10] === "'" ? stringIn(card) : scalarIn(card));
      open = key;
    }
  }
  const axes = Array.from({ length: values.get("NAXIS") as number }, (_, k) => values.get(`NAXIS${k + 1}`) as number);
  const count = axes.reduce((product, n) => product * n, 1);
  const wide = values.get("BITPIX") === -64;
  const width = wide ? 8 : 4;
  const data = new DataView(bytes.buffer, bytes.byteOffset + dataStart);
  const pixels = new Float64Array(count);
  for (let k = 0; k < count; k++) pixels[k] = wide ? data.getFloat64(8 * k, false) : data.getFloat32(4 * k, false);
  const end = dataStart + 2880 * Math.ceil((count * width) / 2880);
  if (bytes.length !== end) throw new Error(`data end at ${end}, file at ${bytes.length}`);
  for (let k = dataStart + count * width; k < end; k++) if (bytes[k] !== 0) throw new Error("data are not filled with zeros");
  return { cards, values, comments, axes, dataStart, pixels };
}

function stringIn(card: string): string {
  let text = "";
  for (let k = 11; ; k++) {
    if (k >= 80) throw new Error(`string does not end: ${card}`);
    if (card[k] !== "'") text += card[k];
    else if (card[k + 1] === "'") text += card[++k];
    else break;
  }
  return text.trimEnd();
}

/** Fixed format: right-justified in columns 11 to 30, a comment only after " /". */
function scalarIn(card: string): number | boolean {
  const field = card.slice(10, 30);
  if (!/^ *\S+$/.test(field)) throw new Error(`not fixed format: ${card}`);
  if (!/^( *| \/ .*)$/.test(card.slice(30))) throw new Error(`stray characters: ${card}`);
  const text = field.trim();
  if (text === "T" || text === "F") return text === "T";
  if (!/^[+-]?\d+(\.\d*)?(E[+-]?\d+)?$/.test(text)) throw new Error(`not a number: ${card}`);
  return Number(text);
}

type Direction = readonly [raDeg: number, decDeg: number];

/**
 * Right ascension and declination of a pixel (from 1) of an image with SIN axes, in degrees.
 * Closed form of the orthographic projection: Calabretta & Greisen 2002, A&A 395, 1077, §5.1.5 with eq. 5.
 */
export function sinSky(values: ReadonlyMap<string, string | number | boolean>, i: number, j: number): Direction {
  const get = (key: string): number => values.get(key) as number;
  const rad = Math.PI / 180;
  const l = rad * get("CDELT1") * (i - get("CRPIX1"));
  const m = rad * get("CDELT2") * (j - get("CRPIX2"));
  const dec0 = rad * get("CRVAL2");
  const n = Math.sqrt(1 - l * l - m * m);
  const ra = get("CRVAL1") + Math.atan2(l, n * Math.cos(dec0) - m * Math.sin(dec0)) / rad;
  const dec = Math.asin(m * Math.cos(dec0) + n * Math.sin(dec0)) / rad;
  return [ra, dec];
}
