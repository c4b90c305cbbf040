import { DateTime } from "luxon";
import { type Pair, pairOf } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import { CALENDAR_PAIRS } from "../calendar/apsis-calendar.ts";
import { type CompleteStyle, completeStyle } from "../calendar/house-style.ts";
import { ApsidaryError } from "../error.ts";
import type { SourceChoice } from "../passages/timeline-for.ts";
import { zoneOf } from "../time/zone-of.ts";
import { CALENDAR_FORMATS, type CalendarOptions } from "./calendar.ts";
import { choiceOf, shown } from "./choice-of.ts";
import { sourceChoiceOf } from "./options.ts";
import { pairsOf } from "./pairs.ts";

/** What `apsidary calendar` is asked for, with nothing left out. */
export interface CalendarRequest {
  readonly format: (typeof CALENDAR_FORMATS)[number];
  readonly years: number | readonly [number, number];
  readonly zone: string;
  readonly pairs: readonly Pair[];
  readonly source: SourceChoice;
  readonly rank: "principal" | "all";
  readonly style: CompleteStyle;
  readonly alarmMinutes: number | null;
  /** The list that is asked for instead of the calendar. */
  readonly list: ListRequest | null;
}

/** A list of the nearest or farthest. */
export interface ListRequest {
  readonly which: "nearest" | "farthest";
  readonly count: number;
  readonly kind: ApsisKind;
}

/** Most rows of a list. */
const MOST = 10_000;

/**
 * Reads the years and options of `apsidary calendar`.
 *
 * @throws ApsidaryError `bad-option`, `bad-date`, `bad-zone`, `bad-pair`
 */
export function calendarRequest(given: string, options: CalendarOptions): CalendarRequest {
  const format = choiceOf("--format", options.format ?? "text", CALENDAR_FORMATS);
  const list = listOf(options);
  const [zone, besides] = zonesOf(options);
  const years = yearsOf(given, zone);
  const named = options.pairs === undefined ? null : pairsOf([options.pairs]);
  const pairs = named ?? (list ? [pairOf("moon-earth")] : CALENDAR_PAIRS.map((name) => pairOf(name)));
  if (list && pairs.length > 1) {
    throw new ApsidaryError("bad-option", `--${list.which} takes one pair, such as --pairs moon-earth.`);
  }
  refuseTogether(options, format);
  return {
    format,
    years,
    zone,
    pairs,
    source: sourceChoiceOf(options),
    rank: choiceOf("--rank", options.rank ?? "all", ["principal", "all"]),
    style: completeStyle({
      besides,
      finest: choiceOf("--unit", options.unit ?? "minute", ["minute", "hour", "day"]),
      rounding: choiceOf("--rounding", options.rounding ?? "nearest", ["nearest", "cut"]),
      months: choiceOf("--months", options.months ?? "numbers", ["numbers", "names"]),
      language: options.lang ?? null,
    }),
    alarmMinutes: alarmOf(options, format),
    list,
  };
}

function refuseTogether({ against, nearest, farthest, page, out, ascii }: CalendarOptions, format: string): void {
  const list = nearest !== undefined || farthest !== undefined;
  const refuse = (what: string) => {
    throw new ApsidaryError("bad-option", what);
  };
  if (list && against !== undefined) refuse("a list and --against exclude each other; leave one of them.");
  if (list && format === "html") refuse("a list has no page; its forms are text, json, ndjson, csv and ics.");
  if (against !== undefined && (format === "html" || format === "ics")) {
    refuse(`--against has no form ${format}; its forms are text, json, ndjson and csv.`);
  }
  if (page !== undefined && (list || against !== undefined || out !== undefined)) {
    refuse("--page goes with a calendar on standard output; for the page alone use --format html --out FILE.");
  }
  if (ascii && format !== "text") refuse(`--ascii belongs to text, not to ${format}.`);
}

function listOf({ nearest, farthest, kind }: CalendarOptions): ListRequest | null {
  if (nearest !== undefined && farthest !== undefined) {
    throw new ApsidaryError("bad-option", "--nearest and --farthest exclude each other; give one of them.");
  }
  const given = nearest ?? farthest;
  if (given === undefined) {
    if (kind === undefined) return null;
    throw new ApsidaryError("bad-option", "--kind goes with --nearest or --farthest; give one of them.");
  }
  const which = nearest === undefined ? "farthest" : "nearest";
  const count = /^\d{1,6}$/.test(given) ? Number(given) : 0;
  if (count < 1 || count > MOST) {
    throw new ApsidaryError("bad-option", `--${which} ${shown(given)} is no number of passages; give 1 to ${MOST}.`);
  }
  const usual = which === "nearest" ? "periapsis" : "apoapsis";
  return { which, count, kind: choiceOf("--kind", kind ?? usual, ["periapsis", "apoapsis"]) };
}

/** The calendar's zone, and those beside it. */
function zonesOf({ zone }: CalendarOptions): [string, string[]] {
  const own = Intl.DateTimeFormat().resolvedOptions().timeZone;
  const [first = own, ...besides] = zone === undefined ? [own] : zone.split(",").map((name) => name.trim());
  for (const name of [first, ...besides]) zoneOf(name);
  return [first, besides];
}

function yearsOf(given: string, zone: string): number | readonly [number, number] {
  if (given === "next") return DateTime.now().setZone(zoneOf(zone)).year + 1;
  const [, first, last] = /^(-?\d{4})(?:-(-?\d{4}))?$/.exec(given) ?? [];
  if (first === undefined) {
    throw new ApsidaryError(
      "bad-date",
      `${shown(given)} is not a year; give four digits such as 2027, several such as 2027-2030, or next.`,
    );
  }
  return last === undefined ? Number(first) : [Number(first), Number(last)];
}

function alarmOf({ alarm }: CalendarOptions, format: string): number | null {
  if (alarm === undefined) return null;
  if (format !== "ics")
    throw new ApsidaryError("bad-option", "--alarm belongs to --format ics; add that, or leave it.");
  if (/^\d{1,6}$/.test(alarm)) return Number(alarm);
  throw new ApsidaryError("bad-option", `--alarm ${shown(alarm)} is no number of minutes; give one such as 30.`);
}
