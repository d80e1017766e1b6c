import { describe, expect, it } from "vitest";
import { DomainError } from "../../../src/base/errors.ts";
import { placedTo, placeFields, placeKeys } from "../../../src/view/ground/fields.ts";
import { placeModel } from "../../../src/view/ground/model.ts";
import { typedAngle, typedLength } from "../../../src/view/ground/typed.ts";
import { planWith, smallRows } from "./plans.ts";

describe("typedLength", () => {
  it("reads kilometres, metres, signs and moves", () => {
    const read = (text: string) => typedLength(text, 11_000, "km", "East");
    expect(read("16.149")).toBeCloseTo(16_149, 9);
    expect(read(" 850 m")).toBe(850);
    expect(read("-3.2km")).toBeCloseTo(-3200, 9);
    expect(read("−3.2 KM")).toBeCloseTo(-3200, 9);
    expect(read("+0.5km")).toBeCloseTo(11_500, 9);
    expect(read("+-500m")).toBe(10_500);
    expect(read(".5")).toBe(500);
    expect(typedLength("+10", 2400, "m", "Height")).toBe(2410);
  });

  it("refuses what is no length, naming the field", () => {
    for (const text of ["", "east", "5 miles", "1,5", "1e999", "--3", "km"]) {
      expect(() => typedLength(text, 0, "km", "East")).toThrow(DomainError);
    }
    expect(() => typedLength("over there", 0, "km", "North")).toThrow('North is "over there"; expected kilometres such as');
  });
});

describe("typedAngle", () => {
  it("reads decimal degrees and degrees, minutes, seconds", () => {
    // 37′ 12″ are 0.62°.
    for (const text of [
      "-31.62",
      "−31.62°",
      "31.62 S",
      "-31:37:12",
      "31°37′12″ S",
      "-31d37m12s",
      "31:37:12 S",
      "31 37 12 S",
      "31°37′12'' S",
    ]) {
      expect(typedAngle(text, "Latitude")).toBeCloseTo(-31.62, 12);
    }
    expect(typedAngle("24:30", "Longitude")).toBeCloseTo(24.5, 12);
    expect(typedAngle("66.94W", "Longitude")).toBeCloseTo(-66.94, 12);
  });

  it("brings longitudes into (−180, 180]", () => {
    expect(typedAngle("190", "Longitude")).toBe(-170);
    expect(typedAngle("180", "Longitude")).toBe(180);
    expect(typedAngle("-180", "Longitude")).toBe(180);
    expect(typedAngle("360", "Longitude")).toBe(0);
  });

  it("refuses what is out of range or unclear", () => {
    for (const text of ["90.1", "-91", "31 E", "-31 S", "31:60", "31:10:60", "north", ""]) {
      expect(() => typedAngle(text, "Latitude")).toThrow(DomainError);
    }
    expect(() => typedAngle("361", "Longitude")).toThrow("Longitude is");
  });
});

describe("placeFields and placedTo", () => {
  const model = placeModel(planWith(smallRows), "all", "K2", false);
  const kestrel = model.stations[1];

  it("show the place and read it back", () => {
    const { east, north, latitude, height } = placeFields(kestrel, "km", false);
    expect([latitude.text, height.text, east.unit, north.unit]).toEqual(["−31.020000", "1010.0", "km", "km"]);
    expect(east.parse("+0.5km")).toBeCloseTo(kestrel.eastM / 1000 + 0.5, 9);
  });

  it("speak metres for small arrays", () => {
    const { east } = placeFields(kestrel, "m", false);
    expect([east.unit, east.text]).toEqual(["m", kestrel.eastM.toFixed(2)]);
    expect(east.parse("1.5km")).toBe(1500);
    const to = placedTo({ frame: model.frame, unit: "m" }, kestrel, "east", 1500);
    expect(model.frame.point(to.latitudeDeg, to.longitudeDeg, to.heightM).eastM).toBeCloseTo(1500, 5);
  });

  it("typed east keeps north and height", () => {
    const to = placedTo(model, kestrel, "east", 5);
    const again = model.frame.point(to.latitudeDeg, to.longitudeDeg, to.heightM);
    expect(again.eastM).toBeCloseTo(5000, 5);
    expect(again.northM).toBeCloseTo(kestrel.northM, 5);
    expect(to.heightM).toBe(1010);
  });

  it("typed latitude, longitude and height change only themselves", () => {
    const { latitudeDeg, longitudeDeg, heightM } = kestrel;
    expect(placedTo(model, kestrel, "latitude", -30)).toEqual({ latitudeDeg: -30, longitudeDeg, heightM });
    expect(placedTo(model, kestrel, "longitude", 25)).toEqual({ latitudeDeg, longitudeDeg: 25, heightM });
    expect(placedTo(model, kestrel, "height", 900)).toEqual({ latitudeDeg, longitudeDeg, heightM: 900 });
  });

  it("refuses places that do not exist", () => {
    expect(() => placedTo(model, kestrel, "east", 7000)).toThrow("this side of the horizon");
    expect(() => placedTo(model, kestrel, "latitude", 91)).toThrow("Latitude is 91");
    expect(() => placedTo(model, kestrel, "height", 200_000)).toThrow("Height is 200000");
  });

  it("leaves out east and north for wide arrays", () => {
    expect(placeKeys({ local: true })).toContain("east");
    expect(placeKeys({ local: false })).toEqual(["latitude", "longitude", "height"]);
  });
});
