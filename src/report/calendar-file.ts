import ical, { ICalAlarmType, ICalEventTransparency } from "ical-generator";

/** An entry of a calendar file. */
export interface CalendarEvent {
  /** Stays the same when the file is made again. */
  readonly uid: string;
  /** An instant; or, of an event that takes whole days, the first day and the day after the last, as midnights of UTC. */
  readonly when: { readonly at: Date } | { readonly firstDay: Date; readonly dayAfter: Date };
  readonly summary: string;
  readonly description: string;
  /** For programs that read the file again, as properties of our own: the unit to which an instant is known where that is not the minute, and the offset of the clock whose days whole days are. */
  readonly unit?: string;
  readonly offset?: string;
}

/** A calendar file as a whole. */
export interface CalendarFile {
  readonly name: string;
  readonly description: string;
  /** `DTSTAMP` of every event: when the file was made. */
  readonly stamp: Date;
  /** Minutes before an event at which it rings; `null` for silence. Events of whole days ring as long before their midnight. */
  readonly alarmMinutes: number | null;
}

const UNIT_PROPERTY = "X-APSIDARY-UNIT";
const OFFSET_PROPERTY = "X-APSIDARY-OFFSET";

/**
 * Writes a calendar file after RFC 5545: instants in UTC, whole days as dates; no event keeps its time busy.
 *
 * @param file   what the file says of itself
 * @param events in order
 * @returns the text, lines ended by CR LF and folded
 */
export function calendarFile(file: CalendarFile, events: Iterable<CalendarEvent>): string {
  const calendar = ical({
    name: file.name,
    description: file.description,
    prodId: { company: "Apsidary", product: "apsidary calendar", language: "EN" },
  });
  for (const { uid, when, summary, description, unit, offset } of events) {
    const x = [
      ...(unit === undefined ? [] : [{ key: UNIT_PROPERTY, value: unit }]),
      ...(offset === undefined ? [] : [{ key: OFFSET_PROPERTY, value: offset }]),
    ];
    const event = calendar.createEvent({
      id: uid,
      stamp: file.stamp,
      summary,
      description,
      transparency: ICalEventTransparency.TRANSPARENT,
      x,
      ...("at" in when
        ? { start: when.at }
        : { start: when.firstDay, end: when.dayAfter, allDay: true, timezone: "UTC" }),
    });
    if (file.alarmMinutes !== null) {
      event.createAlarm({ type: ICalAlarmType.display, trigger: file.alarmMinutes * 60, description: summary });
    }
  }
  return `${calendar.toString()}\r\n`;
}
