import { SPEED_OF_LIGHT } from "../../base/constants.ts";
import { DomainError } from "../../base/errors.ts";
import { parseAngleDeg, parseFrequencyHz, parseHours, parseNumber, parseWavelengthM } from "../../base/quantity.ts";
import type { Antenna, Observation, Site } from "../../plan/schema.ts";
import type { FieldModel, SliderModel } from "../controls.ts";
import { fixed, joined, plain, signed } from "../numbers.ts";
import { declinationText, wavelengthM } from "../observation.ts";
import { frequencyText, wavelengthText } from "../units.ts";
import type { HourValue } from "./change.ts";
import { hoursAbove } from "./elevation.ts";

/** The bar over the Resolve task: what is looked at, when, and how it is weighted. */
export interface ObservationBarModel {
  readonly observation: Observation;
  readonly declination: { readonly field: FieldModel; readonly slider: SliderModel };
  readonly window: { readonly from: FieldModel<HourValue>; readonly to: FieldModel<HourValue>; readonly slider: SliderModel };
  readonly wavelength: { readonly field: FieldModel; readonly frequency: FieldModel; readonly slider: SliderModel };
  readonly bandwidth: { readonly field: FieldModel; readonly slider: SliderModel };
  readonly weighting: {
    readonly field: FieldModel;
    readonly slider: SliderModel;
    readonly scheme: Observation["weighting"]["scheme"];
  };
}

/** @param compact - Little room: minutes instead of seconds of declination, fewer ticks. */
export function observationBar(
  site: Site,
  observation: Observation,
  antennas: readonly Antenna[],
  compact: boolean,
): ObservationBarModel {
  return {
    observation,
    declination: { field: declinationField(observation, compact), slider: declinationSlider(site, observation, antennas) },
    window: {
      from: hourField("Hour angle from", observation.hourAngle.fromH),
      to: hourField("Hour angle to", observation.hourAngle.toH),
      slider: windowSlider(site, observation, antennas),
    },
    wavelength: {
      field: wavelengthField(observation),
      frequency: frequencyField("Frequency", observation.frequencyHz, 4),
      slider: wavelengthSlider(observation, antennas, compact),
    },
    bandwidth: { field: frequencyField("Bandwidth", observation.bandwidthHz, 3), slider: bandwidthSlider(observation, compact) },
    weighting: { field: robustField(observation), slider: robustSlider(observation), scheme: observation.weighting.scheme },
  };
}

export const limitDegOf = (observation: Observation, antennas: readonly Antenna[]): number =>
  Math.max(observation.elevationLimitDeg, ...antennas.map((a) => a.elevationLimitDeg));

function declinationField({ declinationDeg }: Observation, compact: boolean): FieldModel {
  return {
    label: "Declination",
    text: declinationText(declinationDeg, !compact),
    unit: "",
    value: declinationDeg,
    width: compact ? 6.4 : 9.4,
    sizes: [1, 1 / 60, 1 / 3600],
    parse: (text) => {
      const deg = parseAngleDeg(text, "declination");
      if (!(Math.abs(deg) <= 90)) throw new DomainError("declination", text.trim(), "a declination from −90° to +90°");
      return deg;
    },
  };
}

function declinationSlider(site: Site, observation: Observation, antennas: readonly Antenna[]): SliderModel {
  const at = (deg: number): number => (deg + 90) / 180;
  const room = 90 - limitDegOf(observation, antennas);
  const lat = site.origin.latitudeDeg;
  return {
    handles: [
      {
        label: "Declination",
        at: at(observation.declinationDeg),
        text: declinationText(observation.declinationDeg, false),
        step: 1 / 180,
      },
    ],
    ticks: [-90, 0, 90].map((d) => ({ at: at(d), label: `${signed(d, 0)}°` })),
    reach: [[at(Math.max(-90, lat - room)), at(Math.min(90, lat + room))]],
    filled: false,
  };
}

