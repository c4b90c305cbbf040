import { DAY_SECONDS } from "../bodies/constants.ts";
import type { Pair } from "../bodies/pair.ts";
import { POINTS } from "../bodies/point.ts";
import { ApsidaryError } from "../error.ts";
import type { Accuracy } from "./source.ts";

/**
 * Years at which the figures of the planets stand; between them they run straight. The stretch from 1960 to 2060 is
 * DE405's.
 */
const YEARS = [1000, 1250, 1500, 1750, 1960, 2060, 2250, 2500, 2750, 3000] as const;

type Figures = readonly [number, number, number, number, number, number, number, number, number, number];

/**
 * Half-widths about the Sun's centre at `YEARS`: of the range rate at passages (mm/s), and of the distance there (km).
 *
 * 1960–2060: measured against DE405. The other centuries: measured against an integration that carries on from
 * DE405's states (`src/data/make/series/measure-accuracy.ts`), which lies far closer to DE405 than the series do;
 * what DE405's own states are off adds little to it. For the pairs with fewer than 100 passages a century the figures
 * are bounds that all passages kept, for the others what 95 % in each century kept. The theory's own statement is
 * wider: P. Bretagnon and G. Francou, Astron. Astrophys. 202 (1988) 309, give 1″ over 4000 years on either side of
 * J2000 for Mercury to Mars, over 2000 for Jupiter and Saturn, over 6000 for Uranus and Neptune (from memory).
 */
const ABOUT_SUN: Readonly<Record<string, { readonly rate: Figures; readonly range: Figures }>> = {
  mercury: {
    rate: [40, 29, 19, 9, 2.3, 3.2, 8.5, 13, 16, 18],
    range: [1.7, 1.4, 0.9, 0.6, 0.25, 0.25, 0.5, 1, 1.5, 2.2],
  },
  venus: {
    rate: [1.25, 1.3, 1.2, 1.15, 1.15, 1.15, 1.3, 1.5, 1.4, 1.3],
    range: [3.6, 2, 2.1, 1.7, 1.4, 1.4, 1.9, 2.1, 2.6, 5.4],
  },
  earth: {
    rate: [7, 5.3, 4.4, 3.4, 3.25, 3.25, 3.3, 3.4, 5.2, 7.2],
    range: [15, 5, 2.9, 2.9, 2.4, 2.4, 2.4, 4, 4.5, 14],
  },
  emb: {
    rate: [7, 5.3, 4.4, 3.4, 3.25, 3.25, 3.3, 3.4, 5.2, 7.2],
    range: [15, 5, 2.9, 2.9, 2.4, 2.4, 2.4, 4, 4.5, 14],
  },
  mars: {
    rate: [14.5, 13, 9.5, 4.5, 2.2, 2.2, 10, 25, 42, 58],
    range: [90, 40, 14, 14, 6.5, 6.5, 14, 24, 16, 55],
  },
  jupiter: {
    rate: [7.5, 7.5, 7, 6.5, 5.2, 5.2, 6, 7, 8, 9.5],
    range: [320, 300, 200, 190, 150, 150, 220, 330, 350, 320],
  },
  saturn: {
    rate: [27, 16, 26, 12, 10, 10, 14.5, 16.5, 15, 20],
    range: [450, 450, 500, 650, 650, 650, 650, 650, 650, 800],
  },
  uranus: {
    rate: [50, 45, 42, 44, 44, 44, 50, 85, 110, 125],
    range: [40_000, 35_000, 23_000, 13_000, 9500, 9500, 19_000, 26_000, 27_000, 27_000],
  },
  neptune: {
    rate: [60, 60, 65, 75, 75, 75, 60, 55, 55, 55],
    range: [19_000, 18_000, 17_000, 16_000, 16_000, 16_000, 18_000, 19_000, 20_000, 21_000],
  },
};

/**
 * How far the Sun may be off from the barycentre of the planets, Pluto and the Sun, km, at `YEARS`: the errors of
 * Uranus and Neptune, by their masses. Measured likewise.
 */
const SUN_SHIFT_KM: Figures = [40, 34, 20, 11, 6, 6, 12, 19, 26, 38];

