import type { ApsisKind } from "../bodies/term.ts";

/**
 * One passage and how its date moved since the passage of the same kind before it. Frozen.
 *
 * Hours are rounded to 1e-7 h (0.4 ms), days to 1e-8 d, degrees to 1e-6°. The account is for `earth-sun`; of another pair what
 * belongs to it is `null`, and so it is where no source reaches the barycentre's passage.
 */
export interface DriftRow {
  readonly kind: ApsisKind;
  readonly term: string;
  /** ISO 8601; UT1 before 1972. */
  readonly utc: string;
  readonly tdbSeconds: number;
  /** Passage of the Earth's centre minus passage of the barycentre of the Earth and the Moon. */
  readonly bodyMinusBarycentreHours: number | null;
  /** Passage of the barycentre minus the straight line. */
  readonly barycentreMinusMeanHours: number | null;
  /** This passage minus the straight line: the barycentre's for the Earth, the pair's own for others; `null` where a pair has none. */
  readonly bodyMinusMeanHours: number | null;
  /** This passage minus the one before, days of 86 400 s TDB. */
  readonly stepDays: number;
  /** The step less the 365 or 366 days since the same UTC date of the year before. */
  readonly dateStepHours: number | null;
  /** The slope of the straight line less those whole days. */
  readonly calendarHours: number | null;
  /** What changed in `barycentreMinusMeanHours`. */
  readonly planetsHours: number | null;
  /** What changed in `bodyMinusBarycentreHours`. */
  readonly moonHours: number | null;
  /** The Moon's elongation at the barycentre's passage: 0 new, 90 first quarter, 180 full, 270 last quarter. */
  readonly moonElongationDeg: number | null;
  /** What `bodyMinusBarycentreHours` comes to in first order. */
  readonly firstOrderHours: number | null;
  /** Id of the source of this passage; with a plus and a second one where the barycentre's comes from another. */
  readonly source: string;
  readonly timeUncertaintySeconds: number;
  /** The same of the passage before. A step whose two passages come from different sources holds their difference, too. */
  readonly previousSource: string;
  readonly previousTimeUncertaintySeconds: number;
  /** The step in words. */
  readonly sentence: string;
}
