import type { CalendarRow } from "./calendar-row.ts";

/**
 * Gives the nearest or the farthest of some rows, the most extreme first; so many are in memory at a time.
 *
 * @param rows  of one pair
 * @param which which end
 * @param count above zero
 */
export function mostExtreme(
  rows: Iterable<CalendarRow>,
  which: "nearest" | "farthest",
  count: number,
): readonly CalendarRow[] {
  const sign = which === "nearest" ? 1 : -1;
  const order = (a: CalendarRow, b: CalendarRow) => sign * (a.distanceKm - b.distanceKm) || a.tdbSeconds - b.tdbSeconds;
  let kept: CalendarRow[] = [];
  for (const row of rows) {
    kept.push(row);
    if (kept.length >= 2 * count + 64) kept = kept.sort(order).slice(0, count);
  }
  return kept.sort(order).slice(0, count);
}
