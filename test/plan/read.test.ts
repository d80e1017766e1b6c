import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { PlanFaults } from "../../src/plan/faults.ts";
import { migrated } from "../../src/plan/migrate.ts";
import { checkedPlan, readPlan } from "../../src/plan/read.ts";
import { checkPlanSize } from "../../src/plan/text.ts";
import { faults, type Loose, read, refused, small } from "./small.ts";

/** A change that puts a value at a path such as `stations[0].latitudeDeg`; undefined takes the key away. */
const put =
  (path: string, value: unknown) =>
  (plan: Loose): void => {
    const keys = path.split(/[.[\]]+/).filter((key) => key !== "");
    const last = keys.pop() as string;
    const at = keys.reduce((node, key) => node[key], plan);
    if (value === undefined) delete at[last];
    else at[last] = value;
  };

describe("D1 a plan needs only what cannot be guessed; all else has a default", () => {
  it("fills the defaults in", () => {
    const { plan, warnings } = read(() => {});
    expect(warnings).toEqual([]);
    expect(plan).toEqual({
      ...small(),
      title: "",
      notes: "",
      savedUtc: null,
      site: {
        origin: { latitudeDeg: -31, longitudeDeg: 24, heightM: 0 },
        hub: null,
        allowed: null,
        keepOut: [],
        maxSlopeDeg: null,
        clearanceM: 0,
        costAreas: [],
        prices: null,
        terrain: null,
      },
      antennas: [
        {
          id: "d12",
          label: "",
          diameterM: 12,
          elevationLimitDeg: 0,
          elevationUpperLimitDeg: 90,
          minSpacingM: 0,
          beamFactor: 1.029,
          receivers: [],
        },
      ],
      stations: small().stations.map((station: Loose) => ({ ...station, name: "", heightM: 0, locked: false })),
      layouts: [{ id: "wide", label: "", stations: ["K1", "K2"] }],
      observations: [
        {
          id: "south",
          label: "",
          declinationDeg: -45,
          rightAscensionDeg: null,
          epoch: "date",
          startUtc: null,
          hourAngle: { fromH: -5, toH: 3 },
          elevationLimitDeg: 0,
          frequencyHz: 1.42e9,
          bandwidthHz: 1e6,
          channels: 1,
          integrationS: 60,
          repeats: 1,
          polarizations: 2,
          efficiency: 1,
          positionErrorM: null,
          vapourGm3: null,
          weighting: { scheme: "natural", robustness: 0, taperArcsec: null, fieldArcsec: null },
          image: { pixelArcsec: null, sizePx: null, sidelobeRadiusArcsec: null },
        },
      ],
      requirements: [],
    });
  });

  it("gives a requirement its defaults, and a pair its own", () => {
    const { plan } = read(
      put("requirements", [{ id: "R1", quantity: "pair.dip", atLeast: 0.1, when: { pair: { separationArcsec: 2 } } }]),
    );
    expect(plan.requirements[0]).toEqual({
      id: "R1",
      text: "",
      quantity: "pair.dip",
      atMost: null,
      atLeast: 0.1,
      margin: 0.05,
      when: { observation: null, layouts: null, pair: { separationArcsec: 2, positionAngleDeg: 0, fluxRatio: 1 } },
    });
  });

  it.each<[string, string]>([
    ["format", '"spanwright-plan"'],
    ["version", "a whole number from 1 to 1"],
    ["site", "an object"],
    ["site.origin", "an object"],
    ["site.origin.latitudeDeg", "a latitude in [-90, 90] degrees"],
    ["antennas", "a list of antenna kinds"],
    ["antennas[0].diameterM", "a diameter above 0 and at most 10000 m"],
    ["stations", "a list of stations"],
    ["stations[0].antenna", "a name of 1 to 64 letters, digits, spaces, dots, dashes"],
    ["layouts", "a list of layouts"],
    ["observations", "a list of observations"],
    ["observations[0].frequencyHz", "a frequency in [1000, 1e13] hertz"],
    ["observations[0].hourAngle", "an object"],
    ["observations[0].hourAngle.toH", "an hour angle in [-12, 12] hours"],
  ])("refuses one without %s", (path, allowed) => {
    expect(faults(put(path, undefined))[0]).toBe(`${path} is missing; expected ${allowed}.`);
  });

  it("keeps longitudes past 180° as they are given", () => {
    expect(read(put("stations[0].longitudeDeg", 266.5)).plan.stations[0].longitudeDeg).toBe(266.5);
  });
});

