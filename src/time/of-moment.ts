import type { DateTime } from "luxon";
import { dateTimeOf } from "./date-time-of.ts";
import type { LeapSecondList } from "./leap-seconds.ts";
import { type Moment, tdbOf } from "./tdb-of.ts";
import { type Utc, utcOf } from "./utc-of.ts";

/** A leap-second list and what carries one; an `Ephemeris` will do. */
export interface TimeScales {
  readonly leapSeconds: LeapSecondList;
}

/**
 * Gives the UTC of a moment, before 1972 its UT1: day, seconds of the day, what it rests on and how far it may be off.
 *
 * @param moment when
 * @param scales the leap-second list; left out, the built-in one
 * @throws ApsidaryError `bad-date`
 */
export function utcOfMoment(moment: Moment, scales?: TimeScales): Utc {
  return utcOf(tdbOf(moment, scales?.leapSeconds), scales?.leapSeconds);
}

/**
 * Gives a luxon DateTime of a moment in a zone, to the nearest millisecond.
 *
 * @param moment when
 * @param zone   an IANA name or a fixed offset
 * @param scales the leap-second list; left out, the built-in one
 * @throws ApsidaryError `bad-date`, `bad-zone`
 */
export function dateTimeOfMoment(moment: Moment, zone = "UTC", scales?: TimeScales): DateTime<true> {
  return dateTimeOf(tdbOf(moment, scales?.leapSeconds), zone, scales?.leapSeconds);
}
