import { ApsidaryError } from "../error.ts";
import type { PrintedUnit } from "../report/printed-unit.ts";
import { zoneOf } from "../time/zone-of.ts";

/** How a house prints times. Each field may be left out. */
export interface HouseStyle {
  /** Zones that stand beside the calendar's own, at most two. */
  readonly besides?: readonly string[];
  /** The finest unit that is printed, were more known; left out, the minute. */
  readonly finest?: Extract<PrintedUnit, "minute" | "hour" | "day">;
  /** Whether times go to the nearest unit or are cut off; left out, to the nearest. */
  readonly rounding?: "nearest" | "cut";
  /** Whether months are numbers, as in ISO 8601, or names; for readers only, answers for programs keep numbers. Left out, numbers. */
  readonly months?: "numbers" | "names";
  /** The language of month names, weekdays and numbers for readers, a BCP 47 tag; left out, English names and thin groups of digits. */
  readonly language?: string | null;
}

/** A house style with nothing left out. */
export interface CompleteStyle {
  readonly besides: readonly string[];
  readonly finest: "minute" | "hour" | "day";
  readonly rounding: "nearest" | "cut";
  readonly months: "numbers" | "names";
  readonly language: string | null;
}

const FINEST = ["minute", "hour", "day"] as const;
const ROUNDING = ["nearest", "cut"] as const;
const MONTHS = ["numbers", "names"] as const;

/**
 * Completes a house style.
 *
 * @throws ApsidaryError `bad-zone`; `bad-option` for a word that is none of its field's, a language that is no tag, or more than two zones
 */
export function completeStyle(style: HouseStyle = {}): CompleteStyle {
  const { besides = [], finest = "minute", rounding = "nearest", months = "numbers", language = null } = style;
  if (besides.length > 2) {
    throw new ApsidaryError(
      "bad-option",
      `${besides.length} zones beside the first do not fit a line; name two at most.`,
    );
  }
  for (const zone of besides) zoneOf(zone);
  requireWord("finest", finest, FINEST);
  requireWord("rounding", rounding, ROUNDING);
  requireWord("months", months, MONTHS);
  return Object.freeze({
    besides: Object.freeze([...besides]),
    finest,
    rounding,
    months,
    language: language === null ? null : languageTag(language),
  });
}

function requireWord(field: string, given: string, allowed: readonly string[]): void {
  if (allowed.includes(given)) return;
  throw new ApsidaryError(
    "bad-option",
    `${JSON.stringify(given)} is no ${field} of a style; it is one of ${allowed.join(", ")}.`,
  );
}

function languageTag(given: string): string {
  try {
    const [tag] = Intl.DateTimeFormat.supportedLocalesOf(given);
    if (tag !== undefined) return tag;
  } catch {
    // not formed like a tag; refused below
  }
  throw new ApsidaryError(
    "bad-option",
    `${JSON.stringify(given.slice(0, 40))} is no language known here; give a tag such as en-GB, de or pt-BR.`,
  );
}
