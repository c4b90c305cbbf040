import type { DateTime } from "luxon";
import type { PassageRow } from "../passages/to-row.ts";
import type { Column } from "../report/column.ts";
import { printedHalfWidth } from "../report/half-width.ts";
import { printedTime, roundedClock } from "../report/printed-time.ts";
import { printedUnit } from "../report/printed-unit.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
import { cautionsOf } from "./cautions.ts";
import { footOf } from "./foot.ts";
import type { Provenance } from "./provenance.ts";

/** A passage and the local time of it. */
export interface LocalRow {
  readonly row: PassageRow;
  readonly at: DateTime<true>;
}

const COLUMNS: readonly Column<LocalRow>[] = [
  { title: "local time", unit: "", values: ({ at, row }) => printedLocal(at, row.utcUncertaintySeconds), digits: 0 },
  { title: "UTC offset", unit: "", values: ({ at }) => at.toFormat("ZZ"), digits: 0 },
  { title: "body", unit: "", values: ({ row }) => bodyOf(row), digits: 0 },
  { title: "passage", unit: "", values: ({ row }) => row.term, digits: 0 },
  {
    title: "distance",
    unit: "km",
    values: ({ row }) => row.distanceKm,
    digits: ({ row }) => Math.min(0, printedHalfWidth(row.distanceUncertaintyKm).digits),
  },
];

/** Writes a year's passages for people, line by line. */
export function* calendarReport(
  title: string,
  rows: Iterable<LocalRow>,
  made: Provenance,
): Generator<string, void, undefined> {
  const notes = new Set<string>();
  let predicted = false;
  let byDeltaT = false;
  const watched = function* () {
    for (const local of rows) {
      for (const note of cautionsOf(local.row)) notes.add(note);
      predicted ||= local.row.utcBasis === "predicted";
      byDeltaT ||= local.row.utcBasis === "delta-t";
      yield local;
    }
  };
  yield `${title}\n\n`;
  yield* textTable(COLUMNS, watched());
  yield "\nTimes are printed to the minute, hour (h), day, month or year that their uncertainty allows.\n";
  if (predicted) yield "Leap seconds that are not yet announced are not counted; the uncertainty includes them.\n";
  for (const note of notes) yield wrapped(note, 100, "  ");
  yield footOf(made, { deltaT: byDeltaT, zones: true });
}

function bodyOf({ pair }: PassageRow): string {
  const body = pair.slice(0, pair.indexOf("-"));
  return body.slice(0, 1).toUpperCase() + body.slice(1);
}

/** The clock is rounded as an interval of time, so that it stays right where summer time begins or ends within it. */
function printedLocal(at: DateTime<true>, uncertaintySeconds: number): string {
  const unit = printedUnit(uncertaintySeconds);
  const clock = clockOf(at);
  const rounded = at.plus(roundedClock(clock, unit) - clock);
  return printedTime(clockOf(rounded), unit) + (unit === "hour" ? "h" : "");
}

function clockOf(at: DateTime<true>): number {
  return at.toMillis() + at.offset * 60_000;
}
