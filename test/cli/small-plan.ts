/** A plan small enough to assess in a moment: five stations of an invented site, two layouts, two observations. */
export function smallPlan(): Record<string, unknown> {
  const station = (id: string, east: number, north: number) => ({
    id,
    latitudeDeg: -30 + north / 111_000,
    longitudeDeg: 20 + east / 96_500,
    heightM: 900,
    antenna: "d12",
  });
  const observation = (id: string, declinationDeg: number) => ({
    id,
    declinationDeg,
    hourAngle: { fromH: -2, toH: 2 },
    elevationLimitDeg: 15,
    frequencyHz: 1.42e9,
    integrationS: 600,
    weighting: { scheme: "natural" },
    image: { sidelobeRadiusArcsec: 300 },
  });
  return {
    format: "spanwright-plan",
    version: 1,
    title: "Fenwick Ridge",
    site: { origin: { latitudeDeg: -30, longitudeDeg: 20, heightM: 900 } },
    antennas: [{ id: "d12", diameterM: 12, receivers: [{ fromHz: 1e9, toHz: 2e9, sefdJy: 400 }] }],
    stations: [
      station("A", 0, 0),
      station("B", 400, 30),
      station("C", -150, 500),
      station("D", 900, -700),
      station("E", -800, -300),
    ],
    layouts: [
      { id: "wide", label: "All five", stations: ["A", "B", "C", "D", "E"] },
      { id: "close", stations: ["A", "B", "C"] },
    ],
    observations: [observation("south", -45), observation("north", 20)],
    requirements: [],
  };
}

/** One requirement on the beam's major axis. */
export const beamLine = (id: string, atMost: number, more: object = {}): object => ({
  id,
  quantity: "beam.majorArcsec",
  atMost,
  when: { observation: "south", layouts: ["wide"] },
  ...more,
});
