import { sensitivityChecks } from "./checks/sensitivity.ts";
import { section } from "./section.ts";

section("Sensitivity", sensitivityChecks);
