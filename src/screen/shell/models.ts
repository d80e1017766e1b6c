import { antennaById, layoutById, observationById, stationById } from "../../plan/find.ts";
import type { Antenna } from "../../plan/schema.ts";
import { observationsOf } from "../../view/ledger/condition.ts";
import { ledgerModel } from "../../view/ledger/ledger.ts";
import { observationBox } from "../../view/observation.ts";
import type { LedgerPanelModel } from "../ledger/ledger.ts";
import type { ResolveModel } from "../resolve/model.ts";
import type { Shown } from "../store.ts";

/** Ledger and observation box of what is shown. */
export function ledgerPanel({ plan, session, outcomes, live, working, behind, dragging }: Shown): LedgerPanelModel {
  const ledger = ledgerModel({
    plan,
    layout: session.layout,
    settled: outcomes,
    live,
    working: working || (behind && outcomes.length === 0),
    dragging,
  });
  const observation = observationById(plan, session.observation);
  const lines = plan.requirements.filter((line) => !line.when.layouts || line.when.layouts.includes(session.layout));
  const uses = lines.filter((line) => observationsOf(plan, line).some((o) => o.id === observation.id)).length;
  return {
    ledger,
    selected: session.line,
    observation: observationBox(observation, uses, lines.length),
    observations: plan.observations.map(({ id, label }) => ({ id, label: label || id })),
  };
}

/** What the panels of the Resolve task are drawn from. */
export function resolveModel(shown: Shown): ResolveModel {
  const { plan, session, picture, working } = shown;
  const kinds = new Map<string, Antenna>();
  for (const id of layoutById(plan, session.layout).stations) {
    const antenna = antennaById(plan, stationById(plan, id).antenna);
    kinds.set(antenna.id, antenna);
  }
  return {
    plan,
    layout: session.layout,
    observation: observationById(plan, session.observation),
    antennas: [...kinds.values()],
    picture,
    working,
    pair: session.pair,
    theme: session.theme,
    uvHalfWavelengths: shown.uvHalfWavelengths,
    beamHalfArcsec: shown.beamHalfArcsec,
    declinations: shown.declinations,
    sweeping: shown.sweeping,
  };
}
