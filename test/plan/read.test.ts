import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { PlanFaults } from "../../src/plan/faults.ts";
import { readPlan } from "../../src/plan/read.ts";
import { checkPlanSize } from "../../src/plan/text.ts";
import { writePlan } from "../../src/plan/write.ts";

// biome-ignore lint/suspicious/noExplicitAny: broken documents are what is tested
type Loose = any;

const small = (): Loose => ({
  format: "spanwright-plan",
  version: 1,
  site: { origin: { latitudeDeg: -31, longitudeDeg: 24 } },
  antennas: [{ id: "d12", diameterM: 12 }],
  stations: [
    { id: "K1", latitudeDeg: -31, longitudeDeg: 24, antenna: "d12" },
    { id: "K2", latitudeDeg: -31.01, longitudeDeg: 24.01, antenna: "d12" },
  ],
  layouts: [{ id: "wide", stations: ["K1", "K2"] }],
  observations: [{ id: "south", declinationDeg: -45, hourAngle: { fromH: -5, toH: 3 }, frequencyHz: 1.42e9 }],
});

const read = (change: (plan: Loose) => void) => {
  const plan = small();
  change(plan);
  return readPlan(JSON.stringify(plan));
};

/** The lines a broken plan is refused with. */
function refusal(text: string): string[] {
  try {
    readPlan(text);
  } catch (error) {
    if (error instanceof PlanFaults) return error.message.split("\n");
    throw error;
  }
  throw new Error("it was read");
}
const faults = (change: (plan: Loose) => void): string[] => {
  const plan = small();
  change(plan);
  return refusal(JSON.stringify(plan));
};

describe("D1 a plan needs only what cannot be guessed; all else has a default", () => {
  it("fills the defaults in", () => {
    const { plan, warnings } = read(() => {});
    expect(warnings).toEqual([]);
    expect(plan.antennas[0]).toMatchObject({ elevationLimitDeg: 0, elevationUpperLimitDeg: 90, beamFactor: 1.029, receivers: [] });
    expect(plan.observations[0]).toMatchObject({
      rightAscensionDeg: null,
      epoch: "date",
      channels: 1,
      polarizations: 2,
      efficiency: 1,
      weighting: { scheme: "natural", robustness: 0, taperArcsec: null, fieldArcsec: null },
      image: { pixelArcsec: null, sizePx: null, sidelobeRadiusArcsec: null },
    });
    expect(plan.site).toMatchObject({ hub: null, allowed: null, keepOut: [], prices: null, terrain: null });
    expect(plan.requirements).toEqual([]);
  });

  it.each(["format", "version", "site", "antennas", "stations", "layouts", "observations"])("refuses one without %s", (key) => {
    const [line] = faults((plan) => delete plan[key]);
    expect(line).toMatch(new RegExp(`^${key} is missing; expected `));
  });
});

