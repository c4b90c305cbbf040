import Papa from "papaparse";
import { ApsidaryError } from "../error.ts";

/** The rows of a CSV with a header, by the header's names. */
export interface CsvRecords {
  readonly fields: readonly string[];
  readonly rows: readonly Readonly<Record<string, string>>[];
}

/**
 * Reads a CSV with a header. Empty lines, and lines that begin with `#`, are left out; cells are trimmed.
 *
 * @param requireHeader refuses a header that will not do, before the rows are looked at
 * @throws ApsidaryError `bad-input`, in one line: a name that stands twice in the header, a row that has more or fewer cells
 */
export function csvRecords(text: string, requireHeader: (fields: readonly string[]) => void): CsvRecords {
  const { data, errors } = Papa.parse<string[]>(text.replace(/^\uFEFF/, ""), {
    skipEmptyLines: "greedy",
    comments: "#",
  });
  const [fault] = errors.filter((error) => error.code !== "UndetectableDelimiter");
  if (fault)
    throw new ApsidaryError("bad-input", `line ${(fault.row ?? 0) + 1} of the CSV cannot be read: ${fault.message}.`);
  const [header = [], ...records] = data;
  const fields = header.map((name) => name.trim());
  const twice = fields.find((name, i) => name !== "" && fields.indexOf(name) !== i);
  if (twice !== undefined) {
    throw new ApsidaryError(
      "bad-input",
      `the header has ${JSON.stringify(twice.slice(0, 40))} twice; name each column once.`,
    );
  }
  requireHeader(fields);
  const rows = records.map((cells, i) => {
    if (cells.length !== fields.length) {
      throw new ApsidaryError(
        "bad-input",
        `row ${i + 1} has ${cells.length} cells, the header ${fields.length}; give a cell for each name.`,
      );
    }
    return Object.fromEntries(fields.map((name, k) => [name, (cells[k] ?? "").trim()]));
  });
  return { fields, rows };
}
