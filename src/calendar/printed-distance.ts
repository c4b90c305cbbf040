import { AU_KM } from "../bodies/constants.ts";

/** Share of the last printed place that a half-width may reach, as for times: see `printedUnit`, whose proof holds for any unit. */
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
 * The half-width is at most an eighth of the last place, so that at least 95 % of printed values are right, for the same reason as with
 * times; nothing finer than 1 km, nor than the 1e-8 au next above it, is printed.
 *
 * @param km          distance, km
 * @param uncertainty half-width that at least 95 % of such distances keep, km
 */
export function printedDistance(km: number, uncertainty: number): PrintedDistance {
  const placeKm = Math.max(FINEST_KM, uncertainty / SHARE);
  const kmDigits = 0 - exponentFor(placeKm);
  const auDigits = Math.max(0, 0 - exponentFor(placeKm / AU_KM));
  const step = 10 ** -kmDigits;
  return {
    km: (Math.round(km / step) * step).toFixed(0),
    au: (km / AU_KM).toFixed(auDigits),
    kmDigits,
    auDigits,
  };
}

/** The least whole exponent whose power of ten reaches a place; a hair is forgiven, since log10 of a power of ten may be off by a bit. */
function exponentFor(place: number): number {
  return Math.ceil(Math.log10(place) - 1e-12);
}
