import * as v from "valibot";

/** GeoJSON polygons (RFC 7946): rings of [longitude, latitude] in degrees, closed. */
const position = v.pipe(
  v.array(v.pipe(v.number(), v.finite())),
  v.minLength(2, "two or three numbers: longitude, latitude and perhaps height"),
  v.maxLength(3, "two or three numbers: longitude, latitude and perhaps height"),
);
const ring = v.pipe(v.array(position), v.minLength(4, "at least 4 positions, the last equal to the first"));
export const geometrySchema = v.variant("type", [
  v.looseObject({ type: v.literal("Polygon"), coordinates: v.pipe(v.array(ring), v.minLength(1)) }),
  v.looseObject({
    type: v.literal("MultiPolygon"),
    coordinates: v.pipe(v.array(v.pipe(v.array(ring), v.minLength(1))), v.minLength(1)),
  }),
]);

const number = (min: number, max: number, what: string) =>
  v.pipe(v.number(), v.finite(), v.minValue(min, what), v.maxValue(max, what));
const positive = (what: string) => v.pipe(v.number(), v.finite(), v.gtValue(0, what));
const id = v.pipe(
  v.string(),
  v.regex(/^[\p{L}\p{N}][\p{L}\p{N} ._-]{0,63}$/u, "a name of 1 to 64 letters, digits, spaces, dots, dashes"),
);
const label = v.pipe(v.string(), v.maxLength(200, "at most 200 characters"));
const latitude = number(-90, 90, "a latitude in [-90, 90] degrees");
const longitude = number(-180, 360, "a longitude in [-180, 360] degrees");
const height = number(-11_000, 100_000, "a height in [-11000, 100000] metres");

export const FORMAT = "spanwright-plan";
export const VERSION = 1;

export const receiverSchema = v.looseObject({
  fromHz: positive("a frequency above 0 Hz"),
  toHz: positive("a frequency above 0 Hz"),
  sefdJy: positive("a system equivalent flux density above 0 Jy"),
});

export const antennaSchema = v.looseObject({
  id,
  label: v.optional(label, ""),
  diameterM: positive("a diameter above 0 m"),
  elevationLimitDeg: v.optional(number(-90, 90, "an elevation in [-90, 90] degrees"), 0),
  elevationUpperLimitDeg: v.optional(number(-90, 90, "an elevation in [-90, 90] degrees"), 90),
  minSpacingM: v.optional(number(0, 1e6, "a spacing in [0, 1000000] metres"), 0),
  beamFactor: v.optional(number(0.5, 3, "a factor in [0.5, 3]"), 1.029),
  receivers: v.optional(v.array(receiverSchema), []),
});

export const stationSchema = v.looseObject({
  id,
  name: v.optional(label, ""),
  latitudeDeg: latitude,
  longitudeDeg: longitude,
  heightM: v.optional(height, 0),
  antenna: id,
  locked: v.optional(v.boolean(), false),
});

export const layoutSchema = v.looseObject({
  id,
  label: v.optional(label, ""),
  stations: v.pipe(v.array(id), v.minLength(1, "at least one station")),
});

export const weightingSchema = v.looseObject({
  scheme: v.optional(v.picklist(["natural", "uniform", "robust"]), "natural"),
  robustness: v.optional(number(-2, 2, "a robustness in [-2, 2]"), 0),
  taperArcsec: v.optional(v.nullable(positive("a taper above 0 arcsec, or null")), null),
  fieldArcsec: v.optional(v.nullable(positive("a field above 0 arcsec, or null")), null),
});

export const imageSchema = v.looseObject({
  pixelArcsec: v.optional(v.nullable(positive("a pixel above 0 arcsec, or null")), null),
  sizePx: v.optional(v.nullable(v.pipe(v.number(), v.integer(), v.minValue(32), v.maxValue(4096))), null),
  sidelobeRadiusArcsec: v.optional(v.nullable(positive("a radius above 0 arcsec, or null")), null),
});

export const observationSchema = v.looseObject({
  id,
  label: v.optional(label, ""),
  declinationDeg: number(-90, 90, "a declination in [-90, 90] degrees"),
  rightAscensionDeg: v.optional(v.nullable(number(0, 360, "a right ascension in [0, 360] degrees")), null),
  epoch: v.optional(v.picklist(["date", "J2000"]), "date"),
  startUtc: v.optional(v.nullable(v.pipe(v.string(), v.isoTimestamp("a UTC time such as 2027-03-21T18:00:00Z"))), null),
  hourAngle: v.looseObject({
    fromH: number(-12, 12, "an hour angle in [-12, 12] hours"),
    toH: number(-12, 12, "an hour angle in [-12, 12] hours"),
  }),
  elevationLimitDeg: v.optional(number(-90, 90, "an elevation in [-90, 90] degrees"), 0),
  frequencyHz: number(1e3, 1e13, "a frequency in [1000, 1e13] hertz"),
  bandwidthHz: v.optional(positive("a bandwidth above 0 Hz"), 1e6),
  channels: v.optional(v.pipe(v.number(), v.integer(), v.minValue(1), v.maxValue(65_536)), 1),
  integrationS: v.optional(number(0.001, 86_400, "an integration in [0.001, 86400] seconds"), 60),
  repeats: v.optional(v.pipe(v.number(), v.integer(), v.minValue(1), v.maxValue(100_000)), 1),
  polarizations: v.optional(v.picklist([1, 2]), 2),
  efficiency: v.optional(v.pipe(v.number(), v.finite(), v.gtValue(0), v.maxValue(1)), 1),
  weighting: v.optional(weightingSchema, {}),
  image: v.optional(imageSchema, {}),
});

