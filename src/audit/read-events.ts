import { dayOfGregorian } from "../time/civil-calendar.ts";
import type { ListRow, ReadRecord, UnreadRow } from "./list-row.ts";
import { type ReadSettings, readCells } from "./read-cells.ts";
import type { ColumnRole } from "./read-header.ts";
import type { ListRecord } from "./split-records.ts";

const COLUMNS: readonly ColumnRole[] = [
  { role: "kind" },
  { role: "when", kind: null, scale: null, rank: 0 },
  { role: "scale" },
];

/**
 * Gives a function that reads the lines of a calendar file (iCalendar, RFC 5545): an event whose summary names a kind of passage and a body is a row.
 *
 * Events without a kind are passed over. A time without seconds is told to the minute, or to the hour where the calendar says so
 * (`X-APSIDARY-UNIT`), a date alone to the day, or to the month or year that the event takes. Events cannot be mended in their place.
 */
export function eventReader(settings: ReadSettings): (record: ListRecord) => ReadRecord {
  let event: Map<string, string> | null = null;
  let began = 0;
  let last = "";
  return (record) => {
    const text = record.text.replace(/[\r\n]+$/, "");
    let rows: readonly (ListRow | UnreadRow)[] = [];
    if (text === "BEGIN:VEVENT") {
      event = new Map();
      began = record.line;
    } else if (event && /^[ \t]/.test(text)) event.set(last, (event.get(last) ?? "") + text.slice(1));
    else if (text === "END:VEVENT") {
      rows = event ? eventRows(began, event, settings) : [];
      event = null;
    } else if (event) {
      const colon = text.indexOf(":");
      last = text.slice(0, Math.max(0, colon));
      event.set(last, text.slice(colon + 1));
    }
    return { ...record, rows };
  };
}

function eventRows(line: number, event: ReadonlyMap<string, string>, settings: ReadSettings) {
  const property = (name: RegExp) => [...event].find(([key]) => name.test(key));
  const start = property(/^DTSTART\b/);
  const title = (/^[^\\,;]*/.exec(property(/^SUMMARY\b/)?.[1] ?? "")?.[0] ?? "").trim();
  const told = (name: RegExp) => property(name)?.[1] ?? "";
  const time = start && timeOf(start[1], told(/^DTEND\b/), told(/^X-APSIDARY-UNIT\b/), told(/^X-APSIDARY-OFFSET\b/));
  if (!time || title === "") return [];
  const zone = time.offset || (/TZID="?([^;:"]+)/.exec(start[0])?.[1] ?? "");
  const values = [title, time.text, zone];
  const cells = values.map((value) => ({ value, start: 0, end: 0, quoted: false }));
  const rows = readCells(line, cells, values, COLUMNS, settings);
  return rows.filter((row) => !("problem" in row) || !row.problem.startsWith("names no kind"));
}

/** An event's time as text whose last digit tells its precision, and the offset of the clock on which it is a round number. */
function timeOf(start: string, end: string, unit: string, offset: string): { text: string; offset: string } | null {
  const [, y, m, d, h, min, s, z = ""] = DATE_TIME.exec(start) ?? [];
  if (y === undefined || m === undefined || d === undefined) return null;
  if (h === undefined || min === undefined) {
    const [, ey, em, ed] = DATE_TIME.exec(end) ?? [];
    const days = ey === undefined ? 1 : dayOf(ey, em, ed) - dayOf(y, m, d);
    return { text: days > 300 ? y : days > 27 ? `${y}-${m}` : `${y}-${m}-${d}`, offset };
  }
  if (unit !== "hour" || z === "")
    return { text: `${y}-${m}-${d}T${h}:${min}${s === "00" ? "" : `:${s}`}${z}`, offset: "" };
  // whole hours of a zone with odd minutes: told on the nearest clock on which they are whole
  const past = Number(min);
  const wall = new Date(Date.UTC(Number(y), Number(m) - 1, Number(d), Number(h), past === 0 ? 0 : 60)).toISOString();
  return {
    text: wall.slice(0, 13).replace("T", " "),
    offset: past === 0 ? "" : `+00:${String(60 - past).padStart(2, "0")}`,
  };
}

const DATE_TIME = /^(\d{4})(\d\d)(\d\d)(?:T(\d\d)(\d\d)(\d\d)(Z)?)?$/;

function dayOf(year = "", month = "", day = ""): number {
  return dayOfGregorian(Number(year), Number(month), Number(day));
}
