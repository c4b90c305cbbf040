import { AU_KM, DAY_SECONDS } from "../bodies/constants.ts";
import type { PairName } from "../bodies/pair.ts";
import type { Accuracy, AccuracyBasis, Span } from "./source.ts";

const YEAR_SECONDS = 365.25 * DAY_SECONDS;

/** Gives the instant of a Julian epoch: 2000.0 is TDB second zero. */
function epoch(year: number): number {
  return (year - 2000) * YEAR_SECONDS;
}

/** What astronomy-engine is worth for a pair: half-widths that at least 95 % of true errors keep. */
export interface EngineFigures {
  /** Julian years in which it is offered. */
  readonly years: readonly [number, number];
  /** The distance at which `rate` is stated, au: the mean one. */
  readonly mean: number;
  /** Half-width of the distance inside 1960–2059, km. */
  readonly range: number;
  /** Half-width of the range rate at passages inside 1960–2059, km/s. */
  readonly rate: number;
  /** The two where growth begins, outside those years. */
  readonly outside: readonly [number, number];
  /** What the two gain before 1960: so much × (centuries from 2010) to the power of `powers`. */
  readonly before: readonly [number, number];
  /** The same after 2059. */
  readonly after: readonly [number, number];
  /** Left out, both are 2. */
  readonly powers?: readonly [number, number];
}

/**
 * The figures, as `bench/measure-engine.ts` prints them.
 *
 * 1960–2059, but for Jupiter's moons: against JPL's DE405. With 200 passages and more, what 96 % of their errors keep; with
 * fewer, what all keep and 95 % of instants besides. Moons of Jupiter: differences from J. H. Lieske's E5, as given in
 * J. Meeus, *Astronomical Algorithms* (2nd ed., 1998), ch. 44: two theories of different make, so a bound on the worse.
 *
 * Other centuries: against the complete VSOP87 and ELP/MPP02, with growth that covers epochs 250 years apart. What the
 * short series leave out grows with time: for Mercury's range rate evenly, else with its square. The theories' own error
 * is small beside it: 1″ for 4000 years either side of J2000 for Mercury to Mars, 2000 for Jupiter and Saturn (whence
 * their spans), 6000 for Uranus and Neptune (Bretagnon and Francou 1988, from memory), and 1″ in the Earth's
 * longitudes shifts range rates at passages by some 7·10⁻⁵ km/s. Pluto: nothing to measure against, so the figures of
 * 1960–2059 twice over; its two blended integrations end 0.06 to 0.75 million km apart after 80 years, 0.52 million in the
 * stretch that holds most of 1960–2059. The moons of Jupiter: as far as E5 and L1.2 were compared.
 */
