import { spawnSync } from "node:child_process";
import { apsisCalendar, type CalendarQuery } from "../../src/calendar/apsis-calendar.ts";
import { calendarEvents } from "../../src/calendar/calendar-events.ts";
import type { CalendarRow } from "../../src/calendar/calendar-row.ts";
import { completeStyle } from "../../src/calendar/house-style.ts";
import type { Ephemeris } from "../../src/ephemeris/open-sources.ts";
import { calendarFile } from "../../src/report/calendar-file.ts";

/** Makes the rows of a calendar and its file. */
export function madeFile(
  ephemeris: Ephemeris,
  query: CalendarQuery,
  { stamp = new Date(0), alarmMinutes = null as number | null } = {},
): { rows: CalendarRow[]; text: string } {
  const rows = [...apsisCalendar(ephemeris, query)];
  const file = { name: "Passages, Ferry Point Astronomers", description: "A trial", stamp, alarmMinutes };
  return { rows, text: calendarFile(file, calendarEvents(rows, completeStyle(query.style))) };
}

/** Whether Debian's Python has a module. */
export function pythonHas(module: string): boolean {
  return spawnSync("/usr/bin/python3", ["-c", `import ${module}`]).status === 0;
}
