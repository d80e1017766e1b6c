import { layoutChecks } from "./checks/layouts.ts";
import { section } from "./section.ts";

section("Layouts", layoutChecks);
