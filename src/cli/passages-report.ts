import type { PassageRow } from "../passages/to-row.ts";
import type { Column } from "../report/column.ts";
import { durationText } from "../report/duration-text.ts";
import { groupedNumber } from "../report/grouped-number.ts";
import { printedHalfWidth } from "../report/half-width.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
import { cautionsOf } from "./cautions.ts";
import { footOf } from "./foot.ts";
import { printedJulian, printedUtc } from "./printed-utc.ts";
import type { Provenance } from "./provenance.ts";

/** A row of `passages` as it is given out. */
export interface ListedPassage extends Omit<PassageRow, "pair" | "targetPoint" | "centrePoint"> {
  readonly pair: string;
  /** `null` where a track's point has no SPK id. */
  readonly targetPoint: number | null;
  readonly centrePoint: number | null;
  /** Of a track: distance less the radius of the body; `null` where none is known. Only where tracks were given. */
  readonly heightKm?: number | null;
  /** `utc` in the Julian calendar, `null` from 1582-10-15 on; only where that calendar was asked for. */
  readonly utcJulian?: string | null;
}

const HEIGHT: Column<ListedPassage> = {
  title: "height",
  unit: "km",
  values: (row) => row.heightKm ?? null,
  digits: (row) => halfWidth(row).digits,
};

const COLUMNS: readonly Column<ListedPassage>[] = [
  {
    title: "UTC",
    unit: "",
    values: (row) => julianOf(row) ?? printedUtc(row.utc, row.utcUncertaintySeconds),
    digits: 0,
  },
  { title: "known to", unit: "", values: (row) => durationText(row.utcUncertaintySeconds), digits: 0 },
  { title: "pair", unit: "", values: (row) => row.pair, digits: 0 },
  { title: "passage", unit: "", values: shortTerm, digits: 0 },
  { title: "distance", unit: "km", values: (row) => row.distanceKm, digits: (row) => halfWidth(row).digits },
  {
    title: "",
    unit: "",
    values: (row) => `± ${groupedNumber(halfWidth(row).value, halfWidth(row).digits)}`,
    digits: 0,
  },
  { title: "source", unit: "", values: (row) => row.source, digits: 0 },
  { title: "marks", unit: "", values: (row) => marksOf(row).join(", "), digits: 0 },
];

/** What the marks mean, in the order in which they stand. */
const MARKS = {
  secondary: "a more extreme one of its kind lies within half a period; it is no apsis of the orbit",
  "rank unknown": "the sources end too near to tell whether it is principal or secondary",
  uncertain: "the source's error could merge it with its neighbour",
  UT: "before 1972 times are UT1, reckoned with ΔT",
  Julian: "a date of the Julian calendar; dates of rows without this mark, and in the lines below, are Gregorian",
  predicted: "after the leap-second list expires; its last offset is held",
  assumed: "a kernel of unknown accuracy, taken to be as good as the built-in one",
  digits:
    "the half-widths follow from the digits that your data are written with; give their uncertainties if you know them",
} as const;
type Mark = keyof typeof MARKS;
const MARK_NAMES = Object.keys(MARKS) as readonly Mark[];

/**
 * Writes the passages as a report for people, line by line: a title, a table, and a foot that explains what stands in it.
 *
 * Every time is printed to the unit that its uncertainty defends, every distance to the place of its uncertainty.
 *
 * @param title what was asked
 * @param rows  taken one at a time
 * @param made  the provenance
 * @param heights whether there are tracks, whose heights stand beside their distances
 */
export function* passagesReport(
  title: string,
  rows: Iterable<ListedPassage>,
  made: Provenance,
  heights = false,
): Generator<string, void, undefined> {
  let count = 0;
  const marks = new Set<Mark>();
  const notes = new Set<string>();
  const watched = function* () {
    for (const row of rows) {
      count++;
      for (const mark of marksOf(row)) marks.add(mark);
      for (const note of cautionsOf(row)) notes.add(note);
      yield row;
    }
  };
  yield `${title}\n\n`;
  yield* textTable(heights ? [...COLUMNS.slice(0, -2), HEIGHT, ...COLUMNS.slice(-2)] : COLUMNS, watched());
  yield count === 0 ? "No passage in this span.\n" : "\n";
  for (const mark of MARK_NAMES) if (marks.has(mark)) yield wrapped(`${mark}: ${MARKS[mark]}.`, 100, "  ");
  if (count > 0) {
    yield '"known to" and ± are half-widths that at least 95 % of such passages keep; no time is printed finer.\n';
    yield "Distances are geometric, from centre to centre at one instant.\n";
  }
  for (const note of notes) yield wrapped(note, 100, "  ");
  yield footOf(made, { deltaT: marks.has("UT"), zones: false });
}

function shortTerm(row: ListedPassage): string {
  return row.term.replace(/ of distance$/, "");
}

/** The time as it is printed in the Julian calendar; `null` where it is not. */
function julianOf(row: ListedPassage): string | null {
  return row.utcJulian === undefined ? null : printedJulian(row.utc, row.utcUncertaintySeconds);
}

function halfWidth(row: ListedPassage) {
  return printedHalfWidth(row.distanceUncertaintyKm);
}

function marksOf(row: ListedPassage): Mark[] {
  const marks: Mark[] = [];
  if (row.rank === "secondary") marks.push("secondary");
  if (row.rank === null) marks.push("rank unknown");
  if (row.existence === "uncertain") marks.push("uncertain");
  if (row.utcBasis === "delta-t") marks.push("UT");
  if (julianOf(row) !== null) marks.push("Julian");
  if (row.utcBasis === "predicted") marks.push("predicted");
  if (row.accuracyBasis === "assumed") marks.push(row.targetPoint === null ? "digits" : "assumed");
  return marks;
}
