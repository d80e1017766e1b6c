import { ARCSEC_PER_RAD, JANSKY, RAD_PER_DEG, SPEED_OF_LIGHT } from "../../../src/base/constants.ts";
import { beamSolidAngle, brightnessK, imageNoiseJy } from "../../../src/engine/measure/noise.ts";
import { primaryBeamRad } from "../../../src/engine/measure/scales.ts";
import { effectiveAreaM2, janskyPerKelvin, planckFactor, ruzeFactor, sefdJy } from "../../../src/engine/measure/sefd.ts";
import { phaseCoherence } from "../../../src/engine/measure/tolerance.ts";
import { wavelengthsPerMetre } from "../../../src/engine/synthesis/extent.ts";
import { noiseFactor } from "../../../src/engine/synthesis/sums.ts";
import { checksOf, type Figure, type Left } from "../check.ts";
import rows from "../data/sensitivity.json" with { type: "json" };

/** Noise of equal antennas: n baselines of this SEFD, one sample of this length. */
const noise = (
  baselines: number,
  sefd: number,
  sampleS: number,
  channelWidthHz: number,
  polarizations: 1 | 2,
  efficiency: number,
) =>
  imageNoiseJy({
    inverseSefdSquares: baselines / sefd ** 2,
    channelWidthHz,
    sampleS,
    polarizations,
    efficiency,
    repeats: 1,
    weightingFactor: 1,
  });

const answers: { [id: string]: () => readonly Figure[] } = {
  S01: () => [JANSKY],
  S02: () => [sefdJy(1, 25, 1)],
  // The jansky of a square metre of area is the area of a jansky a kelvin.
  S04: () => [janskyPerKelvin(1)],
  S05: () => [noise(351, 420, 3600, 600e6, 2, 0.93), noise(351, 420, 3600, 1e9, 2, 1)],
  S06: () => [noise(1, 370, 1, 1e6, 1, 1)],
  // A visibility of 3.3 Jy s^½ in a channel: the SEFD whose single baseline has it, √(2Δν)·3.3.
  S07: () => [1000 * noise(78, 3.3 * Math.sqrt(2e9), 900 * 10, 1e9, 1, 1)],
  S08: () => [1, 5.51].map((b) => 2 * Math.PI * b * wavelengthsPerMetre(SPEED_OF_LIGHT / 0.01)),
  S09: () => {
    const omega = beamSolidAngle(1 / ARCSEC_PER_RAD, 1 / ARCSEC_PER_RAD);
    return [brightnessK(1, 1e9, omega), brightnessK(1e-3, SPEED_OF_LIGHT / 0.01, omega)];
  },
  S10: () => [brightnessK(1, 5e9, 2 * Math.PI * (50 / ARCSEC_PER_RAD) ** 2)],
  S11: () => [1 / brightnessK(1, SPEED_OF_LIGHT / 0.21106114, 1)],
  S12: () => [beamSolidAngle(1 / ARCSEC_PER_RAD, 1 / ARCSEC_PER_RAD)],
  S15: () => [noiseFactor({ weight: 10, natural: 4, squareOverNatural: 30, uu: 0, uv: 0, vv: 0 })],
  S16: () => [planckFactor(230e9, 10)],
  S17: () => [ruzeFactor(1, 16)],
  S17b: () => [phaseCoherence(30 * RAD_PER_DEG), phaseCoherence(1)],
  S19: () => [(primaryBeamRad(1.029, SPEED_OF_LIGHT / 1e9, 25) / RAD_PER_DEG) * 60],
};
for (const d of ["6", "12", "13.5", "15", "18", "64", "100"]) {
  answers[`S03-${d}`] = () => [janskyPerKelvin(effectiveAreaM2(Number(d), 1))];
}

/** Section 6: sensitivity. */
export const sensitivityChecks = checksOf(rows, answers);

export const sensitivityLeft: Left = {
  S13: "interference levels of RA.769 are no figure of a layout",
  S14: "a conversion of decibels, no figure of this program",
  S18: "quantization is part of the plan's efficiency, not worked out here",
};
