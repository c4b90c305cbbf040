import { pairWords } from "../calendar/body-names.ts";
import type { CalendarChange } from "../calendar/calendar-changes.ts";
import type { CalendarRow } from "../calendar/calendar-row.ts";
import type { CompleteStyle } from "../calendar/house-style.ts";
import { noteWords } from "../calendar/note-words.ts";
import { shownTime } from "../calendar/shown.ts";
import type { Column } from "../report/column.ts";
import { durationText } from "../report/duration-text.ts";
import { groupedNumber } from "../report/grouped-number.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
import { CalendarFoot } from "./calendar-report.ts";
import { footOf } from "./foot.ts";
import type { Provenance } from "./provenance.ts";

/** Writes a list of the nearest or farthest passages for people, the most extreme first. */
export function* extremesReport(
  title: string,
  rows: readonly CalendarRow[],
  style: CompleteStyle,
  made: Provenance,
): Generator<string, void, undefined> {
  const foot = new CalendarFoot();
  const seen = [...foot.watch(rows)];
  const text = (title: string, values: (row: CalendarRow) => string): Column<CalendarRow> => {
    return { title, unit: "", values, digits: 0 };
  };
  const columns: Column<CalendarRow>[] = [
    { title: "", unit: "", values: (row) => seen.indexOf(row) + 1, digits: 0 },
    text("local time", (row) => shownTime(row.printed, row.printedUnit, style)),
    text("offset", ({ local }) => local.slice(-6)),
    text("passage", ({ term }) => term),
    { title: "distance", unit: "km", values: ({ printedKm }) => Number(printedKm), digits: 0 },
    text("notes", (row) =>
      noteWords(row, { predicted: false })
        .filter((words) => /new Moon|full Moon|secondary/.test(words))
        .join("; "),
    ),
  ];
  yield `${title}\n\n`;
  yield* textTable(columns, seen);
  yield foot.count === 0 ? "No passage in this span.\n" : "\n";
  const close = seen.some((row, i) => {
    const next = seen[i + 1];
    const doubt = next ? Math.hypot(row.distanceUncertaintyKm, next.distanceUncertaintyKm) : 0;
    return next !== undefined && Math.abs(next.distanceKm - row.distanceKm) <= doubt;
  });
  if (close)
    yield wrapped("Some neighbours in this list lie closer together than their uncertainty; their order is not known.");
  for (const line of [...foot.cautions(), ...foot.remarks(made)]) yield wrapped(line);
  yield footOf(made, { deltaT: foot.byDeltaT, zones: true });
}

/** Writes for people what changed between two calendars; what is the same is counted. */
export function* changesReport(
  title: string,
  changes: readonly CalendarChange[],
  made: Provenance,
): Generator<string, void, undefined> {
  const told = changes.filter(({ change }) => change !== "same");
  const text = (title: string, values: (change: CalendarChange) => string | null): Column<CalendarChange> => {
    return { title, unit: "", values, digits: 0 };
  };
  const columns = [
    text("before", ({ beforePrinted }) => beforePrinted),
    text("now", ({ afterPrinted }) => afterPrinted),
    text("passage", ({ pair, term }) => `${term}, ${pairWords(pair)}`),
    text("change", changeWords),
    text("farther, km", ({ fartherKm }) => (fartherKm === null ? null : signed(fartherKm, 0))),
  ];
  yield `${title}\n\n`;
  yield* textTable(columns, told);
  if (told.length > 0) yield "\n";
  const same = changes.length - told.length;
  yield `${told.length} of ${changes.length} passages differ in what is printed${same > 0 ? `, ${same} are the same` : ""}.\n`;
  yield footOf(made, { deltaT: false, zones: true });
}

function changeWords({ change, laterSeconds }: CalendarChange): string {
  if (laterSeconds === null) return change;
  return laterSeconds === 0
    ? "same time"
    : `${durationText(Math.abs(laterSeconds))} ${laterSeconds > 0 ? "later" : "earlier"}`;
}

function signed(value: number, digits: number): string {
  const text = groupedNumber(value, digits);
  return (value > 0 && /[1-9]/.test(text) ? "+" : "") + text;
}
