import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";

/**
 * Morning was taken for afternoon or the other way round: twelve hours off, and the date kept.
 *
 * A time after noon thus comes from twelve hours before, a time before noon from twelve hours after.
 */
export const halfDay: TimeCause = Object.freeze({
  name: "half-day",
  predict(row: Case): Prediction[] {
    if (row.when.whole) return [];
    const { wallSeconds } = row.when;
    const before = wallSeconds - Math.floor(wallSeconds / 86_400) * 86_400 < 43_200;
    const other = readOtherwise(row, { wallSeconds: wallSeconds + (before ? 43_200 : -43_200) });
    if (!other) return [];
    return [{ detail: before ? "afternoon" : "morning", share: 1, residual: other.residual, bound: other.bound }];
  },
  say: (detail: string) => `morning and afternoon were confused; it is in the ${detail}`,
});
