import { dayOfGregorian, gregorianOfDay } from "../../time/civil-calendar.ts";
import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";

/** Day and month changed places: 5 July became 7 May. Only days up to the twelfth can. */
export const monthDaySwapped: TimeCause = Object.freeze({
  name: "month-day-swapped",
  predict(row: Case): Prediction[] {
    if (row.when.whole === "month" || row.when.whole === "year") return [];
    const { wallSeconds } = row.when;
    const day = Math.floor(wallSeconds / 86_400);
    const date = gregorianOfDay(day);
    if (date.day > 12 || date.day === date.month) return [];
    const swapped = dayOfGregorian(date.year, date.day, date.month);
    const other = readOtherwise(row, { wallSeconds: wallSeconds + (swapped - day) * 86_400 });
    return other ? [{ detail: "day and month", share: 1, residual: other.residual, bound: other.bound }] : [];
  },
  say: () => "day and month have changed places",
});
