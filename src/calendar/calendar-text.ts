import type { Cell, Column } from "../report/column.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
import { pairWords, pointName } from "./body-names.ts";
import type { CalendarRow } from "./calendar-row.ts";
import type { CompleteStyle } from "./house-style.ts";
import { seenBody } from "./mean-distance.ts";
import { noteWords } from "./note-words.ts";
import { shownNumber, shownTime } from "./shown.ts";
import { yearBlocks } from "./year-blocks.ts";

/** Characters of a line. */
const WIDTH = 100;
/** Before notes. */
const INDENT = "    ";

/**
 * Writes a calendar for people, a block for each body in each year, line by line; no line has more than 100 characters.
 *
 * Under a passage stand its notes; that UTC is predicted is left for the foot to say. Where zones stand side by side, or names of months are long,
 * columns give way: speed first, then size and light, diameter, au.
 *
 * @param rows  in order of time, as `apsisCalendar` gives them
 * @param style the style in which they were made
 * @param utc   whether UTC stands beside the local time; not where the zone is UTC itself
 */
export function* calendarText(
  rows: Iterable<CalendarRow>,
  style: CompleteStyle,
  utc: boolean,
): Generator<string, void, undefined> {
  let begun = false;
  for (const { year, pair, rows: block } of yearBlocks(rows)) {
    if (begun) yield "\n";
    begun = true;
    yield `${pairWords(pair)}, ${year}\n`;
    const lines = fittingTable(block, style, utc);
    const heads = lines.length - block.length;
    yield* lines.slice(0, heads);
    for (const [i, row] of block.entries()) {
      yield lines[heads + i] as string;
      const alone = block.filter(({ kind }) => kind === row.kind).length === 1;
      const words = noteWords(row, { onlyOfYear: alone, predicted: false }).join("; ");
      if (words) yield wrapped(words, WIDTH, INDENT, INDENT);
    }
  }
}

/** A column, and how soon it gives way where a line would be too long: 0 never, then the lowest first. */
interface Yielding extends Column<CalendarRow> {
  readonly yields: number;
}

function fittingTable(block: readonly CalendarRow[], style: CompleteStyle, utc: boolean): string[] {
  let lines: string[] = [];
  for (const look of [style, { ...style, months: "numbers" } as const]) {
    let columns = columnsOf(block, look, utc);
    for (;;) {
      lines = [...textTable(columns, block)];
      if (lines.every((line) => line.length <= WIDTH + 1)) return lines;
      const next = Math.min(...columns.map(({ yields }) => yields || Number.POSITIVE_INFINITY));
      if (next === Number.POSITIVE_INFINITY) break;
      columns = columns.filter(({ yields }) => yields !== next);
    }
  }
  return lines;
}

function columnsOf(block: readonly CalendarRow[], style: CompleteStyle, utc: boolean): Yielding[] {
  const [first] = block;
  const text = (title: string, unit: string, yields: number, values: (row: CalendarRow) => Cell): Yielding => {
    return { title, unit, values, digits: 0, yields };
  };
  /** Words that stand flush right, so that the digits of a language line up. */
  const right = (title: string, unit: string, yields: number, values: (row: CalendarRow) => string): Yielding => {
    const width = Math.max(title.length, ...block.map((row) => values(row).length));
    return text(title.padStart(width), unit.padStart(width), yields, (row) => values(row).padStart(width));
  };
  const columns = [
    text("local time", "", 0, (row) => shownTime(row.printed, row.printedUnit, style)),
    text("offset", "", 6, ({ local }) => local.slice(-6)),
  ];
  const besides = (first?.besides ?? []).map(({ zone }, i) =>
    text(zone.slice(zone.lastIndexOf("/") + 1).replaceAll("_", " "), "", 0, (row) => {
      return shownTime(row.besides?.[i]?.printed ?? "", row.printedUnit, style);
    }),
  );
  if (besides.length > 0) columns.push(...besides);
  else if (utc) columns.push(text(block.some((row) => row.utcBasis === "delta-t") ? "UT" : "UTC", "", 7, utcShort));
  columns.push(
    text("passage", "", 0, ({ term }) => term.replace(/^local (\w+) of distance$/, "local $1")),
    right("distance", "km", 0, (row) => shownNumber(Number(row.printedKm), 0, style)),
    right("", "au", 5, (row) => shownNumber(Number(row.printedAu), decimalsOf(row.printedAu), style)),
  );
  const seen = first && seenBody({ name: first.pair });
  if (seen) {
    // a tenth of a minute of arc is enough where the disc is not the reader's own sky
    const digits = first.pair === "moon-earth" || first.pair === "earth-sun" ? 2 : 1;
    columns.push(
      right(pointName(seen.name), "′", 4, (row) =>
        row.diameterArcmin === null ? "-" : shownNumber(row.diameterArcmin, digits, style),
      ),
    );
  }
  columns.push(
    right("size", "%", 3, (row) => shownNumber(row.sizePercent, 1, style, true)),
    right("light", "%", 3, (row) => shownNumber(row.lightPercent, 1, style, true)),
    right("km/s", "", 2, (row) => shownNumber(row.speedKmS, 2, style)),
  );
  return columns;
}

/** Without its year, which the heading tells but for the hours about New Year, when the notes do. */
function utcShort({ printedUtc, printedUnit }: CalendarRow): string {
  const short = printedUnit === "month" || printedUnit === "year" ? printedUtc : printedUtc.replace(/^[+-]?\d+-/, "");
  return short + (printedUnit === "hour" ? " h" : "");
}

function decimalsOf(plain: string): number {
  const point = plain.indexOf(".");
  return point < 0 ? 0 : plain.length - point - 1;
}
