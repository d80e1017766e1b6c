import type { Left, OutsideCheck } from "./check.ts";
import { baselineChecks } from "./checks/baselines.ts";
import { beamChecks, beamsLeft } from "./checks/beams.ts";
import { fitsChecks, fitsLeft } from "./checks/fits.ts";
import { geodesyChecks } from "./checks/geodesy.ts";
import { layoutChecks, layoutsLeft } from "./checks/layouts.ts";
import { nearfieldChecks, nearfieldLeft } from "./checks/nearfield.ts";
import { sensitivityChecks, sensitivityLeft } from "./checks/sensitivity.ts";
import { smearingChecks, smearingLeft } from "./checks/smearing.ts";
import { standardsChecks, standardsLeft } from "./checks/standards.ts";
import { timeChecks, timeLeft } from "./checks/time.ts";
import { weightingChecks, weightingLeft } from "./checks/weighting.ts";

/** Checks of one subject, and the rows of their sources that the program does not answer. */
export interface Section {
  readonly title: string;
  readonly checks: readonly OutsideCheck[];
  readonly left: Left;
}

/** Every section, in the order they are printed. A new file in `checks/` needs a line here and a test file of its own. */
export const sections: readonly Section[] = [
  { title: "Geodesy", checks: geodesyChecks, left: {} },
  { title: "Time, Earth rotation, directions", checks: timeChecks, left: timeLeft },
  { title: "Baselines and uv coordinates", checks: baselineChecks, left: {} },
  { title: "Closed-form beams", checks: beamChecks, left: beamsLeft },
  { title: "Layouts", checks: layoutChecks, left: layoutsLeft },
  { title: "Sensitivity", checks: sensitivityChecks, left: sensitivityLeft },
  { title: "Smearing and the largest scale", checks: smearingChecks, left: smearingLeft },
  { title: "Weighting", checks: weightingChecks, left: weightingLeft },
  { title: "Shadowing and the near field", checks: nearfieldChecks, left: nearfieldLeft },
  { title: "Standards", checks: standardsChecks, left: standardsLeft },
  { title: "FITS", checks: fitsChecks, left: fitsLeft },
];