function hourField(label: string, hours: number): FieldModel<HourValue> {
  return {
    label,
    text: signed(hours, 2),
    unit: "h",
    value: hours,
    width: 4.7,
    sizes: [1],
    parse: (text) => {
      const both = /^\s*(±|\+-|\+\/-)/.exec(text);
      const value = parseHours(both ? text.slice(both[0].length) : text, label.toLowerCase());
      if (!(Math.abs(value) <= 12)) throw new DomainError(label.toLowerCase(), text.trim(), "an hour angle from −12 h to +12 h");
      return both ? { both: Math.abs(value) } : value;
    },
  };
}

function windowSlider(site: Site, observation: Observation, antennas: readonly Antenna[]): SliderModel {
  const at = (h: number): number => (h + 12) / 24;
  const half = hoursAbove(site.origin.latitudeDeg, observation.declinationDeg, limitDegOf(observation, antennas)) / 2;
  const { fromH, toH } = observation.hourAngle;
  const handle = (label: string, h: number): SliderModel["handles"][number] => ({
    label,
    at: at(h),
    text: joined(signed(h, 2), "h"),
    step: 0.25 / 24,
  });
  return {
    handles: [handle("Hour angle from", fromH), handle("Hour angle to", toH)],
    ticks: [-12, -6, 0, 6, 12].map((h) => ({ at: at(h), label: Math.abs(h) === 12 ? joined(plain(h), "h") : plain(h) })),
    reach: half > 0 ? [[at(-half), at(half)]] : [],
    filled: true,
  };
}

/** Unit word and size that suit a length of wave. */
function waveUnit(metres: number): readonly [word: string, size: number] {
  return metres >= 1000
    ? ["km", 1000]
    : metres >= 1
      ? ["m", 1]
      : metres >= 0.01
        ? ["cm", 0.01]
        : metres >= 1e-3
          ? ["mm", 1e-3]
          : ["µm", 1e-6];
}

function wavelengthField(observation: Observation): FieldModel {
  const metres = wavelengthM(observation);
  const [unit, size] = waveUnit(metres);
  return {
    label: "Wavelength",
    text: significant(metres / size, 4),
    unit,
    value: metres,
    width: 4.6,
    sizes: [size],
    parse: (text) => {
      const bare = /^[\d\s.,+-]+$/.test(text);
      const value = parseWavelengthM(bare ? text + unit : text, "wavelength");
      const hz = SPEED_OF_LIGHT / value;
      if (!(hz >= 1e3 && hz <= 1e13)) throw new DomainError("wavelength", text.trim(), "a wavelength from 30 µm to 299 km");
      return value;
    },
  };
}

function frequencyUnit(hertz: number): readonly [word: string, size: number] {
  return hertz >= 1e9 ? ["GHz", 1e9] : hertz >= 1e6 ? ["MHz", 1e6] : hertz >= 1e3 ? ["kHz", 1e3] : ["Hz", 1];
}

function frequencyField(label: string, hertz: number, figures: number): FieldModel {
  const [unit, size] = frequencyUnit(hertz);
  return {
    label,
    text: figures === 3 ? plain(hertz / size, 4) : significant(hertz / size, figures),
    unit,
    value: hertz,
    width: figures === 3 ? 3.4 : 4.6,
    sizes: [size],
    parse: (text) => {
      const bare = /^[\d\s.,+-]+$/.test(text);
      const name = label.toLowerCase();
      const value = parseFrequencyHz(bare ? text + unit : text, name);
      if (!(value > 0)) throw new DomainError(name, text.trim(), `a ${name} above 0 Hz`);
      return value;
    },
  };
}

const logAt = (value: number, low: number, high: number): number => Math.log(value / low) / Math.log(high / low);

