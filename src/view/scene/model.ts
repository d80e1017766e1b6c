/** What a line of the scene is: the painter gives each kind its colour, width and dash. */
export type LineKind =
  | "grid"
  | "land"
  | "keepOut"
  | "stem"
  | "link"
  | "horizon"
  | "path"
  | "window"
  | "ray"
  | "coast"
  | "graticule"
  | "seenEdge";

export interface SceneLine {
  readonly kind: LineKind;
  /** (segments, 2, 3) flat: start and end of each piece, scene units. */
  readonly segments: Float32Array;
}

export type MarkKind = "station" | "candidate" | "selected" | "hub" | "target" | "compass";

/** A point with a name. */
export interface SceneMark {
  readonly kind: MarkKind;
  readonly label: string;
  readonly at: readonly [x: number, y: number, z: number];
  /** Outward direction where the point stands on a globe: behind it, it is out of sight. */
  readonly outward: readonly [x: number, y: number, z: number] | null;
}

/** A closed surface or patch, (triangles, 3, 3) flat. */
export interface SceneFace {
  readonly kind: "ground" | "globe" | "seen";
  readonly triangles: Float32Array;
}

/** Everything a picture of the array in space needs; right-handed, z up, the array about the middle, its reach 1. */
export interface SpaceModel {
  readonly kind: "ground" | "globe";
  readonly lines: readonly SceneLine[];
  readonly marks: readonly SceneMark[];
  readonly faces: readonly SceneFace[];
  /** How far from the middle everything reaches. */
  readonly radius: number;
  /** How far over the middle the middle of everything lies. */
  readonly aimUp: number;
  /** What is drawn, in one sentence; read aloud and shown. */
  readonly text: string;
  /** What the picture does not show as it is. */
  readonly note: string;
}

/** What the source does while it is observed. Degrees and hours, at the origin. */
export interface SpaceSource {
  readonly declinationDeg: number;
  readonly fromH: number;
  readonly toH: number;
  readonly elevationLimitDeg: number;
  /** The hour angle that is shown as now. */
  readonly hourAngleH: number;
}

/** Gathers pieces of lines of one kind. */
export class Segments {
  readonly #list: number[] = [];

  add(a: readonly number[], b: readonly number[]): void {
    this.#list.push(a[0], a[1], a[2], b[0], b[1], b[2]);
  }

  /** A line through the points. */
  through(points: readonly (readonly number[])[], closed = false): void {
    for (let k = 1; k < points.length; k++) this.add(points[k - 1], points[k]);
    if (closed && points.length > 2) this.add(points[points.length - 1], points[0]);
  }

  line(kind: LineKind): readonly SceneLine[] {
    return this.#list.length === 0 ? [] : [{ kind, segments: Float32Array.from(this.#list) }];
  }
}

/** A patch of rings about a middle: `at(k, j)` on ring k of `rings`, `j` of `sides` round it. */
export function fan(rings: number, sides: number, at: (ring: number, side: number) => readonly number[]): Float32Array {
  const out: number[] = [];
  for (let k = 0; k < rings; k++) {
    for (let j = 0; j < sides; j++) {
      const [a, b, c, d] = [at(k, j), at(k + 1, j), at(k + 1, j + 1), at(k, j + 1)];
      out.push(...a, ...b, ...c);
      if (k > 0) out.push(...a, ...c, ...d);
    }
  }
  return Float32Array.from(out);
}
