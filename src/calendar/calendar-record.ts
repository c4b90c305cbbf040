import { CALENDAR_FIELDS, type CalendarRow } from "./calendar-row.ts";

/** A row as a line of CSV holds it: flat, text, numbers and `null` alone. */
export type CalendarRecord = Readonly<Record<string, string | number | null>>;

/**
 * Gives the names of a CSV's columns: the fields of a row, then for each zone beside the calendar's own `local ZONE` and `printed ZONE`.
 *
 * @param besides the zones, in their order
 */
export function calendarRecordNames(besides: readonly string[]): string[] {
  return [...CALENDAR_FIELDS, ...besides.flatMap((zone) => [`local ${zone}`, `printed ${zone}`])];
}

/** Gives a row as a line of CSV; notes stand with spaces between them. */
export function calendarRecord(row: CalendarRow): CalendarRecord {
  const record: Record<string, string | number | null> = {};
  for (const field of CALENDAR_FIELDS) {
    const value = row[field];
    if (Array.isArray(value)) record[field] = value.join(" ");
    else record[field] = typeof value === "boolean" ? String(value) : (value as string | number | null);
  }
  for (const { zone, local, printed } of row.besides ?? []) {
    record[`local ${zone}`] = local;
    record[`printed ${zone}`] = printed;
  }
  return record;
}
