import { DateTime } from "luxon";
import { type PairName, pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { mergedPassages } from "../passages/merged-passages.ts";
import type { Passage } from "../passages/passage.ts";
import { toRow } from "../passages/to-row.ts";
import { dateTimeOf } from "../time/date-time-of.ts";
import { tdbOf } from "../time/tdb-of.ts";
import { zoneOf } from "../time/zone-of.ts";
import type { CalendarOptions } from "./calendar.ts";
import { calendarReport, type LocalRow } from "./calendar-report.ts";
import { shown } from "./choice-of.ts";
import { openFor } from "./open-for.ts";
import { sourceChoiceOf } from "./options.ts";
import { provenanceOf } from "./provenance.ts";
import { writeAnswer } from "./write-answer.ts";

const PAIRS: readonly PairName[] = [
  "earth-sun",
  "moon-earth",
  "mercury-sun",
  "venus-sun",
  "mars-sun",
  "jupiter-sun",
  "saturn-sun",
  "uranus-sun",
  "neptune-sun",
];

/**
 * Answers `apsidary calendar`.
 *
 * @param given   the year, as given; `next` is the one after this machine's, in the zone
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used, before anything is written
 */
export async function runCalendar(given: string, options: CalendarOptions): Promise<void> {
  const source = sourceChoiceOf(options);
  const zone = options.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  const year = given === "next" ? DateTime.now().setZone(zoneOf(zone)).year + 1 : yearOf(given);
  const begins = startOf(year, zone);
  const ends = startOf(year + 1, zone);

  const ephemeris = await openFor(options);
  const from = tdbOf(begins, ephemeris.leapSeconds);
  const to = tdbOf(ends, ephemeris.leapSeconds);
  const pairs = PAIRS.map((name) => pairOf(name));
  const found = mergedPassages(ephemeris, pairs, { from: { tdbSeconds: from }, to: { tdbSeconds: to }, source });
  const made = await provenanceOf(ephemeris, { pairs, span: { from, to }, source });
  const title = `Apsis passages of ${year}, ${zone}`;
  await writeAnswer(calendarReport(title, rowsOf(found, zone, ephemeris), made), options.out);
}

function* rowsOf(found: Iterable<Passage>, zone: string, ephemeris: Ephemeris): Generator<LocalRow, void, undefined> {
  for (const passage of found) {
    const at = dateTimeOf(passage.tdbSeconds, zone, ephemeris.leapSeconds);
    yield { row: toRow(passage, ephemeris), at };
  }
}

function yearOf(given: string): number {
  const year = /^-?\d{4}$/.test(given) ? Number(given) : Number.NaN;
  if (year > -9999 && year < 9999) return year;
  throw new ApsidaryError("bad-date", `${shown(given)} is not a year; give its four digits, such as 2027, or next.`);
}

function startOf(year: number, zone: string): DateTime<true> {
  const at = DateTime.fromObject({ year, month: 1, day: 1 }, { zone: zoneOf(zone) });
  if (!at.isValid) throw new ApsidaryError("bad-date", `the year ${year} cannot be laid out in ${zone}.`);
  return at;
}
