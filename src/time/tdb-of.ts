import { DateTime } from "luxon";
import { ApsidaryError } from "../error.ts";
import type { LeapSecondList } from "./leap-seconds.ts";
import { parseIso } from "./parse-iso.ts";
import { tdbOfUtc } from "./tdb-of-utc.ts";
import { secondsInDay } from "./utc-of.ts";

/**
 * An instant as a caller may give it: a luxon DateTime, a Date, ISO 8601 text (UTC unless it has an offset; before 1972 UT1), a
 * Temporal.Instant or anything else with its nanoseconds, or TDB seconds past J2000.0.
 */
export type Moment = DateTime | Date | string | { readonly epochNanoseconds: bigint } | { readonly tdbSeconds: number };

/** Modified Julian day number of 1970-01-01. */
export const POSIX_EPOCH_DAY = 40_587;
/** First and last day of the years −9999 to 9999. */
const FIRST_DAY = -4_331_000;
const LAST_DAY = 2_973_483;
const NANOSECONDS_PER_DAY = 86_400_000_000_000n;

/**
 * Gives the TDB seconds past J2000.0 of a moment.
 *
 * @param moment see `Moment`. Text may be a year `2026`, a month `2026-07`, a date (also as week or ordinal date) or a date with a time of day,
 * with or without an offset; a part left out is its beginning. The second 60 is accepted where there was a leap second. Date,
 * DateTime and nanoseconds count POSIX seconds, which know no leap seconds.
 * @param leaps the leap-second list, left out the built-in one
 * @throws `bad-date` where it is no date, there is no such day or second, or its year lies outside −9999 to 9999
 */
export function tdbOf(moment: Moment, leaps?: LeapSecondList): number {
  if (typeof moment === "string") {
    const { day, secondsOfDay } = parseIso(moment, leaps);
    return within(moment, day, () => tdbOfUtc(day, secondsOfDay, leaps));
  }
  if (typeof moment === "object" && moment !== null) {
    if (DateTime.isDateTime(moment)) {
      if (!moment.isValid) throw bad(`This DateTime is invalid (${moment.invalidExplanation ?? moment.invalidReason})`);
      return tdbOfPosix(
        Math.floor(moment.toMillis() / 86_400_000),
        modulo(moment.toMillis(), 86_400_000) / 1000,
        leaps,
      );
    }
    if (isDate(moment)) {
      const milliseconds = moment.getTime();
      if (Number.isNaN(milliseconds)) throw bad("This Date is invalid");
      return tdbOfPosix(Math.floor(milliseconds / 86_400_000), modulo(milliseconds, 86_400_000) / 1000, leaps);
    }
    if ("epochNanoseconds" in moment && typeof moment.epochNanoseconds === "bigint") {
      const total = moment.epochNanoseconds;
      const rest = ((total % NANOSECONDS_PER_DAY) + NANOSECONDS_PER_DAY) % NANOSECONDS_PER_DAY;
      return tdbOfPosix(Number((total - rest) / NANOSECONDS_PER_DAY), Number(rest) / 1e9, leaps);
    }
    if ("tdbSeconds" in moment && typeof moment.tdbSeconds === "number") {
      const { tdbSeconds } = moment;
      if (!Number.isFinite(tdbSeconds)) throw bad(`tdbSeconds is ${tdbSeconds}`);
      return within(`tdbSeconds ${tdbSeconds}`, Math.floor((tdbSeconds + 43_200) / 86_400) + 51_544, () => tdbSeconds);
    }
  }
  throw bad(`${describe(moment)} is not a moment`);
}

function tdbOfPosix(daysSince1970: number, secondsOfDay: number, leaps: LeapSecondList | undefined): number {
  const day = POSIX_EPOCH_DAY + daysSince1970;
  return within(`The day ${daysSince1970} since 1970`, day, () => {
    // where a second was left out, POSIX counts it all the same
    const length = secondsInDay(day, leaps);
    return secondsOfDay < length ? tdbOfUtc(day, secondsOfDay, leaps) : tdbOfUtc(day + 1, secondsOfDay - length, leaps);
  });
}

function within(given: string, day: number, tdb: () => number): number {
  if (day >= FIRST_DAY && day <= LAST_DAY) return tdb();
  throw new ApsidaryError("bad-date", `"${given}" lies outside the years -9999 to 9999; give a date within them.`);
}

function isDate(value: object): value is Date {
  return Object.prototype.toString.call(value) === "[object Date]";
}

function modulo(value: number, divisor: number): number {
  return value - Math.floor(value / divisor) * divisor;
}

function describe(value: unknown): string {
  return typeof value === "object" && value !== null ? "This object" : `${String(value)} (${typeof value})`;
}

function bad(what: string): ApsidaryError {
  return new ApsidaryError(
    "bad-date",
    `${what}; give ISO 8601 text such as "2026-01-03T17:16Z", a Date, a DateTime, { epochNanoseconds } or { tdbSeconds }.`,
  );
}
