import { dayOfGregorian, julianOfDay } from "./civil-calendar.ts";

/** Modified Julian day number of 1582-10-15, the first day of the Gregorian calendar; the day before it was 1582-10-04, Julian. */
const FIRST_GREGORIAN_DAY = -100_840;

/**
 * Gives the same reading of a clock with its date in the Julian calendar, `1066-10-20T09:00:00.000Z` as `1066-10-14T09:00:00.000`; `null`
 * from 1582-10-15 on, where the Gregorian calendar is in force.
 *
 * @param iso a proleptic Gregorian date with a time of day, as `utcText` and `Date.toISOString` write it
 * @returns the time of day as it stands, without its zone letter, so that nothing takes it for ISO 8601 UTC; years as in ISO 8601: year 0
 *   is the one before year 1, and those beyond 0 to 9999 have six digits and a sign
 */
export function julianText(iso: string): string | null {
  const [, year, month, day, time = ""] = /^([+-]?\d+)-(\d\d)-(\d\d)(T[^Z]*)/.exec(iso) ?? [];
  const mjd = dayOfGregorian(Number(year), Number(month), Number(day));
  if (!(mjd < FIRST_GREGORIAN_DAY)) return null;
  const julian = julianOfDay(mjd);
  return `${yearText(julian.year)}-${two(julian.month)}-${two(julian.day)}${time}`;
}

function yearText(year: number): string {
  return year < 0 ? `-${String(-year).padStart(6, "0")}` : String(year).padStart(4, "0");
}

function two(value: number): string {
  return String(value).padStart(2, "0");
}
