import * as v from "valibot";
import { list, oneOf, orNull, positive, ranged, record, text, whole } from "./fields.ts";

export const FORMAT = "spanwright-plan";
export const VERSION = 1;
/** Most stations of a plan. */
export const MOST_STATIONS = 4096;

const id = v.pipe(
  v.string("a name of 1 to 64 letters, digits, spaces, dots, dashes"),
  v.regex(/^[\p{L}\p{N}][\p{L}\p{N} ._-]{0,63}$/u, "a name of 1 to 64 letters, digits, spaces, dots, dashes"),
);
const label = text(200);
const latitude = ranged(-90, 90, "a latitude in [-90, 90] degrees");
const longitude = ranged(-180, 360, "a longitude in [-180, 360] degrees");
const height = ranged(-11_000, 100_000, "a height in [-11000, 100000] metres");
const elevation = ranged(-90, 90, "an elevation in [-90, 90] degrees");
const hours = ranged(-12, 12, "an hour angle in [-12, 12] hours");
const price = ranged(0, 1e12, "a price in [0, 1e12]");
/** Half the sky: no angle on an image is larger. */
const angle = (what: string) => positive(648_000, what, "arcsec");
const frequency = (what: string) => positive(1e13, what, "Hz");
const utc = v.pipe(
  v.string("a UTC time such as 2027-03-21T18:00:00Z, or null"),
  v.isoTimestamp("a UTC time such as 2027-03-21T18:00:00Z, or null"),
  v.check(isRealDate, "a day that the calendar has"),
);

/** GeoJSON polygons (RFC 7946): rings of [longitude, latitude] in degrees, closed. */
const position = v.pipe(
  v.array(v.pipe(v.number("a number of degrees"), v.finite("a finite number of degrees")), "a position: longitude, latitude"),
  v.minLength(2, "two or three numbers: longitude, latitude and perhaps height"),
  v.maxLength(3, "two or three numbers: longitude, latitude and perhaps height"),
);
const ring = v.pipe(
  list(position, "a ring: a list of positions"),
  v.minLength(4, "at least 4 positions, the last equal to the first"),
);
const polygon = v.pipe(list(ring, "a list of rings"), v.minLength(1, "at least one ring"));
export const geometrySchema = v.variant(
  "type",
  [
    record({ type: v.literal("Polygon"), coordinates: polygon }),
    record({
      type: v.literal("MultiPolygon"),
      coordinates: v.pipe(list(polygon, "a list of polygons"), v.minLength(1, "at least one polygon")),
    }),
  ],
  ({ path }) => (path ? '"Polygon" or "MultiPolygon"' : "a GeoJSON Polygon or MultiPolygon"),
);

export const receiverSchema = record({
  fromHz: frequency("a frequency"),
  toHz: frequency("a frequency"),
  // Either this, or system temperature and aperture efficiency, of which it follows.
  sefdJy: orNull(positive(1e12, "a system equivalent flux density", "Jy")),
  // Without the air over the site.
  systemK: orNull(positive(1e6, "a system temperature", "K")),
  // Of a perfect surface: what `surfaceRmsM` costs comes on top (Ruze 1966).
  apertureEfficiency: orNull(positive(1, "an efficiency")),
  surfaceRmsM: v.optional(ranged(0, 1, "a surface error in [0, 1] metres"), 0),
});

export const antennaSchema = record({
  id,
  label: v.optional(label, ""),
  diameterM: positive(10_000, "a diameter", "m"),
  elevationLimitDeg: v.optional(elevation, 0),
  elevationUpperLimitDeg: v.optional(elevation, 90),
  minSpacingM: v.optional(ranged(0, 1e6, "a spacing in [0, 1000000] metres"), 0),
  beamFactor: v.optional(ranged(0.5, 3, "a factor in [0.5, 3]"), 1.029),
  receivers: v.optional(list(receiverSchema, "a list of receivers"), []),
});

export const stationSchema = record({
  id,
  name: v.optional(label, ""),
  latitudeDeg: latitude,
  longitudeDeg: longitude,
  heightM: v.optional(height, 0),
  antenna: id,
  locked: v.optional(v.boolean("true or false"), false),
});

export const layoutSchema = record({
  id,
  label: v.optional(label, ""),
  stations: v.pipe(
    list(id, "a list of station ids"),
    v.minLength(1, "at least one station"),
    v.maxLength(MOST_STATIONS, `at most ${MOST_STATIONS} stations`),
  ),
});

export const weightingSchema = record({
  scheme: v.optional(oneOf(["natural", "uniform", "robust"]), "natural"),
  robustness: v.optional(ranged(-2, 2, "a robustness in [-2, 2]"), 0),
  taperArcsec: orNull(angle("a taper")),
  fieldArcsec: orNull(angle("a field")),
});

export const imageSchema = record({
  pixelArcsec: orNull(angle("a pixel")),
  sizePx: orNull(whole(32, 4096)),
  sidelobeRadiusArcsec: orNull(angle("a radius")),
});

