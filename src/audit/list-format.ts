/** How the rows of a list are laid out. */
export type ListFormat = "csv" | "tsv" | "semicolons" | "json" | "text";

/** The separator of a format's cells, as `splitCells` takes it. */
export const SEPARATORS: Readonly<Record<ListFormat, string>> = {
  csv: ",",
  tsv: "\t",
  semicolons: ";",
  json: ",",
  text: "  ",
};

/**
 * Gives the format of a list by its beginning.
 *
 * JSON begins with a bracket. Of separators the one serves that stands in the first line that has any (outside quotes); lines
 * without are loose columns.
 *
 * @param beginning some lines of the list, comments and blank lines included
 */
export function listFormat(beginning: string): ListFormat {
  const text = beginning.replace(/^(?:\ufeff|\u00ef\u00bb\u00bf)/, "").trimStart();
  if (/^[[{]/.test(text)) return "json";
  for (const line of text.split(/\r\n|\n|\r/).slice(0, 50)) {
    if (line.trim() === "" || /^\s*[#%]/.test(line)) continue;
    const bare = line.replace(/"(?:[^"]|"")*"/g, "");
    if (bare.includes("\t")) return "tsv";
    if (bare.includes(";")) return "semicolons";
    // "Jan. 3, 2026" has a comma as well: a heading or three cells tell
    const commas = bare.split(",").length - 1;
    if (commas > 0 && (/^[\s\w()/*"'+-]+(?:,[^,\d]*)+$/i.test(line) || commas > 1 || /"/.test(line))) return "csv";
    if (/\S {2,}\S/.test(line)) return "text";
    if (commas > 0) return "csv";
  }
  return "text";
}
