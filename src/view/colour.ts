/** The two looks of the page; print takes the light one. */
export type Theme = "light" | "dark";
/** sRGB, 0 to 255 each. */
export type Rgb = readonly [red: number, green: number, blue: number];
type Triple = readonly [number, number, number];

/** Fraction of the peak below which the beam map's stretch is close to linear. */
const SOFTENING = 0.04;
/** Where the density map's filled cells start, so that one sample is told from none. */
const FILLED_FROM = 0.16;

/** Control points at 0, ¼, ½, ¾, 1, of equal OKLab lightness in the two arms. */
const beamArms: { readonly [theme in Theme]: { readonly plus: readonly string[]; readonly minus: readonly string[] } } = {
  dark: {
    plus: ["#0D1412", "#134E34", "#559247", "#B5CA4E", "#FDF8BE"],
    minus: ["#161115", "#602569", "#B553B4", "#EDA0DE", "#FFEEFD"],
  },
  light: {
    plus: ["#F9FBF6", "#D6DC85", "#80AB50", "#2E6D3F", "#072E21"],
    minus: ["#FDF9FC", "#F2C3EA", "#D173CA", "#8F2697", "#3B0C48"],
  },
};
const densityPoints: { readonly [theme in Theme]: readonly string[] } = {
  dark: ["#0D1414", "#224974", "#3690BF", "#86D2E5", "#DFFCFD"],
  light: ["#F6FBFC", "#A2D8E8", "#449CCC", "#1A5998", "#10234F"],
};

/** The beam map's stretch of a fraction of the peak: sign(v)·asinh(|v|/0.04)/asinh(1/0.04), ±1 at ±1. */
export const stretch = (v: number): number => Math.asinh(v / SOFTENING) / Math.asinh(1 / SOFTENING);

/** Colour of a stretched value, −1 to 1 (clamped); not a number counts as 0. The plus arm's start, the page, stands at 0. */
export function beamColour(s: number, theme: Theme): Rgb {
  const { plus, minus } = beamArms[theme];
  return s < 0 ? along(minus, -s) : along(plus, s);
}

/** Colour of a density, 0 (the page) to 1 (clamped). */
export const densityColour = (t: number, theme: Theme): Rgb => along(densityPoints[theme], t);

/**
 * Place of a count of samples on the density map: 0 for none, then on a log scale from 0.16 for one to 1 for `most`.
 * Where no cell holds more than one sample every filled cell is at 1.
 */
export function densityPlace(count: number, most: number): number {
  if (!(count > 0)) return 0;
  if (!(most > 1)) return 1;
  return FILLED_FROM + (1 - FILLED_FROM) * Math.min(1, Math.max(0, Math.log(count) / Math.log(most)));
}

/** Colours at `2 * half + 1` even steps of the stretched value from −1 to 1, three bytes each: value 0 is at index `half`. */
export function beamTable(theme: Theme, half: number): Uint8ClampedArray {
  return tableOf(2 * half + 1, (k) => beamColour((k - half) / half, theme));
}

/** Colours at `steps + 1` even steps from 0 to 1, three bytes each. */
export function densityTable(theme: Theme, steps: number): Uint8ClampedArray {
  return tableOf(steps + 1, (k) => densityColour(k / steps, theme));
}

/** The three channels of `#rrggbb`. */
export function rgbOf(hex: string): Rgb {
  const bits = Number.parseInt(hex.slice(1), 16);
  return [bits >> 16, (bits >> 8) & 255, bits & 255];
}

/**
 * OKLab of an sRGB colour: lightness 0 to 1, then green–red and blue–yellow.
 *
 * Source: B. Ottosson, "A perceptual color space for image processing" (2020); sRGB transfer: IEC 61966-2-1.
 */
export function oklabOf(rgb: Rgb): Triple {
  const [r, g, b] = rgb.map((x) => toLinear(x / 255));
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [
    0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s,
    1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s,
  ];
}

/** The sRGB colour of an OKLab one, rounded; a colour outside sRGB is clipped channel by channel. Source: as {@link oklabOf}. */
export function rgbOfOklab([lightness, a, b]: Triple): Rgb {
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  const channel = (x: number): number => Math.round(255 * fromLinear(Math.min(1, Math.max(0, x))));
  return [
    channel(4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s),
    channel(-1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s),
    channel(-0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s),
  ];
}

/** A point of a piecewise linear path through OKLab. Control points themselves come out unchanged. */
function along(points: readonly string[], t: number): Rgb {
  const last = points.length - 1;
  const at = last * (t > 0 ? Math.min(1, t) : 0);
  const k = Math.min(last - 1, Math.floor(at));
  const part = at - k;
  const from = oklabOf(rgbOf(points[k]));
  const to = oklabOf(rgbOf(points[k + 1]));
  const mix = (c: 0 | 1 | 2): number => from[c] + part * (to[c] - from[c]);
  return rgbOfOklab([mix(0), mix(1), mix(2)]);
}

function tableOf(count: number, colour: (k: number) => Rgb): Uint8ClampedArray {
  const table = new Uint8ClampedArray(3 * count);
  for (let k = 0; k < count; k++) table.set(colour(k), 3 * k);
  return table;
}

const toLinear = (x: number): number => (x <= 0.04045 ? x / 12.92 : ((x + 0.055) / 1.055) ** 2.4);
const fromLinear = (x: number): number => (x <= 0.0031308 ? 12.92 * x : 1.055 * x ** (1 / 2.4) - 0.055);
