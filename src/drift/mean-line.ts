import { DAY_SECONDS } from "../bodies/constants.ts";
import type { PairName } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";

/** A straight line through the passages of one kind: passage number k is expected at `interceptSeconds + k · slopeDays`. */
export interface MeanLine {
  /** Mean interval from passage to passage, days of 86 400 s TDB. */
  readonly slopeDays: number;
  /** Instant of passage number 0, the one nearest to J2000, TDB seconds past J2000. */
  readonly interceptSeconds: number;
}

type Line = readonly [slopeDays: number, interceptSeconds: number];

/**
 * Slope and intercept by pair, of periapsides and of apoapsides.
 *
 * Least squares through all passages of JPL's DE405 from 1960-01-01 to 2060-01-01, made by `bench/fit-mean-lines.ts`. Saturn, Uranus and
 * Neptune pass each apsis at most three times in that century, and a line through so few says nothing: they have none.
 */
const LINES: Partial<Record<PairName, { readonly periapsis: Line; readonly apoapsis: Line }>> = {
  "emb-sun": { periapsis: [365.2596969706, 216822.0], apoapsis: [365.2597522005, -15562516.321] },
  "moon-earth": { periapsis: [27.5545553913, -892391.782], apoapsis: [27.5545499375, 297730.502] },
  "mercury-sun": { periapsis: [87.9693494137, -3690378.344], apoapsis: [87.9693494358, 109897.671] },
  "venus-sun": { periapsis: [224.7007580738, -2718636.689], apoapsis: [224.7007147705, 6988505.69] },
  "mars-sun": { periapsis: [686.9960705565, -3196599.136], apoapsis: [686.9957348548, 26481648.339] },
  "jupiter-sun": { periapsis: [4334.3379905924, -20458462.931], apoapsis: [4333.7306455672, 166824979.937] },
};

/** Gives the mean line of a pair's passages of one kind, `null` where too few are known for one. The Earth's is that of the barycentre. */
export function meanLineOf(pair: PairName, kind: ApsisKind): MeanLine | null {
  const line = LINES[pair === "earth-sun" ? "emb-sun" : pair]?.[kind];
  return line ? { slopeDays: line[0], interceptSeconds: line[1] } : null;
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
