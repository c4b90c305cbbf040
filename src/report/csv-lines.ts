import Papa from "papaparse";

/**
 * What a spreadsheet would take for a formula: text that begins with one of `= + - @`, a tab or a carriage return.
 * Years outside 0 … 9999 begin with a sign in ISO 8601 and are let through.
 */
const FORMULA = /^(?![+-]\d{6}-\d\d-\d\dT)[=+\-@\t\r]/;

/**
 * Writes rows as CSV after RFC 4180: a header of names, then a line for each row, ended by CR LF; `null` is empty.
 *
 * Text that a spreadsheet would run as a formula gets an apostrophe before it.
 *
 * @param names the columns: names of the rows' fields, in order; the fields hold text, numbers or `null`
 * @param rows  taken one at a time
 */
export function* csvLines<Row extends object>(
  names: readonly (keyof Row & string)[],
  rows: Iterable<Row>,
): Generator<string, void, undefined> {
  yield csvLine(names);
  for (const row of rows) yield csvLine(names.map((name) => row[name]));
}

function csvLine(cells: readonly unknown[]): string {
  return `${Papa.unparse([[...cells]], { escapeFormulae: FORMULA, newline: "\r\n" })}\r\n`;
}