describe("D2 every fault of a file is listed, with its path, the value found and what is allowed", () => {
  it("lists all of them, not only the first", () => {
    expect(
      faults((plan) => {
        plan.stations[1].latitudeDeg = 95;
        plan.antennas[0].diameterM = "twelve";
        plan.observations[0].channels = 1.5;
        plan.observations[0].weighting = { scheme: "briggs" };
      }),
    ).toEqual([
      'antennas[0].diameterM is "twelve"; expected a number.',
      "stations[1].latitudeDeg is 95; expected a latitude in [-90, 90] degrees.",
      "observations[0].channels is 1.5; expected a whole number.",
      'observations[0].weighting.scheme is "briggs"; expected "natural" or "uniform" or "robust".',
    ]);
  });

  it("names fifty and counts the rest", () => {
    const lines = faults((plan) => {
      plan.stations = Array.from({ length: 80 }, (_, k) => ({ id: `K${k}`, latitudeDeg: 91, longitudeDeg: 0, antenna: "d12" }));
    });
    expect(lines.length).toBe(51);
    expect(lines[50]).toBe("… and 30 more faults.");
  });

  it.each<[string, (plan: Loose) => void, string]>([
    ["a missing key", (p) => delete p.stations[0].antenna, "stations[0].antenna is missing; expected a value: it has no default."],
    [
      "null where a number must be",
      (p) => {
        p.stations[0].latitudeDeg = null;
      },
      "stations[0].latitudeDeg is null; expected a number.",
    ],
    [
      "a list where an object must be",
      (p) => {
        p.site = [];
      },
      "site.origin is missing; expected a value: it has no default.",
    ],
    [
      "no layouts",
      (p) => {
        p.layouts = [];
      },
      "layouts is []; expected at least one layout.",
    ],
    [
      "an empty layout",
      (p) => {
        p.layouts[0].stations = [];
      },
      "layouts[0].stations is []; expected at least one station.",
    ],
    [
      "an odd id",
      (p) => {
        p.stations[0].id = "<b>";
      },
      'stations[0].id is "<b>"; expected a name of 1 to 64 letters, digits, spaces, dots, dashes.',
    ],
    [
      "a double id",
      (p) => {
        p.stations[1].id = "K1";
        p.layouts[0].stations = ["K1"];
      },
      'stations[1].id is "K1"; expected an id that no other has; stations[0] has it.',
    ],
    [
      "a layout naming a missing station",
      (p) => {
        p.layouts[0].stations[1] = "K9";
      },
      'layouts[0].stations[1] is "K9"; expected the id of a station of the plan.',
    ],
    [
      "a station twice in a layout",
      (p) => {
        p.layouts[0].stations[1] = "K1";
      },
      'layouts[0].stations[1] is "K1"; expected each station once.',
    ],
    [
      "a station naming a missing antenna",
      (p) => {
        p.stations[0].antenna = "d99";
      },
      'stations[0].antenna is "d99"; expected one of d12.',
    ],
    [
      "a reversed window",
      (p) => {
        p.observations[0].hourAngle = { fromH: 3, toH: -5 };
      },
      "observations[0].hourAngle.toH is -5; expected at least hourAngle.fromH, 3.",
    ],
    [
      "a reversed receiver",
      (p) => {
        p.antennas[0].receivers = [{ fromHz: 2e9, toHz: 1e9, sefdJy: 1 }];
      },
      "antennas[0].receivers[0].toHz is 1000000000; expected at least fromHz, 2000000000.",
    ],
    [
      "crossed elevation limits",
      (p) => {
        p.antennas[0].elevationLimitDeg = 80;
        p.antennas[0].elevationUpperLimitDeg = 20;
      },
      "antennas[0].elevationUpperLimitDeg is 20; expected at least elevationLimitDeg, 80.",
    ],
    [
      "a band wider than twice its frequency",
      (p) => {
        p.observations[0].bandwidthHz = 3e9;
      },
      "observations[0].bandwidthHz is 3000000000; expected less than twice frequencyHz, 2840000000.",
    ],
    [
      "a requirement without a limit",
      (p) => {
        p.requirements = [{ id: "R1", quantity: "noiseJy" }];
      },
      "requirements[0].atMost is null; expected a limit: atMost or atLeast.",
    ],
    [
      "an open ring",
      (p) => {
        p.site.allowed = {
          type: "Polygon",
          coordinates: [
            [
              [0, 0],
              [1, 0],
              [1, 1],
              [0, 1],
            ],
          ],
        };
      },
      "site.allowed.coordinates[0][3] is [0,1]; expected the ring's first position again, [0,0].",
    ],
    [
      "a ring of one place",
      (p) => {
        p.site.allowed = {
          type: "Polygon",
          coordinates: [
            [
              [0, 0],
              [0, 0],
              [0, 0],
              [0, 0],
            ],
          ],
        };
      },
      "site.allowed.coordinates[0] is 4; expected a ring of at least three different positions.",
    ],
    [
      "another geometry",
      (p) => {
        p.site.allowed = { type: "Point", coordinates: [0, 0] };
      },
      'site.allowed.type is "Point"; expected "Polygon" or "MultiPolygon".',
    ],
  ])("%s", (_, change, line) => {
    expect(faults(change)).toContain(line);
  });

  it("4 097 stations", () => {
    const [line] = faults((plan) => {
      plan.stations = Array.from({ length: 4097 }, (_, k) => ({ id: `K${k}`, latitudeDeg: 0, longitudeDeg: 0, antenna: "d12" }));
    });
    expect(line).toMatch(/^stations is .*; expected at most 4096 stations\.$/);
  });
});

