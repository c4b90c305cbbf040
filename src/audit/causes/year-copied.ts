import { dayOfGregorian, gregorianOfDay } from "../../time/civil-calendar.ts";
import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";

/** How likely each year is to be the one that was copied. */
const SHARES: readonly (readonly [years: number, share: number])[] = [
  [-1, 0.5],
  [1, 0.3],
  [-2, 0.1],
  [2, 0.1],
];

/** Month, day and time were copied from the line of another year, one or two years before or after. */
export const yearCopied: TimeCause = Object.freeze({
  name: "year-copied",
  predict(row: Case): Prediction[] {
    if (row.when.whole === "month" || row.when.whole === "year") return [];
    const { wallSeconds } = row.when;
    const day = Math.floor(wallSeconds / 86_400);
    const date = gregorianOfDay(day);
    const found: Prediction[] = [];
    for (const [years, share] of SHARES) {
      const copied = dayOfGregorian(date.year + years, date.month, date.day);
      const other = readOtherwise(row, { wallSeconds: wallSeconds + (copied - day) * 86_400 });
      if (!other || other.at === row.at) continue;
      const size = Math.abs(years);
      const detail = `${size === 1 ? "the year" : "two years"} ${years < 0 ? "before" : "after"}`;
      found.push({ detail, share, residual: other.residual, bound: other.bound });
    }
    return found;
  },
  say: (detail: string) => `day and time are those of ${detail}`,
});
