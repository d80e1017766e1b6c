import { DomainError } from "spanwright/assess";
import { moveStation, readPlan, writePlan } from "spanwright/plan";

const text = JSON.stringify({
  format: "spanwright-plan",
  version: 1,
  site: { origin: { latitudeDeg: 10, longitudeDeg: 20, heightM: 0 } },
  antennas: [{ id: "d12", diameterM: 12 }],
  stations: [
    { id: "a", latitudeDeg: 10, longitudeDeg: 20, antenna: "d12" },
    { id: "b", latitudeDeg: 10, longitudeDeg: 20.01, antenna: "d12" },
  ],
  layouts: [{ id: "pair", stations: ["a", "b"] }],
  observations: [{ id: "o", declinationDeg: 20, hourAngle: { fromH: -1, toH: 1 }, frequencyHz: 1.42e9 }],
});
const { plan } = readPlan(text);
const moved = moveStation(plan, "b", { latitudeDeg: 10.005, longitudeDeg: 20.01, heightM: 0 });
console.log(JSON.parse(writePlan(moved)).stations[1].latitudeDeg);

try {
  moveStation(plan, "z", { latitudeDeg: 0, longitudeDeg: 0, heightM: 0 });
} catch (error) {
  if (error instanceof DomainError) console.log(error.message);
}
// prints: 10.005
// prints: station is "z"; expected one of a, b.
