import { DomainError } from "../base/errors.ts";
import { type FitsEntry, fitsCards } from "./fits-cards.ts";

/** A FITS file is made of blocks this long: the header filled with spaces, the data with zeros. */
const BLOCK = 2880;

/** An image and its header. */
export interface FitsImage {
  /** Bits of a pixel, negative for IEEE floating point. */
  readonly bitpix: -32 | -64;
  /** Pixels along each axis, the first changing fastest. */
  readonly axes: readonly number[];
  /** Everything of the header but SIMPLE, BITPIX, NAXIS… and END. */
  readonly header: readonly FitsEntry[];
  /** Pixels in file order, product of `axes` of them. */
  readonly values: ArrayLike<number>;
}

/**
 * The bytes of a FITS file with one image: the same image gives the same bytes.
 *
 * Source: FITS Standard 4.0 (IAU FITS Working Group, 2018), §3 and §4.4.1; big-endian IEEE 754, §5.3.
 *
 * @throws {@link DomainError} where the pixels are not as many as the axes say.
 */
export function fitsBytes(image: FitsImage): Uint8Array {
  const { bitpix, axes, values } = image;
  const count = axes.reduce((product, n) => product * n, 1);
  if (values.length !== count) throw new DomainError("values.length", values.length, `${count}, the product of the axes`);
  const entries: readonly FitsEntry[] = [
    { key: "SIMPLE", value: true, comment: "file conforms to FITS Standard 4.0" },
    { key: "BITPIX", value: BigInt(bitpix), comment: `${-bitpix}-bit IEEE floating point` },
    { key: "NAXIS", value: BigInt(axes.length) },
    ...axes.map((n, k): FitsEntry => ({ key: `NAXIS${k + 1}`, value: BigInt(n) })),
    ...image.header,
  ];
  const header = [...entries.flatMap(fitsCards), "END".padEnd(80)].join("");
  const dataStart = BLOCK * Math.ceil(header.length / BLOCK);
  const width = -bitpix / 8;
  const bytes = new Uint8Array(dataStart + BLOCK * Math.ceil((count * width) / BLOCK));
  bytes.fill(0x20, 0, dataStart);
  for (let k = 0; k < header.length; k++) bytes[k] = header.charCodeAt(k);
  const data = new DataView(bytes.buffer, dataStart);
  if (bitpix === -32) for (let k = 0; k < count; k++) data.setFloat32(4 * k, values[k]);
  else for (let k = 0; k < count; k++) data.setFloat64(8 * k, values[k]);
  return bytes;
}
