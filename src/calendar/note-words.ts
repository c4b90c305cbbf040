import type { PairName } from "../bodies/pair.ts";
import type { CalendarRow } from "./calendar-row.ts";

/**
 * Gives the words for a row's notes, one piece each, in the order of its codes.
 *
 * Of the extremes of the year only those are told that have others to outdo: a planet that passes once a year says nothing by it.
 *
 * @param row the row
 * @param context `onlyOfYear`: whether it is the only one of its pair and kind in its year; `predicted`: whether to say that UTC is
 */
export function noteWords(
  row: CalendarRow,
  { onlyOfYear = false, predicted = true }: { readonly onlyOfYear?: boolean; readonly predicted?: boolean } = {},
): string[] {
  return row.notes.flatMap((note): string | string[] => {
    switch (note) {
      case "nearest-of-year":
        return onlyOfYear ? [] : "nearest of the year";
      case "farthest-of-year":
        return onlyOfYear ? [] : "farthest of the year";
      case "nearest-since":
        return recordWords("nearest", "nearer", row);
      case "farthest-since":
        return recordWords("farthest", "farther", row);
      case "near-new-moon":
        return phaseWords(row.phaseHours, "new Moon");
      case "near-full-moon":
        return phaseWords(row.phaseHours, "full Moon");
      case "date-differs-from-utc":
        return `${row.utcBasis === "delta-t" ? "UT" : "UTC"} date ${row.utc.slice(0, row.utc.indexOf("T"))}`;
      case "predicted-utc":
        return predicted ? "UTC predicted" : [];
      case "secondary":
        return "secondary: a more extreme one lies within half a period";
      case "later-than-last-year":
        return `${stepWords(row)} later than last year's date`;
      case "earlier-than-last-year":
        return `${stepWords(row)} earlier than last year's date`;
      default:
        return [];
    }
  });
}

/** What must be read beside a passage. */
const CAUTIONS = {
  sun: "Never look at the Sun through any optics without a certified solar filter.",
  tides:
    "Perigee near new or full Moon: raised tides are likely. Local tide and weather authorities decide; this is not for " +
    "navigation or the safety of life.",
} as const;

/** Gives the cautions that a row calls for. */
export function calendarCautions(row: Pick<CalendarRow, "pair" | "kind" | "notes">): string[] {
  const cautions: string[] = [];
  if (isEarthAboutSun(row.pair)) cautions.push(CAUTIONS.sun);
  const syzygy = row.notes.includes("near-new-moon") || row.notes.includes("near-full-moon");
  if (row.kind === "periapsis" && syzygy) cautions.push(CAUTIONS.tides);
  return cautions;
}

function isEarthAboutSun(pair: PairName): boolean {
  return pair === "earth-sun" || pair === "emb-sun";
}

/** `nearest since 1948-01-26 and until 2034-11-25`; what was looked through is told where no end was found. */
function recordWords(most: string, more: string, row: CalendarRow): string {
  const since = row.sinceUtc
    ? `since ${dateOf(row.sinceUtc)}${row.sinceCertain ? "" : " (too close to tell)"}`
    : `of all back to ${row.lookedFromYear}`;
  const until = row.untilUtc
    ? `until ${dateOf(row.untilUtc)}${row.untilCertain ? "" : " (too close to tell)"}`
    : `none ${more} up to ${row.lookedToYear}`;
  return `${most} ${since}${row.untilUtc ? " and " : ", "}${until}`;
}

function dateOf(utc: string): string {
  return utc.slice(0, utc.indexOf("T"));
}

function phaseWords(hours: number | null, phase: string): string {
  const whole = Math.round(Math.abs(hours ?? 0));
  if (whole === 0) return `within half an hour of ${phase}`;
  return `${whole} h ${(hours ?? 0) > 0 ? "after" : "before"} ${phase}`;
}

/** Hours, or days where the instants are not known to an hour. */
function stepWords(row: CalendarRow): string {
  const hours = Math.abs(row.dateStepHours ?? 0);
  // the two instants of a step are off independently, and an eighth of the unit keeps 95 % right
  if (row.timeUncertaintySeconds * Math.SQRT2 <= 450) return `${Math.round(hours)} h`;
  return `about ${Math.max(1, Math.round(hours / 24))} d`;
}
