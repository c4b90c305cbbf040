import { groupedNumber } from "../report/grouped-number.ts";
import type { PrintedUnit } from "../report/printed-unit.ts";
import type { CompleteStyle } from "./house-style.ts";

/** The part of a style that decides how a value looks to a reader. */
export type Look = Pick<CompleteStyle, "months" | "language">;

/**
 * Gives a printed time as a house shows it: `2026-01-03 17:16`, `2026-01-03 17 h`, or `3 Jan 2026, 17:16` with names, in the style's language.
 *
 * @param printed   as `printedLocal` gives it
 * @param unit      its last place
 * @param weekday   whether the day of the week is shown as well
 */
export function shownTime(printed: string, unit: PrintedUnit, look: Look, weekday = false): string {
  const hour = unit === "hour" ? " h" : "";
  const [date = "", clock] = printed.split(" ");
  const fields = /^(\d{4})(?:-(\d\d)(?:-(\d\d))?)?$/.exec(date);
  if (!fields || (look.months === "numbers" && !weekday)) return printed + hour;
  const at = new Date(0);
  at.setUTCFullYear(Number(fields[1]), Number(fields[2] ?? 1) - 1, Number(fields[3] ?? 1));
  const shownDate = fields[2] ? dateText(at, fields[3] !== undefined, look, weekday, date) : date;
  return clock === undefined ? shownDate : `${shownDate}${look.months === "names" ? ", " : " "}${clock}${hour}`;
}

function dateText(at: Date, withDay: boolean, { months, language }: Look, weekday: boolean, iso: string): string {
  const locale = language ?? "en-GB";
  const day =
    weekday && withDay ? new Intl.DateTimeFormat(locale, { weekday: "short", timeZone: "UTC" }).format(at) : "";
  const date =
    months === "numbers"
      ? iso
      : new Intl.DateTimeFormat(locale, {
          calendar: "gregory",
          numberingSystem: "latn",
          year: "numeric",
          month: "short",
          ...(withDay ? { day: "numeric" } : {}),
          timeZone: "UTC",
        }).format(at);
  return day ? `${day} ${date}` : date;
}

/** Gives a number in the style's language, or with thin groups where it has none; `digits` as for `groupedNumber`. */
export function shownNumber(value: number, digits: number, { language }: Pick<Look, "language">, sign = false): string {
  const plus = sign && value > 0 ? "+" : "";
  if (language === null) return plus + groupedNumber(value, digits);
  const step = 10 ** Math.max(-digits, 0);
  const decimals = Math.max(digits, 0);
  return (
    plus +
    new Intl.NumberFormat(language, {
      numberingSystem: "latn",
      minimumFractionDigits: decimals,
      maximumFractionDigits: decimals,
    }).format(digits < 0 ? Math.round(value / step) * step : value)
  );
}
