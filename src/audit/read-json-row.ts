import { decoded } from "./decoded.ts";
import type { CellPlace, ListRow, UnreadRow } from "./list-row.ts";
import { type ReadSettings, readCells } from "./read-cells.ts";
import { readHeading } from "./read-header.ts";
import type { ListRecord } from "./split-records.ts";

/**
 * Reads the row that stands in a JSON object; the names of its fields are those of a table's columns.
 *
 * @param record the object's text
 */
export function readJsonRow(record: ListRecord, settings: ReadSettings): readonly (ListRow | UnreadRow)[] {
  let object: unknown;
  try {
    object = JSON.parse(decoded(record.text));
  } catch {
    return [{ line: record.line, when: "", problem: "is no valid JSON object" }];
  }
  const entries = Object.entries(object as Record<string, unknown>);
  const names: string[] = [];
  const values: string[] = [];
  for (const [name, value] of entries) {
    if (typeof value !== "string" && typeof value !== "number") continue;
    names.push(name);
    values.push(typeof value === "number" ? plainNumber(value) : value.trim());
  }
  const places = names.map((name) => placeOf(record.text, name));
  const cells = places.map(({ start, end }, i) => ({ value: values[i] ?? "", start, end, quoted: false }));
  const rows = readCells(record.line, cells, values, names.map(readHeading), settings);
  return rows.map((row) =>
    "problem" in row
      ? row
      : {
          ...row,
          places: {
            when: row.places.when.map(({ place, text }) => ({ place: json(place), text })),
            kind: row.places.kind && { ...row.places.kind, place: json(row.places.kind.place) },
            distance: row.places.distance && json(row.places.distance),
          },
        },
  );
}

function json(place: CellPlace): CellPlace {
  return { ...place, form: "json" };
}

/** A number without an exponent, so that its digits can be counted. */
function plainNumber(value: number): string {
  const text = String(value);
  return text.includes("e") ? value.toFixed(12).replace(/0+$/, "").replace(/\.$/, "") : text;
}

/** Where a field's value stands in the object's text. */
function placeOf(text: string, name: string): { start: number; end: number } {
  const key = JSON.stringify(name).replace(/[.*+?^${}()|[\]\\]/g, "\\$&");
  const found = new RegExp(`${key}\\s*:\\s*("(?:[^"\\\\]|\\\\.)*"|-?[\\d.eE+-]+)`).exec(text);
  if (!found?.[1]) return { start: 0, end: 0 };
  const start = found.index + found[0].length - found[1].length;
  return { start, end: start + found[1].length };
}
