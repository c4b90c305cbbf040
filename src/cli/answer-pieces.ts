import { jsonAnswer } from "../report/json-answer.ts";
import { jsonLines } from "../report/json-lines.ts";
import type { Format } from "./options.ts";

/** An answer before it has a form. */
export interface Answer<Row> {
  /** The fields of the JSON before its rows. */
  readonly head: Readonly<Record<string, unknown>>;
  /** The fields of a row, in order: the header of the CSV. */
  readonly names: readonly (keyof Row & string)[];
  /** Taken one at a time. */
  readonly rows: Iterable<Row>;
  /** Writes the rows for people. */
  readonly report: (rows: Iterable<Row>) => Iterable<string>;
}

/** Gives an answer in the form of `--format`, piece by piece. */
export async function answerPieces<Row extends object>(format: Format, answer: Answer<Row>): Promise<Iterable<string>> {
  const { head, names, rows, report } = answer;
  switch (format) {
    case "json":
      return jsonAnswer(head, rows);
    case "ndjson":
      return jsonLines(rows);
    case "csv": {
      const { csvLines } = await import("../report/csv-lines.ts"); // brings a library that the other forms do without
      return csvLines(names, rows);
    }
    case "text":
      return report(rows);
  }
}
