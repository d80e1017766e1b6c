import { fitsChecks } from "./checks/fits.ts";
import { section } from "./section.ts";

section("FITS", fitsChecks);
