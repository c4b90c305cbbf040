import type { CauseName } from "./cause.ts";

/**
 * What a cause's odds must be at least against the next cause and against chance before it is named.
 *
 * Nineteen to one is the 95 % of this library's half-widths.
 */
export const NAMED = 19;
/** What the shift of a whole list by years or kinds must be against no shift. */
export const SHIFTED = 100;

/**
 * How likely each cause is before a row has been looked at, against 0.2 for an error of no known kind. Common practice, no source: round
 * figures, of which the findings depend little, since a cause that gives a row's own minute is a hundred times as likely after as before.
 */
export const ROW_SHARES: Readonly<Partial<Record<CauseName, number>>> = Object.freeze({
  "scale-tt": 0.03,
  zone: 0.2,
  "half-day": 0.12,
  "whole-days": 0.15,
  "emb-centre": 0.08,
  "ssb-centre": 0.05,
  "kind-swapped": 0.08,
  "year-copied": 0.08,
  "month-day-swapped": 0.05,
  "julian-calendar": 0.02,
  "light-time": 0.04,
  "coarse-model": 0.1,
});
export const CHANCE_SHARE = 0.2;

/** The same for a whole list, against 0.8 for none. */
export const LIST_SHARES: Readonly<Partial<Record<CauseName, number>>> = Object.freeze({
  "scale-tt": 0.03,
  zone: 0.06,
  "half-day": 0.006,
  "whole-days": 0.01,
  "emb-centre": 0.02,
  "ssb-centre": 0.006,
  "kind-swapped": 0.006,
  "year-copied": 0.01,
  "month-day-swapped": 0.006,
  "julian-calendar": 0.006,
  "light-time": 0.008,
  "coarse-model": 0.03,
});
export const NO_CAUSE_SHARE = 0.8;
/** A whole list off by one amount that no cause explains. */
export const CONSTANT_SHARE = 0.002;

/** Slips of any kind among the rows of a list. */
export const SLIP_SHARE = 0.08;
/**
 * Values one digit off among the rows of a list: few in a list that was made with as much care as its digits promise, half in one whose source
 * scatters by more than its last digit (handbooks from older theories do); and how likely each sort of list is.
 */
export const NEAR_MISSES: readonly { readonly share: number; readonly likely: number }[] = Object.freeze([
  { share: 0.04, likely: 0.9 },
  { share: 0.5, likely: 0.1 },
]);

const DAY = 86_400;
/** Errors by chance are taken to be at least so large, and at most. */
const LEAST = 30;
const MOST = 400 * DAY;
const LOG_WIDTH = Math.log(MOST / LEAST);

/**
 * Density of errors of no known kind, per second: one third spread over the hours of a day either way, one third over half a month either way, one
 * third over all sizes alike (evenly in the logarithm).
 *
 * @param residual published minus computed, seconds
 */
export function chanceDensity(residual: number): number {
  const size = Math.abs(residual);
  let density = 1 / (2 * Math.max(size, LEAST) * LOG_WIDTH);
  if (size <= 14 * 3600) density += 1 / (28 * 3600);
  if (size <= 16 * DAY) density += 1 / (32 * DAY);
  return density / 3;
}

/** Sum of numbers that are given by their logarithms, as a logarithm. */
export function logSum(logs: readonly number[]): number {
  const most = Math.max(...logs);
  if (most === -Infinity) return most;
  let sum = 0;
  for (const log of logs) sum += Math.exp(log - most);
  return most + Math.log(sum);
}
