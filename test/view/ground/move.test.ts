import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { displacement, heldTo } from "../../../src/view/ground/displacement.ts";
import { bearingText, callOut, lifted, liftedBy, liftedTo, movedText } from "../../../src/view/ground/lift.ts";
import { placeModel } from "../../../src/view/ground/model.ts";
import { planWith, smallRows, square } from "./plans.ts";

describe("displacement", () => {
  // Source: GeographicLib documentation, GeodSolve, the inverse example from JFK (40.6, −73.8) to LHR (51.6, −0.5):
  // 5551.76 km; quoted from memory, tolerance its rounding.
  it("is the geodesic of the published example", () => {
    const { distanceM } = displacement({ latitudeDeg: 40.6, longitudeDeg: -73.8 }, { latitudeDeg: 51.6, longitudeDeg: -0.5 });
    expect(Math.abs(distanceM - 5_551_760)).toBeLessThan(5);
  });

  it("has bearings in [0, 360) and 0 for no move", () => {
    const from = { latitudeDeg: 10, longitudeDeg: 20 };
    expect(displacement(from, { latitudeDeg: 10, longitudeDeg: 19.9 }).bearingDeg).toBeCloseTo(270, 1);
    expect(displacement(from, from)).toEqual({ distanceM: 0, bearingDeg: 0 });
  });
});

describe("heldTo", () => {
  const from = { latitudeDeg: -31, longitudeDeg: 24 };

  it("keeps a place that lies on the bearing, and stays on it otherwise", () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 359, noNaN: true }), fc.double({ min: -0.2, max: 0.2, noNaN: true }), (bearing, d) => {
        const to = { latitudeDeg: -31 + d, longitudeDeg: 24 + d / 2 };
        const held = heldTo(from, to, bearing);
        const way = displacement(from, held);
        // A foot behind the start lies on the opposite bearing.
        const off = Math.abs(Math.sin(((way.bearingDeg - bearing) * Math.PI) / 180));
        expect(way.distanceM * off).toBeLessThan(1e-3);
        const own = displacement(from, to);
        if (own.distanceM < 1) return;
        const same = displacement(to, heldTo(from, to, own.bearingDeg));
        // Arc from length by the mean radius and back: rounding only.
        expect(same.distanceM).toBeLessThan(1e-5);
      }),
      { seed: 20260101 },
    );
  });

  it("stands still for a move square to the bearing", () => {
    const held = heldTo(from, { latitudeDeg: -31, longitudeDeg: 24.01 }, 0);
    // 950 m along the parallel: its first azimuth is off 90° by 0.0026°, 0.04 m at that length.
    expect(displacement(from, held).distanceM).toBeLessThan(0.1);
  });
});

describe("lifting a station", () => {
  const plan = planWith(smallRows, {
    allowed: square(23.9, -31.1, 24.1, -30.9),
    keepOut: [{ label: "Salt pan reserve", geometry: square(24.0, -30.99, 24.02, -30.97) }],
  });
  const model = placeModel(plan, "all", "K1", false);
  const kite = model.stations[0];

  it("steps by metres of east and north and keeps the height", () => {
    const moved = liftedBy(liftedBy(lifted(kite), 10, 0, model.frame), 0, 100, model.frame);
    expect(moved.to.eastM - kite.eastM).toBeCloseTo(10, 6);
    expect(moved.to.northM - kite.northM).toBeCloseTo(100, 6);
    const again = model.frame.point(moved.to.latitudeDeg, moved.to.longitudeDeg, kite.heightM);
    expect(again.northM).toBeCloseTo(moved.to.northM, 5);
  });

  it("counts distance at the station's height, so that a hundred-metre step reads as one", () => {
    const high = { ...kite, heightM: 2400 };
    const step = liftedBy(lifted(high), 0, 600, model.frame);
    expect(callOut(step, model).moved).toBe("Moved 600.0\u00a0m, 000°");
  });

  it("says how far, which way, where to, and what lies there", () => {
    const to = model.frame.point(-30.98, 24.01, kite.heightM);
    const say = callOut(liftedTo(lifted(kite), to, model.frame, false), model);
    expect(say.title).toBe("K1 Kite");
    // 0.02° of latitude by 0.01° of longitude at 31° S: 2217 m north, 955 m east, so 2.41 km at 23°.
    expect(say.moved).toBe("Moved 2.41\u00a0km, 023°");
    expect(say.place).toMatch(/^E 0\.955\u00a0km, N 2\.218\u00a0km$/);
    expect(say.height).toBe("Height kept, 1000.0\u00a0m");
    expect(say.verdict).toEqual({ clear: false, text: "inside Salt pan reserve" });
    expect(say.held).toBeNull();
  });

  it("holds the bearing it had when Shift went down, until it goes up", () => {
    const { frame } = model;
    const first = liftedTo(lifted(kite), frame.point(-30.99, 24, kite.heightM), frame, false);
    const held = liftedTo(first, frame.point(-30.98, 24.02, kite.heightM), frame, true);
    expect(held.heldBearingDeg).toBeCloseTo(0, 9);
    expect(held.to.longitudeDeg).toBeCloseTo(24, 9);
    const on = liftedTo(held, frame.point(-30.97, 23.9, kite.heightM), frame, true);
    expect(on.heldBearingDeg).toBe(held.heldBearingDeg);
    expect(liftedTo(on, frame.point(-30.97, 23.9, kite.heightM), frame, false).heldBearingDeg).toBeNull();
    expect(liftedTo(lifted(kite), frame.point(-30.97, 23.9, kite.heightM), frame, true).heldBearingDeg).toBeNull();
  });

  it("writes distances and bearings in fixed forms", () => {
    expect(movedText({ distanceM: 0, bearingDeg: 0 })).toBe("0\u00a0m");
    expect(movedText({ distanceM: 103.44, bearingDeg: 17.4 })).toBe("103.4\u00a0m, 017°");
    expect(movedText({ distanceM: 2700, bearingDeg: 359.7 })).toBe("2.70\u00a0km, 000°");
    expect(bearingText(28)).toBe("028°");
  });
});
