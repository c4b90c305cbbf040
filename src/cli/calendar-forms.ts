import { calendarEvents } from "../calendar/calendar-events.ts";
import { calendarRecord, calendarRecordNames } from "../calendar/calendar-record.ts";
import type { CalendarRow } from "../calendar/calendar-row.ts";
import type { CompleteStyle } from "../calendar/house-style.ts";
import { ApsidaryError } from "../error.ts";
import { answerPieces } from "./answer-pieces.ts";
import type { CalendarRequest } from "./calendar-request.ts";
import { shown } from "./choice-of.ts";

/** A calendar or a list before it has a form. */
export interface CalendarAnswer {
  readonly title: string;
  /** The fields of the JSON before its rows. */
  readonly head: Readonly<Record<string, unknown>>;
  readonly rows: Iterable<CalendarRow>;
  readonly report: (rows: Iterable<CalendarRow>) => Iterable<string>;
  readonly page: (rows: Iterable<CalendarRow>) => Iterable<string>;
}

const FILE_NOTE =
  "Passages through the least and the greatest distance, rounded to what is known. Computed by apsidary.";

/**
 * Gives a calendar or a list in the form that is asked for, piece by piece.
 *
 * @throws ApsidaryError `bad-option` for a `SOURCE_DATE_EPOCH` that is no time
 */
export async function calendarForms(request: CalendarRequest, answer: CalendarAnswer): Promise<Iterable<string>> {
  const { format, style } = request;
  const { title, head, rows, report, page } = answer;
  switch (format) {
    case "html":
      return page(rows);
    case "ics":
      return fileOf(title, rows, style, request.alarmMinutes);
    case "csv": {
      const { csvLines } = await import("../report/csv-lines.ts"); // brings a library that the other forms do without
      return csvLines(calendarRecordNames(style.besides), records(rows));
    }
    default:
      return answerPieces<CalendarRow>(format, { head, names: [], rows, report });
  }
}

async function fileOf(
  name: string,
  rows: Iterable<CalendarRow>,
  style: CompleteStyle,
  alarmMinutes: number | null,
): Promise<Iterable<string>> {
  const stamp = stampOf(process.env.SOURCE_DATE_EPOCH);
  const { calendarFile } = await import("../report/calendar-file.ts"); // as above
  return [calendarFile({ name, description: FILE_NOTE, stamp, alarmMinutes }, calendarEvents(rows, style))];
}

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

function* records(rows: Iterable<CalendarRow>) {
  for (const row of rows) yield calendarRecord(row);
}