/** 1 mm to 1 km, or wider by whole decades. */
export function waveAxis(observation: Observation): readonly [number, number] {
  const metres = wavelengthM(observation);
  return [Math.min(1e-3, 10 ** Math.floor(Math.log10(metres))), Math.max(1000, 10 ** Math.ceil(Math.log10(metres)))];
}

function wavelengthSlider(observation: Observation, antennas: readonly Antenna[], compact: boolean): SliderModel {
  const [low, high] = waveAxis(observation);
  const metres = wavelengthM(observation);
  const at = (m: number): number => Math.max(0, Math.min(1, logAt(m, low, high)));
  const decades = Array.from({ length: Math.round(Math.log10(high / low)) + 1 }, (_, k) => low * 10 ** k);
  return {
    handles: [
      {
        label: "Wavelength",
        at: at(metres),
        text: `${wavelengthText(metres, 4)}, ${frequencyText(observation.frequencyHz)}`,
        step: 0.005,
      },
    ],
    ticks: decades.map((m, k) => ({ at: at(m), label: compact && k % 2 === 1 && k < decades.length - 1 ? "" : wavelengthText(m) })),
    reach: antennas.flatMap((a) => a.receivers.map((r) => [at(SPEED_OF_LIGHT / r.toHz), at(SPEED_OF_LIGHT / r.fromHz)] as const)),
    filled: false,
  };
}

/** 1 MHz to 1 GHz, or wider by whole decades. */
export function bandwidthAxis(observation: Observation): readonly [number, number] {
  const hz = observation.bandwidthHz;
  return [Math.min(1e6, 10 ** Math.floor(Math.log10(hz))), Math.max(1e9, 10 ** Math.ceil(Math.log10(hz)))];
}

function bandwidthSlider(observation: Observation, compact: boolean): SliderModel {
  const [low, high] = bandwidthAxis(observation);
  const count = Math.round(Math.log10(high / low));
  return {
    handles: [
      {
        label: "Bandwidth",
        at: logAt(observation.bandwidthHz, low, high),
        text: frequencyText(observation.bandwidthHz, 3),
        step: 0.01,
      },
    ],
    ticks: Array.from({ length: count + 1 }, (_, k) => ({
      at: k / count,
      label: k === 0 || k === count ? frequencyText(low * 10 ** k, 1) : compact ? "" : plainPower(low * 10 ** k),
    })),
    reach: [[0, Math.max(0, Math.min(1, logAt(2 * observation.frequencyHz, low, high)))]],
    filled: false,
  };
}

/** 10 MHz as "10": between ends that carry the units. */
const plainPower = (hertz: number): string => plain(hertz / frequencyUnit(hertz)[1]);

function robustField({ weighting }: Observation): FieldModel {
  return {
    label: "Robustness",
    text: signed(weighting.robustness, 1),
    unit: "",
    value: weighting.robustness,
    width: 3.2,
    sizes: [1],
    parse: (text) => {
      const value = parseNumber(text, "robustness");
      if (!(Math.abs(value) <= 2)) throw new DomainError("robustness", text.trim(), "a robustness from −2 to +2");
      return value;
    },
  };
}

function robustSlider({ weighting }: Observation): SliderModel {
  const value = weighting.scheme === "natural" ? 2 : weighting.scheme === "uniform" ? -2 : weighting.robustness;
  return {
    handles: [
      {
        label: "Robustness",
        at: (value + 2) / 4,
        text: weighting.scheme === "robust" ? fixed(value, 1) : weighting.scheme,
        step: 0.025,
      },
    ],
    ticks: [
      { at: 0, label: "\u22122 uniform" },
      { at: 0.5, label: "0" },
      { at: 1, label: "natural +2" },
    ],
    reach: [[0, 1]],
    filled: false,
  };
}

/** As many figures as are asked for, trailing zeros kept so that the width holds. */
function significant(value: number, figures: number): string {
  const digits = Math.floor(Math.log10(Math.abs(value)) + 1e-9) + 1;
  return fixed(value, Math.max(0, figures - digits));
}
