/**
 * Writes rows as JSON, one a line.
 *
 * @param rows plain values, taken one at a time
 */
export function* jsonLines(rows: Iterable<object>): Generator<string, void, undefined> {
  for (const row of rows) yield `${JSON.stringify(row)}\n`;
}
