import { DateTime } from "luxon";
import { ApsidaryError } from "../error.ts";
import { dayOfGregorian, daysInMonth } from "./civil-calendar.ts";
import { isoDate } from "./iso-text.ts";
import type { LeapSecondList } from "./leap-seconds.ts";
import { secondsInDay } from "./utc-of.ts";

const MODIFIED_JULIAN_OF_1970 = 40_587;

/** Year, month, day; a blank or T; hours, minutes, seconds, decimals; offset. */
const EXTENDED =
  /^([+-]?\d+)(?:-(\d\d)(?:-(\d\d))?)?(?:[T ](\d\d)(?::?(\d\d)(?::?(\d\d)(?:[.,](\d+))?)?)?)?\s*(Z|[+-]\d\d(?::?\d\d)?)?$/i;
/** Week dates, ordinal dates and dates without hyphens, which luxon reads. */
const OTHER_DATE = /^(\d{4}-?W\d\d(?:-?\d)?|\d{4}-\d{3}|\d{7,8})(?=$|[T ])/i;

/**
 * Reads ISO 8601 text as a UTC day and the seconds of it.
 *
 * @param text  a year, a month, a date or a date with a time of day; UTC unless an offset follows the time
 * @param leaps the leap-second list by which a second 60 is judged
 * @returns Modified Julian day number and seconds since its beginning (86 400 and more in a leap second)
 * @throws `bad-date` where it cannot be read, or names a month, day, hour, minute, second or offset that does not exist
 */
export function parseIso(
  text: string,
  leaps?: LeapSecondList,
): { readonly day: number; readonly secondsOfDay: number } {
  const given = text.trim();
  const match = EXTENDED.exec(OTHER_DATE.test(given) ? plainDate(given) : given.replace(/^\u2212/, "-"));
  if (!match) throw bad(text, "cannot be read as a date");
  const [, yearText = "", monthText, dayText, hourText, minuteText, secondText, decimals, offsetText] = match;
  if (yearText.replace(/^[+-]/, "").length < 4) {
    throw bad(text, `has a year of fewer than four digits`, `Write the year with four, such as "0999" or "-0500".`);
  }
  const year = Number(yearText);
  if (Math.abs(year) > 9999) throw bad(text, "lies outside the years -9999 to 9999", "Give a date within them.");
  const month = Number(monthText ?? 1);
  if (month < 1 || month > 12) throw bad(text, `has no month ${monthText}`, "Months are 01 to 12.");
  const dayOfMonth = Number(dayText ?? 1);
  const length = daysInMonth(year, month);
  if (dayOfMonth < 1 || dayOfMonth > length) {
    throw bad(text, `names a day that does not exist`, `${yearText}-${monthText} has the days 01 to ${length}.`);
  }
  if (hourText !== undefined && dayText === undefined) throw bad(text, "has a time of day without a day");
  if (offsetText !== undefined && hourText === undefined) throw bad(text, "has an offset without a time of day");
  const hour = Number(hourText ?? 0);
  const minute = Number(minuteText ?? 0);
  const second = Number(secondText ?? 0);
  const fraction = decimals === undefined ? 0 : Number(`0.${decimals}`);
  const endOfDay = hour === 24 && minute === 0 && second === 0 && fraction === 0;
  if ((hour > 23 && !endOfDay) || minute > 59 || second > 60) {
    throw bad(
      text,
      "names a time of day that does not exist",
      "Times are 00:00:00 to 23:59:59, and 23:59:60 in a leap second.",
    );
  }
  const offset = minutesOf(offsetText);
  if (offset === undefined) throw bad(text, `has no offset ${offsetText}`, "Offsets are -15:59 to +15:59, or Z.");
  const minutes = hour * 60 + minute - offset;
  const carry = Math.floor(minutes / 1440);
  const day = dayOfGregorian(year, month, dayOfMonth) + carry;
  const secondsOfDay = (minutes - carry * 1440) * 60 + second + fraction;
  const inDay = secondsInDay(day, leaps);
  if (second === 60 && !(minutes - carry * 1440 === 1439 && inDay > 86_400)) {
    throw bad(text, "names a second 60 where there was no leap second", "Seconds are 00 to 59.");
  }
  if (secondsOfDay >= inDay) throw bad(text, `names a second that was left out of ${isoDate(day)}`);
  return { day, secondsOfDay };
}

/** The same text with its date as year, month and day; by luxon, which also refuses weeks and days that do not exist. */
function plainDate(text: string): string {
  const date = OTHER_DATE.exec(text)?.[0] ?? "";
  const read = DateTime.fromISO(date.toUpperCase(), { zone: "utc" });
  if (!read.isValid) throw bad(text, `names a date that does not exist`);
  return isoDate(Math.floor(read.toMillis() / 86_400_000) + MODIFIED_JULIAN_OF_1970) + text.slice(date.length);
}

/** Minutes east of UTC; `undefined` where there is no such offset. */
function minutesOf(offset: string | undefined): number | undefined {
  if (offset === undefined || /^z$/i.test(offset)) return 0;
  const hours = Number(offset.slice(1, 3));
  const minutes = Number(offset.slice(3).replace(":", "") || 0);
  if (hours > 15 || minutes > 59) return undefined;
  return (offset.startsWith("-") ? -1 : 1) * (hours * 60 + minutes);
}

function bad(
  text: string,
  what: string,
  remedy = 'Write ISO 8601, such as "2026", "2026-07-06" or "2026-07-06T17:30:00Z".',
): ApsidaryError {
  const shown = text.length > 60 ? `${text.slice(0, 60)}...` : text;
  return new ApsidaryError("bad-date", `"${shown}" ${what}. ${remedy}`);
}
