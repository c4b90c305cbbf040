import { DAY_SECONDS } from "../bodies/constants.ts";
import type { PairName } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";

/** A straight line through the passages of one kind: passage number k is expected at `interceptSeconds + k · slopeDays`. */
export interface MeanLine {
  /** Mean interval from passage to passage, days of 86 400 s TDB. */
  readonly slopeDays: number;
  /** Instant of passage number 0, the one nearest to J2000, TDB seconds past J2000. */
  readonly interceptSeconds: number;
  /** First and last year of the passages that it was fitted to. */
  readonly years: readonly [number, number];
}

type Line = readonly [slopeDays: number, interceptSeconds: number];

interface Lines {
  readonly periapsis: Line;
  readonly apoapsis: Line;
}

/**
 * Slope and intercept by pair, of periapsides and of apoapsides.
 *
 * Least squares through all passages of JPL's DE405 from 1960-01-01 to 2060-01-01, made by `bench/fit-mean-lines.ts`.
 */
const LINES_OF_THE_CENTURY: Partial<Record<PairName, Lines>> = {
  "emb-sun": { periapsis: [365.2596969706, 216822.0], apoapsis: [365.2597522005, -15562516.321] },
  "moon-earth": { periapsis: [27.5545553913, -892391.782], apoapsis: [27.5545499375, 297730.502] },
  "mercury-sun": { periapsis: [87.9693494137, -3690378.344], apoapsis: [87.9693494358, 109897.671] },
  "venus-sun": { periapsis: [224.7007580738, -2718636.689], apoapsis: [224.7007147705, 6988505.69] },
  "mars-sun": { periapsis: [686.9960705565, -3196599.136], apoapsis: [686.9957348548, 26481648.339] },
};

/**
 * The same of the outer planets, which pass each apsis nine times in that century at most, and whose periods change over centuries: through
 * the principal passages of the years 1001 to 2998 after the complete VSOP87, made by the same script.
 */
const LINES_OF_AGES: Partial<Record<PairName, Lines>> = {
  "jupiter-sun": { periapsis: [4332.8802760472, -20755464.03], apoapsis: [4332.8820181694, 166429533.711] },
  "saturn-sun": { periapsis: [10764.898985541, 110849953.469], apoapsis: [10765.036831454, -354209786.728] },
  "uranus-sun": { periapsis: [30698.355224843, -1047277642.686], apoapsis: [30708.1241906293, 278850527.852] },
  "neptune-sun": { periapsis: [60121.3398501749, 1456254337.295], apoapsis: [60123.3999469981, -1121137728.9] },
};

/** Gives the mean line of a pair's passages of one kind, `null` where there is none. The Earth's is that of the barycentre. */
export function meanLineOf(pair: PairName, kind: ApsisKind): MeanLine | null {
  const name = pair === "earth-sun" ? "emb-sun" : pair;
  const ofCentury = LINES_OF_THE_CENTURY[name]?.[kind];
  const line = ofCentury ?? LINES_OF_AGES[name]?.[kind];
  if (!line) return null;
  return { slopeDays: line[0], interceptSeconds: line[1], years: ofCentury ? [1960, 2059] : [1001, 2998] };
}

/** Gives the number of the passage that the line expects nearest to an instant (TDB seconds past J2000); 0 is the one nearest to J2000. */
export function passageNumber(line: MeanLine, tdb: number): number {
  return Math.round((tdb - line.interceptSeconds) / (line.slopeDays * DAY_SECONDS));
}

/** Gives how much later than the line a passage is, seconds. */
export function departureSeconds(line: MeanLine, tdb: number): number {
  const slope = line.slopeDays * DAY_SECONDS;
  return tdb - line.interceptSeconds - passageNumber(line, tdb) * slope;
}
