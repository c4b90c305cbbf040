import { AU_KM } from "../bodies/constants.ts";

/** Share of the last printed place that a half-width may reach, as for times (`printedUnit`). */
const SHARE = 1 / 8;
/** Finest place that is printed, km. */
const FINEST_KM = 1;

/** A distance as it may be printed: plain decimals, no grouping. */
export interface PrintedDistance {
  readonly km: string;
  readonly au: string;
  /** Decimals of `km`: nought, or below it for tens, hundreds and so on. */
  readonly kmDigits: number;
  /** Decimals of `au`. */
  readonly auDigits: number;
}

/**
 * Rounds a distance to the finest power of ten, in km and in au, that its uncertainty defends.
 *
 * Two things are asked of the last place: the half-width is at most an eighth of it, and both ends of the distance's interval round to the same
 * value. Instants fall anywhere within their minute, so an eighth alone keeps 95 % of them right; the distances of a body do not spread
 * so. Mercury's perihelia all lie within 500 km of 0.3075 au, on the very edge between 0.307 and 0.308, and there every second
 * value would be wrong. With the second condition each printed value by itself is right with the 95 % of its half-width.
 *
 * Nothing finer than 1 km, nor than the 1e-8 au next above it, is printed.
 *
 * @param km          distance, km
 * @param uncertainty half-width that at least 95 % of such distances keep, km
 */
export function printedDistance(km: number, uncertainty: number): PrintedDistance {
  const kmDigits = 0 - exponentFor(km, uncertainty, FINEST_KM);
  const auDigits = Math.max(0, 0 - exponentFor(km / AU_KM, uncertainty / AU_KM, FINEST_KM / AU_KM));
  const step = 10 ** -kmDigits;
  return {
    km: (Math.round(km / step) * step).toFixed(0),
    au: (km / AU_KM).toFixed(auDigits),
    kmDigits,
    auDigits,
  };
}

/** The exponent of the finest place; a hair is forgiven, since log10 of a power of ten may be off by a bit. */
function exponentFor(value: number, uncertainty: number, finest: number): number {
  const exponent = Math.ceil(Math.log10(Math.max(finest, uncertainty / SHARE)) - 1e-12);
  const place = 10 ** exponent;
  const agree = Math.round((value - uncertainty) / place) === Math.round((value + uncertainty) / place);
  // the edges of the next place lie half a place away from those of this one
  return agree ? exponent : exponent + 1;
}
