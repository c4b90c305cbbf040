import { DAY_SECONDS } from "../bodies/constants.ts";
import type { Pair } from "../bodies/pair.ts";
import { POINTS } from "../bodies/point.ts";
import type { Accuracy, AccuracyBasis } from "./source.ts";

/**
 * How far the built-in kernel may be from the truth about the Sun's centre (the Moon: about the Earth's).
 *
 * `seconds` is the most by which passages of 1960–2059 differ between kindred ephemerides: DE405 against DE200 (Debian's
 * `casacore-data-jpl-de200`; twenty years of data less) or against an ephemeris made from DE431, whichever is more; for Uranus and
 * beyond DE200 is set aside, which was made before Voyager 2 passed there. `acceleration`, km/d², is the median range
 * acceleration at DE405's passages (Neptune, whose five differ tenfold: between the least and the median); the product of the
 * two is the range-rate error that passages inherit. `km` is the most by which the distances there differ between DE405 and DE200; for Uranus and
 * beyond twice the range-rate error over the mean motion. These are bounds between kindred ephemerides, not samples of a law; the
 * refit of the built-in kernel (up to 0.1 s, Neptune 1.1 s, and 0.7 m) lies inside them.
 */
const ABOUT_SUN: Record<string, { seconds: number; acceleration: number; km: number }> = {
  earth: { seconds: 1, acceleration: 790, km: 0.06 },
  emb: { seconds: 0.6, acceleration: 760, km: 0.06 },
  moon: { seconds: 2, acceleration: 1190, km: 0.007 },
  mercury: { seconds: 0.25, acceleration: 41_800, km: 0.07 },
  venus: { seconds: 0.3, acceleration: 570, km: 0.25 },
  mars: { seconds: 0.5, acceleration: 2160, km: 0.6 },
  jupiter: { seconds: 150, acceleration: 86, km: 50 },
  saturn: { seconds: 470, acceleration: 29, km: 600 },
  uranus: { seconds: 1500, acceleration: 5.7, km: 1000 },
  neptune: { seconds: 23_400, acceleration: 0.4, km: 2100 },
  pluto: { seconds: 4200, acceleration: 13, km: 18_000 },
};

/**
 * How far the solar-system barycentre itself may lie from where DE405 has it, km.
 *
 * The masses beyond Neptune were not in DE405; counting them moves the barycentre by about 100 km (R. S. Park et al.,
 * *The JPL planetary and lunar ephemerides DE440 and DE441*, Astron. J. 161 (2021) 105; from memory). The line of sight turns once
 * an orbit, so a fixed shift enters the range rate as shift × mean motion.
 */
const BARYCENTRE_SHIFT_KM = 150;

/**
 * Gives the accuracy of the built-in kernel.
 *
 * @param pair  any pair that the kernel supplies
 * @param basis `measured` for the built-in kernel itself; what it is lent to says otherwise
 * @returns half-widths of range (km) and range rate (km/s) that at least 95 % of true errors keep
 */
export function kernelAccuracy(pair: Pair, basis: AccuracyBasis): Accuracy {
  const orbiter = pair.name.split("-")[0] ?? "";
  const figures = ABOUT_SUN[orbiter] ?? { seconds: 60, acceleration: 1000, km: 100 };
  const rate = (figures.seconds * figures.acceleration) / DAY_SECONDS ** 2;
  if (pair.centre !== POINTS.ssb) return { rangeKm: figures.km, rangeRateKmS: rate, basis };
  const meanMotion = Math.PI / pair.halfPeriodSeconds;
  return {
    rangeKm: Math.hypot(figures.km, BARYCENTRE_SHIFT_KM),
    rangeRateKmS: Math.hypot(rate, BARYCENTRE_SHIFT_KM * meanMotion),
    basis,
  };
}
