import { ApsidaryError } from "../error.ts";

/** The last place of an instant that may be printed. */
export type PrintedUnit = "minute" | "hour" | "day" | "month" | "year";

/** Half-widths, seconds, up to which a unit may be printed: an eighth of it (of a month: four days). */
const LIMITS: readonly (readonly [PrintedUnit, number])[] = [
  ["minute", 7.5],
  ["hour", 450],
  ["day", 10_800],
  ["month", 345_600],
];

/**
 * Gives the finest unit of an instant that its uncertainty defends.
 *
 * Why an eighth keeps 95 % of printed values right. Let U be the unit, e the error of the computed instant, u its
 * half-width of 95 %. The printed text is wrong where an edge between two printed values lies between the computed
 * and the true instant. Passages fall anywhere within their minute, hour or day, evenly, so given e that happens with
 * the probability min(1, |e| / U), and over all passages with
 *
 *     share wrong ≤ mean |e| / U.
 *
 * For errors that follow the normal law with deviation s, mean |e| = √(2/π) s = 0.798 s. A half-width of two
 * deviations, u = 2 s, thus has mean |e| = 0.399 u, and with u ≤ U / 8 the share wrong is at most 0.399 / 8 = 4.99 %. It falls
 * in proportion to u, so that most rows are far better. At the very limit the bare 1.96 deviations give 94.9 %.
 * Errors that spread evenly over the whole of ±u, which half-widths of this library do not (their median may be up to
 * three deviations, an even spread has 1.73), would give 93.8 % there, and 95 % from u = U / 10 down. Four days of a
 * month of 28 to 31 are between an eighth and a seventh.
 *
 * @param uncertaintySeconds half-width that at least 95 % of such instants keep, time scale included
 * @throws ApsidaryError `bad-option` for a number below zero or NaN
 */
export function printedUnit(uncertaintySeconds: number): PrintedUnit {
  if (!(uncertaintySeconds >= 0)) {
    throw new ApsidaryError("bad-option", `an uncertainty must be zero seconds or more, not ${uncertaintySeconds}.`);
  }
  for (const [unit, limit] of LIMITS) if (uncertaintySeconds <= limit) return unit;
  return "year";
}
