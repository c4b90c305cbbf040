import { mkdtemp, readFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { apsisCalendar, type CalendarSpan, calendarSpan } from "../calendar/apsis-calendar.ts";
import { pairWords } from "../calendar/body-names.ts";
import { CHANGE_FIELDS, calendarChanges } from "../calendar/calendar-changes.ts";
import type { CalendarRow } from "../calendar/calendar-row.ts";
import { earlierCalendar } from "../calendar/earlier-calendar.ts";
import { mostExtreme } from "../calendar/most-extreme.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { asciiText } from "../report/ascii-text.ts";
import { zoneOf } from "../time/zone-of.ts";
import { answerPieces } from "./answer-pieces.ts";
import type { CalendarOptions } from "./calendar.ts";
import { type CalendarAnswer, calendarForms } from "./calendar-forms.ts";
import { changesReport, extremesReport } from "./calendar-lists.ts";
import { calendarHtml, calendarReport } from "./calendar-report.ts";
import { type CalendarRequest, calendarRequest, type ListRequest } from "./calendar-request.ts";
import { shown } from "./choice-of.ts";
import { openFor } from "./open-for.ts";
import { mayShowProgress, withProgress } from "./progress.ts";
import { type Provenance, provenanceOf } from "./provenance.ts";
import { writeAnswer } from "./write-answer.ts";

/**
 * Answers `apsidary calendar`.
 *
 * @param given   the years, as given; `next` is the year after this machine's, in the zone
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used, before anything is written
 */
export async function runCalendar(given: string, options: CalendarOptions): Promise<void> {
  const request = calendarRequest(given, options);
  const earlier = options.against === undefined ? null : await readEarlier(options.against, request);
  const ephemeris = await openFor(options);
  const span = calendarSpan(ephemeris, request);
  const rows = () => apsisCalendar(ephemeris, request);
  const drawn = rows(); // refuses what cannot be answered
  const made = await provenanceOf(ephemeris, { pairs: request.pairs, span, source: request.source });
  const watched = withProgress(drawn, timeOf, span.from, span.to, mayShowProgress(options.out));

  if (earlier && request.format !== "html" && request.format !== "ics") {
    const before = { rows: earlier.rows, firstYear: earlier.years[0] };
    const changes = calendarChanges(before, { rows: [...watched], firstYear: span.first });
    const title = `Apsis passages of ${yearsText(span.first, span.last)} against ${yearsText(...earlier.years)}, ${request.zone}`;
    const pieces = await answerPieces(request.format, {
      head: {
        schema: "apsidary/calendar-changes/1",
        made,
        years: [span.first, span.last],
        zone: request.zone,
        againstYears: earlier.years,
      },
      names: CHANGE_FIELDS,
      rows: changes,
      report: () => changesReport(title, changes, made),
    });
    await writeAnswer(options.ascii ? inAscii(pieces) : pieces, options.out);
    return;
  }

  const answer = request.list
    ? listAnswer(request, request.list, span, watched, made)
    : yearAnswer(ephemeris, request, span, watched, made);
  const pieces = await calendarForms(request, answer);
  if (options.page !== undefined) {
    const path = options.page === true ? await temporaryPage(span) : options.page;
    await writePage(answer.page(rows()), path);
    await writeAnswer(options.ascii ? inAscii(pieces) : pieces, undefined);
    process.stderr.write(`apsidary: the page of this calendar is ${resolve(path)}\n`);
    return;
  }
  await writeAnswer(options.ascii ? inAscii(pieces) : pieces, options.out);
}

function yearAnswer(
  ephemeris: Ephemeris,
  request: CalendarRequest,
  span: CalendarSpan,
  rows: Iterable<CalendarRow>,
  made: Provenance,
): CalendarAnswer {
  const { zone, style, source, pairs } = request;
  const years: readonly [number, number] = [span.first, span.last];
  const title = `Apsis passages of ${yearsText(...years)}, ${zone}`;
  const inUtc = zoneOf(zone).equals(zoneOf("UTC"));
  return {
    title,
    head: headOf(request, span, made),
    rows,
    report: (drawn) => calendarReport(drawn, { title, style, inUtc, made }),
    page: (drawn) => calendarHtml(ephemeris, drawn, { title, zone, style, source, years }, pairs, made),
  };
}

function listAnswer(
  request: CalendarRequest,
  list: ListRequest,
  span: CalendarSpan,
  rows: Iterable<CalendarRow>,
  made: Provenance,
): CalendarAnswer {
  const kept = mostExtreme(ofKind(rows, list.kind), list.which, list.count);
  const [pair] = request.pairs;
  const what = kept[0]?.term ?? list.kind;
  const about = pair ? pairWords(pair.name) : "";
  const title = `${about}, ${what}: the ${kept.length} ${list.which} of ${yearsText(span.first, span.last)}, ${request.zone}`;
  return {
    title,
    head: { ...headOf(request, span, made), list },
    rows: kept,
    report: () => extremesReport(title, kept, request.style, made),
    page: () => [],
  };
}

function headOf({ zone }: CalendarRequest, { first, last }: CalendarSpan, made: Provenance) {
  return { schema: "apsidary/calendar/1", made, years: [first, last], zone };
}

function* ofKind(rows: Iterable<CalendarRow>, kind: string): Generator<CalendarRow, void, undefined> {
  for (const row of rows) if (row.kind === kind) yield row;
}

function* inAscii(pieces: Iterable<string>): Generator<string, void, undefined> {
  for (const piece of pieces) yield asciiText(piece);
}

function timeOf({ tdbSeconds }: CalendarRow): number {
  return tdbSeconds;
}

function yearsText(first: number, last: number): string {
  return first === last ? String(first) : `${first} to ${last}`;
}

/** A file in a new folder among the temporary files, so that nothing of the user's is written over. */
async function temporaryPage({ first, last }: CalendarSpan): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), "apsidary-"));
  return join(folder, `apsides-${first === last ? first : `${first}-${last}`}.html`);
}

/** Writes the page; a failure names the option that was given. */
async function writePage(pieces: Iterable<string>, path: string): Promise<void> {
  try {
    await writeAnswer(pieces, path);
  } catch (error) {
    if (!(error instanceof ApsidaryError) || error.code !== "unwritable") throw error;
    throw new ApsidaryError(error.code, error.message.replace(/^--out /, "--page "));
  }
}

/** Reads the calendar of `--against`, which must be for the same zone. */
async function readEarlier(path: string, { zone }: CalendarRequest) {
  const name = `--against ${shown(path)}`;
  let text: string;
  try {
    text = await readFile(path, "utf8");
  } catch (error) {
    const { code, message } = error as NodeJS.ErrnoException;
    const why = code === "ENOENT" || code === "ENOTDIR" ? "there is no such file" : message;
    throw new ApsidaryError("unreadable", `${name} cannot be read: ${why}.`);
  }
  const earlier = earlierCalendar(text, name);
  if (!zoneOf(earlier.zone).equals(zoneOf(zone))) {
    throw new ApsidaryError("bad-input", `${name} is for ${earlier.zone}, not ${zone}; add --zone ${earlier.zone}.`);
  }
  return earlier;
}
