import { baselineChecks } from "./checks/baselines.ts";
import { section } from "./section.ts";

section("Baselines and (u, v, w)", baselineChecks);
