import { type DateTime, FixedOffsetZone } from "luxon";
import { dateTimeOf } from "../time/date-time-of.ts";
import type { LeapSecondList } from "../time/leap-seconds.ts";

/**
 * Gives the local time of an instant, its offset in whole minutes, as ISO 8601 writes it.
 *
 * Before zones were agreed on, clocks kept the place's own time, whose offset has seconds; it is rounded to the minute, so the clock
 * may be half a minute off the place's, and reading and offset together still give the instant.
 *
 * @param tdb  TDB seconds past J2000
 * @param zone as `zoneOf` reads it
 * @throws ApsidaryError `bad-zone`, `bad-date`
 */
export function localTimeOf(tdb: number, zone: string, leaps: LeapSecondList): DateTime<true> {
  const at = dateTimeOf(tdb, zone, leaps);
  return Number.isInteger(at.offset) ? at : withFixed(at);
}

function withFixed(at: DateTime<true>): DateTime<true> {
  const fixed = at.setZone(FixedOffsetZone.instance(Math.round(at.offset)));
  return fixed.isValid ? fixed : at;
}
