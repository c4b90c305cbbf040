import { ApsidaryError } from "../error.ts";
import { shown } from "./choice-of.ts";

const UNITS = { s: 1, min: 60, h: 3600, d: 86_400 } as const;

/**
 * Gives the seconds of a step such as `6h`, `30min`, `1.5d`, `90s`.
 *
 * @throws ApsidaryError `bad-option` for anything else, and for a step below a millisecond
 */
export function stepOf(given: string | undefined): number {
  const [, number, unit] = /^(\d+(?:\.\d+)?)\s*(s|min|h|d)$/.exec(given ?? "") ?? [];
  const seconds = Number(number) * (UNITS[unit as keyof typeof UNITS] ?? Number.NaN);
  if (seconds >= 1e-3 && Number.isFinite(seconds)) return seconds;
  throw new ApsidaryError(
    "bad-option",
    `--step ${given === undefined ? "is missing" : `${shown(given)} is no step of time`}; give a number with its unit ` +
      "(s, min, h or d), such as --step 6h, at least 0.001s.",
  );
}
