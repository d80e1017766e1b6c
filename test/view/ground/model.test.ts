import { describe, expect, it } from "vitest";
import { extentOf, labelOf, placeModel, titleOf } from "../../../src/view/ground/model.ts";
import { nextSorting, sortedStations } from "../../../src/view/ground/sorted.ts";
import { columns, idLength, isNamed, tally } from "../../../src/view/ground/table.ts";
import { planWith, smallRows, square } from "./plans.ts";

const ids = (stations: readonly { readonly id: string }[]) => stations.map(({ id }) => id);

describe("placeModel", () => {
  const plan = planWith(smallRows, { hub: { latitudeDeg: -31, longitudeDeg: 24.001 } });

  it("splits stations into those of the layout and those of none", () => {
    const all = placeModel(plan, "all", null, false);
    expect(ids(all.stations)).toEqual(["K1", "K2", "K3"]);
    expect(ids(all.candidates)).toEqual(["C1"]);
    const few = placeModel(plan, "few", null, false);
    expect(ids(few.stations)).toEqual(["K1", "K2"]);
    // K3 belongs to another layout: it is no candidate.
    expect(ids(few.candidates)).toEqual(["C1"]);
    expect(few.layoutLabel).toBe("few");
  });

  it("selects what it shows and nothing else", () => {
    expect(placeModel(plan, "few", "K2", false).selected?.name).toBe("Kestrel");
    expect(placeModel(plan, "few", "C1", false).selected?.inLayout).toBe(false);
    expect(placeModel(plan, "few", "K3", false).selected).toBeNull();
    expect(placeModel(plan, "few", "gone", false).selected).toBeNull();
  });

  it("shows an unknown layout as empty", () => {
    const none = placeModel(plan, "gone", null, false);
    expect(none.stations).toEqual([]);
    expect(none.layoutLabel).toBe("gone");
  });

  it("takes over from the model before what did not change, and only that", () => {
    const before = placeModel(plan, "all", "K1", false);
    const moved = { ...plan, stations: plan.stations.map((s) => (s.id === "K2" ? { ...s, latitudeDeg: -31.03 } : s)) };
    const after = placeModel(moved, "all", "K1", true, before);
    expect(after.stations[0]).toBe(before.stations[0]);
    expect(after.stations[1]).not.toBe(before.stations[1]);
    expect(after.stations[1].northM).toBeLessThan(before.stations[1].northM);
    expect(after.frame).toBe(before.frame);
    const elsewhere = { ...plan, site: { ...plan.site, origin: { latitudeDeg: -31.1, longitudeDeg: 24, heightM: 0 } } };
    expect(placeModel(elsewhere, "all", "K1", false, before).stations[0].northM).toBeGreaterThan(11_000);
  });

  it("tells small arrays from wide ones", () => {
    expect(placeModel(plan, "all", null, false)).toMatchObject({ local: true, wide: false });
    const continent = planWith([
      ["A", "", -31, 24, 0],
      ["B", "", -20, 30, 0],
    ]);
    expect(placeModel(continent, "all", null, false)).toMatchObject({ local: false, wide: false });
    const world = planWith([
      ["A", "", 50, 0, 0],
      ["B", "", -40, 150, 0],
      ["D", "", 20, -155, 0],
      ["E", "", -25, 27, 0],
    ]);
    expect(placeModel(world, "all", null, false)).toMatchObject({ local: false, wide: true });
  });
});

describe("extentOf", () => {
  it("takes in the land unless it dwarfs the array", () => {
    const near = placeModel(planWith(smallRows, { allowed: square(23.95, -31.05, 24.05, -30.95) }), "all", null, false);
    expect(extentOf(near).length).toBeGreaterThan(3);
    const vast = placeModel(planWith(smallRows, { allowed: square(20, -35, 28, -27) }), "all", null, false);
    expect(extentOf(vast)).toHaveLength(3);
  });
});

describe("names", () => {
  it("falls back to the id", () => {
    expect(titleOf({ id: "K3", name: "" })).toBe("K3");
    expect(titleOf({ id: "K1", name: "Kite" })).toBe("K1 Kite");
    expect(labelOf({ id: "K3", name: "" })).toBe("K3");
  });
});

describe("the station table", () => {
  const model = placeModel(planWith(smallRows), "all", null, false);

  it("counts what may be moved", () => {
    expect(tally(model)).toBe("2 movable, 1 locked, 1 candidate");
  });

  it("shows east and north in km, in metres for small arrays, latitude and longitude for wide ones", () => {
    const [east, north, height] = columns(model);
    expect([east.title, north.title, height.title]).toEqual(["E, km", "N, km", "Height, m"]);
    expect(east.text(model.stations[0])).toBe("0.00");
    // 0.02° of latitude at 31° S are 2217 m (WGS84 meridian, 110.86 km a degree; common value).
    expect(north.text(model.stations[1])).toBe("−2.22");
    const close = placeModel(planWith([["F1", "", -31.0001, 24, 0]]), "all", null, false);
    expect(columns(close).map(({ title }) => title)).toEqual(["E, m", "N, m", "Height, m"]);
    expect(columns(close)[1].text(close.stations[0])).toBe("−11.1");
    const wide = placeModel(
      planWith([
        ["A", "", -31, 24, 0],
        ["B", "", -20, 30, 12.4],
      ]),
      "all",
      null,
      false,
    );
    expect(columns(wide).map(({ text }) => text(wide.stations[1]))).toEqual(["−20.0", "30.0", "12"]);
  });

  it("knows how wide ids are and whether there are names", () => {
    expect(idLength(model)).toBe(2);
    expect(isNamed(model)).toBe(true);
    const plain = placeModel(planWith([["F0001", "", -31, 24, 0]]), "all", null, false);
    expect([idLength(plain), isNamed(plain)]).toEqual([5, false]);
  });

  it("sorts both ways, numbers in names as numbers, and returns to the plan's order", () => {
    const sorting = nextSorting(null, "northM");
    expect(ids(sortedStations(model.stations, sorting))).toEqual(["K2", "K1", "K3"]);
    const down = nextSorting(sorting, "northM");
    expect(ids(sortedStations(model.stations, down))).toEqual(["K3", "K1", "K2"]);
    expect(nextSorting(down, "northM")).toBeNull();
    expect(nextSorting(down, "id")).toEqual({ key: "id", descending: false });
    const many = placeModel(
      planWith([
        ["M10", "", -31, 24, 0],
        ["M9", "", -31.1, 24, 0],
      ]),
      "all",
      null,
      false,
    );
    expect(ids(sortedStations(many.stations, { key: "id", descending: false }))).toEqual(["M9", "M10"]);
  });
});
