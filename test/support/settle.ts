import { addToDensity, densityField, emptyDensity, naturalWeight } from "../../src/engine/synthesis/density.ts";
import { extent, wavelengthsPerMetre } from "../../src/engine/synthesis/extent.ts";
import type { BeamPlane, PlaneAxes } from "../../src/engine/synthesis/plane.ts";
import { SettledBeam } from "../../src/engine/synthesis/settled.ts";
import { addToSums, emptySums } from "../../src/engine/synthesis/sums.ts";
import type { Track } from "../../src/engine/synthesis/track.ts";
import { visibility } from "../../src/engine/synthesis/visibility.ts";
import { Walk } from "../../src/engine/synthesis/walk.ts";
import { sampleWeights, type Weighting } from "../../src/engine/synthesis/weights.ts";

/** The engine's chain from a track to a settled image, as assess/ runs it, without a plan. */
export function settle(track: Track, weighting: Weighting, wantedFieldRad: number) {
  const n = track.diameterM.length;
  const seen = visibility(track);
  const walk = new Walk(track, seen);
  const spans = extent(walk);
  const perMetre = wavelengthsPerMetre(track.channelHz[track.channelHz.length - 1]);
  const maxUv = Math.max(spans.maxUM, spans.maxVM) * perMetre;
  const fieldRad = densityField(wantedFieldRad, maxUv);
  const natural = naturalWeight(track.sefdJy);
  const density = emptyDensity(fieldRad, maxUv);
  addToDensity(density, walk, natural, 0, n);
  const weights = sampleWeights(weighting, natural, density);
  const sums = emptySums();
  addToSums(sums, walk, natural, weights, 0, n);
  const plane = (axes: PlaneAxes): BeamPlane => {
    const beam = new SettledBeam(axes, spans.maxUM * perMetre, spans.maxVM * perMetre);
    const scratch = new Float64Array(track.hourAngleRad.length);
    walk.baselines(0, n, (run) => {
      for (const hz of track.channelHz) {
        weights(run, hz, scratch);
        beam.add(run, hz, scratch);
      }
    });
    return beam.finish(sums.weight);
  };
  return { seen, walk, spans, maxUv, fieldRad, density, natural, weights, sums, plane };
}
