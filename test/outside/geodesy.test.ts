import { geodesyChecks } from "./checks/geodesy.ts";
import { section } from "./section.ts";

section("Geodesy", geodesyChecks);
