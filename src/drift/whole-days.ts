import { dayOfGregorian, gregorianOfDay } from "../time/civil-calendar.ts";

/**
 * Gives the days from the same date of the year before to a date: 365 or 366.
 *
 * @param day Modified Julian day number of the date; of a 29 February the same date is 1 March of the year before
 */
export function daysSinceSameDate(day: number): number {
  const { year, month, day: dayOfMonth } = gregorianOfDay(day);
  return day - dayOfGregorian(year - 1, month, dayOfMonth);
}
