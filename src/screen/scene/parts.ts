import {
  BufferAttribute,
  BufferGeometry,
  DoubleSide,
  FrontSide,
  type Material,
  Mesh,
  MeshBasicMaterial,
  type Object3D,
} from "three";
import { LineMaterial } from "three/addons/lines/LineMaterial.js";
import { LineSegments2 } from "three/addons/lines/LineSegments2.js";
import { LineSegmentsGeometry } from "three/addons/lines/LineSegmentsGeometry.js";
import type { LineKind, SceneFace, SceneLine } from "../../view/scene/model.ts";
import type { Palette } from "../place/palette.ts";

/** How each kind of line looks: a role of the palette, pixels wide, dash in scene units. */
const LINES: {
  readonly [K in LineKind]: {
    readonly role: keyof Palette;
    readonly px: number;
    readonly dash?: number;
    readonly opacity?: number;
  };
} = {
  grid: { role: "line", px: 1 },
  graticule: { role: "line", px: 1 },
  land: { role: "ink2", px: 1.4, dash: 0.02 },
  keepOut: { role: "ink3", px: 1.4 },
  coast: { role: "ink3", px: 1 },
  stem: { role: "edge", px: 1 },
  link: { role: "ink3", px: 1, opacity: 0.65 },
  horizon: { role: "edge", px: 1 },
  path: { role: "ink3", px: 1.2, dash: 0.025 },
  window: { role: "accent", px: 3 },
  ray: { role: "accent", px: 1.2, dash: 0.03 },
  seenEdge: { role: "accent", px: 1.6 },
};

export function lineOf({ kind, segments }: SceneLine, palette: Palette, width: number, height: number): Object3D {
  const { role, px, dash, opacity = 1 } = LINES[kind];
  const geometry = new LineSegmentsGeometry();
  geometry.setPositions(segments);
  const material = new LineMaterial({
    color: palette[role],
    linewidth: px,
    dashed: dash !== undefined,
    dashSize: dash ?? 1,
    gapSize: dash === undefined ? 0 : 0.7 * dash,
    transparent: opacity < 1,
    opacity,
  });
  material.resolution.set(width, height);
  const line = new LineSegments2(geometry, material);
  if (dash !== undefined) line.computeLineDistances();
  return line;
}

export function faceOf({ kind, triangles }: SceneFace, palette: Palette): Object3D {
  const geometry = new BufferGeometry();
  geometry.setAttribute("position", new BufferAttribute(triangles, 3));
  const seen = kind === "seen";
  const material = new MeshBasicMaterial({
    color: seen ? palette.accent : kind === "globe" ? palette.surface : palette.sunken,
    transparent: seen,
    opacity: seen ? 0.16 : 1,
    depthWrite: !seen,
    side: kind === "ground" ? DoubleSide : FrontSide,
    // Lines lie on the faces: the faces give way.
    polygonOffset: true,
    polygonOffsetFactor: 1,
    polygonOffsetUnits: 1,
  });
  // The globe is seen from outside whichever way its triangles were wound.
  if (kind !== "ground") material.side = DoubleSide;
  return new Mesh(geometry, material);
}

/** Frees what the graphics memory holds for an object. */
export function free(object: Object3D): void {
  const { geometry, material } = object as Partial<{ geometry: BufferGeometry; material: Material }>;
  geometry?.dispose();
  material?.dispose();
}
