import type { BeamFigures, BeamImage, Picture } from "../../assess/result.ts";
import { ARCSEC_PER_RAD } from "../../base/constants.ts";
import { fixed, plain } from "../numbers.ts";
import { figure, shownAs, type Unit, unitFor } from "../units.ts";
import { niceBelow, type TextEquivalent } from "./figure.ts";
import { along, beamAtArcsec } from "./sample.ts";

/** The synthesized beam panel. Drawn with north up and east to the left. */
export interface BeamModel {
  readonly image: BeamImage | null;
  readonly halfWidthArcsec: number;
  readonly unit: Unit;
  /** "1.80″ × 1.50″, PA 100.9°". */
  readonly title: string;
  /** Fitted ellipse at half power, in fractions of the half width. */
  readonly ellipse: { readonly major: number; readonly minor: number; readonly positionAngleDeg: number } | null;
  readonly bar: { readonly label: string; readonly length: number };
  readonly across: string;
  readonly text: TextEquivalent;
}

/** Beam widths from the peak to the edge of the picture. */
const WIDTHS_SHOWN = 5.6;

/** From the peak to the edge of the picture: a round figure that holds the first sidelobes, no wider than the image. */
export function beamHalfWidth(beam: BeamFigures, image: BeamImage | null): number {
  const covered = image ? (image.size / 2 - 2) * image.pixelRad * ARCSEC_PER_RAD : Number.POSITIVE_INFINITY;
  const wanted = beam.majorArcsec === null ? covered : WIDTHS_SHOWN * beam.majorArcsec;
  const half = Math.min(wanted, covered);
  return Number.isFinite(half) ? niceHalf(half) : 1;
}

/** 1, 1.5, 2, 2.5, 3, 4, 5, 6, 8 times a power of ten, at or below. */
function niceHalf(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value) + 1e-9);
  const steps = [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8];
  return power * (steps.findLast((s) => s <= value / power + 1e-9) ?? 1);
}

/** @param halfWidthArcsec - Fixed while a station moves; null: from the beam itself. */
export function beamModel(picture: Picture, halfWidthArcsec: number | null): BeamModel {
  const { beam, result } = picture;
  const figures = result.beam;
  const half = halfWidthArcsec ?? beamHalfWidth(figures, beam);
  const unit = unitFor("angle", figures.majorArcsec ?? half);
  const { majorArcsec, minorArcsec, positionAngleDeg } = figures;
  const fitted = majorArcsec !== null && minorArcsec !== null && positionAngleDeg !== null;
  const bar = niceBelow(half / 2);
  return {
    image: beam,
    halfWidthArcsec: half,
    unit,
    title: fitted
      ? `${figure(majorArcsec, unit)}${unit.word} × ${figure(minorArcsec, unit)}${unit.word}, PA ${fixed(positionAngleDeg, 1)}°`
      : "no fitted ellipse",
    ellipse: fitted ? { major: majorArcsec / 2 / half, minor: minorArcsec / 2 / half, positionAngleDeg } : null,
    bar: { label: arcLabel(bar), length: bar / half },
    across: `${arcLabel(2 * half)} across`,
    text: {
      summary: fitted
        ? `Main lobe ${figure(majorArcsec, unit)} by ${shownAs("angle", minorArcsec)}, long axis at position angle ${fixed(positionAngleDeg, 1)}°; sidelobes from ${percentOr(figures.deepestSidelobe)} to ${percentOr(figures.peakSidelobe)} of the peak.`
        : "The beam has no fitted ellipse.",
      columns: ["Figure", "Value"],
      rows: [
        ["FWHM, major", angleOr(majorArcsec)],
        ["FWHM, minor", angleOr(minorArcsec)],
        ["Half-power width, longest", angleOr(figures.halfPowerMajorArcsec)],
        ["Half-power width, shortest", angleOr(figures.halfPowerMinorArcsec)],
        ["First minimum, nearest", angleOr(figures.firstMinimumMinArcsec)],
        ["First minimum, farthest", angleOr(figures.firstMinimumMaxArcsec)],
        ["Peak sidelobe", percentOr(figures.peakSidelobe)],
        ["Deepest sidelobe", percentOr(figures.deepestSidelobe)],
        ["Sidelobe rms", percentOr(figures.rmsSidelobe)],
        ["Sidelobes within", angleOr(figures.sidelobeRadiusArcsec)],
      ],
    },
  };
}

/** "2.1″ E, 0.8″ N: −1.4 % of peak", for a point of the picture: x to the right, y upward, −1 to 1. */
export function beamReadout(model: BeamModel, x: number, y: number): string {
  if (!model.image) return "";
  const east = -x * model.halfWidthArcsec;
  const north = y * model.halfWidthArcsec;
  const value = beamAtArcsec(model.image, east, north);
  const side = (offset: number, plus: string, minus: string): string =>
    `${Math.abs(offset / model.unit.size).toFixed(1)}${model.unit.word} ${offset < 0 ? minus : plus}`;
  const level = Number.isNaN(value) ? "outside the image" : `${fixed(100 * value, 1)} % of peak`;
  return `${side(east, "E", "W")}, ${side(north, "N", "S")}: ${level}`;
}

/** A tick on the colour bar: the stretched place of a level, 0 to 1 from −10 % to 100 %. */
export const BAR_LEVELS = [-0.1, -0.03, 0, 0.03, 0.1, 0.3, 1] as const;

/** Ends of a line along the ellipse's axis, in fractions of the half width, x right (west) and y up (north). */
export function axisEnds(positionAngleDeg: number, from: number, to: number): readonly [number, number, number, number] {
  const { east, north } = along(positionAngleDeg);
  return [-east * from, north * from, -east * to, north * to];
}

/** A round angle in its unit, without decimals it does not need. */
export function arcLabel(arcsec: number): string {
  const unit = unitFor("angle", arcsec);
  return `${plain(arcsec / unit.size)}${unit.word === "mas" || unit.word === "µas" ? `\u00a0${unit.word}` : unit.word}`;
}

const angleOr = (arcsec: number | null): string => (arcsec === null ? "none" : shownAs("angle", arcsec));
const percentOr = (fraction: number | null): string => (fraction === null ? "none" : `${fixed(100 * fraction, 1)}\u00a0%`);
