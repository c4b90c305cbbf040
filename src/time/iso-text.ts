import { ApsidaryError } from "../error.ts";
import { gregorianOfDay } from "./civil-calendar.ts";

/**
 * Gives a day and a time of day as ISO 8601 text without a zone, `2026-01-03T17:15:37.939`.
 *
 * @param day          Modified Julian day number
 * @param secondsOfDay since its beginning
 * @param secondsInDay how many seconds this day has; those past 86 400 are printed as the seconds 60 of its last minute
 * @param decimals     of the second, 0 to 9; rounded to nearest, with carry
 * @throws `bad-option` where `decimals` is not a whole number from 0 to 9
 */
export function isoText(day: number, secondsOfDay: number, secondsInDay: number, decimals: number): string {
  if (!(Number.isInteger(decimals) && decimals >= 0 && decimals <= 9)) {
    throw new ApsidaryError("bad-option", `${decimals} decimals of a second cannot be printed; ask for 0 to 9.`);
  }
  const scale = 10 ** decimals;
  let ticks = Math.round(secondsOfDay * scale);
  let printedDay = day;
  if (ticks >= secondsInDay * scale) {
    ticks -= secondsInDay * scale;
    printedDay += 1;
  }
  const seconds = Math.floor(ticks / scale);
  const minuteOfDay = Math.min(Math.floor(seconds / 60), 1439);
  const fraction = decimals === 0 ? "" : `.${String(ticks - seconds * scale).padStart(decimals, "0")}`;
  const time = `${two(Math.floor(minuteOfDay / 60))}:${two(minuteOfDay % 60)}:${two(seconds - 60 * minuteOfDay)}`;
  return `${isoDate(printedDay)}T${time}${fraction}`;
}

/** Gives the proleptic Gregorian date of a Modified Julian day number as ISO text; years beyond 0 to 9999 with sign and six digits. */
export function isoDate(mjd: number): string {
  const { year, month, day } = gregorianOfDay(mjd);
  return `${isoYear(year)}-${two(month)}-${two(day)}`;
}

function isoYear(year: number): string {
  if (year >= 0 && year <= 9999) return String(year).padStart(4, "0");
  return `${year < 0 ? "-" : "+"}${String(Math.abs(year)).padStart(6, "0")}`;
}

function two(value: number): string {
  return String(value).padStart(2, "0");
}
