import { PROTECTED_BANDS, protectionOf } from "../../../src/engine/sky/bands.ts";
import { gasAttenuation } from "../../../src/engine/sky/opacity.ts";
import { checksOf, type Figure, type Left } from "../check.ts";
import rows from "../data/standards.json" with { type: "json" };

const passive = (fromHz: number, toHz: number): number =>
  protectionOf(fromHz, toHz).bands.some((b) => b.protection === "passive" && b.fromHz === fromHz && b.toHz === toHz) ? 1 : 0;
const urged = (fromHz: number): readonly number[] => {
  const band = PROTECTED_BANDS.find((b) => b.protection === "urged" && b.fromHz === fromHz);
  return band ? [band.fromHz, band.toHz] : [Number.NaN, Number.NaN];
};

const answers: { [id: string]: () => readonly Figure[] } = {
  I03: () => [1330e6, 4950e6, 42.5e9].flatMap(urged),
  I04: () => [passive(1.4e9, 1.427e9), passive(23.6e9, 24e9)],
};
for (const ghz of [12, 20, 60, 90, 130]) {
  answers[`I01-${ghz}`] = () => {
    // The workbook's air: 7.5 g/m³ of vapour at 288.15 K.
    const air = { dryHPa: 1013.25, vapourHPa: 9.97288878634056, temperatureK: 288.15 };
    const { dryDbPerKm, vapourDbPerKm } = gasAttenuation(ghz * 1e9, air);
    return [dryDbPerKm, vapourDbPerKm];
  };
}

/** Section 10: standards. */
export const standardsChecks = checksOf(rows, answers);

export const standardsLeft: Left = { I02: "galactic noise is part of a receiver's SEFD in the plan" };
