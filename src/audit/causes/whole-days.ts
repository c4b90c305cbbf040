import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";

const MOST = 31;

/** How likely a slip by so many days is among slips of days: one day most of all. */
function shareOf(days: number): number {
  const size = Math.abs(days);
  if (size === 1) return 0.2;
  if (size === 2) return 0.1;
  if (size === 3) return 0.05;
  return 0.3 / (2 * (MOST - 3));
}

/** The date is off by whole days, up to a month, and the time of day is right. */
export const wholeDays: TimeCause = Object.freeze({
  name: "whole-days",
  predict(row: Case): Prediction[] {
    const found: Prediction[] = [];
    for (let days = -MOST; days <= MOST; days++) {
      if (days === 0) continue;
      const other = readOtherwise(row, { wallSeconds: row.when.wallSeconds - days * 86_400 });
      if (!other) continue;
      const size = Math.abs(days);
      const detail = `${size} day${size === 1 ? "" : "s"} ${days > 0 ? "late" : "early"}`;
      found.push({ detail, share: shareOf(days), residual: other.residual, bound: other.bound });
    }
    return found;
  },
  say: (detail: string) => `the date is ${detail} and the time of day right`,
});
