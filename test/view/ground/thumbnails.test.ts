import { describe, expect, it } from "vitest";
import type { BeamFigures, Picture } from "../../../src/assess/result.ts";
import { ARCSEC_PER_RAD } from "../../../src/base/constants.ts";
import { beamLine, beamThumbnail, uvThumbnail } from "../../../src/view/ground/thumbnails.ts";

function pictureWith(beam: Partial<BeamFigures>, settled = true): Picture {
  const size = 256;
  const values = new Float32Array(size * size);
  values[size * 128 + 128] = 1;
  const counts = new Float32Array(size * size);
  counts[size * 128 + 140] = 3;
  counts[size * 129 + 141] = 4;
  return {
    settled,
    result: { beam: { majorArcsec: null, minorArcsec: null, positionAngleDeg: null, ...beam } },
    beam: { size, pixelRad: 0.25 / ARCSEC_PER_RAD, values },
    uv: { size, cellWavelengths: 1250, counts },
    cuts: null,
  } as unknown as Picture;
}

describe("beamThumbnail", () => {
  it("is a round angle of about twelve beam widths, peak in the middle", () => {
    const thumb = beamThumbnail(pictureWith({ majorArcsec: 1.8, minorArcsec: 1.5 }), 128);
    expect(thumb?.caption).toBe("20″ across, east left");
    expect(thumb?.size).toBe(128);
    expect(thumb?.values.indexOf(Math.max(...(thumb?.values ?? [])))).toBeGreaterThan(0);
  });

  it("stays inside the image and does without a beam", () => {
    // 256 pixels of 0.25″ are 64″: the largest round angle in them is 50″.
    expect(beamThumbnail(pictureWith({ majorArcsec: 30 }), 64)?.caption).toBe("50″ across, east left");
    expect(beamThumbnail({ ...pictureWith({}), beam: null }, 64)).toBeNull();
  });
});

describe("uvThumbnail", () => {
  it("says how far it reaches and pools cells without losing a sample", () => {
    const thumb = uvThumbnail(pictureWith({}), 120);
    expect(thumb?.caption).toBe("±160\u00a0kλ");
    expect(thumb?.size).toBe(128);
    expect(thumb?.values.reduce((sum, x) => sum + x, 0)).toBe(7);
    expect(thumb?.values[128 * 64 + 70]).toBe(7);
  });
});

describe("a held span", () => {
  it("keeps the scale of the image before", () => {
    const beam = beamThumbnail(pictureWith({ majorArcsec: 5 }), 64, 20);
    expect(beam?.caption).toBe("20″ across, east left");
    // 160 kλ over 128 cells: 120 kλ are the middle 96, 200 kλ are 160 with an empty rim.
    const closer = uvThumbnail(pictureWith({}), 120, 120_000);
    expect([closer?.size, closer?.caption, closer?.values[96 * 48 + 54]]).toEqual([96, "±120\u00a0kλ", 7]);
    const wider = uvThumbnail(pictureWith({}), 120, 200_000);
    expect([wider?.size, wider?.values[160 * 80 + 86]]).toEqual([160, 7]);
  });
});

describe("beamLine", () => {
  it("gives the size, and says when it is a preview", () => {
    const beam = { majorArcsec: 1.806, minorArcsec: 1.5, positionAngleDeg: 100.4 };
    expect(beamLine(pictureWith(beam))).toBe("1.81″ × 1.50″ at PA 100°");
    expect(beamLine(pictureWith(beam, false))).toBe("1.81″ × 1.50″ at PA 100°, preview");
    expect(beamLine(pictureWith({}, false))).toBe("Preview, coarse grid");
    expect(beamLine(pictureWith({}))).toMatch(/^No beam/);
  });
});
