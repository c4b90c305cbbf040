import { type PairName, pairOf } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import { rounded } from "../report/rounded.ts";
import { dayOfGregorian } from "../time/civil-calendar.ts";
import type { CalendarRow } from "./calendar-row.ts";

/** What is read of a row of an earlier calendar. */
export type EarlierRow = Pick<
  CalendarRow,
  "pair" | "kind" | "term" | "tdbSeconds" | "distanceKm" | "local" | "printed" | "printedKm"
>;

/** A passage in two calendars. Frozen. */
export interface CalendarChange {
  readonly pair: PairName;
  readonly kind: ApsisKind;
  readonly term: string;
  /** `moved`: the printed time or distance differs; `added` and `removed`: it stands in one of the two alone. */
  readonly change: "same" | "moved" | "added" | "removed";
  readonly beforeLocal: string | null;
  readonly beforePrinted: string | null;
  readonly beforePrintedKm: string | null;
  readonly afterLocal: string | null;
  readonly afterPrinted: string | null;
  readonly afterPrintedKm: string | null;
  /** How much later it is, in TDB; between different years, less the whole days from year to year. */
  readonly laterSeconds: number | null;
  readonly fartherKm: number | null;
}

/** The fields of a change, in order. */
export const CHANGE_FIELDS = [
  "pair",
  "kind",
  "term",
  "change",
  "beforeLocal",
  "beforePrinted",
  "beforePrintedKm",
  "afterLocal",
  "afterPrinted",
  "afterPrintedKm",
  "laterSeconds",
  "fartherKm",
] as const satisfies readonly (keyof CalendarChange)[];

/**
 * Tells what changed between two calendars: two versions of the same years, or those of two years.
 *
 * Passages of a pair and kind are matched by date within the year, the nearest first, each with one other at most and none over half a sidereal
 * period. In order of the later calendar; what was removed stands at its old date.
 *
 * @param before the earlier calendar's rows, and its first year
 * @param after  the later calendar's
 */
export function calendarChanges(
  before: { readonly rows: readonly EarlierRow[]; readonly firstYear: number },
  after: { readonly rows: readonly EarlierRow[]; readonly firstYear: number },
): CalendarChange[] {
  const shift = 86_400 * (dayOfGregorian(after.firstYear, 1, 1) - dayOfGregorian(before.firstYear, 1, 1));
  const sameYears = shift === 0;
  const candidates: { old: EarlierRow; now: EarlierRow; apart: number }[] = [];
  for (const now of after.rows) {
    for (const old of before.rows) {
      if (old.pair !== now.pair || old.kind !== now.kind) continue;
      const apart = Math.abs(now.tdbSeconds - shift - old.tdbSeconds);
      if (apart < pairOf(now.pair).halfPeriodSeconds) candidates.push({ old, now, apart });
    }
  }
  const partner = new Map<EarlierRow, EarlierRow>();
  for (const { old, now } of candidates.sort((a, b) => a.apart - b.apart)) {
    if (!partner.has(old) && !partner.has(now)) partner.set(old, now).set(now, old);
  }
  const changes = after.rows.map((now) => ({ at: now.tdbSeconds, change: changeOf(partner.get(now) ?? null, now) }));
  for (const old of before.rows) {
    if (!partner.has(old)) changes.push({ at: old.tdbSeconds + shift, change: changeOf(old, null) });
  }
  return changes.sort((a, b) => a.at - b.at).map(({ change }) => change);

  function changeOf(old: EarlierRow | null, now: EarlierRow | null): CalendarChange {
    const { pair, kind, term } = (now ?? old) as EarlierRow;
    const same = sameYears && old?.printed === now?.printed && old?.printedKm === now?.printedKm;
    return Object.freeze({
      pair,
      kind,
      term,
      change: !old ? "added" : !now ? "removed" : same ? "same" : "moved",
      beforeLocal: old?.local ?? null,
      beforePrinted: old?.printed ?? null,
      beforePrintedKm: old?.printedKm ?? null,
      afterLocal: now?.local ?? null,
      afterPrinted: now?.printed ?? null,
      afterPrintedKm: now?.printedKm ?? null,
      laterSeconds: old && now ? rounded(now.tdbSeconds - shift - old.tdbSeconds, 3) : null,
      fartherKm: old && now ? rounded(now.distanceKm - old.distanceKm, 3) : null,
    });
  }
}
