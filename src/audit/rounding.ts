import type { PublishedWhen } from "./published-when.ts";

/**
 * How a list brings a moment to its last digit.
 *
 * - `usual`: minutes and hours to the nearest; a day, month or year is the one that holds the moment.
 * - `other`: minutes and hours cut off; a day is that of the nearest midnight.
 * - `up`: minutes and hours to the next; no careful editor does this.
 */
export type RoundingRule = "usual" | "other" | "up";
export const ROUNDING_RULES: readonly RoundingRule[] = Object.freeze(["usual", "other", "up"]);

/** How likely each is before a list has been looked at. Common practice, no source. */
export const RULE_SHARES: Readonly<Record<RoundingRule, number>> = Object.freeze({ usual: 0.7, other: 0.27, up: 0.03 });

/** Gives the least value of published minus true that a rule can leave, seconds; the greatest is one unit more. */
function leastResidual(when: PublishedWhen, rule: RoundingRule): number {
  const unit = when.unitSeconds;
  if (rule === "usual") return -unit / 2;
  if (rule === "up") return 0;
  return when.whole ? 0 : -unit;
}

/** Whether a rule could have left a residual, where the true time is known to `bound`. */
export function ruleFits(when: PublishedWhen, rule: RoundingRule, residual: number, bound: number): boolean {
  const least = leastResidual(when, rule);
  // a hair for the arithmetic of seconds since 1858
  return residual >= least - bound - 1e-5 && residual <= least + when.unitSeconds + bound + 1e-5;
}

/** Density of residuals under a rule, per second: even over the unit, widened by the bound. */
export function ruleDensity(when: PublishedWhen, rule: RoundingRule, residual: number, bound: number): number {
  return ruleFits(when, rule, residual, bound) ? 1 / (when.unitSeconds + 2 * bound) : 0;
}

/** The same for values that are one digit off as well. */
export function nearMissDensity(when: PublishedWhen, rule: RoundingRule, residual: number, bound: number): number {
  const unit = when.unitSeconds;
  const least = leastResidual(when, rule) - unit;
  return residual >= least - bound && residual <= least + 3 * unit + bound ? 1 / (3 * unit + 2 * bound) : 0;
}
