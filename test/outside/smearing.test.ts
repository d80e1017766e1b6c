import { smearingChecks } from "./checks/smearing.ts";
import { section } from "./section.ts";

section("Smearing and the largest scale", smearingChecks);
