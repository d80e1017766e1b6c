/** Where the picture is seen from: about the middle, angles in degrees, distance in scene units. */
export interface Orbit {
  /** From east through north, of the place the picture is seen from. */
  readonly turnDeg: number;
  /** Above the horizontal. */
  readonly tiltDeg: number;
  readonly distance: number;
}

const LEAST_TILT = { ground: 4, globe: -88 } as const;
const MOST_TILT = 88;
export const TURN_STEP_DEG = 10;
export const ZOOM_STEP = 1.25;

/** Turned by pixels of a drag or by steps of a key; the ground is never seen from below. */
export const turned = (orbit: Orbit, turnDeg: number, tiltDeg: number, kind: "ground" | "globe"): Orbit => ({
  ...orbit,
  turnDeg: (((orbit.turnDeg + turnDeg) % 360) + 360) % 360,
  tiltDeg: Math.min(MOST_TILT, Math.max(LEAST_TILT[kind], orbit.tiltDeg + tiltDeg)),
});

/** Closer (> 1) or farther (< 1), between a tenth of the reach and six times it. */
export const nearer = (orbit: Orbit, factor: number, radius: number): Orbit => ({
  ...orbit,
  distance: Math.min(6 * radius, Math.max(radius * 1.05, orbit.distance / factor)),
});

/** What a key asks of the picture; undefined where it asks nothing. */
export function orbitKey(
  key: string,
): { readonly turn?: readonly [number, number]; readonly zoom?: number; readonly reset?: true } | undefined {
  switch (key) {
    case "ArrowLeft":
      return { turn: [-TURN_STEP_DEG, 0] };
    case "ArrowRight":
      return { turn: [TURN_STEP_DEG, 0] };
    case "ArrowUp":
      return { turn: [0, TURN_STEP_DEG] };
    case "ArrowDown":
      return { turn: [0, -TURN_STEP_DEG] };
    case "+":
    case "=":
      return { zoom: ZOOM_STEP };
    case "-":
      return { zoom: 1 / ZOOM_STEP };
    case "0":
      return { reset: true };
    default:
      return undefined;
  }
}

/** The first look: over the ground from the south-south-east, or over the array's own part of the globe. */
export function firstOrbit(
  kind: "ground" | "globe",
  radius: number,
  origin: { readonly latitudeDeg: number; readonly longitudeDeg: number },
): Orbit {
  return kind === "ground"
    ? { turnDeg: 290, tiltDeg: 28, distance: 3.4 * radius }
    : {
        turnDeg: (origin.longitudeDeg + 360) % 360,
        tiltDeg: Math.max(-60, Math.min(60, origin.latitudeDeg / 2)),
        distance: 3.5 * radius,
      };
}

/** The eye of an orbit, scene axes. */
export function eyeOf({ turnDeg, tiltDeg, distance }: Orbit): readonly [number, number, number] {
  const [turn, tilt] = [(turnDeg * Math.PI) / 180, (tiltDeg * Math.PI) / 180];
  return [distance * Math.cos(tilt) * Math.cos(turn), distance * Math.cos(tilt) * Math.sin(turn), distance * Math.sin(tilt)];
}