const square = (coordinates: unknown) => ({ type: "Polygon", coordinates });
const multi = (coordinates: unknown) => ({ type: "MultiPolygon", coordinates });
const line = (requirement: object) => [{ id: "R1", quantity: "noiseJy", atMost: 1, ...requirement }];
const receiver = (change: object) => [{ fromHz: 1e9, toHz: 2e9, sefdJy: 400, ...change }];

describe("D2 every fault of a file is listed, with its path, the value found and what is allowed", () => {
  it("lists all of them, of single fields and between fields, not only the first", () => {
    expect(
      faults((plan) => {
        plan.stations[1].latitudeDeg = 95;
        plan.antennas[0].diameterM = "twelve";
        plan.observations[0].channels = 1.5;
        plan.observations[0].weighting = { scheme: "even" };
        plan.observations[0].hourAngle.toH = -6;
        plan.layouts[0].stations[1] = "K9";
        plan.layouts.push({ id: "wide", stations: ["K1"] });
      }),
    ).toEqual([
      'antennas[0].diameterM is "twelve"; expected a diameter above 0 and at most 10000 m.',
      "stations[1].latitudeDeg is 95; expected a latitude in [-90, 90] degrees.",
      "observations[0].channels is 1.5; expected a whole number in [1, 65536].",
      'observations[0].weighting.scheme is "even"; expected "natural" or "uniform" or "robust".',
      'layouts[1].id is "wide"; expected an id that no other has; layouts[0] has it.',
      'layouts[0].stations[1] is "K9"; expected the id of a station of the plan.',
      "observations[0].hourAngle.toH is -6; expected at least fromH, -5.",
    ]);
  });

  it("has the path, value and words on the error as well", () => {
    const { faults: found } = refused(JSON.stringify({ ...small(), title: 5 }));
    expect(found).toEqual([{ path: "title", value: 5, found: undefined, expected: "a text of at most 200 characters" }]);
  });

  it("names fifty and counts the rest", () => {
    const many = (count: number) =>
      faults((plan) => {
        plan.stations = Array.from({ length: count }, (_, k) => ({
          id: `K${k}`,
          latitudeDeg: 91,
          longitudeDeg: 0,
          antenna: "d12",
        }));
      });
    expect(many(50).length).toBe(50);
    expect(many(51)[50]).toBe("… and 1 more fault.");
    const lines = many(80);
    expect(lines.length).toBe(51);
    expect(lines[50]).toBe("… and 30 more faults.");
  });

  it("quotes no more of a value than fits a line, and no control characters", () => {
    const [long] = faults(put("stations[0].id", "x".repeat(5000)));
    expect(long.length).toBeLessThan(250);
    expect(faults(put("stations[0].id", "a\n\u001b[31mb"))[0]).toBe(
      'stations[0].id is "a\\n\\u001b[31mb"; expected a name of 1 to 64 letters, digits, spaces, dots, dashes.',
    );
  });

  // Every way a single field can be wrong: another type, out of range, an end of the range just passed.
  it.each<[string, unknown, string]>([
    ["title", 5, "title is 5; expected a text of at most 200 characters."],
    ["title", "x".repeat(201), "title is 201 characters long; expected a text of at most 200 characters."],
    ["notes", null, "notes is null; expected a text of at most 100000 characters."],
    ["savedUtc", "yesterday", 'savedUtc is "yesterday"; expected a UTC time such as 2027-03-21T18:00:00Z, or null.'],
    ["site", [], "site is []; expected an object."],
    ["site", "here", 'site is "here"; expected an object.'],
    ["site.origin", null, "site.origin is null; expected an object."],
    ["site.origin.latitudeDeg", null, "site.origin.latitudeDeg is null; expected a latitude in [-90, 90] degrees."],
    ["site.origin.latitudeDeg", "-31", 'site.origin.latitudeDeg is "-31"; expected a latitude in [-90, 90] degrees.'],
    ["site.origin.latitudeDeg", -90.0001, "site.origin.latitudeDeg is -90.0001; expected a latitude in [-90, 90] degrees."],
    ["site.origin.longitudeDeg", 360.5, "site.origin.longitudeDeg is 360.5; expected a longitude in [-180, 360] degrees."],
    ["site.origin.heightM", -20_000, "site.origin.heightM is -20000; expected a height in [-11000, 100000] metres."],
    ["site.hub", {}, "site.hub.latitudeDeg is missing; expected a latitude in [-90, 90] degrees."],
    ["site.maxSlopeDeg", 91, "site.maxSlopeDeg is 91; expected a slope in [0, 90] degrees."],
    ["site.clearanceM", -1, "site.clearanceM is -1; expected a clearance in [0, 1000000] metres."],
    ["site.prices", [1], "site.prices is [1]; expected an object."],
    ["site.prices", { padEach: -5 }, "site.prices.padEach is -5; expected a price in [0, 1e12]."],
    [
      "site.prices",
      { currency: "shells of the sea" },
      "site.prices.currency is 17 characters long; expected a text of at most 10 characters.",
    ],
    ["site.terrain", {}, "site.terrain.file is missing; expected a text of at most 500 characters."],
    ["site.terrain", { file: "" }, "site.terrain.file is empty; expected the name of a file."],
    [
      "site.terrain",
      { file: "a.tif", sha256: "12ab" },
      'site.terrain.sha256 is "12ab"; expected 64 hexadecimal digits in lower case.',
    ],
    ["site.keepOut", {}, "site.keepOut is {}; expected a list of areas."],
    ["site.keepOut", [{}], "site.keepOut[0].geometry is missing; expected a GeoJSON Polygon or MultiPolygon."],
    ["site.keepOut", [{ geometry: 5 }], "site.keepOut[0].geometry is 5; expected a GeoJSON Polygon or MultiPolygon."],
    ["site.allowed", { type: "Point", coordinates: [0, 0] }, 'site.allowed.type is "Point"; expected "Polygon" or "MultiPolygon".'],
    ["site.allowed", { type: "Polygon" }, "site.allowed.coordinates is missing; expected a list of rings."],
    ["site.allowed", square([]), "site.allowed.coordinates is empty; expected at least one ring."],
    ["site.allowed", multi([]), "site.allowed.coordinates is empty; expected at least one polygon."],
    [
      "site.allowed",
      square([[[0, 0]]]),
      "site.allowed.coordinates[0] is a list of 1; expected at least 4 positions, the last equal to the first.",
    ],
    [
      "site.allowed",
      square([[[0, 0], [1, 0], [1], [0, 0]]]),
      "site.allowed.coordinates[0][2] is a list of 1; expected two or three numbers: longitude, latitude and perhaps height.",
    ],
    [
      "site.allowed",
      square([
        [
          [0, 0],
          [1, 0],
          [1, "1"],
          [0, 0],
        ],
      ]),
      'site.allowed.coordinates[0][2][1] is "1"; expected a number of degrees.',
    ],
    [
      "site.allowed",
      square([
        [
          [0, 0],
          [1, 0],
          [1, 1],
          [0, 1],
        ],
      ]),
      "site.allowed.coordinates[0][3] is [0,1]; expected the ring's first position again, [0,0].",
    ],
    [
      "site.allowed",
      multi([
        [
          [
            [0, 0],
            [1, 0],
            [0, 0],
            [0, 0],
          ],
        ],
      ]),
      "site.allowed.coordinates[0][0] is a ring of 2 different positions; expected at least three.",
    ],
    [
      "site.costAreas",
      [
        {
          factor: 2,
          geometry: square([
            [
              [0, 0],
              [1, 95],
              [1, 1],
              [0, 0],
            ],
          ]),
        },
      ],
      "site.costAreas[0].geometry.coordinates[0][1] is [1,95]; expected a longitude in [-180, 360] and a latitude in [-90, 90] degrees, in this order.",
    ],
    [
      "site.costAreas",
      [{ factor: 0, geometry: null }],
      "site.costAreas[0].factor is 0; expected a factor above 0 and at most 1000000.",
    ],
    ["antennas", [], "antennas is empty; expected at least one antenna kind."],
    ["antennas", { d12: {} }, 'antennas is {"d12":{}}; expected a list of antenna kinds.'],
    ["antennas[0]", 12, "antennas[0] is 12; expected an object."],
    ["antennas[0].diameterM", 0, "antennas[0].diameterM is 0; expected a diameter above 0 and at most 10000 m."],
    ["antennas[0].beamFactor", 5, "antennas[0].beamFactor is 5; expected a factor in [0.5, 3]."],
    ["antennas[0].minSpacingM", -1, "antennas[0].minSpacingM is -1; expected a spacing in [0, 1000000] metres."],
    ["antennas[0].elevationLimitDeg", 91, "antennas[0].elevationLimitDeg is 91; expected an elevation in [-90, 90] degrees."],
    ["antennas[0].elevationUpperLimitDeg", -1, "antennas[0].elevationUpperLimitDeg is -1; expected at least elevationLimitDeg, 0."],
    [
      "antennas[0].receivers",
      receiver({ sefdJy: null }),
      "antennas[0].receivers[0].sefdJy is missing; expected a system equivalent flux density, or systemK and apertureEfficiency.",
    ],
    [
      "antennas[0].receivers",
      receiver({ sefdJy: null, systemK: 40 }),
      "antennas[0].receivers[0].sefdJy is missing; expected a system equivalent flux density, or systemK and apertureEfficiency.",
    ],
    [
      "antennas[0].receivers",
      receiver({ systemK: 40 }),
      "antennas[0].receivers[0].apertureEfficiency is missing; expected both systemK and apertureEfficiency, or neither.",
    ],
    [
      "antennas[0].receivers",
      receiver({ systemK: 40, apertureEfficiency: 0.7 }),
      "antennas[0].receivers[0].sefdJy is 400; expected null where systemK and apertureEfficiency say it.",
    ],
    [
      "antennas[0].receivers",
      receiver({ sefdJy: null, systemK: 40, apertureEfficiency: 1.2 }),
      "antennas[0].receivers[0].apertureEfficiency is 1.2; expected an efficiency above 0 and at most 1.",
    ],
    [
      "antennas[0].receivers",
      receiver({ sefdJy: 0 }),
      "antennas[0].receivers[0].sefdJy is 0; expected a system equivalent flux density above 0 and at most 1000000000000 Jy.",
    ],
    [
      "antennas[0].receivers",
      receiver({ toHz: 5e8 }),
      "antennas[0].receivers[0].toHz is 500000000; expected at least fromHz, 1000000000.",
    ],
    ["stations", [], "stations is empty; expected at least one station."],
    ["stations[0].id", "<b>", 'stations[0].id is "<b>"; expected a name of 1 to 64 letters, digits, spaces, dots, dashes.'],
    ["stations[0].id", 7, "stations[0].id is 7; expected a name of 1 to 64 letters, digits, spaces, dots, dashes."],
    ["stations[1].id", "K1", 'stations[1].id is "K1"; expected an id that no other has; stations[0] has it.'],
    ["stations[0].antenna", "d99", 'stations[0].antenna is "d99"; expected one of d12.'],
    ["stations[0].locked", "yes", 'stations[0].locked is "yes"; expected true or false.'],
    ["layouts", [], "layouts is empty; expected at least one layout."],
    ["layouts[0].stations", [], "layouts[0].stations is empty; expected at least one station."],
    [
      "layouts[0].stations",
      ["K1", 5],
      "layouts[0].stations[1] is 5; expected a name of 1 to 64 letters, digits, spaces, dots, dashes.",
    ],
    ["layouts[0].stations[1]", "K9", 'layouts[0].stations[1] is "K9"; expected the id of a station of the plan.'],
    ["layouts[0].stations[1]", "K1", 'layouts[0].stations[1] is "K1"; expected each station once.'],
    ["observations", [], "observations is empty; expected at least one observation."],
    ["observations[0].declinationDeg", 91, "observations[0].declinationDeg is 91; expected a declination in [-90, 90] degrees."],
    [
      "observations[0].rightAscensionDeg",
      361,
      "observations[0].rightAscensionDeg is 361; expected a right ascension in [0, 360] degrees.",
    ],
    ["observations[0].epoch", "B1950", 'observations[0].epoch is "B1950"; expected "date" or "J2000".'],
    [
      "observations[0].startUtc",
      "2027-03-21 18:00",
      'observations[0].startUtc is "2027-03-21 18:00"; expected a UTC time such as 2027-03-21T18:00:00Z, or null.',
    ],
    [
      "observations[0].startUtc",
      "2027-02-29T18:00:00Z",
      'observations[0].startUtc is "2027-02-29T18:00:00Z"; expected a day that the calendar has.',
    ],
    [
      "observations[0].hourAngle",
      { fromH: -13, toH: 0 },
      "observations[0].hourAngle.fromH is -13; expected an hour angle in [-12, 12] hours.",
    ],
    ["observations[0].hourAngle", { fromH: 3, toH: -5 }, "observations[0].hourAngle.toH is -5; expected at least fromH, 3."],
    ["observations[0].frequencyHz", 0, "observations[0].frequencyHz is 0; expected a frequency in [1000, 1e13] hertz."],
    [
      "observations[0].bandwidthHz",
      3e9,
      "observations[0].bandwidthHz is 3000000000; expected less than twice frequencyHz, 2840000000.",
    ],
    ["observations[0].channels", 0, "observations[0].channels is 0; expected a whole number in [1, 65536]."],
    ["observations[0].repeats", "3", 'observations[0].repeats is "3"; expected a whole number in [1, 100000].'],
    ["observations[0].integrationS", 0, "observations[0].integrationS is 0; expected an integration in [0.001, 86400] seconds."],
    [
      "observations[0].integrationS",
      0.01,
      "observations[0].integrationS is 0.01; expected at least 0.0288 s for a window of 8 h: 1000000 samples a baseline are the most.",
    ],
    ["observations[0].polarizations", 4, "observations[0].polarizations is 4; expected 1 or 2."],
    ["observations[0].efficiency", 1.2, "observations[0].efficiency is 1.2; expected an efficiency above 0 and at most 1."],
    ["observations[0].weighting", [], "observations[0].weighting is []; expected an object."],
    [
      "observations[0].weighting",
      { robustness: 3 },
      "observations[0].weighting.robustness is 3; expected a robustness in [-2, 2].",
    ],
    [
      "observations[0].weighting",
      { taperArcsec: 0 },
      "observations[0].weighting.taperArcsec is 0; expected a taper above 0 and at most 648000 arcsec.",
    ],
    ["observations[0].image", { sizePx: 16 }, "observations[0].image.sizePx is 16; expected a whole number in [32, 4096]."],
    [
      "requirements",
      [{ quantity: "noiseJy", atMost: 1 }],
      "requirements[0].id is missing; expected a name of 1 to 64 letters, digits, spaces, dots, dashes.",
    ],
    ["requirements", line({ quantity: "" }), "requirements[0].quantity is empty; expected a quantity such as beam.majorArcsec."],
    ["requirements", line({ atMost: undefined }), "requirements[0].atMost is null; expected a limit: atMost or atLeast."],
    ["requirements", line({ atMost: "1" }), 'requirements[0].atMost is "1"; expected a number.'],
    ["requirements", line({ atLeast: 2 }), "requirements[0].atMost is 1; expected at least atLeast, 2."],
    ["requirements", line({ margin: 2 }), "requirements[0].margin is 2; expected a margin in [0, 1]."],
    [
      "requirements",
      [...line({}), ...line({})],
      'requirements[1].id is "R1"; expected an id that no other has; requirements[0] has it.',
    ],
    ["requirements", line({ when: { without: 3 } }), "requirements[0].when.without is 3; expected 1 or 2."],
    [
      "requirements",
      line({ when: { observation: 5 } }),
      "requirements[0].when.observation is 5; expected a text of at most 64 characters.",
    ],
    ["requirements", line({ when: { layouts: "wide" } }), 'requirements[0].when.layouts is "wide"; expected a list of layout ids.'],
    [
      "requirements",
      line({ when: { pair: { separationArcsec: 1, fluxRatio: 2 } } }),
      "requirements[0].when.pair.fluxRatio is 2; expected a flux ratio above 0 and at most 1.",
    ],
    [
      "requirements",
      line({ when: { declinationDeg: { from: 10, to: -10, step: 5 } } }),
      "requirements[0].when.declinationDeg.to is -10; expected at least from, 10.",
    ],
    [
      "requirements",
      line({ when: { declinationDeg: { from: -100, to: 0, step: 5 } } }),
      "requirements[0].when.declinationDeg.from is -100; expected a declination in [-90, 90] degrees.",
    ],
    [
      "requirements",
      line({ when: { wavelengthM: { from: 0.1, to: 0.2, step: 0 } } }),
      "requirements[0].when.wavelengthM.step is 0; expected a step above 0 and at most 299792 metres.",
    ],
    [
      "requirements",
      line({ when: { wavelengthM: { from: 0.1, to: 0.2, step: 1e-6 } } }),
      "requirements[0].when.wavelengthM.step is 0.000001; expected a step that makes at most 10000 points from 0.1 to 0.2.",
    ],
    [
      "requirements",
      line({ when: { declinationDeg: { from: 0, to: 1, step: 1 }, wavelengthM: { from: 0.1, to: 0.2, step: 0.1 } } }),
      "requirements[0].when is over two ranges; expected declinationDeg or wavelengthM, not both.",
    ],
  ])("%s of %j", (path, value, want) => {
    expect(faults(put(path, value))).toContain(want);
  });

  it("takes the ends of its ranges", () => {
    const { plan } = read((p) => {
      Object.assign(p.site.origin, { latitudeDeg: -90, longitudeDeg: -180, heightM: -11_000 });
      Object.assign(p.stations[0], { latitudeDeg: 90, longitudeDeg: 360, heightM: 100_000 });
      Object.assign(p.antennas[0], { elevationLimitDeg: 30, elevationUpperLimitDeg: 30, receivers: receiver({ toHz: 1e9 }) });
      Object.assign(p.observations[0], {
        declinationDeg: 90,
        hourAngle: { fromH: 12, toH: 12 },
        efficiency: 1,
        integrationS: 0.001,
      });
    });
    expect(plan.observations[0].hourAngle).toEqual({ fromH: 12, toH: 12 });
  });

  it("one place has one fault", () => {
    const text = JSON.stringify(small()).replace('"latitudeDeg":-31,', '"latitudeDeg":1e999,');
    expect(refused(text).message).toBe("site.origin.latitudeDeg is Infinity; expected a latitude in [-90, 90] degrees.");
  });

  it("4 097 stations are too many, 4 096 are not", () => {
    const stations = (count: number): Loose => Array.from({ length: count }, (_, k) => ({ ...small().stations[0], id: `K${k}` }));
    expect(faults(put("stations", stations(4097)))).toEqual(["stations is a list of 4097; expected at most 4096 stations."]);
    expect(read(put("stations", stations(4096))).plan.stations.length).toBe(4096);
  });

  it("looks for a thousand faults and no more, so that a large file of nothing else is refused in time and space", () => {
    const lines = (change: (plan: Loose) => void): string[] => {
      const told = faults(change);
      expect(told.length).toBe(51);
      expect(told[50]).toBe("… and at least 950 more faults.");
      return told;
    };
    const many = <T>(value: T): T[] => Array.from({ length: 200_000 }, () => value);
    expect(lines(put("stations", many(0)))[49]).toBe("stations[49] is 0; expected an object.");
    expect(lines(put("layouts", [{ id: "l", stations: many("K1") }]))[0]).toBe(
      "layouts[0].stations is a list of 200000; expected at most 4096 stations.",
    );
    expect(lines(put("site.allowed", square(many([]))))[0]).toMatch(/^site.allowed.coordinates\[0\] is empty/);
    expect(lines(put("site.keepOut", many({})))[0]).toMatch(/^site.keepOut\[0\].geometry is missing/);
    expect(lines(put("requirements", many(line({})[0])))[0]).toMatch(/^requirements\[1\].id is "R1"/);
  });

  it("whatever stands in the place of a field, the plan is read or refused in lines", () => {
    const paths: string[] = [];
    const walk = (node: Loose, path: string): void => {
      if (path !== "" && path !== "format" && path !== "version") paths.push(path);
      if (node === null || typeof node !== "object") return;
      for (const [key, inner] of Object.entries(node))
        walk(inner, Array.isArray(node) ? `${path}[${key}]` : path === "" ? key : `${path}.${key}`);
    };
    const whole = read((p) => {
      p.site.allowed = square([
        [
          [0, 0],
          [1, 0],
          [1, 1],
          [0, 0],
        ],
      ]);
      p.antennas[0].receivers = receiver({});
      p.requirements = line({ when: { declinationDeg: { from: 0, to: 1, step: 1 }, pair: { separationArcsec: 1 } } });
    }).plan;
    walk(whole, "");
    const odd = fc.oneof(
      fc.jsonValue(),
      fc.constantFrom(null, -1, 0, 1e308, -1e308, 5e-324, "", [], {}, [[]], [[[]]], [null], true),
    );
    fc.assert(
      fc.property(fc.constantFrom(...paths), odd, (path, value) => {
        const plan = structuredClone(whole);
        put(path, value)(plan);
        try {
          checkedPlan(plan);
        } catch (error) {
          if (!(error instanceof PlanFaults)) throw error;
          for (const told of error.message.split("\n")) expect(told).toMatch(/^[\w.[\]]+ is [^\n]+; expected .+\.$/);
        }
      }),
      { seed: 20260101, numRuns: 2000 },
    );
  });
});

