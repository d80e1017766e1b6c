import type { Picture, UvDensity } from "../../assess/result.ts";
import { SPEED_OF_LIGHT } from "../../base/constants.ts";
import { fixed, joined, plain } from "../numbers.ts";
import { shownAs } from "../units.ts";
import { multiples, niceBelow, type TextEquivalent, type Tick } from "./figure.ts";

/** The uv coverage panel. Positions run from −1 to 1 across the square: u to the right, v upward. */
export interface UvModel {
  readonly density: UvDensity | null;
  /** Wavelengths from the centre to the edge of the square. */
  readonly halfWavelengths: number;
  readonly wavelengthM: number;
  readonly ticks: readonly Tick[];
  readonly unit: string;
  readonly rings: readonly { readonly radius: number; readonly label: string }[];
  /** Key figures under the square. */
  readonly keys: readonly { readonly label: string; readonly value: string }[];
  readonly text: TextEquivalent;
}

/** Edge of the square for a grid: the whole of a settled one, which has little room around its samples. */
export const uvHalf = (uv: UvDensity): number => (uv.cellWavelengths * uv.size) / 2;

/**
 * @param halfWavelengths - Fixed while a station moves, so that the picture does not breathe; null: what the grid holds.
 */
export function uvModel(picture: Picture, frequencyHz: number, halfWavelengths: number | null): UvModel {
  const { uv, result } = picture;
  const wavelengthM = SPEED_OF_LIGHT / frequencyHz;
  const half = halfWavelengths ?? (uv ? uvHalf(uv) : 1);
  const big = half >= 2e6;
  const scale = big ? 1e6 : half >= 2000 ? 1e3 : 1;
  const unit = big ? "Mλ" : scale === 1e3 ? "kλ" : "λ";
  const step = niceBelow((half / scale) * 0.8);
  const ticks = multiples(-half / scale, half / scale, step)
    .filter((t) => t !== 0)
    .map((t) => ({ at: (t * scale) / half, label: plain(t) }));
  const reachM = half * wavelengthM;
  const ringStep = niceBelow(reachM / 3);
  const rings = multiples(ringStep, reachM * 0.98, ringStep).map((m) => ({ radius: m / reachM, label: shortLength(m) }));
  const keys = [
    { label: "longest", value: lengthOr(result.longestProjectedM) },
    { label: "shortest", value: lengthOr(result.shortestProjectedM) },
    { label: "", value: `${result.baselineCount} baselines` },
  ];
  const { filledFraction, largestRadialGap, azimuthalUniformity } = result.coverage;
  const dash = (value: number | null, text: (x: number) => string): string => (value === null ? "none" : text(value));
  return {
    density: uv,
    halfWavelengths: half,
    wavelengthM,
    ticks,
    unit,
    rings,
    keys,
    text: {
      summary: uv
        ? `${result.baselineCount} baselines reach ${lengthOr(result.longestProjectedM)} and begin at ${lengthOr(result.shortestProjectedM)}, as seen from the source; ${dash(filledFraction, (x) => `${fixed(100 * x, 1)} % of the uv cells hold a sample`)}.`
        : "No samples: nothing to draw.",
      columns: ["Figure", "Value"],
      rows: [
        ["Longest projected baseline", lengthOr(result.longestProjectedM)],
        ["Shortest projected baseline", lengthOr(result.shortestProjectedM)],
        ["Baselines", String(result.baselineCount)],
        ["Samples that count", String(result.samplesKept)],
        ["uv cells filled", dash(filledFraction, (x) => `${fixed(100 * x, 1)} %`)],
        ["Largest radial gap, ratio", dash(largestRadialGap, (x) => fixed(x, 2))],
        ["Azimuthal evenness", dash(azimuthalUniformity, (x) => fixed(x, 2))],
      ],
    },
  };
}

/** "u 62.1, v −18.4 kλ is a 13.7 km spacing", for a point of the square. */
export function uvReadout(model: UvModel, x: number, y: number): string {
  const u = x * model.halfWavelengths;
  const v = y * model.halfWavelengths;
  const scale = model.unit === "Mλ" ? 1e6 : model.unit === "kλ" ? 1e3 : 1;
  const spacing = shownAs("length", Math.hypot(u, v) * model.wavelengthM);
  return `u ${fixed(u / scale, 1)}, v ${fixed(v / scale, 1)} ${model.unit} is a ${spacing} spacing`;
}

const lengthOr = (metres: number | null): string => (metres === null ? "none" : shownAs("length", metres));
const shortLength = (metres: number): string => (metres >= 1000 ? joined(plain(metres / 1000), "km") : joined(plain(metres), "m"));
