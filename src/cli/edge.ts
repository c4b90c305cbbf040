import { ApsidaryError } from "../error.ts";
import type { LeapSecondList } from "../time/leap-seconds.ts";
import { tdbOf } from "../time/tdb-of.ts";
import { shown } from "./choice-of.ts";

/**
 * Gives the moment of `--from` or `--to` as TDB seconds past J2000.
 *
 * @throws ApsidaryError `bad-date`, naming the option; `bad-span` where it is missing
 */
export function edgeOf(option: "--from" | "--to", given: string | undefined, leapSeconds: LeapSecondList): number {
  if (given === undefined) {
    throw new ApsidaryError(
      "bad-span",
      `${option} is missing; give a date such as ${option} 2027-01-01, or a bare year.`,
    );
  }
  try {
    return tdbOf(given, leapSeconds);
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    throw new ApsidaryError(error.code, `${option}: ${error.message}`);
  }
}

/** Refuses a span that ends before it begins. @throws ApsidaryError `bad-span` */
export function requireOrder(from: number, to: number, options: { from?: string; to?: string }): void {
  if (from < to) return;
  const how = from === to ? "is the same moment as" : "comes after";
  throw new ApsidaryError(
    "bad-span",
    `--from ${shown(options.from ?? "")} ${how} --to ${shown(options.to ?? "")}; the end of the span must be later (it is excluded).`,
  );
}
