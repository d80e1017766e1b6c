import { SPEED_OF_LIGHT } from "../base/constants.ts";
import type { Observation } from "../plan/schema.ts";
import { fixed, joined, plain, signed } from "./numbers.ts";
import { frequencyText, wavelengthText } from "./units.ts";

/** A declination in degrees and minutes, with seconds where asked: "−30° 00′ 00″". Rounded to what is shown. */
export function declinationText(deg: number, seconds: boolean): string {
  const perDegree = seconds ? 3600 : 60;
  const total = Math.round(Math.abs(deg) * perDegree);
  const whole = Math.floor(total / perDegree);
  const rest = total - whole * perDegree;
  const two = (x: number): string => String(x).padStart(2, "0");
  const parts = seconds ? `${two(Math.floor(rest / 60))}′ ${two(rest % 60)}″` : `${two(rest)}′`;
  const sign = total === 0 ? "" : deg < 0 ? "\u2212" : "+";
  return `${sign}${two(whole)}° ${parts}`;
}

/** "δ −30°", as short as the value allows. */
export const declinationShort = (deg: number): string => `δ ${plain(deg, 4)}°`;

/** "robust 0.5", "natural". */
export function weightingText({ weighting }: Observation, decimals?: number): string {
  if (weighting.scheme !== "robust") return weighting.scheme;
  return `robust ${decimals === undefined ? plain(weighting.robustness) : fixed(weighting.robustness, decimals)}`;
}

/** "−4.0 to +4.0 h". */
export const windowText = ({ hourAngle }: Observation): string =>
  `${signed(hourAngle.fromH, 1)} to ${joined(signed(hourAngle.toH, 1), "h")}`;

export const wavelengthM = (observation: Observation): number => SPEED_OF_LIGHT / observation.frequencyHz;

export interface ObservationBoxModel {
  readonly id: string;
  readonly title: string;
  readonly rows: readonly (readonly [label: string, value: string])[];
}

/** The box at the foot of the ledger. `uses`: how many lines of the ledger speak of this observation, of how many. */
export function observationBox(observation: Observation, uses: number, lines: number): ObservationBoxModel {
  return {
    id: observation.id,
    title: observation.label || observation.id,
    rows: [
      ["Declination", declinationText(observation.declinationDeg, false)],
      ["Hour angle", windowText(observation)],
      ["Wavelength", `${wavelengthText(wavelengthM(observation))}, ${frequencyText(observation.frequencyHz)}`],
      ["Bandwidth", frequencyText(observation.bandwidthHz, 3)],
      ["Weighting", weightingText(observation, 1)],
      ...(lines === 0 ? [] : [["Used by", uses === lines ? "all lines" : `${uses} of ${lines} lines`] as const]),
    ],
  };
}
