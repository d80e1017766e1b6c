import { beamAt, fitLobe, SettledBeam, squareAxes } from "spanwright/beam";

// Samples along u and v, 1 to 20 wavelengths, all of one weight: a cross-shaped beam.
const lengths = Float64Array.from({ length: 20 }, (_, k) => k + 1);
const none = new Float64Array(20);
const weights = new Float64Array(20).fill(1);
const hz = 299_792_458; // a metre of wavelength, so that metres are wavelengths

const beam = new SettledBeam(squareAxes(256, 0.002), 20, 20);
for (const [uM, vM] of [
  [lengths, none],
  [none, lengths],
]) {
  beam.add({ i: 0, j: 1, count: 20, uM, vM, wM: none }, hz, weights);
}
const image = beam.finish(40);
const lobe = fitLobe(image);
console.log(`peak ${beamAt([image])(0, 0).toFixed(4)}, FWHM ${(1000 * (lobe?.majorRad ?? Number.NaN)).toFixed(2)} mrad`);
// prints: peak 1.0000, FWHM 44.05 mrad
