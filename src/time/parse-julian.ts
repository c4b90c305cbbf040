import { ApsidaryError } from "../error.ts";
import { dayOfJulian } from "./civil-calendar.ts";
import { isoDate } from "./iso-text.ts";
import type { LeapSecondList } from "./leap-seconds.ts";
import { parseIso } from "./parse-iso.ts";

/** Year, month and day, before a time of day or the end. */
const DATE = /^([+-]?\d{4,})(?:-(\d\d)(?:-(\d\d))?)?(?=$|[T ])/i;
/** Week dates, ordinal dates and dates without hyphens. */
const OTHER_DATE = /^(\d{4})(?:-?W\d\d(?:-?\d)?|-\d{3}|\d{3,4})(?=$|[T ])/i;

/**
 * Reads a date as `parseIso` does, those before 1582-10-15 in the Julian calendar.
 *
 * @param text  a year, a month, a date or a date with a time of day; UTC unless an offset follows the time. The date as written decides
 *   which calendar it belongs to, so that 1582 begins Julian and 1583 Gregorian
 * @param leaps the leap-second list by which a second 60 is judged
 * @returns Modified Julian day number and seconds since its beginning
 * @throws `bad-date` as `parseIso`; where a date is one of the ten left out, 1582-10-05 to 1582-10-14; where a date before them
 *   is written otherwise than as year, month and day
 */
export function parseJulian(
  text: string,
  leaps?: LeapSecondList,
): { readonly day: number; readonly secondsOfDay: number } {
  const given = text.trim().replace(/^\u2212/, "-");
  const other = OTHER_DATE.exec(given);
  if (other && Number(other[1]) <= 1582) {
    throw bad(
      given,
      'is not written as year, month and day; in the Julian calendar only these are read, "1066-09-25".',
    );
  }
  const match = other ? null : DATE.exec(given);
  if (!match) return parseIso(text, leaps);
  const [date, yearText = "", monthText, dayText] = match;
  const year = Number(yearText);
  const month = Number(monthText ?? 1);
  const day = Number(dayText ?? 1);
  if (month < 1 || month > 12 || year < -9999) return parseIso(text, leaps); // which says what is wrong
  const written = (year * 100 + month) * 100 + day;
  if (written >= 1582_10_15) return parseIso(text, leaps);
  if (written >= 1582_10_05) {
    throw bad(given, "does not exist: 1582-10-04 of the Julian calendar was followed by 1582-10-15 of the Gregorian.");
  }
  const length = daysInJulianMonth(year, month);
  if (day < 1 || day > length) {
    throw bad(
      given,
      `names a day that does not exist. ${yearText}-${monthText} has the days 01 to ${length} in the Julian calendar.`,
    );
  }
  const gregorian = isoDate(dayOfJulian(year, month, day));
  try {
    return parseIso(gregorian + given.slice(date.length), leaps);
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    throw new ApsidaryError(error.code, error.message.replace(gregorian, date)); // the words of the caller
  }
}

function daysInJulianMonth(year: number, month: number): number {
  const after = month === 12 ? dayOfJulian(year + 1, 1, 1) : dayOfJulian(year, month + 1, 1);
  return after - dayOfJulian(year, month, 1);
}

function bad(text: string, what: string): ApsidaryError {
  const shown = text.length > 60 ? `${text.slice(0, 60)}...` : text;
  return new ApsidaryError("bad-date", `"${shown}" ${what}`);
}
