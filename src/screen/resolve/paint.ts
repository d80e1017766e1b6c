/** Canvas pixels for a square of this many CSS pixels: sharp on dense screens, no more than four a CSS pixel. */
export const canvasSide = (side: number): number => Math.round(side * Math.min(2, devicePixelRatio));

/** Puts painted pixels on a canvas, one to one; the canvas is then scaled by its style. */
export function put(canvas: HTMLCanvasElement, pixels: Uint8ClampedArray, size: number): void {
  if (canvas.width !== size) canvas.width = size;
  if (canvas.height !== size) canvas.height = size;
  const image = new ImageData(size, size);
  image.data.set(pixels);
  canvas.getContext("2d")?.putImageData(image, 0, 0);
}
