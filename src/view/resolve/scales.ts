import type { Picture } from "../../assess/result.ts";
import { SPEED_OF_LIGHT } from "../../base/constants.ts";
import type { Antenna } from "../../plan/schema.ts";
import { plain } from "../numbers.ts";
import { frequencyText, shownAs, wavelengthText } from "../units.ts";
import type { Box, Size, TextEquivalent, Tick } from "./figure.ts";

/** A line of an angle that grows as the wavelength, and the angle it has at the observation's wavelength. */
export interface ScaleLine {
  readonly name: "primary beam" | "largest scale" | "beam, major axis";
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
  /** Where and how steeply its name is written. */
  readonly label: { readonly x: number; readonly y: number; readonly angleDeg: number };
  /** At the observation's wavelength. */
  readonly at: { readonly x: number; readonly y: number; readonly text: string };
}

export interface ScalesModel {
  readonly box: Box;
  readonly xTicks: readonly Tick[];
  readonly yTicks: readonly Tick[];
  readonly lines: readonly ScaleLine[];
  /** Between largest scale and beam: what the layout sees. */
  readonly seen: string | null;
  readonly targetX: number;
  readonly bands: readonly { readonly x: number; readonly width: number; readonly label: string }[];
  readonly text: TextEquivalent;
}

const ANGLE_TICKS = [1e-4, 1e-3, 0.01, 0.1, 1, 10, 60, 600, 3600, 36_000, 360_000];

/** Shortest and longest wavelength of the axis: 1 mm to 10 m, or wider by whole decades as receivers and observation ask. */
export function wavelengthRange(wavelengthM: number, antennas: readonly Antenna[]): readonly [number, number] {
  const edges = antennas.flatMap((a) => a.receivers.flatMap((r) => [SPEED_OF_LIGHT / r.toHz, SPEED_OF_LIGHT / r.fromHz]));
  const all = [wavelengthM, ...edges];
  const low = 10 ** Math.floor(Math.log10(Math.min(...all)) + 1e-9);
  const high = 10 ** Math.ceil(Math.log10(Math.max(...all)) - 1e-9);
  return [Math.min(1e-3, low), Math.max(10, high)];
}

/** All three angles grow as the wavelength: same stations, same hours, same relative weights. */
export function scalesModel(picture: Picture, frequencyHz: number, antennas: readonly Antenna[], size: Size): ScalesModel | null {
  if (size.width < 160 || size.height < 90) return null;
  const { result } = picture;
  const wavelengthM = SPEED_OF_LIGHT / frequencyHz;
  const [from, to] = wavelengthRange(wavelengthM, antennas);
  const given = [
    { name: "primary beam", arcsec: result.primaryBeamArcsec },
    { name: "largest scale", arcsec: result.largestScaleArcsec },
    { name: "beam, major axis", arcsec: result.beam.majorArcsec },
  ] as const;
  const present = given.filter((g): g is typeof g & { arcsec: number } => g.arcsec !== null && g.arcsec > 0);
  const at = (arcsec: number, lambda: number): number => (arcsec * lambda) / wavelengthM;
  const lowest = Math.min(...present.map((p) => at(p.arcsec, from)));
  const highest = Math.max(...present.map((p) => at(p.arcsec, to)));
  const low = Math.log10(lowest) - 0.1;
  const high = Math.log10(highest) + 0.1;
  const box: Box = { x: 44, y: 8, width: size.width - 44 - 20, height: size.height - 8 - 38 };
  const decades = Math.log10(to / from);
  const x = (lambda: number): number => box.x + (box.width * Math.log10(lambda / from)) / decades;
  const y = (arcsec: number): number => box.y + (box.height * (high - Math.log10(arcsec))) / (high - low);
  const slope = (box.height * decades) / (high - low) / box.width;
  const angleDeg = (-Math.atan(slope) * 180) / Math.PI;
  const lines = present.map(({ name, arcsec }): ScaleLine => {
    const labelAt = from * 10 ** (decades * (name === "beam, major axis" ? 0.2 : name === "largest scale" ? 0.12 : 0.06));
    return {
      name,
      x1: x(from),
      y1: y(at(arcsec, from)),
      x2: x(to),
      y2: y(at(arcsec, to)),
      label: { x: x(labelAt), y: y(at(arcsec, labelAt)), angleDeg },
      at: { x: x(wavelengthM), y: y(arcsec), text: shownAs("angle", arcsec) },
    };
  });
  const upper = lines.find((l) => l.name === "largest scale");
  const lower = lines.find((l) => l.name === "beam, major axis");
  const everyDecade = Array.from({ length: Math.round(decades) + 1 }, (_, k) => from * 10 ** k);
  return {
    box,
    xTicks: everyDecade.map((l) => ({ at: x(l), label: wavelengthText(l), below: frequencyText(SPEED_OF_LIGHT / l, 1) })),
    yTicks: ANGLE_TICKS.filter((a) => Math.log10(a) > low && Math.log10(a) < high).map((a) => ({
      at: y(a),
      label: a >= 3600 ? `${a / 3600}°` : a >= 60 ? `${a / 60}′` : `${plain(a)}″`,
    })),
    lines,
    seen:
      upper && lower ? `M${upper.x1} ${upper.y1}L${upper.x2} ${upper.y2}L${lower.x2} ${lower.y2}L${lower.x1} ${lower.y1}Z` : null,
    targetX: x(wavelengthM),
    bands: bandsOf(antennas).map((b) => {
      const left = x(SPEED_OF_LIGHT / b.toHz);
      return { x: left, width: x(SPEED_OF_LIGHT / b.fromHz) - left, label: bandText(b) };
    }),
    text: {
      summary: `At ${wavelengthText(wavelengthM)} the layout sees from ${lower?.at.text ?? "none"} to ${upper?.at.text ?? "none"} inside a primary beam of ${shownAs("angle", result.primaryBeamArcsec)}; each grows as the wavelength.`,
      columns: ["Wavelength", ...present.map((p) => p.name)],
      rows: everyDecade.map((l) => [wavelengthText(l), ...present.map((p) => shownAs("angle", at(p.arcsec, l)))]),
    },
  };
}

/** Receiver bands of the antennas, each once. */
function bandsOf(antennas: readonly Antenna[]): readonly { readonly fromHz: number; readonly toHz: number }[] {
  const seen = new Map(antennas.flatMap((a) => a.receivers.map((r) => [`${r.fromHz} ${r.toHz}`, r] as const)));
  return [...seen.values()].sort((a, b) => b.fromHz - a.fromHz);
}

const bandText = ({ fromHz, toHz }: { fromHz: number; toHz: number }): string => `${plain(fromHz / 1e9)}–${plain(toHz / 1e9)}`;
