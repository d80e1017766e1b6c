import { timeChecks } from "./checks/time.ts";
import { section } from "./section.ts";

section("Time and Earth rotation", timeChecks);
