import { DomainError } from "../../base/errors.ts";
import { betaOfLoss } from "./loss.ts";
import { TIME_LOSS } from "./scales.ts";

/** What a wanted field asks of channels and samples. */
export interface FieldNeeds {
  /** Widest channel and longest sample that keep the loss at the field's edge, Hz and seconds. */
  readonly channelWidthHz: number;
  readonly sampleS: number;
}

/**
 * The widest channel and longest sample that lose no more than `loss` of a point source's peak at the edge of a field, each by
 * itself (Bridle & Schwab 1999; the time law is the mean over directions).
 */
export function fieldNeeds(fieldRadiusRad: number, fwhmRad: number, frequencyHz: number, loss: number): FieldNeeds {
  if (!(fieldRadiusRad > 0)) throw new DomainError("fieldRadiusRad", fieldRadiusRad, "radians above 0");
  if (!(loss > 0 && loss < 1)) throw new DomainError("loss", loss, "a fraction above 0 and below 1");
  const widths = fieldRadiusRad / fwhmRad;
  return { channelWidthHz: (betaOfLoss(loss) * frequencyHz) / widths, sampleS: Math.sqrt(loss / TIME_LOSS) / widths };
}

/** What a correlator has to do, and what leaves it. */
export interface CorrelatorLoad {
  readonly channels: number;
  /** Visibilities a second: baselines, autocorrelations too, × channels × products / sample. */
  readonly visibilitiesPerS: number;
  readonly bytesPerS: number;
  /** Complex multiply-adds a second of the cross products, and real operations of the channels' Fourier transforms. */
  readonly crossPerS: number;
  readonly transformPerS: number;
}

/**
 * The load of a correlator that transforms first and multiplies then (Thompson, Moran & Swenson, 3rd ed., ch. 8).
 *
 * @param products - 1, 2 or 4 polarization products of two receptors (1: of one).
 * @param bytesPerVisibility - 8 for a pair of single floats, common practice.
 */
export function correlatorLoad(
  stations: number,
  bandwidthHz: number,
  needs: FieldNeeds,
  products: 1 | 2 | 4,
  bytesPerVisibility = 8,
): CorrelatorLoad {
  if (!(stations >= 1 && Number.isInteger(stations))) throw new DomainError("stations", stations, "a whole number of 1 or more");
  if (!(bandwidthHz > 0)) throw new DomainError("bandwidthHz", bandwidthHz, "a bandwidth above 0 Hz");
  const channels = Math.max(1, Math.ceil(bandwidthHz / needs.channelWidthHz));
  const pairs = (stations * (stations + 1)) / 2;
  const receptors = products === 1 ? 1 : 2;
  const visibilitiesPerS = (pairs * channels * products) / needs.sampleS;
  return {
    channels,
    visibilitiesPerS,
    bytesPerS: visibilitiesPerS * bytesPerVisibility,
    // Complex samples of the band come Δν a second; each is multiplied once a pair and product.
    crossPerS: pairs * products * bandwidthHz,
    // 5 N log₂ N real operations for N complex points (Cooley & Tukey 1965), bandwidth/N transforms a second.
    transformPerS: 5 * stations * receptors * bandwidthHz * Math.log2(Math.max(2, channels)),
  };
}
