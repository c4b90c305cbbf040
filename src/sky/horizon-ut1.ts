import { decimalYear, deltaT, deltaTSeconds } from "../time/delta-t.ts";
import { DELTA_T_LAST_YEAR } from "../time/delta-t-table.ts";
import type { LeapSecondList } from "../time/leap-seconds.ts";
import { tdbMinusTt } from "../time/tdb-minus-tt.ts";
import { utcOf } from "../time/utc-of.ts";

/** Modified Julian day of J2000.0. */
const J2000_MJD = 51_544.5;
/** UTC stays within so many seconds of UT1, by its definition. */
const DUT1_BOUND = 0.9;

/**
 * Gives UT1 at an instant, days past J2000 (2000-01-01 12:00 UT1): by the table of ΔT up to its end in 2026, after it by UTC.
 *
 * UTC follows UT1 within 0.9 s, and a time told in UTC then stands with the Sun as clocks will show it, however many leap
 * seconds come.
 *
 * @param tdb   TDB seconds past J2000
 * @param leaps the leap-second list
 */
export function ut1Days(tdb: number, leaps: LeapSecondList): number {
  const year = decimalYear(tdb);
  if (year < DELTA_T_LAST_YEAR) return (tdb - tdbMinusTt(tdb) - deltaTSeconds(year)) / 86_400;
  const { day, secondsOfDay } = utcOf(tdb, leaps);
  return day - J2000_MJD + secondsOfDay / 86_400;
}

/**
 * Gives how far UT1 may be off, seconds, half-width that holds at least 95 in 100: that of ΔT, after the table that of UTC, at least 0.9 s.
 *
 * @param tdb   TDB seconds past J2000
 * @param leaps the leap-second list
 */
export function ut1Uncertainty(tdb: number, leaps: LeapSecondList): number {
  const year = decimalYear(tdb);
  if (year < DELTA_T_LAST_YEAR) return deltaT(year).uncertaintySeconds;
  return Math.max(utcOf(tdb, leaps).uncertaintySeconds, DUT1_BOUND);
}
