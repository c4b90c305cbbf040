import { decimalYear, deltaT } from "../time/delta-t.ts";
import { DELTA_T_LAST_YEAR } from "../time/delta-t-table.ts";
import type { LeapSecondList } from "../time/leap-seconds.ts";
import { tdbMinusTt } from "../time/tdb-minus-tt.ts";
import { utcOf } from "../time/utc-of.ts";

/** The Earth's clock. */
export interface Ut1 {
  /** UT1 days past J2000 (2000-01-01 12:00 UT1). */
  readonly days: number;
  /** Half-width that holds at least 95 in 100, seconds. */
  readonly uncertaintySeconds: number;
}

/** Modified Julian day of J2000.0. */
const J2000_MJD = 51_544.5;
/** UTC stays within so many seconds of UT1, by its definition. */
const DUT1_BOUND = 0.9;

/**
 * Gives UT1 at an instant: by the table of ΔT up to its end in 2026, after it by UTC.
 *
 * UTC follows UT1 within 0.9 s, and a time told in UTC then stands with the Sun as clocks will show it, however many leap
 * seconds come. The half-width after the table is that of the time scale and of those 0.9 s.
 *
 * @param tdb   TDB seconds past J2000
 * @param leaps the leap-second list
 */
export function ut1Of(tdb: number, leaps: LeapSecondList): Ut1 {
  const year = decimalYear(tdb);
  if (year < DELTA_T_LAST_YEAR) {
    const { seconds, uncertaintySeconds } = deltaT(year);
    return { days: (tdb - tdbMinusTt(tdb) - seconds) / 86_400, uncertaintySeconds };
  }
  const { day, secondsOfDay, uncertaintySeconds } = utcOf(tdb, leaps);
  return {
    days: day - J2000_MJD + secondsOfDay / 86_400,
    uncertaintySeconds: Math.max(uncertaintySeconds, DUT1_BOUND),
  };
}
