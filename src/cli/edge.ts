import { ApsidaryError } from "../error.ts";
import type { LeapSecondList } from "../time/leap-seconds.ts";
import { parseJulian } from "../time/parse-julian.ts";
import { tdbOf } from "../time/tdb-of.ts";
import { tdbOfUtc } from "../time/tdb-of-utc.ts";
import { shown } from "./choice-of.ts";
import type { Calendar } from "./options.ts";

/**
 * Gives the moment of `--from` or `--to` as TDB seconds past J2000.
 *
 * @param calendar that of dates before 1582-10-15
 * @throws ApsidaryError `bad-date`, naming the option; `bad-span` where it is missing
 */
export function edgeOf(
  option: "--from" | "--to",
  given: string | undefined,
  leapSeconds: LeapSecondList,
  calendar: Calendar = "gregorian",
): number {
  if (given === undefined) {
    throw new ApsidaryError(
      "bad-span",
      `${option} is missing; give a date such as ${option} 2027-01-01, or a bare year.`,
    );
  }
  try {
    if (calendar === "gregorian") return tdbOf(given, leapSeconds);
    const { day, secondsOfDay } = parseJulian(given, leapSeconds);
    return tdbOfUtc(day, secondsOfDay, leapSeconds);
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    throw new ApsidaryError(error.code, `${option}: ${error.message}`);
  }
}

/** Refuses a span that ends before it begins. @throws ApsidaryError `bad-span` */
export function requireOrder(from: number, to: number, options: { from?: string; to?: string }): void {
  if (from < to) return;
  const how = from === to ? "is the same moment as" : "comes after";
  throw new ApsidaryError(
    "bad-span",
    `--from ${shown(options.from ?? "")} ${how} --to ${shown(options.to ?? "")}; the end of the span must be later (it is excluded).`,
  );
}

/**
 * Does a search, and where its span is not covered says of which calendar the dates of the message are, if another was asked for.
 *
 * @throws ApsidaryError as the search
 */
export function tellingCalendar<Result>(calendar: Calendar, search: () => Result): Result {
  try {
    return search();
  } catch (error) {
    if (calendar === "gregorian" || !(error instanceof ApsidaryError) || error.code !== "not-covered") throw error;
    throw new ApsidaryError(error.code, `${error.message} These dates are proleptic Gregorian.`);
  }
}