const rangeSchema = v.looseObject({
  from: v.pipe(v.number(), v.finite()),
  to: v.pipe(v.number(), v.finite()),
  step: positive("a step above 0"),
});
export const pairSchema = v.looseObject({
  separationArcsec: positive("a separation above 0 arcsec"),
  positionAngleDeg: v.optional(number(-360, 360, "a position angle in [-360, 360] degrees"), 0),
  fluxRatio: v.optional(v.pipe(v.number(), v.finite(), v.gtValue(0), v.maxValue(1)), 1),
});
export const whenSchema = v.looseObject({
  observation: v.optional(v.nullable(v.string()), null),
  layouts: v.optional(v.nullable(v.array(v.string())), null),
  declinationDeg: v.optional(rangeSchema),
  wavelengthM: v.optional(rangeSchema),
  pair: v.optional(pairSchema),
  sidelobeRadiusArcsec: v.optional(positive("a radius above 0 arcsec")),
  aboveElevationDeg: v.optional(number(-90, 90, "an elevation in [-90, 90] degrees")),
  without: v.optional(v.picklist([1, 2])),
});
export const requirementSchema = v.looseObject({
  id,
  text: v.optional(label, ""),
  quantity: v.pipe(v.string(), v.minLength(1), v.maxLength(100)),
  atMost: v.optional(v.nullable(v.pipe(v.number(), v.finite())), null),
  atLeast: v.optional(v.nullable(v.pipe(v.number(), v.finite())), null),
  margin: v.optional(number(0, 1, "a margin in [0, 1]"), 0.05),
  when: v.optional(whenSchema, {}),
});

export const siteSchema = v.looseObject({
  origin: v.looseObject({ latitudeDeg: latitude, longitudeDeg: longitude, heightM: v.optional(height, 0) }),
  hub: v.optional(v.nullable(v.looseObject({ latitudeDeg: latitude, longitudeDeg: longitude })), null),
  allowed: v.optional(v.nullable(geometrySchema), null),
  keepOut: v.optional(v.array(v.looseObject({ label: v.optional(label, ""), geometry: geometrySchema })), []),
  maxSlopeDeg: v.optional(v.nullable(number(0, 90, "a slope in [0, 90] degrees")), null),
  clearanceM: v.optional(number(0, 1e6, "a clearance in [0, 1000000] metres"), 0),
  costAreas: v.optional(
    v.array(v.looseObject({ label: v.optional(label, ""), factor: positive("a factor above 0"), geometry: geometrySchema })),
    [],
  ),
  prices: v.optional(
    v.nullable(
      v.looseObject({
        currency: v.optional(v.pipe(v.string(), v.maxLength(10)), "EUR"),
        trenchPerKm: v.optional(number(0, 1e12, "a price of 0 or more"), 0),
        padEach: v.optional(number(0, 1e12, "a price of 0 or more"), 0),
      }),
    ),
    null,
  ),
  terrain: v.optional(
    v.nullable(
      v.looseObject({
        file: v.pipe(v.string(), v.maxLength(500)),
        sha256: v.optional(v.nullable(v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/, "64 hexadecimal digits"))), null),
        undulationM: v.optional(number(-200, 200, "an undulation in [-200, 200] metres"), 0),
      }),
    ),
    null,
  ),
});

export const planSchema = v.looseObject({
  format: v.literal(FORMAT),
  version: v.literal(VERSION),
  title: v.optional(label, ""),
  notes: v.optional(v.pipe(v.string(), v.maxLength(100_000)), ""),
  savedUtc: v.optional(v.nullable(v.string()), null),
  site: siteSchema,
  antennas: v.pipe(v.array(antennaSchema), v.minLength(1, "at least one antenna kind")),
  stations: v.pipe(v.array(stationSchema), v.minLength(1, "at least one station"), v.maxLength(4096, "at most 4096 stations")),
  layouts: v.pipe(v.array(layoutSchema), v.minLength(1, "at least one layout")),
  observations: v.pipe(v.array(observationSchema), v.minLength(1, "at least one observation")),
  requirements: v.optional(v.array(requirementSchema), []),
});

/** A plan with every default filled in. Records are treated as frozen: edits make new ones. */
export type Plan = v.InferOutput<typeof planSchema>;
export type Site = v.InferOutput<typeof siteSchema>;
export type Antenna = v.InferOutput<typeof antennaSchema>;
export type Station = v.InferOutput<typeof stationSchema>;
export type Layout = v.InferOutput<typeof layoutSchema>;
export type Observation = v.InferOutput<typeof observationSchema>;
export type Requirement = v.InferOutput<typeof requirementSchema>;
export type Pair = v.InferOutput<typeof pairSchema>;
export type Geometry = v.InferOutput<typeof geometrySchema>;
