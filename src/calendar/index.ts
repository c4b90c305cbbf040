export {
  apsisCalendar,
  CALENDAR_PAIRS,
  type CalendarQuery,
  type CalendarSpan,
  calendarSpan,
} from "./apsis-calendar.ts";
export { type BesideTime, CALENDAR_FIELDS, type CalendarRow, NOTE_CODES, type NoteCode } from "./calendar-row.ts";
export { type CompleteStyle, completeStyle, type HouseStyle } from "./house-style.ts";
