import { groupedNumber } from "../report/grouped-number.ts";

/** Gives a span of time in days and whole hours, without sign: `6 h`, `1 day`, `1 day 13 h`, `365 days 6 h`; nought is `less than 1 h`. */
export function hoursInWords(hours: number): string {
  const whole = Math.round(Math.abs(hours));
  const days = Math.floor(whole / 24);
  const rest = whole % 24;
  if (whole === 0) return "less than 1 h";
  const dayText = days === 0 ? [] : [daysInWords(days)];
  return [...dayText, ...(rest === 0 ? [] : [`${rest} h`])].join(" ");
}

/** Gives a whole number of days: `1 day`, `27 days`, `10 755 days`. */
export function daysInWords(days: number): string {
  return `${groupedNumber(days, 0)} ${days === 1 ? "day" : "days"}`;
}
