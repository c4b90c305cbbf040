import { gregorianOfDay } from "../time/civil-calendar.ts";
import type { PublishedWhen, WhenPart } from "./published-when.ts";

const MONTHS = [
  "January", "February", "March", "April", "May", "June", "July", "August", "September", "October", "November", "December",
]; // biome-ignore format: one list

/**
 * Writes a reading of a clock in the manner and to the precision of a printed time.
 *
 * @param wallSeconds seconds since Modified Julian day 0 on the clock that the list uses
 * @param like        the printed time that is imitated
 * @param cutOff      whether the list cuts off instead of rounding
 */
export function writeWhen(wallSeconds: number, like: PublishedWhen, cutOff = false): string {
  const unit = like.whole ? 1 : like.unitSeconds;
  const steps = wallSeconds / unit;
  const rounded = (like.whole || cutOff ? Math.floor(steps + 1e-9) : Math.floor(steps + 0.5)) * unit;
  // a thousandth of the unit keeps what is rounded from falling under its own digits again
  const at = rounded + (like.whole ? 0 : unit / 1000);
  const day = Math.floor(at / 86_400);
  const seconds = at - day * 86_400;
  const date = gregorianOfDay(day);
  const parts = like.style?.parts ?? plainParts(like);
  return parts.map((part) => ("text" in part ? part.text : fieldText(part, date, seconds))).join("");
}

function fieldText(
  part: Exclude<WhenPart, { text: string }>,
  date: { year: number; month: number; day: number },
  seconds: number,
): string {
  switch (part.field) {
    case "year":
      return date.year < 0 ? `-${padded(-date.year, Math.max(4, part.width - 1))}` : padded(date.year, part.width);
    case "month":
      return padded(date.month, part.width);
    case "monthName":
      return monthName(date.month, part.like ?? "Jan");
    case "day":
      return number(date.day + (part.decimals ? seconds / 86_400 : 0), part);
    case "hour":
      return number(part.decimals ? seconds / 3600 : Math.floor(seconds / 3600), part);
    case "hour12":
      return padded(((Math.floor(seconds / 3600) + 11) % 12) + 1, part.width);
    case "meridiem": {
      const letter = seconds < 43_200 ? "a" : "p";
      return part.like === "A" || part.like === "P" ? letter.toUpperCase() : letter;
    }
    case "minute": {
      const minutes = (seconds % 3600) / 60;
      return number(part.decimals ? minutes : Math.floor(minutes), part);
    }
    case "second":
      return number(part.decimals ? seconds % 60 : Math.floor(seconds % 60), part);
  }
}

function number(value: number, { width, decimals }: { width: number; decimals: number }): string {
  if (decimals === 0) return padded(Math.floor(value), width);
  const scale = 10 ** decimals;
  const parts = Math.floor(value * scale);
  return `${padded(Math.floor(parts / scale), width)}.${String(parts % scale).padStart(decimals, "0")}`;
}

function padded(value: number, width: number): string {
  return String(value).padStart(width, "0");
}

function monthName(month: number, like: string): string {
  const full = MONTHS[month - 1] ?? "";
  const name = like.length > 4 || (like.length === 4 && !/^sept$/i.test(like)) ? full : full.slice(0, 3);
  if (like === like.toUpperCase()) return name.toUpperCase();
  return like === like.toLowerCase() ? name.toLowerCase() : name;
}

function plainParts({ whole, unitSeconds }: PublishedWhen): readonly WhenPart[] {
  const date: WhenPart[] = [
    { field: "year", width: 4, decimals: 0 },
    { text: "-" },
    { field: "month", width: 2, decimals: 0 },
  ];
  if (whole === "year") return date.slice(0, 1);
  if (whole === "month") return date;
  const day: WhenPart[] = [...date, { text: "-" }, { field: "day", width: 2, decimals: 0 }];
  if (whole === "day") return day;
  const hour: WhenPart[] = [...day, { text: " " }, { field: "hour", width: 2, decimals: 0 }];
  if (unitSeconds >= 3600) return hour;
  const minute: WhenPart[] = [...hour, { text: ":" }, { field: "minute", width: 2, decimals: 0 }];
  if (unitSeconds >= 60) return minute;
  const decimals = Math.max(0, Math.round(-Math.log10(unitSeconds)));
  return [...minute, { text: ":" }, { field: "second", width: 2, decimals }];
}
