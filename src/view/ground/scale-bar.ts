import { joined } from "../numbers.ts";
import { niceAtMost } from "./nice.ts";

export interface ScaleBar {
  readonly lengthM: number;
  readonly lengthPx: number;
  readonly text: string;
}

/** The longest round length that fits `mostPx`. */
export function scaleBar(metresPerPx: number, mostPx: number): ScaleBar {
  const lengthM = niceAtMost(metresPerPx * mostPx);
  return { lengthM, lengthPx: lengthM / metresPerPx, text: roundLength(lengthM) };
}

function roundLength(metres: number): string {
  if (metres >= 1000) return joined(grouped(metres / 1000), "km");
  if (metres >= 1) return joined(String(metres), "m");
  return joined(String(Number((metres * 100).toPrecision(6))), "cm");
}

/** Thousands set off by a no-break thin space: 10 000. */
const grouped = (x: number): string => String(x).replace(/\B(?=(\d{3})+$)/g, "\u202f");
