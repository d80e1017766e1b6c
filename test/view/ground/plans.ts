import * as v from "valibot";
import { type Plan, planSchema } from "../../../src/plan/schema.ts";

type StationRow = readonly [id: string, name: string, latitudeDeg: number, longitudeDeg: number, heightM: number, locked?: boolean];

/** A plan with the stations given; the layout `all` holds those whose id does not begin with C, `few` the first two. */
export function planWith(rows: readonly StationRow[], site: object = {}): Plan {
  return v.parse(planSchema, {
    format: "spanwright-plan",
    version: 1,
    title: "Test ground",
    site: { origin: { latitudeDeg: -31, longitudeDeg: 24, heightM: 1000 }, ...site },
    antennas: [{ id: "d12", diameterM: 12 }],
    stations: rows.map(([id, name, latitudeDeg, longitudeDeg, heightM, locked = false]) => ({
      id,
      name,
      latitudeDeg,
      longitudeDeg,
      heightM,
      antenna: "d12",
      locked,
    })),
    layouts: [
      { id: "all", label: "All of them", stations: rows.map(([id]) => id).filter((id) => !id.startsWith("C")) },
      { id: "few", stations: rows.slice(0, 2).map(([id]) => id) },
    ],
    observations: [{ id: "S", declinationDeg: -30, hourAngle: { fromH: -1, toH: 1 }, frequencyHz: 1.4e9 }],
  });
}

export const smallRows: readonly StationRow[] = [
  ["K1", "Kite", -31.0, 24.0, 1000],
  ["K2", "Kestrel", -31.02, 24.03, 1010],
  ["K3", "", -30.97, 23.96, 990, true],
  ["C1", "Spare", -31.01, 24.01, 1005],
];

export const square = (west: number, south: number, east: number, north: number) => ({
  type: "Polygon" as const,
  coordinates: [
    [
      [west, south],
      [east, south],
      [east, north],
      [west, north],
      [west, south],
    ],
  ],
});
