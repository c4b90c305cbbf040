import { groupedNumber } from "./grouped-number.ts";
import { printedHalfWidth } from "./half-width.ts";

const UNITS = [
  { word: "s", seconds: 1, below: 120 },
  { word: "min", seconds: 60, below: 7200 },
  { word: "h", seconds: 3600, below: 172_800 },
  { word: "d", seconds: 86_400, below: Infinity },
] as const;

/**
 * Gives a half-width of time in the unit that suits it, rounded up to one or two digits: `0.3 s`, `25 min`, `6.5 h`, `3 d`.
 *
 * @param seconds zero or more
 */
export function durationText(seconds: number): string {
  const unit = UNITS.find(({ below }) => seconds < below) ?? UNITS[3];
  const { value, digits } = printedHalfWidth(seconds / unit.seconds, 2);
  return `${groupedNumber(value, digits)} ${unit.word}`;
}
