import { readHeading } from "./read-header.ts";
import { readKind } from "./read-kind.ts";
import { splitCells } from "./split-cells.ts";

/** How the rows of a list are laid out. */
export type ListFormat = "csv" | "tsv" | "semicolons" | "json" | "text" | "events" | "markup";

/** The separator of a format's cells, as `splitCells` takes it. */
export const SEPARATORS: Readonly<Record<ListFormat, string>> = {
  csv: ",",
  tsv: "\t",
  semicolons: ";",
  json: ",",
  text: "  ",
  events: "  ",
  markup: "  ",
};

/**
 * Gives the format of a list by its beginning.
 *
 * JSON begins with a bracket. Of separators the one serves by which a line becomes a heading; lines without one are loose columns.
 *
 * @param beginning some lines of the list, comments and blank lines included
 */
export function listFormat(beginning: string): ListFormat {
  const text = beginning.replace(/^(?:\ufeff|\u00ef\u00bb\u00bf)/, "").trimStart();
  if (/^[[{]/.test(text)) return "json";
  if (/^BEGIN:VCALENDAR\b/i.test(text)) return "events";
  if (/^<(?:!doctype|html|table|\?xml)\b/i.test(text) || text.startsWith("<?xml")) return "markup";
  const lines = text
    .split(/\r\n|\n|\r/)
    .slice(0, 60)
    .filter((line) => line.trim() !== "" && !/^\s*[#%]/.test(line));
  const named = (line: string, separator: string) =>
    splitCells(line, separator, 200).filter(({ value }) => readHeading(value) !== null).length;
  for (const line of lines) {
    for (const format of ["tsv", "semicolons", "csv"] as const) if (named(line, SEPARATORS[format]) > 1) return format;
    if (named(line, "  ") > 1) return "text";
  }
  // without a heading: cells that are the same in number in most lines
  for (const format of ["tsv", "semicolons", "csv"] as const) {
    const counts = lines.map((line) => splitCells(line, SEPARATORS[format], 200).length);
    const most = counts.filter((count) => count > 2 && count === counts[0]).length;
    if (most > 0 && most * 2 > lines.length && !lines.some((line) => readKind(line) && / {2}/.test(line)))
      return format;
  }
  return "text";
}
