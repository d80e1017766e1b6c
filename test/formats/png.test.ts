import { decode } from "fast-png";
import { describe, expect, it } from "vitest";
import { pngBytes } from "../../src/formats/png.ts";

describe("PNG", () => {
  const rgba = Uint8ClampedArray.from({ length: 4 * 6 }, (_, k) => (k % 4 === 3 ? 255 : 10 * k));

  it("holds the picture, without alpha, and its texts in ASCII", () => {
    const got = decode(pngBytes(rgba, 3, 2, { Title: "Beam, 2″" }));
    expect([got.width, got.height, got.channels, got.depth]).toEqual([3, 2, 3, 8]);
    expect([...got.data]).toEqual([...rgba].filter((_, k) => k % 4 !== 3));
    expect(got.text).toEqual({ Title: 'Beam, 2"' });
  });

  // Source: PNG (W3C, ISO/IEC 15948), §5.2: the eight bytes every file starts with.
  it("starts as every PNG does, and is the same each time", () => {
    const bytes = pngBytes(rgba, 3, 2, {});
    expect([...bytes.subarray(0, 8)]).toEqual([137, 80, 78, 71, 13, 10, 26, 10]);
    expect(pngBytes(rgba, 3, 2, {})).toEqual(bytes);
  });
});