describe("D3 what is no plan is refused in one line", () => {
  const text = JSON.stringify(small());
  it.each<[string, string, string]>([
    [
      "an empty file",
      "",
      "the file is not JSON: line 1, column 1, where it ends; expected a value: a number, a text in double quotes, true, false, null, [ or {.",
    ],
    [
      "a file cut short",
      text.slice(0, 60),
      "the file is not JSON: line 1, column 61, where it ends; expected the closing double quote.",
    ],
    ["a stray comma", '{\n  "format": 1,,\n}', 'the file is not JSON: line 2, column 15, at ","; expected a key in double quotes.'],
    [
      "NaN",
      '{"format": NaN}',
      'the file is not JSON: line 1, column 12, at "N"; expected a value: a number, a text in double quotes, true, false, null, [ or {.',
    ],
    ["100 000 nested brackets", "[".repeat(100_000), "the file is nested 100000 deep; expected at most 64 levels of brackets."],
    ["100 000 nested objects", '{"a":'.repeat(100_000), "the file is nested 100000 deep; expected at most 64 levels of brackets."],
    [
      "a fault after a wide character and a line of Windows",
      '{"title": "𝔎",\r\n "notes": "𝔎𝔎" 5}',
      'the file is not JSON: line 2, column 16, at "5"; expected a comma or }.',
    ],
    ["a list", "[1, 2]", 'the plan is [1,2]; expected an object with "format": "spanwright-plan".'],
    ["null", "null", 'the plan is null; expected an object with "format": "spanwright-plan".'],
    ["a number", "5", 'the plan is 5; expected an object with "format": "spanwright-plan".'],
    ["another format", '{"format":"geojson"}', 'format is "geojson"; expected "spanwright-plan".'],
    ["an object of no format", "{}", 'format is missing; expected "spanwright-plan".'],
    [
      "a newer version, by its number",
      text.replace('"version":1', '"version":7'),
      "version is 7; expected at most 1: a newer program wrote this plan.",
    ],
    ["version 0", text.replace('"version":1', '"version":0'), "version is 0; expected a whole number from 1 to 1."],
    ["version 1.5", text.replace('"version":1', '"version":1.5'), "version is 1.5; expected a whole number from 1 to 1."],
    ["a version in quotes", text.replace('"version":1', '"version":"1"'), 'version is "1"; expected a whole number from 1 to 1.'],
    [
      "a version that is infinite",
      text.replace('"version":1', '"version":1e999'),
      "version is Infinity; expected a whole number from 1 to 1.",
    ],
  ])("%s", (_, broken, want) => {
    expect(refused(broken).message).toBe(want);
  });

  it("a file past 64 MiB, by its size alone", () => {
    expect(() => checkPlanSize(64 * 1024 * 1024 + 1)).toThrow("the file is 67108865 bytes long; expected at most 64 MiB.");
    expect(() => checkPlanSize(64 * 1024 * 1024)).not.toThrow();
  });

  it("brackets inside texts do not count as nesting, and a byte-order mark is no fault", () => {
    const notes = `${"[{".repeat(500)}\\"`;
    expect(read(put("notes", notes)).plan.notes).toBe(notes);
    expect(readPlan(`\uFEFF${text}`).warnings).toEqual([]);
  });

  it("a document of version 1 is read as it is: there is no older one to bring up", () => {
    const document = small();
    expect(migrated(document)).toBe(document);
  });
});

