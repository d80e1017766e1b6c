import { beamChecks } from "./checks/beams.ts";
import { section } from "./section.ts";

section("Closed-form beams", beamChecks);
