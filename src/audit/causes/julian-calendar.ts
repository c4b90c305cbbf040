import { dayOfJulian, gregorianOfDay } from "../../time/civil-calendar.ts";
import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";

/** The date is one of the Julian calendar: thirteen days behind in this century. */
export const julianCalendar: TimeCause = Object.freeze({
  name: "julian-calendar",
  predict(row: Case): Prediction[] {
    if (row.when.whole === "month" || row.when.whole === "year") return [];
    const { wallSeconds } = row.when;
    const day = Math.floor(wallSeconds / 86_400);
    const date = gregorianOfDay(day);
    const meant = dayOfJulian(date.year, date.month, date.day);
    if (meant === day) return [];
    const other = readOtherwise(row, { wallSeconds: wallSeconds + (meant - day) * 86_400 });
    return other ? [{ detail: "Julian date", share: 1, residual: other.residual, bound: other.bound }] : [];
  },
  say: () => "the date is one of the Julian calendar",
});
