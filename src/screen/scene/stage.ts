import { Color, PerspectiveCamera, Scene, Vector3, WebGLRenderer } from "three";
import type { SceneMark, SpaceModel } from "../../view/scene/model.ts";
import { eyeOf, type Orbit } from "../../view/scene/orbit.ts";
import type { Palette } from "../place/palette.ts";
import { faceOf, free, lineOf } from "./parts.ts";

/** A mark as it lies on the canvas, CSS pixels; null: behind the globe or the eye. */
export type Seen = { readonly x: number; readonly y: number } | null;

/** The canvas: draws when it is told to, never by itself. */
export class Stage {
  readonly #renderer: WebGLRenderer;
  readonly #scene = new Scene();
  readonly #camera = new PerspectiveCamera(32, 1, 0.02, 40);
  #width = 1;
  #height = 1;

  /** @throws Error where the browser gives no WebGL. */
  constructor(canvas: HTMLCanvasElement) {
    this.#renderer = new WebGLRenderer({ canvas, antialias: true, preserveDrawingBuffer: true });
    this.#camera.up.set(0, 0, 1);
  }

  resize(width: number, height: number): void {
    this.#width = Math.max(1, width);
    this.#height = Math.max(1, height);
    this.#renderer.setPixelRatio(Math.min(2, devicePixelRatio));
    this.#renderer.setSize(this.#width, this.#height, false);
    this.#camera.aspect = this.#width / this.#height;
    this.#camera.updateProjectionMatrix();
  }

  /** Takes another model, or the same in other colours. */
  show(model: SpaceModel, palette: Palette): void {
    this.#empty();
    this.#scene.background = new Color(palette.desk);
    for (const face of model.faces) this.#scene.add(faceOf(face, palette));
    for (const line of model.lines) this.#scene.add(lineOf(line, palette, this.#width, this.#height));
  }

  /** @param aimUp - How far over the middle the eye aims. */
  draw(orbit: Orbit, aimUp: number): void {
    this.#camera.position.set(...eyeOf(orbit));
    this.#camera.lookAt(0, 0, aimUp);
    this.#camera.updateMatrixWorld();
    this.#renderer.render(this.#scene, this.#camera);
  }

  /** Where the marks lie after the last drawing. */
  seen(marks: readonly SceneMark[]): readonly Seen[] {
    const point = new Vector3();
    const eye = this.#camera.position;
    return marks.map(({ at, outward }) => {
      if (outward && outward[0] * (eye.x - at[0]) + outward[1] * (eye.y - at[1]) + outward[2] * (eye.z - at[2]) < 0) return null;
      point.set(...at).project(this.#camera);
      if (point.z > 1 || Math.abs(point.x) > 1 || Math.abs(point.y) > 1) return null;
      return { x: ((point.x + 1) / 2) * this.#width, y: ((1 - point.y) / 2) * this.#height };
    });
  }

  close(): void {
    this.#empty();
    this.#renderer.dispose();
  }

  #empty(): void {
    for (const child of [...this.#scene.children]) {
      this.#scene.remove(child);
      free(child);
    }
  }
}
