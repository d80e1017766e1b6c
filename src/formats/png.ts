import { encode } from "fast-png";
import { asciiText } from "./ascii.ts";

/**
 * A PNG file of an opaque picture, 8 bits a channel.
 *
 * @param rgba - width × height pixels from the top left, row by row, four bytes each; alpha is not written.
 * @param text - Said in the file beside the picture, such as `Title` and `Software`.
 */
export function pngBytes(
  rgba: Uint8ClampedArray,
  width: number,
  height: number,
  text: { readonly [key: string]: string },
): Uint8Array {
  const data = new Uint8Array(width * height * 3);
  for (let k = 0, from = 0; k < data.length; k += 3, from += 4) {
    data[k] = rgba[from];
    data[k + 1] = rgba[from + 1];
    data[k + 2] = rgba[from + 2];
  }
  const plain = Object.fromEntries(Object.entries(text).map(([key, value]) => [key, asciiText(value)]));
  return encode({ width, height, data, depth: 8, channels: 3, text: plain });
}
