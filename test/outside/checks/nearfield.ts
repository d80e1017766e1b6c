import { RAD_PER_DEG } from "../../../src/base/constants.ts";
import { fraunhoferM, planeFieldRad } from "../../../src/engine/measure/nearfield.ts";
import { hiddenPart, shadeElevationRad } from "../../../src/engine/measure/shade.ts";
import { SHADOWED, visibility } from "../../../src/engine/synthesis/visibility.ts";
import { trackOf } from "../../support/track.ts";
import { checksOf, type Left } from "../check.ts";
import rows from "../data/nearfield.json" with { type: "json" };

/** The highest elevation at which a pair in line with the setting source shades itself: two stations east and west on the equator. */
function shadedUpToDeg(diameterM: number, spacingM: number): number {
  const enu = [
    [0, 0, 0],
    [spacingM, 0, 0],
  ];
  // A snapshot every second of the setting hours; on the equator, on the equator of the sky, elevation is 90° less the hour angle.
  const track = trackOf(enu, { latitudeDeg: 0, decDeg: 0, fromH: 1, toH: 6, integrationS: 1, lowestDeg: 0, diameterM });
  const { flags } = visibility(track);
  const times = track.hourAngleRad.length;
  for (let k = 0; k < times; k++) {
    if (flags[k] === SHADOWED || flags[times + k] === SHADOWED) return 90 - track.hourAngleRad[k] / RAD_PER_DEG;
  }
  return Number.NaN;
}

/** Section 9: shadowing and the near field. */
export const nearfieldChecks = checksOf(rows, {
  N02: () => [shadeElevationRad(25, 35), shadeElevationRad(12, 15)].map((rad) => rad / RAD_PER_DEG),
  N02b: () => [shadedUpToDeg(25, 35), shadedUpToDeg(12, 15)],
  N03: () => [0.25, 0.5, 0.75, 0.9].map((t) => hiddenPart(t, 1)),
  N03b: () => [hiddenPart(0.4039727532995172, 1)],
  N04: () => [fraunhoferM(25, 0.21)],
  N05: () => [(planeFieldRad(0.2, 36_400) / RAD_PER_DEG) * 60],
});

export const nearfieldLeft: Left = {
  N01: "the criterion itself: its property tests stand with the engine's visibility",
  N06: "no trench network yet",
  N07: "no trench network yet",
  N08: "no trench network yet",
};
