import type { PlaceStation } from "./model.ts";

export type SortKey = "id" | "name" | "eastM" | "northM" | "latitudeDeg" | "longitudeDeg" | "heightM";
export interface Sorting {
  readonly key: SortKey;
  readonly descending: boolean;
}

/** Stations in the order asked for; equal ones and the missing order keep the plan's. */
export function sortedStations(stations: readonly PlaceStation[], sorting: Sorting | null): readonly PlaceStation[] {
  if (!sorting) return stations;
  const { key, descending } = sorting;
  const sign = descending ? -1 : 1;
  return stations.toSorted((a, b) => {
    const [x, y] = [a[key], b[key]];
    if (typeof x === "string" && typeof y === "string") return sign * x.localeCompare(y, "en", { numeric: true });
    return sign * ((x as number) - (y as number));
  });
}

/** What a click on a header asks for next: up, down, then the plan's order again. */
export function nextSorting(sorting: Sorting | null, key: SortKey): Sorting | null {
  if (sorting?.key !== key) return { key, descending: false };
  return sorting.descending ? null : { key, descending: true };
}
