import type { Span } from "../ephemeris/source.ts";
import { brentZero } from "../numeric/brent-zero.ts";
import type { RangeFunction } from "./range-function.ts";

/** Half-width of an instant, seconds, and whether the extremum could merge with a neighbour. */
export interface TimeUncertainty {
  readonly seconds: number;
  readonly existence: "certain" | "uncertain";
}

/** Up to this share of the sampling step the range rate is as good as straight and the first order serves. */
const STRAIGHT_SHARE = 0.02;
/** Seconds to which the ends of the interval are found where it is walked. */
const END_TOLERANCE = 1;

/**
 * Gives the half-width of the instant of an extremum: how far on either side the range rate stays within its error.
 *
 * In first order that is error ÷ |range acceleration|. Where this comes to more than a fiftieth of the sampling step, the interval
 * is walked outwards, and its longer side is given; where a neighbouring extremum is passed before the range rate leaves its
 * error, the two could merge, and `existence` is uncertain.
 *
 * @param range        the distance function
 * @param span         where it may be evaluated; the walk stops at its ends
 * @param tdb          the extremum, TDB seconds past J2000
 * @param acceleration range acceleration there, km/s²
 * @param rateError    half-width of the range rate's error, km/s
 * @param step         sampling step of the pair, seconds
 * @param limit        seconds at which the walk ends
 */
export function timeUncertainty(
  range: RangeFunction,
  span: Span,
  tdb: number,
  acceleration: number,
  rateError: number,
  step: number,
  limit: number,
): TimeUncertainty {
  const firstOrder = rateError / Math.abs(acceleration);
  if (firstOrder < STRAIGHT_SHARE * step || !range.givesRate) return { seconds: firstOrder, existence: "certain" };
  const rising = acceleration > 0 ? 1 : -1;
  let existence: TimeUncertainty["existence"] = "certain";
  let seconds = 0;
  for (const side of [-1, 1]) {
    // `outward` grows from zero as long as no neighbour is passed
    const outward = (t: number) => side * rising * range.rate(t);
    let near = tdb;
    let far = tdb;
    let value = 0;
    do {
      near = far;
      far = Math.min(Math.max(far + (side * step) / 4, span.from), span.to);
      value = outward(far);
      if (value < 0) existence = "uncertain";
    } while (Math.abs(value) < rateError && far !== near && Math.abs(far - tdb) < limit);
    let end = far;
    if (Math.abs(value) > rateError) {
      const sign = value < 0 ? -1 : 1;
      const excess = (t: number) => sign * outward(t) - rateError;
      end = brentZero(excess, near, excess(near), far, excess(far), END_TOLERANCE);
      if (Number.isNaN(end)) end = far;
    }
    seconds = Math.max(seconds, Math.abs(end - tdb));
  }
  return { seconds, existence };
}
