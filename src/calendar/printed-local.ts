import type { DateTime } from "luxon";
import { printedTime, roundedClock } from "../report/printed-time.ts";
import { type PrintedUnit, printedUnit } from "../report/printed-unit.ts";
import type { CompleteStyle } from "./house-style.ts";

/** A local time as it may be printed. */
export interface PrintedLocal {
  /** `2026-01-03 17:16`, `2026-01-03 17`, `2026-01-03`, `2026-01` or `2026`. */
  readonly text: string;
  readonly unit: PrintedUnit;
  /** The instant to which it was rounded, in its zone; its offset is the one that holds there. */
  readonly at: DateTime<true>;
}

const COARSER: readonly PrintedUnit[] = ["minute", "hour", "day", "month", "year"];

/**
 * Gives a local time to the unit that its uncertainty defends, or to the style's where that one is coarser.
 *
 * Rounding moves the instant and not the reading of the clock, so that it stays right where summer time begins or ends within
 * the minute or hour. Cut off, a time is wrong as seldom as rounded: the proof of `printedUnit` asks only how far apart the edges are.
 *
 * @param at                 the instant in its zone
 * @param uncertaintySeconds half-width that at least 95 % of such instants keep
 */
export function printedLocal(
  at: DateTime<true>,
  uncertaintySeconds: number,
  style: Pick<CompleteStyle, "finest" | "rounding">,
): PrintedLocal {
  const known = printedUnit(uncertaintySeconds);
  const unit = COARSER.indexOf(known) > COARSER.indexOf(style.finest) ? known : style.finest;
  const clock = clockOf(at);
  const step = unit === "minute" ? 60_000 : unit === "hour" ? 3_600_000 : 1;
  const target = style.rounding === "cut" ? Math.floor(clock / step) * step : roundedClock(clock, unit);
  const rounded = at.plus(target - clock);
  return { text: printedTime(clockOf(rounded), unit), unit, at: rounded };
}

/** What clock and calendar show, in milliseconds as `roundedClock` takes them. */
function clockOf(at: DateTime<true>): number {
  return at.toMillis() + at.offset * 60_000;
}
