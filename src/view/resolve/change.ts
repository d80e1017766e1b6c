import { SPEED_OF_LIGHT } from "../../base/constants.ts";
import { DomainError } from "../../base/errors.ts";
import type { Observation } from "../../plan/schema.ts";
import { fixed, joined, plain, signed } from "../numbers.ts";
import { frequencyText, wavelengthText } from "../units.ts";

/** A change of the observation, with the name it has in undo. */
export interface ObservationChange {
  readonly label: string;
  /** Changes in a row with one key are one step of undo. */
  readonly squash: string;
  readonly patch: Partial<Observation>;
  /** Whether a preview can follow it while it is dragged. */
  readonly previews: boolean;
}

/** One end of the window, or, typed as ±4h, both. */
export type HourValue = number | { readonly both: number };

const describe = (what: string, value: string): { label: string } => ({ label: `${what} ${value}` });

/** Typed and slid values become changes of the observation. */
export const change = {
  declination: (deg: number): ObservationChange => ({
    ...describe("declination", `${plain(deg, 4)}°`),
    squash: "declination",
    patch: { declinationDeg: deg },
    previews: true,
  }),
  /** @throws {@link DomainError} for a window that would end before it begins. */
  window: (observation: Observation, end: "fromH" | "toH", value: HourValue): ObservationChange => {
    const hourAngle = {
      ...observation.hourAngle,
      ...(typeof value === "number" ? { [end]: value } : { fromH: -value.both, toH: value.both }),
    };
    if (!(hourAngle.fromH <= hourAngle.toH)) {
      const other = end === "fromH" ? `at most ${signed(hourAngle.toH, 2)}` : `at least ${signed(hourAngle.fromH, 2)}`;
      throw new DomainError(
        `hour angle ${end === "fromH" ? "from" : "to"}`,
        hourAngle[end],
        `${other} h, the other end of the window`,
      );
    }
    return {
      ...describe("window", `${signed(hourAngle.fromH, 2)} to ${joined(signed(hourAngle.toH, 2), "h")}`),
      squash: `window ${end}`,
      patch: { hourAngle },
      previews: true,
    };
  },
  wavelength: (metres: number): ObservationChange => ({
    ...describe("wavelength", wavelengthText(metres, 4)),
    squash: "frequency",
    patch: { frequencyHz: SPEED_OF_LIGHT / metres },
    previews: false,
  }),
  frequency: (hertz: number): ObservationChange => ({
    ...describe("frequency", frequencyText(hertz)),
    squash: "frequency",
    patch: { frequencyHz: hertz },
    previews: false,
  }),
  /** @throws {@link DomainError} for a band that would reach below 0 Hz. */
  bandwidth: (observation: Observation, hertz: number): ObservationChange => {
    if (!(hertz < 2 * observation.frequencyHz)) {
      throw new DomainError(
        "bandwidth",
        frequencyText(hertz),
        `less than twice the frequency, ${frequencyText(2 * observation.frequencyHz)}`,
      );
    }
    return {
      ...describe("bandwidth", frequencyText(hertz, 3)),
      squash: "bandwidth",
      patch: { bandwidthHz: hertz },
      previews: false,
    };
  },
  robustness: (observation: Observation, robustness: number): ObservationChange => ({
    ...describe("robustness", fixed(robustness, 1)),
    squash: "robustness",
    patch: { weighting: { ...observation.weighting, scheme: "robust", robustness } },
    previews: true,
  }),
  scheme: (observation: Observation, scheme: Observation["weighting"]["scheme"]): ObservationChange => ({
    ...describe("weighting", scheme),
    squash: "scheme",
    patch: { weighting: { ...observation.weighting, scheme } },
    previews: true,
  }),
};

/** Values a handle stands for, rounded to what a hand can set. The widest band is one that stays above 0 Hz. */
export const slid = {
  declination: (at: number): number => Math.round(2 * (180 * at - 90)) / 2,
  hours: (at: number): number => Math.round(20 * (24 * at - 12)) / 20,
  wavelength: (at: number, axis: readonly [number, number]): number => Number((axis[0] * (axis[1] / axis[0]) ** at).toPrecision(3)),
  bandwidth: (at: number, axis: readonly [number, number], frequencyHz: number): number =>
    Math.min(Number((axis[0] * (axis[1] / axis[0]) ** at).toPrecision(2)), 1.9 * frequencyHz),
  robustness: (at: number): number => Math.round(10 * (4 * at - 2)) / 10,
};
