import { nearfieldChecks } from "./checks/nearfield.ts";
import { section } from "./section.ts";

section("Shadowing and the near field", nearfieldChecks);