export const ENGINE_FIGURES: Readonly<Record<PairName, EngineFigures>> = {
  "moon-earth": {
    years: [-1000, 4000],
    mean: 0.002567,
    range: 14,
    rate: 1.6e-5,
    outside: [17, 2.0e-5],
    before: [0.085, 1.3e-6],
    after: [0.025, 5.3e-7],
  },
  "earth-sun": {
    years: [-1000, 4000],
    mean: 1,
    range: 1400,
    rate: 3.7e-4,
    outside: [1700, 4.6e-4],
    before: [9.3, 1.5e-6],
    after: [4.5, 4.6e-7],
  },
  "emb-sun": {
    years: [-1000, 4000],
    mean: 1,
    range: 1400,
    rate: 3.5e-4,
    outside: [1700, 4.4e-4],
    before: [9.4, 1.5e-6],
    after: [4.6, 5.1e-7],
  },
  "mercury-sun": {
    years: [-1000, 4000],
    mean: 0.3871,
    range: 2500,
    rate: 2.4e-3,
    outside: [3100, 3.0e-3],
    before: [49, 4.2e-3],
    after: [59, 4.2e-3],
    powers: [2, 1],
  },
  "venus-sun": {
    years: [-1000, 4000],
    mean: 0.7233,
    range: 1200,
    rate: 3.0e-4,
    outside: [1400, 3.7e-4],
    before: [8.9, 6.3e-6],
    after: [11, 5.2e-6],
  },
  "mars-sun": {
    years: [-1000, 4000],
    mean: 1.524,
    range: 5900,
    rate: 8.8e-4,
    outside: [7300, 1.1e-3],
    before: [19, 4.5e-6],
    after: [13, 2.8e-6],
  },
  "jupiter-sun": {
    years: [0, 4000],
    mean: 5.203,
    range: 31_000,
    rate: 6.0e-4,
    outside: [39_000, 7.5e-4],
    before: [870, 2.0e-5],
    after: [920, 2.1e-5],
  },
  "saturn-sun": {
    years: [0, 4000],
    mean: 9.536,
    range: 63_000,
    rate: 8.1e-4,
    outside: [79_000, 1.1e-3],
    before: [3900, 2.2e-5],
    after: [1800, 2.0e-5],
  },
  "uranus-sun": {
    years: [0, 4000],
    mean: 19.19,
    range: 73_000,
    rate: 5.1e-4,
    outside: [130_000, 6.8e-4],
    before: [760, 8.5e-6],
    after: [1800, 5.9e-6],
  },
  "neptune-sun": {
    years: [0, 4000],
    mean: 30.07,
    range: 120_000,
    rate: 3.9e-4,
    outside: [490_000, 5.0e-4],
    before: [3100, 5.7e-6],
    after: [4900, 6.8e-6],
  },
  "pluto-sun": {
    years: [2, 3998],
    mean: 39.48,
    range: 250_000,
    rate: 2.2e-4,
    outside: [490_000, 4.4e-4],
    before: [0, 0],
    after: [0, 0],
  },
  "earth-ssb": {
    years: [-1000, 4000],
    mean: 1,
    range: 2000,
    rate: 4.3e-4,
    outside: [2500, 5.4e-4],
    before: [7.3, 1.4e-6],
    after: [6.3, 4.0e-7],
  },
  "emb-ssb": {
    years: [-1000, 4000],
    mean: 1,
    range: 2000,
    rate: 4.4e-4,
    outside: [2500, 5.5e-4],
    before: [7.3, 1.3e-6],
    after: [6.3, 4.5e-7],
  },
  "mercury-ssb": {
    years: [-1000, 4000],
    mean: 0.3871,
    range: 2900,
    rate: 4.8e-3,
    outside: [3600, 6.0e-3],
    before: [63, 4.1e-3],
    after: [82, 4.1e-3],
    powers: [2, 1],
  },
  "venus-ssb": {
    years: [-1000, 4000],
    mean: 0.7233,
    range: 1500,
    rate: 3.7e-4,
    outside: [1900, 4.7e-4],
    before: [20, 7.3e-6],
    after: [18, 6.9e-6],
  },
  "mars-ssb": {
    years: [-1000, 4000],
    mean: 1.524,
    range: 5900,
    rate: 8.7e-4,
    outside: [7400, 1.1e-3],
    before: [18, 4.7e-6],
    after: [13, 3.0e-6],
  },
  "jupiter-ssb": {
    years: [0, 4000],
    mean: 5.198,
    range: 32_000,
    rate: 6.0e-4,
    outside: [40_000, 7.5e-4],
    before: [860, 2.0e-5],
    after: [910, 2.1e-5],
  },
  "saturn-ssb": {
    years: [0, 4000],
    mean: 9.535,
    range: 62_000,
    rate: 7.9e-4,
    outside: [78_000, 9.9e-4],
    before: [4100, 2.2e-5],
    after: [1800, 2.0e-5],
  },
  "uranus-ssb": {
    years: [0, 4000],
    mean: 19.19,
    range: 73_000,
    rate: 4.7e-4,
    outside: [130_000, 7.1e-4],
    before: [740, 1.2e-5],
    after: [1500, 5.4e-6],
  },
  "neptune-ssb": {
    years: [0, 4000],
    mean: 30.07,
    range: 120_000,
    rate: 3.3e-4,
    outside: [540_000, 5.8e-4],
    before: [2900, 3.3e-6],
    after: [5200, 1.6e-6],
  },
  "pluto-ssb": {
    years: [2, 3998],
    mean: 39.48,
    range: 250_000,
    rate: 1.5e-4,
    outside: [490_000, 3.0e-4],
    before: [0, 0],
    after: [0, 0],
  },
  "io-jupiter": {
    years: [1600, 2400],
    mean: 0.002819,
    range: 26,
    rate: 7.9e-4,
    outside: [32, 9.9e-4],
    before: [0, 5.4e-6],
    after: [0, 4.4e-5],
  },
  "europa-jupiter": {
    years: [1600, 2400],
    mean: 0.004486,
    range: 310,
    rate: 5.3e-3,
    outside: [380, 6.6e-3],
    before: [0, 0],
    after: [0, 0],
  },
  "ganymede-jupiter": {
    years: [1600, 2400],
    mean: 0.007155,
    range: 240,
    rate: 3.4e-3,
    outside: [300, 4.2e-3],
    before: [17, 1.5e-4],
    after: [41, 3.7e-4],
  },
  "callisto-jupiter": {
    years: [1600, 2400],
    mean: 0.01259,
    range: 300,
    rate: 3.1e-3,
    outside: [380, 3.9e-3],
    before: [0, 0],
    after: [0, 0],
  },
};

const FROM = epoch(1960);
const TO = epoch(2060);
const MIDDLE = epoch(2010);

/** Gives the span in which astronomy-engine is offered for a pair, TDB seconds past J2000. */
export function engineSpan(pair: PairName): Span {
  const [first, last] = ENGINE_FIGURES[pair].years;
  return { from: epoch(first), to: epoch(last) };
}

/**
 * Gives the accuracy of astronomy-engine for a pair at a time.
 *
 * What is wrong with a range rate at a passage is mostly a shift in time, and so in proportion to the range acceleration, which
 * at an apsis goes with the inverse square of the distance: Mercury's is 2.3 times larger at perihelion than at
 * aphelion. The half-width of the range rate is scaled in the same way.
 *
 * @param pair     a pair's name
 * @param tdb      TDB seconds past J2000
 * @param distance the pair's distance at that time, km
 * @returns half-widths of distance (km) and range rate (km/s): `measured` inside 1960–2059 (`published` for the moons of Jupiter, which are
 *   not in DE405), outside `published` where complete theories stand behind them, else `assumed`
 */
export function engineAccuracy(pair: PairName, tdb: number, distance: number): Accuracy {
  const { mean, range, rate, outside, before, after, powers = [2, 2] } = ENGINE_FIGURES[pair];
  const nearness = ((mean * AU_KM) / distance) ** 2;
  if (tdb >= FROM && tdb <= TO) return { rangeKm: range, rangeRateKmS: rate * nearness, basis: basisOf(pair, true) };
  const centuries = Math.abs(tdb - MIDDLE) / (100 * YEAR_SECONDS);
  const [rangeGain, rateGain] = tdb < MIDDLE ? before : after;
  return {
    rangeKm: outside[0] + rangeGain * centuries ** powers[0],
    rangeRateKmS: (outside[1] + rateGain * centuries ** powers[1]) * nearness,
    basis: basisOf(pair, false),
  };
}

function basisOf(pair: PairName, inside: boolean): AccuracyBasis {
  if (pair.endsWith("-jupiter")) return inside ? "published" : "assumed";
  if (inside) return "measured";
  return pair.startsWith("pluto") ? "assumed" : "published";
}
