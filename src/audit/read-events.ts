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
 * Events without a kind are passed over. A time without seconds is told to the minute, a date alone to the day. Events cannot be mended in their place.
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
  const start = [...event].find(([name]) => /^DTSTART\b/.test(name));
  const summary = [...event].find(([name]) => /^SUMMARY\b/.test(name))?.[1] ?? "";
  const [, y, m, d, h, min, s, z] = /^(\d{4})(\d\d)(\d\d)(?:T(\d\d)(\d\d)(\d\d)(Z)?)?$/.exec(start?.[1] ?? "") ?? [];
  const title = (/^[^\\,;]*/.exec(summary)?.[0] ?? "").trim();
  if (!start || y === undefined || title === "") return [];
  const clock = h === undefined ? "" : `T${h}:${min}${s === "00" ? "" : `:${s}`}${z ?? ""}`;
  const zone = /TZID="?([^;:"]+)/.exec(start[0])?.[1] ?? "";
  const values = [title, `${y}-${m}-${d}${clock}`, zone];
  const cells = values.map((value) => ({ value, start: 0, end: 0, quoted: false }));
  const rows = readCells(line, cells, values, COLUMNS, settings);
  return rows.filter((row) => !("problem" in row) || !row.problem.startsWith("names no kind"));
}
