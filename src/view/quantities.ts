import type { Kind } from "./units.ts";

/** How a quantity of the results is named on a page. */
export interface QuantityWords {
  /** Title of a ledger line. */
  readonly title: string;
  /** Title in the narrow rail. */
  readonly short: string;
  readonly kind: Kind;
  /** Which settings its value depends on; they make the condition under the title. */
  readonly depends: readonly ("target" | "wavelength" | "weighting" | "bandwidth" | "radius" | "sign" | "pair")[];
}

const words: { readonly [path: string]: QuantityWords } = {
  "beam.majorArcsec": { title: "Beam, major axis", short: "Beam", kind: "angle", depends: ["target", "wavelength", "weighting"] },
  "beam.minorArcsec": {
    title: "Beam, minor axis",
    short: "Minor axis",
    kind: "angle",
    depends: ["target", "wavelength", "weighting"],
  },
  "beam.axisRatio": {
    title: "Beam axis ratio",
    short: "Axis ratio",
    kind: "ratio",
    depends: ["target", "wavelength", "weighting"],
  },
  "beam.positionAngleDeg": { title: "Beam position angle", short: "Beam PA", kind: "degrees", depends: ["target", "weighting"] },
  "beam.halfPowerMajorArcsec": {
    title: "Half-power width, long",
    short: "Half power",
    kind: "angle",
    depends: ["target", "wavelength", "weighting"],
  },
  "beam.halfPowerMinorArcsec": {
    title: "Half-power width, short",
    short: "Half power",
    kind: "angle",
    depends: ["target", "wavelength", "weighting"],
  },
  "beam.firstMinimumMinArcsec": {
    title: "First minimum, nearest",
    short: "First min.",
    kind: "angle",
    depends: ["target", "wavelength", "weighting"],
  },
  "beam.firstMinimumMaxArcsec": {
    title: "First minimum, farthest",
    short: "First min.",
    kind: "angle",
    depends: ["target", "wavelength", "weighting"],
  },
  "beam.firstZeroMinArcsec": {
    title: "First zero, nearest",
    short: "First zero",
    kind: "angle",
    depends: ["target", "wavelength", "weighting"],
  },
  "beam.firstZeroMaxArcsec": {
    title: "First zero, farthest",
    short: "First zero",
    kind: "angle",
    depends: ["target", "wavelength", "weighting"],
  },
  "beam.peakSidelobe": { title: "Peak sidelobe", short: "Sidelobe", kind: "fraction", depends: ["radius", "weighting"] },
  "beam.deepestSidelobe": { title: "Deepest sidelobe", short: "Deepest", kind: "fraction", depends: ["radius", "weighting"] },
  "beam.peakAbsoluteSidelobe": { title: "Peak sidelobe", short: "Sidelobe", kind: "fraction", depends: ["radius", "sign"] },
  "beam.rmsSidelobe": { title: "Sidelobe rms", short: "Rms", kind: "fraction", depends: ["radius", "weighting"] },
  "pair.dip": { title: "Pair, dip between", short: "Pair dip", kind: "fraction", depends: ["pair"] },
  largestScaleArcsec: { title: "Largest scale", short: "Scale", kind: "angle", depends: ["target", "wavelength"] },
  "recoverable.gaussianArcsec": {
    title: "Gaussian half seen",
    short: "Gaussian",
    kind: "angle",
    depends: ["target", "wavelength"],
  },
  "recoverable.discArcsec": { title: "Disc half seen", short: "Disc", kind: "angle", depends: ["target", "wavelength"] },
  "apertureResolutionArcsec.slit": { title: "Resolution λ/b", short: "λ/b", kind: "angle", depends: ["target", "wavelength"] },
  "apertureResolutionArcsec.circular": {
    title: "Resolution 1.22 λ/b",
    short: "1.22 λ/b",
    kind: "angle",
    depends: ["target", "wavelength"],
  },
  primaryBeamArcsec: { title: "Primary beam", short: "Primary", kind: "angle", depends: ["wavelength"] },
  noiseJy: { title: "Noise", short: "Noise", kind: "flux", depends: ["weighting", "bandwidth"] },
  brightnessNoiseK: { title: "Brightness noise", short: "Brightness", kind: "temperature", depends: ["weighting", "bandwidth"] },
  weightingNoiseFactor: { title: "Noise over natural", short: "Noise", kind: "times", depends: ["weighting", "bandwidth"] },
  hoursVisible: { title: "Hours on the source", short: "Hours", kind: "hours", depends: ["target"] },
  longestBaselineM: { title: "Longest baseline", short: "Longest", kind: "length", depends: [] },
  shortestBaselineM: { title: "Shortest baseline", short: "Shortest", kind: "length", depends: [] },
  longestProjectedM: { title: "Longest projected", short: "Longest", kind: "length", depends: ["target"] },
  shortestProjectedM: { title: "Shortest projected", short: "Shortest", kind: "length", depends: ["target"] },
  longestUvWavelengths: {
    title: "Longest, in wavelengths",
    short: "Longest",
    kind: "wavelengths",
    depends: ["target", "wavelength"],
  },
  maxWWavelengths: { title: "Largest w", short: "Largest w", kind: "wavelengths", depends: ["target", "wavelength"] },
  "coverage.filledFraction": { title: "uv cells filled", short: "Filled", kind: "fraction", depends: ["target", "wavelength"] },
  "coverage.largestRadialGap": { title: "Largest radial gap", short: "Gap", kind: "ratio", depends: ["target"] },
  "coverage.azimuthalUniformity": { title: "Azimuthal evenness", short: "Evenness", kind: "ratio", depends: ["target"] },
  "smearing.bandwidthArcsec": {
    title: "Bandwidth smearing",
    short: "Smearing",
    kind: "angle",
    depends: ["bandwidth", "wavelength"],
  },
  "smearing.timeArcsec": { title: "Time smearing", short: "Smearing", kind: "angle", depends: ["wavelength"] },
  planarRadiusArcsec: { title: "Planar radius", short: "Planar", kind: "angle", depends: ["target", "wavelength"] },
  "air.zenithOpacity": { title: "Zenith opacity", short: "Opacity", kind: "ratio", depends: ["wavelength"] },
  "air.noiseFactor": { title: "Noise by the air", short: "Air", kind: "times", depends: ["target", "wavelength"] },
  "fraunhoferM.antenna": { title: "Far field of a dish", short: "Far field", kind: "length", depends: ["wavelength"] },
  "fraunhoferM.array": { title: "Far field of the array", short: "Far field", kind: "length", depends: ["wavelength"] },
  protectedFraction: { title: "Protected band", short: "Protected", kind: "fraction", depends: ["wavelength", "bandwidth"] },
  "positionError.phaseDeg": { title: "Phase by position error", short: "Phase", kind: "degrees", depends: ["wavelength"] },
  "positionError.coherence": {
    title: "Peak left by position error",
    short: "Coherence",
    kind: "fraction",
    depends: ["wavelength"],
  },
  "positionError.widthFraction": {
    title: "Beam change by position error",
    short: "Width",
    kind: "fraction",
    depends: ["target", "weighting"],
  },
  "fullField.channelWidthHz": {
    title: "Full field, channel",
    short: "Channel",
    kind: "frequency",
    depends: ["target", "wavelength"],
  },
  "fullField.sampleS": { title: "Full field, sample", short: "Sample", kind: "seconds", depends: ["target", "wavelength"] },
  "fullField.visibilitiesPerS": {
    title: "Full field, visibilities a second",
    short: "Visibilities",
    kind: "count",
    depends: ["target", "wavelength", "bandwidth"],
  },
  "fullField.bytesPerS": {
    title: "Full field, bytes a second",
    short: "Bytes",
    kind: "count",
    depends: ["target", "wavelength", "bandwidth"],
  },
  stationCount: { title: "Stations", short: "Stations", kind: "count", depends: [] },
  baselineCount: { title: "Baselines", short: "Baselines", kind: "count", depends: [] },
  samplesKept: { title: "Samples kept", short: "Samples", kind: "count", depends: ["target"] },
  shadowedStationSamples: { title: "Shadowed samples", short: "Shadowed", kind: "count", depends: ["target"] },
  trenchM: { title: "Trench", short: "Trench", kind: "length", depends: [] },
  hoursAboveElevation: { title: "Time above elevation", short: "Above", kind: "hours", depends: ["target"] },
};

/** Names and kind of a quantity; one that is not known is shown by its path, as a bare number. */
export function quantityWords(path: string): QuantityWords {
  if (Object.hasOwn(words, path)) return words[path];
  if (path.startsWith("primaryBeams.")) return { ...words.primaryBeamArcsec, title: `Primary beam, ${path.slice(13)}` };
  return { title: path, short: path, kind: "ratio", depends: [] };
}
