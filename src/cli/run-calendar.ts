import { mkdtemp } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { DateTime } from "luxon";
import { pairOf } from "../bodies/pair.ts";
import { apsisCalendar, CALENDAR_PAIRS, calendarSpan } from "../calendar/apsis-calendar.ts";
import { calendarEvents } from "../calendar/calendar-events.ts";
import { calendarRecord, calendarRecordNames } from "../calendar/calendar-record.ts";
import type { CalendarRow } from "../calendar/calendar-row.ts";
import { completeStyle, type HouseStyle } from "../calendar/house-style.ts";
import { ApsidaryError } from "../error.ts";
import { asciiText } from "../report/ascii-text.ts";
import { jsonAnswer } from "../report/json-answer.ts";
import { jsonLines } from "../report/json-lines.ts";
import { zoneOf } from "../time/zone-of.ts";
import { CALENDAR_FORMATS, type CalendarOptions } from "./calendar.ts";
import { calendarHtml, calendarReport } from "./calendar-report.ts";
import { choiceOf, shown } from "./choice-of.ts";
import { openFor } from "./open-for.ts";
import { sourceChoiceOf } from "./options.ts";
import { pairsOf } from "./pairs.ts";
import { provenanceOf } from "./provenance.ts";
import { writeAnswer } from "./write-answer.ts";

/**
 * Answers `apsidary calendar`.
 *
 * @param given   the years, as given; `next` is the year after this machine's, in the zone
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used, before anything is written
 */
export async function runCalendar(given: string, options: CalendarOptions): Promise<void> {
  const format = choiceOf("--format", options.format ?? "text", CALENDAR_FORMATS);
  const source = sourceChoiceOf(options);
  const alarmMinutes = alarmOf(options, format);
  const stamp = stampOf(process.env.SOURCE_DATE_EPOCH);
  const rank = choiceOf("--rank", options.rank ?? "all", ["principal", "all"]);
  const [zone, besides] = zonesOf(options);
  const years = yearsOf(given, zone);
  const style = completeStyle(styleOf(options, besides));
  const pairs = options.pairs === undefined ? CALENDAR_PAIRS.map((name) => pairOf(name)) : pairsOf([options.pairs]);

  const ephemeris = await openFor(options);
  const { first, last, from, to } = calendarSpan(ephemeris, { years, zone });
  const rows = () => apsisCalendar(ephemeris, { years, zone, pairs, source, rank, style });
  const drawn = rows(); // refuses what cannot be answered
  const made = await provenanceOf(ephemeris, { pairs, span: { from, to }, source });
  const title = `Apsis passages of ${first === last ? first : `${first} to ${last}`}, ${zone}`;
  const head = { schema: "apsidary/calendar/1", made, years: [first, last], zone };
  const inUtc = zoneOf(zone).equals(zoneOf("UTC"));

  const span: readonly [number, number] = [first, last];
  const page = (of: Iterable<CalendarRow>) =>
    calendarHtml(ephemeris, of, { title, zone, style, source, years: span }, pairs, made);

  const pieces = async (): Promise<Iterable<string>> => {
    switch (format) {
      case "json":
        return jsonAnswer(head, drawn);
      case "ndjson":
        return jsonLines(drawn);
      case "csv": {
        const { csvLines } = await import("../report/csv-lines.ts"); // brings a library that the other forms do without
        return csvLines(calendarRecordNames(besides), records(drawn));
      }
      case "html":
        return page(drawn);
      case "ics": {
        const { calendarFile } = await import("../report/calendar-file.ts");
        const file = { name: title, description: FILE_NOTE, stamp, alarmMinutes };
        return [calendarFile(file, calendarEvents(drawn, style))];
      }
      default: {
        const report = calendarReport(drawn, { title, style, inUtc, made });
        return options.ascii ? inAscii(report) : report;
      }
    }
  };
  if (options.page !== undefined) {
    const path = options.page === true ? await temporaryPage(first, last) : options.page;
    await writeAnswer(page(rows()), path);
    await writeAnswer(await pieces(), options.out);
    process.stderr.write(`apsidary: the page is ${resolve(path)}\n`);
    return;
  }
  await writeAnswer(await pieces(), options.out);
}

/** A file in a new folder among the temporary files, so that nothing of the user's is written over. */
async function temporaryPage(first: number, last: number): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), "apsidary-"));
  return join(folder, `apsides-${first === last ? first : `${first}-${last}`}.html`);
}

const FILE_NOTE =
  "Passages through the least and the greatest distance, rounded to what is known. Computed by apsidary.";

/** When a calendar file is made: `SOURCE_DATE_EPOCH` where it is set, so that files can be made again to the byte; else now. */
function stampOf(epoch: string | undefined): Date {
  if (epoch === undefined || epoch === "") return new Date();
  const stamp = new Date(/^\d{1,11}$/.test(epoch) ? Number(epoch) * 1000 : Number.NaN);
  if (stamp.getTime() < Date.UTC(10_000, 0)) return stamp;
  throw new ApsidaryError(
    "bad-option",
    `SOURCE_DATE_EPOCH ${shown(epoch)} is no time; it counts whole seconds since 1970, such as 1767225600.`,
  );
}

function alarmOf({ alarm }: CalendarOptions, format: string): number | null {
  if (alarm === undefined) return null;
  if (format !== "ics")
    throw new ApsidaryError("bad-option", "--alarm belongs to --format ics; add that, or leave it.");
  if (/^\d{1,6}$/.test(alarm)) return Number(alarm);
  throw new ApsidaryError("bad-option", `--alarm ${shown(alarm)} is no number of minutes; give one such as 30.`);
}

function* records(rows: Iterable<CalendarRow>) {
  for (const row of rows) yield calendarRecord(row);
}

function* inAscii(pieces: Iterable<string>): Generator<string, void, undefined> {
  for (const piece of pieces) yield asciiText(piece);
}

/** The calendar's zone, and those beside it. */
function zonesOf({ zone }: CalendarOptions): [string, string[]] {
  const own = Intl.DateTimeFormat().resolvedOptions().timeZone;
  const [first = own, ...besides] = zone === undefined ? [own] : zone.split(",").map((name) => name.trim());
  for (const name of [first, ...besides]) zoneOf(name);
  return [first, besides];
}

function yearsOf(given: string, zone: string): number | readonly [number, number] {
  if (given === "next") return DateTime.now().setZone(zoneOf(zone)).year + 1;
  const [, first, last] = /^(-?\d{4})(?:-(-?\d{4}))?$/.exec(given) ?? [];
  if (first === undefined) {
    throw new ApsidaryError(
      "bad-date",
      `${shown(given)} is no year; give four digits such as 2027, several such as 2027-2030, or next.`,
    );
  }
  return last === undefined ? Number(first) : [Number(first), Number(last)];
}

function styleOf(options: CalendarOptions, besides: readonly string[]): HouseStyle {
  return {
    besides,
    finest: choiceOf("--unit", options.unit ?? "minute", ["minute", "hour", "day"]),
    rounding: choiceOf("--rounding", options.rounding ?? "nearest", ["nearest", "cut"]),
    months: choiceOf("--months", options.months ?? "numbers", ["numbers", "names"]),
    ...(options.lang === undefined ? {} : { language: options.lang }),
  };
}
