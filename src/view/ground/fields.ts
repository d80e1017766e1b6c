import { DomainError } from "../../base/errors.ts";
import { fixed } from "../numbers.ts";
import type { GroundUnit, PlaceModel, PlaceStation } from "./model.ts";
import { typedAngle, typedLength } from "./typed.ts";

/** A number with its unit that may be typed over. */
export interface PlaceField {
  readonly label: string;
  readonly text: string;
  readonly unit: string;
  readonly value: number;
  readonly width: number;
  readonly sizes: readonly number[];
  readonly parse: (text: string) => number;
}

export type PlaceKey = "east" | "north" | "latitude" | "longitude" | "height";

/** The places a station may be typed to. */
export interface PlaceTarget {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly heightM: number;
}

/** The typed equivalent of dragging one station: east and north from the origin, latitude, longitude, height. */
export function placeFields(station: PlaceStation, unit: GroundUnit, narrow: boolean): { readonly [K in PlaceKey]: PlaceField } {
  const { id, eastM, northM, latitudeDeg, longitudeDeg, heightM } = station;
  const size = unit === "km" ? 1000 : 1;
  const length = (label: string, metres: number): PlaceField => ({
    label: `${label} of ${id}`,
    text: fixed(metres / size, unit === "km" ? 3 : 2),
    unit,
    value: metres / size,
    width: narrow ? 8 : 10.7,
    sizes: [1],
    parse: (text) => typedLength(text, metres, unit, label) / size,
  });
  const degrees = (label: "Latitude" | "Longitude", value: number): PlaceField => ({
    label: `${label} of ${id}`,
    text: fixed(value, 6),
    unit: "°",
    value,
    width: narrow ? 9.5 : 12.1,
    sizes: [1],
    parse: (text) => typedAngle(text, label),
  });
  return {
    east: length("East", eastM),
    north: length("North", northM),
    latitude: degrees("Latitude", latitudeDeg),
    longitude: degrees("Longitude", longitudeDeg),
    height: {
      label: `Height of ${id}`,
      text: fixed(heightM, 1),
      unit: "m",
      value: heightM,
      width: narrow ? 8.6 : 11.2,
      sizes: [1],
      parse: (text) => typedLength(text, heightM, "m", "Height"),
    },
  };
}

/** The fields in the order shown: east and north only where they mean something. */
export const placeKeys = ({ local }: Pick<PlaceModel, "local">): readonly PlaceKey[] =>
  local ? ["east", "north", "latitude", "longitude", "height"] : ["latitude", "longitude", "height"];

/**
 * Where a station stands once a field holds a value. East and north keep the height, and each the other.
 *
 * @param value - In the field's unit: the model's for east and north, degrees, metres for the height.
 * @throws {@link DomainError} for a place that does not exist or a plan does not hold.
 */
export function placedTo(
  { frame, unit }: Pick<PlaceModel, "frame" | "unit">,
  station: PlaceStation,
  key: PlaceKey,
  value: number,
): PlaceTarget {
  const { latitudeDeg, longitudeDeg, heightM } = station;
  switch (key) {
    case "east":
    case "north": {
      const metres = unit === "km" ? value * 1000 : value;
      const to = key === "east" ? frame.at(metres, station.northM, heightM) : frame.at(station.eastM, metres, heightM);
      if (!to)
        throw new DomainError(
          key === "east" ? "East" : "North",
          `${fixed(value, 3)} ${unit}`,
          "a place this side of the horizon, within about 6 000 km of the origin",
        );
      return { latitudeDeg: to.latitudeDeg, longitudeDeg: to.longitudeDeg, heightM };
    }
    case "latitude":
      if (!(Math.abs(value) <= 90)) throw new DomainError("Latitude", value, "degrees in [−90, 90]");
      return { latitudeDeg: value, longitudeDeg, heightM };
    case "longitude":
      if (!(value >= -180 && value <= 360)) throw new DomainError("Longitude", value, "degrees in [−180, 180]");
      return { latitudeDeg, longitudeDeg: value, heightM };
    case "height":
      if (!(value >= -11_000 && value <= 100_000)) throw new DomainError("Height", value, "metres in [−11 000, 100 000]");
      return { latitudeDeg, longitudeDeg, heightM: value };
  }
}
