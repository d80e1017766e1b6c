import type { Observation, Plan, Requirement } from "../../plan/schema.ts";
import { plain } from "../numbers.ts";
import { declinationShort, wavelengthM, weightingText } from "../observation.ts";
import { quantityWords } from "../quantities.ts";
import { frequencyText, shownAs, wavelengthText } from "../units.ts";

/** Observations a line speaks of; with none named, all of the plan's. */
export function observationsOf(plan: Plan, line: Requirement): readonly Observation[] {
  return line.when.observation ? plan.observations.filter((o) => o.id === line.when.observation) : plan.observations;
}

/** Under which conditions a line holds, in the few words there is room for: "δ −30°, 21 cm, robust 0". */
export function conditionText(plan: Plan, line: Requirement): string {
  const { when } = line;
  const observations = observationsOf(plan, line);
  const observation = observations[0];
  const parts: string[] = [];
  if (when.without) parts.push(when.without === 1 ? "any one station out" : "any two stations out");
  if (when.aboveElevationDeg !== undefined) parts.push(`above ${plain(when.aboveElevationDeg)}°`);
  if (when.pair) {
    parts.push(`${shownAs("angle", when.pair.separationArcsec)} apart at PA ${plain(when.pair.positionAngleDeg)}°`);
    if (when.pair.fluxRatio !== 1) parts.push(`fluxes 1 : ${plain(when.pair.fluxRatio)}`);
  }
  if (when.declinationDeg) parts.push(`${declinationShort(when.declinationDeg.from)} to ${plain(when.declinationDeg.to, 4)}°`);
  if (when.wavelengthM) parts.push(`${wavelengthText(when.wavelengthM.from)} to ${wavelengthText(when.wavelengthM.to)}`);
  if (observations.length > 1 && !when.observation) return [...parts, `worst of ${observations.length} observations`].join(", ");
  if (!observation) return parts.join(", ");
  for (const what of quantityWords(line.quantity).depends) {
    if (what === "target" && !when.declinationDeg) parts.push(declinationShort(observation.declinationDeg));
    if (what === "wavelength" && !when.wavelengthM) parts.push(wavelengthText(wavelengthM(observation), 2));
    if (what === "weighting") parts.push(weightingText(observation));
    if (what === "bandwidth") parts.push(frequencyText(observation.bandwidthHz, 3));
    if (what === "radius") {
      const radius = when.sidelobeRadiusArcsec ?? observation.image.sidelobeRadiusArcsec;
      parts.push(radius === null ? "within 20 beam widths" : `within ${plain(radius)}″`);
    }
    if (what === "sign") parts.push("either sign");
  }
  return parts.join(", ");
}
