import type { Checkpoint } from "../base/checkpoint.ts";
import { inBlocks } from "../engine/synthesis/blocks.ts";
import {
  addToDensity,
  type DensityGrid,
  densityField,
  emptyDensity,
  type NaturalWeight,
  naturalWeight,
} from "../engine/synthesis/density.ts";
import { type Extent, extent, wavelengthsPerMetre } from "../engine/synthesis/extent.ts";
import type { BeamPlane, PlaneAxes } from "../engine/synthesis/plane.ts";
import { SettledBeam } from "../engine/synthesis/settled.ts";
import { addToSums, emptySums, type WeightSums } from "../engine/synthesis/sums.ts";
import { type Visibility, visibility } from "../engine/synthesis/visibility.ts";
import { Walk } from "../engine/synthesis/walk.ts";
import { type SampleWeights, sampleWeights } from "../engine/synthesis/weights.ts";
import type { Setup } from "./setup.ts";

/** The samples of a setup, weighed: all that a beam or a noise figure is made from. Samples themselves are never held. */
export interface Synthesis {
  readonly setup: Setup;
  readonly seen: Visibility;
  readonly walk: Walk;
  readonly extent: Extent;
  /** Wavelengths per metre at the highest channel: lengths in wavelengths are the largest over channels. */
  readonly topPerMetre: number;
  readonly density: DensityGrid;
  readonly natural: NaturalWeight;
  readonly weights: SampleWeights;
  readonly sums: WeightSums;
}

/** Visibility, extent, density and weight sums: the passes that every figure needs. */
export async function synthesize(setup: Setup, checkpoint?: Checkpoint): Promise<Synthesis> {
  const { track } = setup;
  const stationCount = setup.stations.length;
  const seen = visibility(track);
  await checkpoint?.(0.05);
  const walk = new Walk(track, seen);
  const spans = extent(walk);
  await checkpoint?.(0.1);
  const topPerMetre = wavelengthsPerMetre(track.channelHz[track.channelHz.length - 1]);
  const maxUv = Math.max(spans.maxUM, spans.maxVM) * topPerMetre;
  const density = emptyDensity(densityField(setup.fieldRad, maxUv), maxUv);
  const natural = naturalWeight(track.sefdJy);
  await inBlocks(stationCount, (from, to) => addToDensity(density, walk, natural, from, to), checkpoint, 0.1, 0.2);
  const weights = sampleWeights(setup.weighting, natural, density);
  const sums = emptySums();
  await inBlocks(stationCount, (from, to) => addToSums(sums, walk, natural, weights, from, to), checkpoint, 0.2, 0.3);
  return { setup, seen, walk, extent: spans, topPerMetre, density, natural, weights, sums };
}

/** A settled image of the beam. */
export async function settledPlane(
  synthesis: Synthesis,
  axes: PlaneAxes,
  checkpoint: Checkpoint | undefined,
  fromDone: number,
  toDone: number,
): Promise<BeamPlane> {
  const { setup, walk, weights, extent: spans, topPerMetre, sums } = synthesis;
  const beam = new SettledBeam(axes, spans.maxUM * topPerMetre, spans.maxVM * topPerMetre);
  const scratch = new Float64Array(setup.track.hourAngleRad.length);
  const add = (from: number, to: number): void =>
    walk.baselines(from, to, (run) => {
      for (const channelHz of setup.track.channelHz) {
        weights(run, channelHz, scratch);
        beam.add(run, channelHz, scratch);
      }
    });
  await inBlocks(setup.stations.length, add, checkpoint, fromDone, toDone - 0.2 * (toDone - fromDone));
  const plane = beam.finish(sums.weight);
  await checkpoint?.(toDone);
  return plane;
}
