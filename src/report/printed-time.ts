import type { PrintedUnit } from "./printed-unit.ts";

/** Characters of `YYYY-MM-DDTHH:MM` that a unit keeps, counted from the end of the year. */
const KEPT: Record<PrintedUnit, number> = { year: 0, month: 3, day: 6, hour: 9, minute: 12 };

/**
 * Rounds the reading of a clock to the unit in which it is printed.
 *
 * Minutes and hours go to the nearest, halves up, and carry into the date. A day is the day that holds the instant, so
 * days, months and years stay as they are.
 *
 * @param clock what a clock and calendar show, as milliseconds since their 1970-01-01 00:00 (proleptic Gregorian, days of 86 400 s);
 *   of an instant in a zone this is its Unix time plus the zone's offset
 * @returns the rounded reading, in the same form
 */
export function roundedClock(clock: number, unit: PrintedUnit): number {
  const step = unit === "minute" ? 60_000 : unit === "hour" ? 3_600_000 : 1;
  return Math.floor(clock / step + 0.5) * step;
}

/**
 * Gives an instant as it is printed: `2026-01-03 17:16`, `2026-01-03 17`, `2026-01-03`, `2026-01` or `2026`.
 *
 * @param clock as in `roundedClock`
 */
export function printedTime(clock: number, unit: PrintedUnit): string {
  const text = new Date(roundedClock(clock, unit)).toISOString();
  return text.slice(0, text.indexOf("-", 1) + KEPT[unit]).replace("T", " ");
}
