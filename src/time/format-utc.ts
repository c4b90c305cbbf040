import { isoText } from "./iso-text.ts";
import type { LeapSecondList } from "./leap-seconds.ts";
import { type Utc, utcOf } from "./utc-of.ts";

/**
 * Gives a UTC (before 1972 a UT1) as ISO 8601 text, `2026-01-03T17:15:37.939Z`; inside a leap second `2016-12-31T23:59:60.500Z`.
 *
 * @param utc      as `utcOf` gives it
 * @param decimals of the second, 0 to 9; rounded to nearest, with the carry into minute, day and year
 *
 * Years beyond 0 to 9999 have the expanded form of ISO 8601 with six digits and a sign, `-000500`.
 */
export function formatUtc(utc: Utc, decimals = 3): string {
  return `${isoText(utc.day, utc.secondsOfDay, utc.secondsInDay, decimals)}Z`;
}

/** Gives the UTC text of a TDB instant: `formatUtc` of `utcOf`. */
export function utcText(tdb: number, decimals = 3, leaps?: LeapSecondList): string {
  return formatUtc(utcOf(tdb, leaps), decimals);
}
