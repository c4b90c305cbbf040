import { DateTime } from "luxon";
import { ApsidaryError } from "../error.ts";
import type { LeapSecondList } from "./leap-seconds.ts";
import { POSIX_EPOCH_DAY } from "./tdb-of.ts";
import { utcOf } from "./utc-of.ts";
import { zoneOf } from "./zone-of.ts";

/**
 * Gives a luxon DateTime, to the nearest millisecond, of an instant in a zone.
 *
 * @param tdb   TDB seconds past J2000.0
 * @param zone  an IANA name or a fixed offset, as `zoneOf` reads it
 * @param leaps the leap-second list
 * @throws `bad-zone` where there is no such zone, `bad-date` where `tdb` is not a finite number
 *
 * A DateTime cannot stand inside a leap second; such an instant becomes the last millisecond before it. Before 1972 its UTC is UT1.
 */
export function dateTimeOf(tdb: number, zone = "UTC", leaps?: LeapSecondList): DateTime<true> {
  const { day, secondsOfDay } = utcOf(tdb, leaps);
  const milliseconds = secondsOfDay >= 86_400 ? 86_399_999 : Math.round(secondsOfDay * 1000);
  const at = DateTime.fromMillis((day - POSIX_EPOCH_DAY) * 86_400_000 + milliseconds, { zone: zoneOf(zone) });
  if (!at.isValid) throw new ApsidaryError("bad-date", `The instant ${tdb} lies outside what a DateTime can hold.`);
  return at;
}
