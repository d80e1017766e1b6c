import { weightingChecks } from "./checks/weighting.ts";
import { section } from "./section.ts";

section("Weighting", weightingChecks);
