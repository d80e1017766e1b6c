import type { AssessResult } from "../../assess/result.ts";
import type { Observation } from "../../plan/schema.ts";
import { fixed, joined, plain } from "../numbers.ts";
import { weightingText } from "../observation.ts";
import { frequencyText, type Kind, shownAs } from "../units.ts";

export interface FigureGroup {
  readonly title: string;
  /** Name, value, and what the value means or assumes. */
  readonly rows: readonly (readonly [name: string, value: string, meaning: string])[];
}

/** Every figure of a result with its meaning, for reading beside the pictures. */
export function allFigures(result: AssessResult, observation: Observation): readonly FigureGroup[] {
  const { beam, coverage, smearing, recoverable, apertureResolutionArcsec } = result;
  const of = (kind: Kind, value: number | null): string => (value === null ? "cannot be had" : shownAs(kind, value));
  const radius = of("angle", beam.sidelobeRadiusArcsec);
  return [
    {
      title: "Baselines",
      rows: [
        ["Stations, baselines", `${result.stationCount}, ${result.baselineCount}`, ""],
        [
          "Longest, shortest",
          `${of("length", result.longestBaselineM)}, ${of("length", result.shortestBaselineM)}`,
          "between stations, straight through the ground",
        ],
        [
          "Longest, shortest projected",
          `${of("length", result.longestProjectedM)}, ${of("length", result.shortestProjectedM)}`,
          "as seen from the source, over samples that count",
        ],
        ["Longest in wavelengths", of("wavelengths", result.longestUvWavelengths), "largest over channels"],
        ["Samples that count", String(result.samplesKept), "every channel; both stations see the source, neither is shadowed"],
        ["Shadowed", `${result.shadowedStationSamples} of ${result.visibleStationSamples}`, "station samples"],
        ["On the source", of("hours", result.hoursVisible), "hour angle with at least two stations seeing it"],
      ],
    },
    {
      title: "uv coverage",
      rows: [
        ["Cells filled", of("fraction", coverage.filledFraction), "of the density cells inside the longest projected baseline"],
        ["Largest radial gap", of("ratio", coverage.largestRadialGap), "ratio of neighbouring sample radii"],
        ["Azimuthal evenness", of("ratio", coverage.azimuthalUniformity), "1 is even"],
      ],
    },
    {
      title: "Beam",
      rows: [
        [
          "FWHM",
          `${of("angle", beam.majorArcsec)} × ${of("angle", beam.minorArcsec)}`,
          "fitted Gaussian, peak fixed, samples at half power and above",
        ],
        [
          "Position angle",
          beam.positionAngleDeg === null ? "cannot be had" : `${fixed(beam.positionAngleDeg, 1)}°`,
          "north through east",
        ],
        [
          "Half-power widths",
          `${of("angle", beam.halfPowerMajorArcsec)}, ${of("angle", beam.halfPowerMinorArcsec)}`,
          "longest and shortest chord of the half-power contour",
        ],
        [
          "First zero",
          beam.firstZeroMinArcsec !== null && beam.firstZeroMaxArcsec === null
            ? `from ${of("angle", beam.firstZeroMinArcsec)}`
            : `${of("angle", beam.firstZeroMinArcsec)} to ${of("angle", beam.firstZeroMaxArcsec)}`,
          beam.firstZeroMinArcsec !== null && beam.firstZeroMaxArcsec === null
            ? "nearest; in some directions there is none"
            : "nearest and farthest over all directions",
        ],
        [
          "First minimum",
          `${of("angle", beam.firstMinimumMinArcsec)} to ${of("angle", beam.firstMinimumMaxArcsec)}`,
          "end of the main lobe",
        ],
        ["Peak sidelobe", of("fraction", beam.peakSidelobe), `highest beyond the main lobe, within ${radius}`],
        ["Deepest sidelobe", of("fraction", beam.deepestSidelobe), `lowest, within ${radius}`],
        ["Sidelobe rms", of("fraction", beam.rmsSidelobe), `within ${radius}`],
        [
          "λ/b, 1.22 λ/b",
          `${of("angle", apertureResolutionArcsec.slit)}, ${of("angle", apertureResolutionArcsec.circular)}`,
          "slit and filled aperture as long as the longest projected baseline",
        ],
      ],
    },
    {
      title: "Scales",
      rows: [
        ["Largest scale", of("angle", result.largestScaleArcsec), "0.6 λ over the shortest projected baseline"],
        [
          "Gaussian, disc half seen",
          `${of("angle", recoverable.gaussianArcsec)}, ${of("angle", recoverable.discArcsec)}`,
          "visibility 0.5 on the shortest baseline",
        ],
        ["Primary beam", of("angle", result.primaryBeamArcsec), "FWHM, the smallest of the layout’s antenna kinds"],
        ["Bandwidth smearing", of("angle", smearing.bandwidthArcsec), "radius of 10 % peak loss, one channel"],
        ["Time smearing", of("angle", smearing.timeArcsec), "radius of 10 % peak loss, mean law: exact for no one direction"],
        ["Planar radius", of("angle", result.planarRadiusArcsec), "beyond it leaving w out costs more than 0.1 rad of phase"],
        [
          "Far field",
          of("length", result.fraunhoferM.antenna),
          `2D²/λ of the largest dish; of the array ${of("length", result.fraunhoferM.array)}`,
        ],
      ],
    },
    {
      title: "Band and data",
      rows: [
        [
          "Position error",
          observation.positionErrorM === null
            ? "none stated"
            : `${of("degrees", result.positionError.phaseDeg)}, ${of("fraction", result.positionError.coherence)} left`,
          "phase of a baseline, part of a point’s peak; errors that are solved for cost nothing",
        ],
        [
          "Protected band",
          of("fraction", result.protectedFraction),
          "of the band: Radio Regulations 5.149 and 5.340, below 100 GHz",
        ],
        [
          "Channel, sample",
          `${of("frequency", result.fullField.channelWidthHz)}, ${of("seconds", result.fullField.sampleS)}`,
          "at most, for 10 % loss each at the primary beam’s half level",
        ],
        ["Visibilities a second", of("count", result.fullField.visibilitiesPerS), "with those, autocorrelations too; 8 bytes each"],
      ],
    },
    {
      title: "Noise",
      rows: [
        [
          "Noise",
          of("flux", result.noiseJy),
          `one channel image, ${observation.polarizations === 2 ? "Stokes I" : "one polarization"}, efficiency ${plain(observation.efficiency)}`,
        ],
        [
          "Air, opacity, times the noise",
          observation.vapourGm3 === null
            ? "not counted"
            : `${result.air.zenithOpacity === null ? "cannot be had" : plain(result.air.zenithOpacity)}, ${of("times", result.air.noiseFactor)}`,
          observation.vapourGm3 === null
            ? "the observation gives no water vapour"
            : "clear reference air, ITU-R P.676 and P.835; counted in the noise",
        ],
        ["Brightness noise", of("temperature", result.brightnessNoiseK), "over the fitted beam"],
        ["Noise over natural", of("times", result.weightingNoiseFactor), `cost of ${weightingText(observation)}`],
      ],
    },
    {
      title: "Settings behind the weights",
      rows: [
        [
          "Weighting",
          weightingText(observation, 1),
          observation.weighting.taperArcsec === null ? "no taper" : `taper ${shownAs("angle", observation.weighting.taperArcsec)}`,
        ],
        [
          "Density field",
          of("angle", result.densityFieldArcsec),
          "cells are one over this; robust and uniform results move with it",
        ],
        ["Integration", joined(plain(observation.integrationS, 4), "s"), `${result.samplesPerBaseline} samples a baseline`],
        ["Channels", String(observation.channels), `${frequencyText(observation.bandwidthHz / observation.channels, 3)} each`],
        [
          "Pixel, size",
          beam.pixelArcsec === null ? "cannot be had" : `${of("angle", beam.pixelArcsec)}, ${beam.sizePx}`,
          "of the image the sidelobes are read from",
        ],
      ],
    },
  ];
}
