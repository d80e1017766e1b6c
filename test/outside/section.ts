import { describe, expect, it } from "vitest";
import { evaluate, type OutsideCheck } from "./check.ts";

/** One test of every check of a section. */
export function section(title: string, checks: readonly OutsideCheck[]): void {
  describe(title, () => {
    for (const check of checks) testOf(check);
  });
}

/** The test of one check, its title showing what is compared with whose figure. */
export function testOf(check: OutsideCheck): void {
  it(`${check.id} ${check.quantity} (${check.status}: ${check.source})`, () => {
    for (const [k, { ours, theirs, difference, tolerance }] of evaluate(check).comparisons.entries()) {
      const told = `figure ${k}: ours ${ours}, theirs ${theirs}, tolerance ${tolerance}, ${check.toleranceReason}`;
      expect(difference, told).toBeLessThanOrEqual(tolerance);
    }
  });
}
