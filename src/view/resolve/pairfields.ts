import { parseAngleArcsec, parseAngleDeg, parseNumber } from "../../base/quantity.ts";
import type { Pair } from "../../plan/schema.ts";
import type { FieldModel } from "../controls.ts";
import { fixed, plain } from "../numbers.ts";
import { unitFor } from "../units.ts";

/** The three fields under the picture of two sources. */
export function pairFields(pair: Pair): {
  readonly separation: FieldModel;
  readonly angle: FieldModel;
  readonly ratio: FieldModel;
} {
  const unit = unitFor("angle", pair.separationArcsec);
  return {
    separation: {
      label: "Separation",
      text: plain(pair.separationArcsec / unit.size, 4),
      unit: unit.word,
      value: pair.separationArcsec,
      width: 4,
      sizes: [unit.size],
      parse: (text) =>
        /^[\d\s.,+-]+$/.test(text) ? parseNumber(text, "separation") * unit.size : parseAngleArcsec(text, "separation"),
    },
    angle: {
      label: "Position angle of the pair, north through east",
      text: plain(pair.positionAngleDeg, 4),
      unit: "°",
      value: pair.positionAngleDeg,
      width: 3,
      sizes: [1],
      parse: (text) => parseAngleDeg(text, "position angle"),
    },
    ratio: {
      label: "Flux ratio, fainter over brighter",
      text: fixed(pair.fluxRatio, 2),
      unit: "",
      value: pair.fluxRatio,
      width: 3.6,
      sizes: [1],
      parse: (text) => parseNumber(text, "flux ratio"),
    },
  };
}