export const observationSchema = record({
  id,
  label: v.optional(label, ""),
  declinationDeg: ranged(-90, 90, "a declination in [-90, 90] degrees"),
  rightAscensionDeg: orNull(ranged(0, 360, "a right ascension in [0, 360] degrees")),
  epoch: v.optional(oneOf(["date", "J2000"]), "date"),
  startUtc: orNull(utc),
  hourAngle: record({ fromH: hours, toH: hours }),
  elevationLimitDeg: v.optional(elevation, 0),
  frequencyHz: ranged(1e3, 1e13, "a frequency in [1000, 1e13] hertz"),
  bandwidthHz: v.optional(frequency("a bandwidth"), 1e6),
  channels: v.optional(whole(1, 65_536), 1),
  integrationS: v.optional(ranged(0.001, 86_400, "an integration in [0.001, 86400] seconds"), 60),
  repeats: v.optional(whole(1, 100_000), 1),
  polarizations: v.optional(oneOf([1, 2]), 2),
  efficiency: v.optional(positive(1, "an efficiency"), 1),
  // Rms of every station coordinate that nobody knows of, metres: given, the results say what it costs.
  positionErrorM: orNull(ranged(0, 1000, "a position error in [0, 1000] metres")),
  // Water vapour at sea level under the site; given, the air's opacity counts in the noise.
  vapourGm3: orNull(ranged(0, 50, "a water vapour density in [0, 50] g/m³")),
  weighting: v.optional(weightingSchema, {}),
  image: v.optional(imageSchema, {}),
});

const declination = ranged(-90, 90, "a declination in [-90, 90] degrees");
// The lengths of the frequencies an observation may have.
const wavelength = ranged(3e-5, 299_792, "a wavelength in [0.00003, 299792] metres");
export const pairSchema = record({
  separationArcsec: angle("a separation"),
  positionAngleDeg: v.optional(ranged(-360, 360, "a position angle in [-360, 360] degrees"), 0),
  fluxRatio: v.optional(positive(1, "a flux ratio"), 1),
});
export const whenSchema = record({
  observation: orNull(text(64)),
  layouts: orNull(list(text(64), "a list of layout ids")),
  declinationDeg: v.optional(record({ from: declination, to: declination, step: positive(180, "a step", "degrees") })),
  wavelengthM: v.optional(record({ from: wavelength, to: wavelength, step: positive(299_792, "a step", "metres") })),
  pair: v.optional(pairSchema),
  sidelobeRadiusArcsec: v.optional(angle("a radius")),
  aboveElevationDeg: v.optional(elevation),
  without: v.optional(oneOf([1, 2])),
});
const limit = orNull(v.pipe(v.number("a number"), v.finite("a finite number")));
export const requirementSchema = record({
  id,
  text: v.optional(label, ""),
  quantity: v.pipe(text(100), v.minLength(1, "a quantity such as beam.majorArcsec")),
  atMost: limit,
  atLeast: limit,
  margin: v.optional(ranged(0, 1, "a margin in [0, 1]"), 0.05),
  when: v.optional(whenSchema, {}),
});

export const siteSchema = record({
  origin: record({ latitudeDeg: latitude, longitudeDeg: longitude, heightM: v.optional(height, 0) }),
  hub: orNull(record({ latitudeDeg: latitude, longitudeDeg: longitude })),
  allowed: orNull(geometrySchema),
  keepOut: v.optional(list(record({ label: v.optional(label, ""), geometry: geometrySchema }), "a list of areas"), []),
  maxSlopeDeg: orNull(ranged(0, 90, "a slope in [0, 90] degrees")),
  clearanceM: v.optional(ranged(0, 1e6, "a clearance in [0, 1000000] metres"), 0),
  costAreas: v.optional(
    list(record({ label: v.optional(label, ""), factor: positive(1e6, "a factor"), geometry: geometrySchema }), "a list of areas"),
    [],
  ),
  prices: orNull(
    record({
      currency: v.optional(text(10), "EUR"),
      trenchPerKm: v.optional(price, 0),
      padEach: v.optional(price, 0),
    }),
  ),
  terrain: orNull(
    record({
      file: v.pipe(text(500), v.minLength(1, "the name of a file")),
      sha256: orNull(v.pipe(v.string("64 hexadecimal digits"), v.regex(/^[0-9a-f]{64}$/, "64 hexadecimal digits in lower case"))),
      undulationM: v.optional(ranged(-200, 200, "an undulation in [-200, 200] metres"), 0),
    }),
  ),
});

export const planSchema = record({
  format: v.literal(FORMAT),
  version: v.literal(VERSION),
  title: v.optional(label, ""),
  notes: v.optional(text(100_000), ""),
  savedUtc: orNull(utc),
  site: siteSchema,
  antennas: v.pipe(list(antennaSchema, "a list of antenna kinds"), v.minLength(1, "at least one antenna kind")),
  stations: v.pipe(
    list(stationSchema, "a list of stations"),
    v.minLength(1, "at least one station"),
    v.maxLength(MOST_STATIONS, `at most ${MOST_STATIONS} stations`),
  ),
  layouts: v.pipe(list(layoutSchema, "a list of layouts"), v.minLength(1, "at least one layout")),
  observations: v.pipe(list(observationSchema, "a list of observations"), v.minLength(1, "at least one observation")),
  requirements: v.optional(list(requirementSchema, "a list of requirements"), []),
});

/** A plan with every default filled in. Records are treated as frozen: edits make new ones. */
export type Plan = v.InferOutput<typeof planSchema>;
export type Site = v.InferOutput<typeof siteSchema>;
export type Antenna = v.InferOutput<typeof antennaSchema>;
export type Receiver = v.InferOutput<typeof receiverSchema>;
export type Station = v.InferOutput<typeof stationSchema>;
export type Layout = v.InferOutput<typeof layoutSchema>;
export type Observation = v.InferOutput<typeof observationSchema>;
export type Requirement = v.InferOutput<typeof requirementSchema>;
export type Pair = v.InferOutput<typeof pairSchema>;
export type Geometry = v.InferOutput<typeof geometrySchema>;

/** The pattern of a timestamp lets February have 31 days. */
function isRealDate(text: string): boolean {
  const [year, month, day] = text.slice(0, 10).split("-").map(Number);
  const date = new Date(Date.UTC(year, month - 1, day));
  return date.getUTCMonth() === month - 1 && date.getUTCDate() === day;
}
