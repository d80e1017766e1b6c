import { fixed, joined } from "../numbers.ts";
import { niceAtLeast } from "./nice.ts";

export interface Tick {
  readonly valueM: number;
  /** The figure alone; the tick nearest the middle carries unit and direction. */
  readonly text: string;
}

/** Steps between crosses in metres: at least `leastPx` on screen, a round number of metres or kilometres. */
export const tickStepM = (metresPerPx: number, leastPx = 60): number => niceAtLeast(metresPerPx * leastPx);

/**
 * Ticks at whole multiples of `stepM` within [fromM, toM], counted from the plan's origin.
 * Written in km from a step of 100 m up, in m below. `direction` is the letter after the unit: E or N.
 */
export function ticks(fromM: number, toM: number, stepM: number, direction: "E" | "N"): readonly Tick[] {
  const [unitM, word] = stepM >= 100 ? [1000, "km"] : [1, "m"];
  const decimals = Math.max(0, -Math.floor(Math.log10(stepM / unitM) + 1e-9));
  const first = Math.ceil(fromM / stepM - 1e-9);
  const last = Math.floor(toM / stepM + 1e-9);
  const middle = Math.round((first + last) / 2);
  const found: Tick[] = [];
  for (let k = first; k <= last; k++) {
    const figure = fixed((k * stepM) / unitM, decimals);
    found.push({ valueM: k * stepM, text: k === middle ? `${joined(figure, word)} ${direction}` : figure });
  }
  return found;
}
