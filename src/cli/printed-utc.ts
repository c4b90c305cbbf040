import { printedTime, roundedClock } from "../report/printed-time.ts";
import { printedUnit } from "../report/printed-unit.ts";
import { julianText } from "../time/julian-text.ts";

/**
 * Gives the reading of a clock that shows the time of an ISO text without a zone or with `Z`, in milliseconds as `roundedClock`
 * takes them. The 60th second of a minute, which a leap second has, counts as the last millisecond before the next.
 */
export function clockOf(iso: string): number {
  const plain = iso.replace(/:60(\.\d+)?/, ":59.999").replace(/Z?$/, "Z");
  return Date.parse(plain);
}

/** Gives a time to the unit that its uncertainty defends; hours carry an `h`, so that they cannot be taken for anything else. */
export function printedUtc(iso: string, uncertaintySeconds: number): string {
  const unit = printedUnit(uncertaintySeconds);
  return printedTime(clockOf(iso), unit) + (unit === "hour" ? "h" : "");
}

/** Gives what `printedUtc` gives, with the date in the Julian calendar; `null` where what it gives is 1582-10-15 or later. */
export function printedJulian(iso: string, uncertaintySeconds: number): string | null {
  const julian = julianText(new Date(roundedClock(clockOf(iso), printedUnit(uncertaintySeconds))).toISOString());
  if (julian === null) return null;
  const gregorian = printedUtc(iso, uncertaintySeconds);
  const afterYear = gregorian.slice(endOfYear(gregorian)); // of the same length, whichever calendar
  const kept = julian.slice(0, endOfYear(julian) + afterYear.replace("h", "").length).replace("T", " ");
  return afterYear.endsWith("h") ? `${kept}h` : kept;
}

function endOfYear(iso: string): number {
  const end = iso.indexOf("-", 1);
  return end < 0 ? iso.length : end;
}