describe("D4 keys that are not known are kept, named in a warning, and handed back", () => {
  it("at every level, polygons included", () => {
    const { plan, warnings } = read((p) => {
      p.mood = "calm";
      p.stations[1].paint = { hue: 3, hues: [{ deep: null }] };
      p.observations[0].weighting = { scheme: "natural", flavour: 1 };
      p.site.keepOut = [
        {
          geometry: {
            ...square([
              [
                [0, 0],
                [1, 0],
                [1, 1],
                [0, 0],
              ],
            ]),
            bbox: [0, 0, 1, 1],
          },
        },
      ];
      p.requirements = line({ when: { pair: { separationArcsec: 1, why: "test" } } });
    });
    expect(warnings).toEqual([
      "keys that are not known are kept as they are: site.keepOut[0].geometry.bbox, stations[1].paint, " +
        "observations[0].weighting.flavour, mood, requirements[0].when.pair.why",
    ]);
    expect(plan).toMatchObject({ mood: "calm", stations: [{}, { paint: { hue: 3, hues: [{ deep: null }] } }] });
  });

  it("names twenty and counts the rest", () => {
    const { warnings } = read((p) => {
      for (let k = 0; k < 30; k++) p[`x${k}`] = k;
    });
    expect(warnings).toEqual([expect.stringMatching(/: x0, x1, .*, x19 and 10 more$/)]);
  });

  it("names odd ones on one line", () => {
    const { warnings } = read((p) => {
      p["two\nlines"] = 1;
      p["y".repeat(500)] = 1;
    });
    expect(warnings[0]).toContain('"two\\nlines"');
    expect(warnings[0].length).toBeLessThan(250);
  });

  it("__proto__, prototype and constructor do no harm: they are left out, with a warning", () => {
    const harm = '"__proto__":{"polluted":true},"constructor":{"prototype":{"polluted":true}},"prototype":1';
    const text = JSON.stringify(small()).replace('"version":1', `"version":1,${harm}`).replace('"id":"K1"', `"id":"K1",${harm}`);
    const { plan, warnings } = readPlan(text);
    expect(({} as Loose).polluted).toBeUndefined();
    expect((plan as Loose).polluted).toBeUndefined();
    expect((plan.stations[0] as Loose).polluted).toBeUndefined();
    expect(warnings).toEqual([
      "keys that no plan can have are left out: __proto__, constructor, prototype, " +
        "stations[0].__proto__, stations[0].constructor, stations[0].prototype",
    ]);
  });
});

describe("D5 a requirement may outlive what it names", () => {
  it("is kept with a warning", () => {
    const { plan, warnings } = read((p) => {
      p.requirements = [
        ...line({ when: { observation: "gone", layouts: ["wide", "lost"] } }),
        { id: "R2", quantity: "noiseJy", atMost: 1, when: { layouts: [] } },
      ];
    });
    expect(plan.requirements.map((r) => r.id)).toEqual(["R1", "R2"]);
    expect(warnings).toEqual([
      "requirements[0].when.observation names gone, which the plan does not have: the line cannot be computed",
      "requirements[0].when.layouts names lost, which the plan does not have",
      "requirements[1].when.layouts is empty: the line speaks of no layout",
    ]);
  });

  it("and may ask for a quantity that this program does not know", () => {
    expect(read(put("requirements", line({ quantity: "beam.fancy" }))).warnings).toEqual([]);
  });
});
