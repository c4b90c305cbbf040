import type { PairName } from "../../bodies/pair.ts";
import type { ApsisKind } from "../../bodies/term.ts";

/** Julian date (TD) of J2000.0. */
const J2000 = 2_451_545;

/** Epoch (JD), period (d), square term (d) by planet; passage k is a perihelion for whole k, an aphelion for k + ½. */
const MEAN: Partial<Record<PairName, readonly [number, number, number]>> = {
  "mercury-sun": [2_451_590.257, 87.969_349_63, 0],
  "venus-sun": [2_451_738.233, 224.700_818_8, -0.000_000_032_7],
  "emb-sun": [2_451_547.507, 365.259_635_8, 0.000_000_015_6],
  "earth-sun": [2_451_547.507, 365.259_635_8, 0.000_000_015_6],
  "mars-sun": [2_452_195.026, 686.995_785_7, -0.000_000_118_7],
  "jupiter-sun": [2_455_636.936, 4332.897_065, 0.000_136_7],
  "saturn-sun": [2_452_830.12, 10_764.216_76, 0.000_827],
  "uranus-sun": [2_470_213.5, 30_694.876_7, -0.005_41],
  "neptune-sun": [2_468_895.1, 60_190.33, 0.034_29],
};

/** Arguments (degrees) and amplitudes (days, perihelion and aphelion) by which the Earth's centre departs from the barycentre's mean passage. */
const EARTH: readonly (readonly [number, number, number, number])[] = [
  [328.41, 132.788_585, 1.278, -1.352],
  [316.13, 584.903_153, -0.055, 0.061],
  [346.2, 450.380_738, -0.091, 0.062],
  [136.95, 659.306_737, -0.056, 0.029],
  [249.52, 329.653_368, -0.045, 0.031],
];

/** The formulae that handbooks give. */
export type HandbookFormula = "mean" | "corrected";

/**
 * Gives the time of a passage by the mean-motion formula of the handbooks, TT seconds past J2000, nearest to a time; `null` for pairs that have none.
 *
 * @param formula `mean` motion alone; `corrected`, for the Earth only, with the five terms of its centre
 *
 * Source: J. Meeus, *Astronomical Algorithms*, 2nd ed., chapter 38 (from memory; hours off for the Earth, up to weeks for the slow planets).
 */
export function handbookPassage(pair: PairName, kind: ApsisKind, tdb: number, formula: HandbookFormula): number | null {
  const mean = MEAN[pair];
  if (!mean || (formula === "corrected" && pair !== "earth-sun")) return null;
  const [epoch, period, square] = mean;
  const half = kind === "periapsis" ? 0 : 0.5;
  const k = Math.round((J2000 + tdb / 86_400 - epoch) / period - half) + half;
  let jd = epoch + period * k + square * k * k;
  if (formula === "corrected") {
    for (const [at, rate, perihelion, aphelion] of EARTH) {
      jd += (half === 0 ? perihelion : aphelion) * Math.sin(((at + rate * k) * Math.PI) / 180);
    }
  }
  return (jd - J2000) * 86_400;
}
