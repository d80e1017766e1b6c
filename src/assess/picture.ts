import type { Checkpoint } from "../base/checkpoint.ts";
import type { BeamPlane } from "../engine/synthesis/plane.ts";
import { assessment } from "./assess.ts";
import { axisCuts } from "./cuts.ts";
import type { BeamImage, Picture, PictureRequest } from "./result.ts";
import { uvImage } from "./uvimage.ts";

/** Pixels a side of the image a page gets, cut from the middle of the settled one. */
export const PICTURE_SIZE = 512;

/** One layout and observation, settled, with what a page draws. */
export async function picture(request: PictureRequest, checkpoint?: Checkpoint): Promise<Picture> {
  const { plan, layout, observation, pair, uvSize } = request;
  const { result, synthesis, beam } = await assessment(plan, layout, observation, { pair }, checkpoint);
  return {
    settled: true,
    result,
    beam: beam ? middle(beam.image, PICTURE_SIZE) : null,
    uv: uvImage(synthesis, uvSize),
    cuts: beam ? axisCuts(beam) : null,
  };
}

/** The middle of an image as 32-bit figures. */
function middle(image: BeamPlane, largest: number): BeamImage {
  const size = Math.min(largest, image.size);
  const skip = (image.size - size) / 2;
  const values = new Float32Array(size * size);
  for (let y = 0; y < size; y++) {
    const from = image.size * (y + skip) + skip;
    values.set(image.values.subarray(from, from + size), size * y);
  }
  return { size, pixelRad: image.xl, values };
}
