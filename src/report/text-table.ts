import type { Cell, Column } from "./column.ts";
import { groupedNumber } from "./grouped-number.ts";

const GAP = "  ";
const EMPTY = "-";

/**
 * Lays rows out as a table for people, line by line: titles, units, then a line for each row.
 *
 * Numbers stand with their decimal points under each other, words at the left of their column. Widths are measured over
 * blocks of rows and only grow, so a table of any length is made in constant memory; one of a single block is flush throughout.
 *
 * @param columns   what each column shows
 * @param rows      taken one at a time
 * @param blockRows rows that are measured together
 * @returns lines, each with its line feed; none where there are no rows
 */
export function* textTable<Row>(
  columns: readonly Column<Row>[],
  rows: Iterable<Row>,
  blockRows = 2000,
): Generator<string, void, undefined> {
  const layouts = columns.map(({ title, unit }): Layout => ({ width: Math.max(title.length, unit.length), tail: 0 }));
  let block: CellText[][] = [];
  let begun = false;
  const flush = function* () {
    for (const cells of block) {
      cells.forEach((cell, i) => {
        grow(layouts[i] as Layout, cell);
      });
    }
    if (!begun) {
      const numeric = columns.map((_, i) => block.some((cells) => cells[i]?.numeric));
      yield headerLine(
        columns.map((column) => column.title),
        layouts,
        numeric,
      );
      if (columns.some((column) => column.unit))
        yield headerLine(
          columns.map((column) => column.unit),
          layouts,
          numeric,
        );
      begun = true;
    }
    for (const cells of block) yield line(cells.map((cell, i) => padded(cell, layouts[i] as Layout)));
    block = [];
  };
  for (const row of rows) {
    block.push(columns.map((column) => cellText(column, row)));
    if (block.length === blockRows) yield* flush();
  }
  if (block.length > 0) yield* flush();
}

interface Layout {
  width: number;
  /** Characters from the decimal point on. */
  tail: number;
  /** Characters before it. */
  head?: number;
}

interface CellText {
  readonly text: string;
  readonly numeric: boolean;
}

function cellText<Row>({ values, digits }: Column<Row>, row: Row): CellText {
  const cell: Cell = values(row);
  if (cell === null) return { text: EMPTY, numeric: false };
  if (typeof cell === "string") return { text: cell, numeric: false };
  return { text: groupedNumber(cell, typeof digits === "number" ? digits : digits(row)), numeric: true };
}

/** Characters before the decimal point. */
function headOf(text: string): number {
  const point = text.indexOf(".");
  return point < 0 ? text.length : point;
}

function grow(layout: Layout, { text, numeric }: CellText): void {
  if (!numeric) {
    layout.width = Math.max(layout.width, text.length);
    return;
  }
  const head = headOf(text);
  layout.head = Math.max(layout.head ?? 0, head);
  layout.tail = Math.max(layout.tail, text.length - head);
  layout.width = Math.max(layout.width, layout.head + layout.tail);
}

function padded({ text, numeric }: CellText, { width, tail }: Layout): string {
  if (!numeric) return text.padEnd(width);
  const missing = tail - (text.length - headOf(text));
  return (text + " ".repeat(missing)).padStart(width);
}

function headerLine(words: string[], layouts: readonly Layout[], numeric: readonly boolean[]): string {
  return line(
    words.map((word, i) => (numeric[i] ? word.padStart(layouts[i]?.width ?? 0) : word.padEnd(layouts[i]?.width ?? 0))),
  );
}

function line(cells: string[]): string {
  return `${cells.join(GAP).trimEnd()}\n`;
}
