import { DomainError } from "../../base/errors.ts";

/** @throws {@link DomainError} unless every value named is finite. */
export function checkFinite(values: { readonly [field: string]: number }): void {
  for (const field in values) {
    if (!Number.isFinite(values[field])) throw new DomainError(field, values[field], "a finite number");
  }
}

/** @throws {@link DomainError} unless every angle named (a latitude, declination, elevation) lies in [−π/2, π/2]. */
export function checkQuarter(angles: { readonly [field: string]: number }): void {
  for (const field in angles) {
    if (!(Math.abs(angles[field]) <= Math.PI / 2)) {
      throw new DomainError(field, angles[field], "radians in [-π/2, π/2]", "Were degrees passed?");
    }
  }
}
