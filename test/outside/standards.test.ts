import { standardsChecks } from "./checks/standards.ts";
import { section } from "./section.ts";

section("Standards", standardsChecks);
