import { fixed, joined } from "../numbers.ts";
import { type GroundVerdict, groundVerdict } from "./areas.ts";
import { type Displacement, displacement, heldTo } from "./displacement.ts";
import type { GroundPoint, LocalFrame } from "./frame.ts";
import { type PlaceModel, type PlaceStation, titleOf } from "./model.ts";

/** A station taken up from the ground: where it stood, where it is now. Its height is kept. */
export interface Lift {
  readonly station: PlaceStation;
  readonly to: GroundPoint;
  /** Bearing the move is held to, degrees; null when it is free. */
  readonly heldBearingDeg: number | null;
}

export const lifted = (station: PlaceStation): Lift => ({ station, to: station, heldBearingDeg: null });

/** The lift with the station at a place; `held` keeps it on the bearing it had when Shift went down. */
export function liftedTo(lift: Lift, to: GroundPoint, frame: LocalFrame, held: boolean): Lift {
  if (!held) return { ...lift, to, heldBearingDeg: null };
  const way = displacement(lift.station, lift.to);
  const bearing = lift.heldBearingDeg ?? (way.distanceM > 0 ? way.bearingDeg : null);
  if (bearing === null) return { ...lift, to, heldBearingDeg: null };
  const on = heldTo(lift.station, to, bearing);
  return { ...lift, to: frame.point(on.latitudeDeg, on.longitudeDeg, lift.station.heightM), heldBearingDeg: bearing };
}

/** The lift one step of the arrow keys on: east and north in metres of the plan's frame. */
export function liftedBy(lift: Lift, eastM: number, northM: number, frame: LocalFrame): Lift {
  const to = frame.at(lift.to.eastM + eastM, lift.to.northM + northM, lift.station.heightM);
  return to ? { ...lift, to, heldBearingDeg: null } : lift;
}

/** What the call-out beside a lifted station says. */
export interface CallOut {
  readonly title: string;
  readonly moved: string;
  readonly place: string;
  readonly height: string;
  readonly verdict: GroundVerdict | null;
  readonly held: string | null;
}

export function callOut({ station, to, heldBearingDeg }: Lift, model: PlaceModel): CallOut {
  return {
    title: titleOf(station),
    moved: `Moved ${movedText(displacement(station, to, station.heightM))}`,
    place: placeText(to, model),
    height: `Height kept, ${joined(fixed(station.heightM, 1), "m")}`,
    verdict: groundVerdict(model.site, to),
    held: heldBearingDeg === null ? null : `Held on ${bearingText(heldBearingDeg)}`,
  };
}

/** Distance with three decimals of its unit while small, and the bearing in three figures: 2.70 km, 028°. */
export function movedText({ distanceM, bearingDeg }: Displacement): string {
  if (distanceM < 0.05) return joined("0", "m");
  const far =
    distanceM < 1000 ? joined(fixed(distanceM, 1), "m") : joined(fixed(distanceM / 1000, distanceM < 100_000 ? 2 : 0), "km");
  return `${far}, ${bearingText(bearingDeg)}`;
}

export const bearingText = (deg: number): string => `${String(Math.round(deg) % 360).padStart(3, "0")}°`;

/** East and north from the origin, or latitude and longitude for arrays too wide for that. */
export function placeText(
  { eastM, northM, latitudeDeg, longitudeDeg }: GroundPoint,
  { local, unit }: Pick<PlaceModel, "local" | "unit">,
): string {
  if (!local) return `${fixed(latitudeDeg, 4)}°, ${fixed(longitudeDeg, 4)}°`;
  const length = (metres: number): string => joined(unit === "km" ? fixed(metres / 1000, 3) : fixed(metres, 2), unit);
  return `E ${length(eastM)}, N ${length(northM)}`;
}
