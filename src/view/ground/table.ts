import { fixed } from "../numbers.ts";
import type { PlaceModel, PlaceStation } from "./model.ts";
import type { SortKey } from "./sorted.ts";

export interface Column {
  readonly key: SortKey;
  readonly title: string;
  readonly text: (station: PlaceStation) => string;
}

/** The figures of the station table: east and north in the model's unit, for wide arrays latitude and longitude; then the height. */
export function columns({ local, unit }: Pick<PlaceModel, "local" | "unit">): readonly Column[] {
  const height: Column = { key: "heightM", title: "Height, m", text: ({ heightM }) => fixed(heightM, 0) };
  if (!local) {
    return [
      { key: "latitudeDeg", title: "Lat, °", text: ({ latitudeDeg }) => fixed(latitudeDeg, 1) },
      { key: "longitudeDeg", title: "Lon, °", text: ({ longitudeDeg }) => fixed(longitudeDeg, 1) },
      height,
    ];
  }
  const written = (metres: number): string => (unit === "km" ? fixed(metres / 1000, 2) : fixed(metres, 1));
  return [
    { key: "eastM", title: `E, ${unit}`, text: ({ eastM }) => written(eastM) },
    { key: "northM", title: `N, ${unit}`, text: ({ northM }) => written(northM) },
    height,
  ];
}

/** The stations in one line: how many may be moved. */
export function tally({ stations, candidates }: PlaceModel): string {
  const locked = stations.filter((station) => station.locked).length;
  const parts = [`${stations.length - locked} movable`];
  if (locked > 0) parts.push(`${locked} locked`);
  if (candidates.length > 0) parts.push(`${candidates.length} ${candidates.length === 1 ? "candidate" : "candidates"}`);
  return parts.join(", ");
}

/** Characters of the longest id, within reason. */
export const idLength = ({ stations, candidates }: PlaceModel): number =>
  [...stations, ...candidates].reduce((most, { id }) => Math.min(12, Math.max(most, id.length)), 2);

/** Whether any station has a name beside its id. */
export const isNamed = ({ stations, candidates }: PlaceModel): boolean =>
  [...stations, ...candidates].some(({ name }) => name !== "");