/**
 * How far the solar-system barycentre itself may lie from where these masses put it, km: as in the accuracy of the
 * built-in kernel, for the masses beyond Neptune (R. S. Park et al., *The JPL planetary and lunar ephemerides DE440
 * and DE441*, Astron. J. 161 (2021) 105; from memory).
 */
const BARYCENTRE_SHIFT_KM = 150;

/**
 * The Moon. Inside 1960–2060, against DE405, what is left is what was left out of the series: `rate` and `range`.
 *
 * Outside, its mean anomaly is uncertain by `driftArcseconds` × τ² (τ: centuries from 2000). The theory's secular
 * terms are fitted to DE406 and follow it within a few tenths of a second of arc over these centuries (J. Chapront
 * and G. Francou, Astron. Astrophys. 404 (2003) 735; from memory), so the tide rules: DE405's acceleration of
 * −25.826″ a century squared against −25.858″ from laser ranging (J. Chapront et al., Astron. Astrophys. 387 (2002)
 * 700) and up to −25.9″ since (all from memory), half of which counts. An arcsecond of the anomaly moves a passage by
 * 1.84 s, and with `acceleration`, the greatest at a perigee, the range rate; the distance of a passage it moves
 * through the evection, by `evection` × drift.
 */
const MOON = {
  rateMmS: 0.055,
  rangeKm: 0.025,
  driftArcseconds: 0.04,
  secondsPerArcsecond: 1.84,
  accelerationKmS2: 2.7e-7,
  evectionKmPerArcsecond: 0.036,
} as const;

/**
 * Gives the accuracy of the series: half-widths of range (km) and range rate (km/s) that at least 95 % of true errors
 * at passages keep.
 *
 * Basis: `measured` for the planets (1960 to 2060 against DE405, else against the integration that carries on from
 * it) and for the Moon from 1960 to 2060; for the Moon in other years `published`. From the solar-system barycentre
 * the shift of that point is added (with the mean motion, in the range rate), which for the inner planets is most of
 * it.
 *
 * @param pair one that the series supply
 * @param tdb  TDB seconds past J2000
 * @throws ApsidaryError `not-supplied` for another pair
 */
export function seriesAccuracy(pair: Pair, tdb: number): Accuracy {
  const year = 2000 + tdb / (365.25 * DAY_SECONDS);
  if (pair.target === POINTS.moon) {
    const basis = year >= 1960 && year <= 2060 ? "measured" : "published";
    const centuries = (year - 2000) / 100;
    const drift = basis === "measured" ? 0 : MOON.driftArcseconds * centuries * centuries;
    return {
      rangeKm: Math.hypot(MOON.rangeKm, MOON.evectionKmPerArcsecond * drift),
      rangeRateKmS: Math.hypot(MOON.rateMmS * 1e-6, MOON.accelerationKmS2 * MOON.secondsPerArcsecond * drift),
      basis,
    };
  }
  const figures = ABOUT_SUN[pair.name.split("-")[0] ?? ""];
  if (!figures)
    throw new ApsidaryError("not-supplied", `the series do not hold ${pair.name}, so they state no accuracy for it.`);
  const rangeKm = at(figures.range, year);
  const rangeRateKmS = at(figures.rate, year) * 1e-6;
  const basis = "measured";
  if (pair.centre === POINTS.sun) return { rangeKm, rangeRateKmS, basis };
  const shift = Math.hypot(at(SUN_SHIFT_KM, year), BARYCENTRE_SHIFT_KM);
  const meanMotion = Math.PI / pair.halfPeriodSeconds;
  return { rangeKm: Math.hypot(rangeKm, shift), rangeRateKmS: Math.hypot(rangeRateKmS, shift * meanMotion), basis };
}

function at(figures: Figures, year: number): number {
  let i = 1;
  while (i < YEARS.length - 1 && year > (YEARS[i] as number)) i++;
  const [x0, x1] = [YEARS[i - 1] as number, YEARS[i] as number];
  const [y0, y1] = [figures[i - 1] as number, figures[i] as number];
  return y0 + ((y1 - y0) * Math.min(Math.max(year - x0, 0), x1 - x0)) / (x1 - x0);
}
