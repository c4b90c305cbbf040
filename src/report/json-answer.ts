/**
 * Writes an answer as one JSON object, piece by piece, so that rows without number go in constant memory.
 *
 * The object holds the fields of `head`, then `rows`; each row stands on a line of its own.
 *
 * @param head fields before the rows: `schema`, `made` and what else belongs to the answer as a whole
 * @param rows plain values, taken one at a time
 * @returns pieces of text; joined, they are the JSON with a line feed at its end
 */
export function* jsonAnswer(
  head: Readonly<Record<string, unknown>>,
  rows: Iterable<object>,
): Generator<string, void, undefined> {
  const fields = Object.entries(head).map(([name, value]) => `${JSON.stringify(name)}: ${JSON.stringify(value)},\n`);
  yield `{${fields.join("")}"rows": [`;
  let separator = "\n";
  for (const row of rows) {
    yield separator + JSON.stringify(row);
    separator = ",\n";
  }
  yield separator === "\n" ? "]}\n" : "\n]}\n";
}
