import { ARCSEC_PER_RAD, RAD_PER_DEG } from "../base/constants.ts";
import { fitsBytes } from "./fits.ts";
import type { FitsEntry } from "./fits-cards.ts";

/** A synthesized beam and what its header says of it. Plain values: the caller takes them from plan and result. */
export interface BeamFits {
  /** (size, size) at `size * y + x`: l east = (x − size/2)·pixelRad, m north likewise; 1 at the centre. */
  readonly values: ArrayLike<number>;
  readonly size: number;
  readonly pixelRad: number;
  readonly program: string;
  readonly title: string;
  readonly layout: string;
  readonly observation: string;
  /** Mean coordinates of date. null: none is given, the header says 0. */
  readonly rightAscensionDeg: number | null;
  readonly declinationDeg: number;
  /** Start of the observation; null when it has no date. Any ISO 8601 time with its zone. */
  readonly startUtc: string | null;
  readonly frequencyHz: number;
  readonly bandwidthHz: number;
  /** Fitted Gaussian, FWHM, north through east; null where there is none. */
  readonly fitted: { readonly majorArcsec: number; readonly minorArcsec: number; readonly positionAngleDeg: number } | null;
  /** What the beam assumes, a sentence each. */
  readonly remarks: readonly string[];
}

/**
 * The beam as a FITS image with the four axes radio images carry: RA---SIN, DEC--SIN, FREQ, STOKES.
 *
 * East is left: pixel i (from 1) holds the engine's column size − i, so the peak is at (size/2, size/2 + 1) and CDELT1 < 0.
 * The SIN projection's plane is that of the direction cosines l and m, so the axes are exact, not only near the centre.
 * Coordinates are mean of date, as the engine computes: EQUINOX is the Julian epoch of the start; without a date the frame
 * is GAPPT, place of date, and no EQUINOX is claimed. BUNIT is left out, as for any pure number: pixels are fractions of the
 * peak. There is no DATE: the same plan gives the same bytes. Pixels are 32-bit: 6e-8 of the peak, the beam's own error is 1e-6.
 *
 * Source: FITS Standard 4.0 (2018), §8; Calabretta & Greisen 2002, A&A 395, 1077 (SIN, §5.1.5). BMAJ, BMIN and BPA: common practice.
 */
export function beamFits(beam: BeamFits): Uint8Array {
  const { size, values } = beam;
  const flipped = new Float32Array(size * size);
  for (let y = 0; y < size; y++) {
    for (let x = 0; x < size; x++) flipped[size * y + (size - 1 - x)] = values[size * y + x];
  }
  return fitsBytes({ bitpix: -32, axes: [size, size, 1, 1], header: beamHeader(beam), values: flipped });
}

function beamHeader(beam: BeamFits): readonly FitsEntry[] {
  // As many digits as fit with a minus sign in front, so that both steps are written alike.
  const pixelDeg = Number((beam.pixelRad / RAD_PER_DEG).toPrecision(13));
  return [
    { key: "OBJECT", value: beam.title, comment: "title of the plan" },
    { key: "LAYOUT", value: beam.layout, comment: "layout of the plan" },
    { key: "OBSERVTN", value: beam.observation, comment: "observation of the plan" },
    { key: "ORIGIN", value: beam.program },
    { key: "CREATOR", value: beam.program },
    { key: "BTYPE", value: "Beam", comment: "synthesized beam, fraction of its peak" },
    ...axis(1, "RA---SIN", beam.rightAscensionDeg ?? 0, -pixelDeg, beam.size / 2, "deg"),
    ...axis(2, "DEC--SIN", beam.declinationDeg, pixelDeg, beam.size / 2 + 1, "deg"),
    ...axis(3, "FREQ", beam.frequencyHz, beam.bandwidthHz, 1, "Hz"),
    ...axis(4, "STOKES", 1, 1, 1, ""),
    { key: "LONPOLE", value: 180 },
    { key: "LATPOLE", value: beam.declinationDeg },
    ...frame(beam.startUtc),
    { key: "SPECSYS", value: "TOPOCENT" },
    { key: "RESTFRQ", value: beam.frequencyHz, comment: "[Hz] band centre: the plan names no line" },
    ...fittedCards(beam),
    ...remarks(beam).map((text): FitsEntry => ({ key: "COMMENT", text })),
  ];
}

function axis(n: number, type: string, value: number, step: number, pixel: number, unit: string): readonly FitsEntry[] {
  return [
    { key: `CTYPE${n}`, value: type },
    { key: `CRVAL${n}`, value },
    { key: `CDELT${n}`, value: step },
    { key: `CRPIX${n}`, value: pixel },
    ...(unit === "" ? [] : [{ key: `CUNIT${n}`, value: unit }]),
  ];
}

function frame(startUtc: string | null): readonly FitsEntry[] {
  if (startUtc === null) return [{ key: "RADESYS", value: "GAPPT", comment: "place of date; the plan gives no date" }];
  const start = new Date(startUtc);
  const days = start.getTime() / 86_400_000;
  // Julian epoch, from memory: J2000.0 is 10 957.5 days after 1970 January 1, 0 h, which is MJD 40587. UTC stands for TT.
  const equinox = 2000 + (days - 10_957.5) / 365.25;
  return [
    { key: "RADESYS", value: "FK5", comment: "mean place" },
    { key: "EQUINOX", value: Number(equinox.toFixed(6)), comment: "of date" },
    { key: "DATE-OBS", value: start.toISOString().replace(/(\.000)?Z$/, ""), comment: "start in the plan" },
    { key: "MJD-OBS", value: Number((days + 40_587).toFixed(9)) },
    { key: "TIMESYS", value: "UTC" },
  ];
}

function fittedCards({ fitted }: BeamFits): readonly FitsEntry[] {
  if (!fitted) return [];
  return [
    { key: "BMAJ", value: fitted.majorArcsec / 3600, comment: "[deg] FWHM of the fitted Gaussian" },
    { key: "BMIN", value: fitted.minorArcsec / 3600, comment: "[deg] FWHM of the fitted Gaussian" },
    { key: "BPA", value: fitted.positionAngleDeg, comment: "[deg] north through east" },
  ];
}

function remarks(beam: BeamFits): readonly string[] {
  return [
    `Synthesized beam, sum(w cos 2 pi (u l + v m)) / sum(w). Pixels are fractions of the peak, a pure number: no BUNIT.`,
    `North up, east left. Pixel ${(beam.pixelRad * ARCSEC_PER_RAD).toPrecision(6)} arcsec. Peak 1 at pixel (${beam.size / 2}, ${beam.size / 2 + 1}).`,
    ...(beam.rightAscensionDeg === null
      ? ["The observation has no right ascension: CRVAL1 is 0 and stands for the target's own."]
      : []),
    ...(beam.fitted ? [] : ["The beam has no fitted ellipse: no BMAJ, BMIN, BPA."]),
    ...beam.remarks,
  ];
}
