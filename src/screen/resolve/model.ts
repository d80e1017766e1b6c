import type { Picture } from "../../assess/result.ts";
import type { Antenna, Observation, Pair, Plan } from "../../plan/schema.ts";
import type { DeclinationSweep } from "../store.ts";
import type { Theme } from "../tokens.ts";

/** What every panel of the Resolve task is drawn from. */
export interface ResolveModel {
  readonly plan: Plan;
  readonly layout: string;
  readonly observation: Observation;
  /** Kinds of the layout's antennas. */
  readonly antennas: readonly Antenna[];
  readonly picture: Picture | null;
  /** The picture is of an earlier state, and its successor has been waited for longer than a moment. */
  readonly working: boolean;
  readonly pair: Pair;
  readonly theme: Theme;
  readonly uvHalfWavelengths: number | null;
  readonly beamHalfArcsec: number | null;
  readonly declinations: DeclinationSweep | null;
  readonly sweeping: number | null;
}
