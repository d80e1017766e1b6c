import { assess } from "spanwright/assess";
import { readPlan } from "spanwright/plan";

const station = (id: string, latitudeDeg: number, longitudeDeg: number) => ({ id, latitudeDeg, longitudeDeg, antenna: "d12" });
const { plan } = readPlan(
  JSON.stringify({
    format: "spanwright-plan",
    version: 1,
    site: { origin: { latitudeDeg: -31.6, longitudeDeg: -66.9, heightM: 2360 } },
    antennas: [{ id: "d12", diameterM: 12 }],
    stations: [
      station("a", -31.6, -66.9),
      station("b", -31.59, -66.89),
      station("c", -31.61, -66.88),
      station("d", -31.62, -66.91),
    ],
    layouts: [{ id: "four", stations: ["a", "b", "c", "d"] }],
    observations: [{ id: "south", declinationDeg: -45, hourAngle: { fromH: -3, toH: 3 }, frequencyHz: 1.42e9, integrationS: 120 }],
  }),
);
const { beam, longestBaselineM } = await assess(plan, "four", "south");
console.log(`${longestBaselineM?.toFixed(0)} m, ${beam.majorArcsec?.toFixed(1)}″ × ${beam.minorArcsec?.toFixed(1)}″`);
// prints: 3830 m, 11.0″ × 7.3″