describe("D3 what is no plan is refused in one line", () => {
  const text = JSON.stringify(small());
  it.each<[string, string, RegExp]>([
    ["malformed JSON", text.slice(0, 60), /^the file is not JSON: .*; expected a JSON document\.$/],
    [
      "a stray comma, by line and column",
      '{\n  "format": 1,,\n}',
      /^the file is not JSON: line 2, column 15; expected a JSON document\.$/,
    ],
    ["NaN", text.replace("-31,", "NaN,"), /^the file is not JSON/],
    [
      "1e999, which JSON reads as infinity",
      text.replace('"latitudeDeg":-31,', '"latitudeDeg":1e999,'),
      /^site\.origin\.latitudeDeg is Infinity; expected a finite number/,
    ],
    [
      "100 000 nested brackets",
      `${"[".repeat(100_000)}${"]".repeat(100_000)}`,
      /^the file is nested 100000 deep; expected at most 64 levels of brackets\.$/,
    ],
    ["a list", "[1, 2]", /^the plan is \[1,2\]; expected an object with "format": "spanwright-plan"\.$/],
    ["another format", '{"format":"geojson"}', /^format is "geojson"; expected "spanwright-plan"\.$/],
    [
      "a newer version, by its number",
      text.replace('"version":1', '"version":7'),
      /^version is 7; expected at most 1: a newer program wrote this plan\.$/,
    ],
    ["version 0", text.replace('"version":1', '"version":0'), /^version is 0; expected a whole number from 1 to 1\.$/],
    ["an empty file", "", /^the file is not JSON/],
  ])("%s", (_, broken, line) => {
    const lines = refusal(broken);
    expect(lines[0]).toMatch(line);
    expect(lines.length).toBe(1);
  });

  it("a file past 64 MiB, by its size alone", () => {
    expect(() => checkPlanSize(70 * 1024 * 1024)).toThrow("the file is 73400320 bytes long; expected at most 64 MiB.");
    expect(() => checkPlanSize(64 * 1024 * 1024)).not.toThrow();
  });

  it("brackets inside texts do not count as nesting, and a byte-order mark is no fault", () => {
    expect(
      read((plan) => {
        plan.notes = `${"[{".repeat(500)}\\"`;
      }).plan.notes.length,
    ).toBe(1002);
    expect(readPlan(`\uFEFF${text}`).warnings).toEqual([]);
  });
});

describe("D4 keys that are not known are kept, named in a warning, and handed back", () => {
  it("at every level", () => {
    const { plan, warnings } = read((p) => {
      p.mood = "calm";
      p.stations[1].paint = { hue: 3 };
      p.observations[0].weighting = { scheme: "natural", flavour: 1 };
    });
    expect(warnings).toEqual([
      "keys that are not known are kept as they are: stations[1].paint, observations[0].weighting.flavour, mood",
    ]);
    const again = JSON.parse(writePlan(plan));
    expect(again.mood).toBe("calm");
    expect(again.stations[1].paint).toEqual({ hue: 3 });
    expect(again.observations[0].weighting.flavour).toBe(1);
  });

  it("names twenty and counts the rest; __proto__ does no harm", () => {
    const { warnings } = read((p) => {
      for (let k = 0; k < 30; k++) p[`x${k}`] = k;
    });
    expect(warnings[0]).toMatch(/x19 and 10 more$/);
    const text = JSON.stringify(small()).replace('"version":1', '"version":1,"__proto__":{"polluted":true}');
    readPlan(text);
    expect(({} as Loose).polluted).toBeUndefined();
  });
});

describe("D5 a requirement may outlive what it names", () => {
  it("is kept with a warning", () => {
    const { warnings } = read((p) => {
      p.requirements = [{ id: "R1", quantity: "noiseJy", atMost: 1, when: { observation: "gone", layouts: ["wide", "lost"] } }];
    });
    expect(warnings).toEqual([
      "requirements[0].when.observation names gone, which the plan does not have: the line cannot be computed",
      "requirements[0].when.layouts names lost, which the plan does not have",
    ]);
  });
});

describe("D6 writing a plan and reading it again changes nothing", () => {
  it.each(["thistledown", "sallow-flat", "long-meridian"])("%s, byte for byte, without fault or warning", (name) => {
    const { plan, warnings } = readPlan(readFileSync(`scenarios/${name}.plan.json`, "utf8"));
    expect(warnings).toEqual([]);
    const text = writePlan(plan);
    expect(writePlan(readPlan(text).plan)).toBe(text);
    expect(Object.keys(JSON.parse(text)).slice(0, 4)).toEqual(["format", "version", "title", "notes"]);
  });
});
