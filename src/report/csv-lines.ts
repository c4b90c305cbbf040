import Papa from "papaparse";

/**
 * What a spreadsheet would take for a formula: text that begins with one of `= + - @`, a tab or a carriage return.
 * Years outside 0 … 9999 begin with a sign in ISO 8601 and are let through.
 */
const FORMULA = /^(?![+-]\d{6}-\d\d-\d\dT)[=+\-@\t\r]/;
/** Rows that are written at a time. */
const BLOCK = 100;

/**
 * Writes rows as CSV after RFC 4180: a header of names, then a line for each row, ended by CR LF; `null` is empty.
 *
 * Text that a spreadsheet would run as a formula gets an apostrophe before it.
 *
 * @param names the columns: names of the rows' fields, in order; the fields hold text, numbers or `null`
 * @param rows  taken some at a time
 * @returns pieces of one or more lines
 */
export function* csvLines<Row extends object>(
  names: readonly (keyof Row & string)[],
  rows: Iterable<Row>,
): Generator<string, void, undefined> {
  let block: unknown[][] = [[...names]];
  for (const row of rows) {
    block.push(names.map((name) => row[name]));
    if (block.length < BLOCK) continue;
    yield csv(block);
    block = [];
  }
  if (block.length > 0) yield csv(block);
}

function csv(lines: unknown[][]): string {
  return `${Papa.unparse(lines, { escapeFormulae: FORMULA, newline: "\r\n" })}\r\n`;
}
