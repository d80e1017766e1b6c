import { sampleTimes, type Track, visibility, Walk } from "spanwright/tracks";

// Three stations on the equator, 1 km apart to the east, looking at the pole of the sky for an hour.
const { hourAngleRad, sampleS } = sampleTimes(-0.5, 0.5, 600);
const track: Track = {
  stationXyzM: Float64Array.of(0, 0, 0, 0, 1000, 0, 0, 3000, 0),
  normals: Float64Array.of(1, 0, 0, 1, 0, 0, 1, 0, 0),
  diameterM: new Float64Array(3).fill(12),
  sefdJy: null,
  lowestRad: new Float64Array(3).fill(0),
  highestRad: new Float64Array(3).fill(Math.PI / 2),
  decRad: 0.5,
  hourAngleRad,
  sampleS,
  frequencyHz: 1.42e9,
  channelHz: Float64Array.of(1.42e9),
  channelWidthHz: 1e6,
};
const walk = new Walk(track, visibility(track));
walk.baselines(0, 3, ({ i, j, count, uM }) => {
  console.log(`${i}-${j}: ${count} samples, u from ${uM[0].toFixed(1)} to ${uM[count - 1].toFixed(1)} m`);
});
// prints: 0-1: 6 samples, u from 994.1 to 994.1 m
// prints: 0-2: 6 samples, u from 2982.2 to 2982.2 m
// prints: 1-2: 6 samples, u from 1988.1 to 1988.1 m
