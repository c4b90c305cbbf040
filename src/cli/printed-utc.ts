import { printedTime } from "../report/printed-time.ts";
import { printedUnit } from "../report/printed-unit.ts";

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
