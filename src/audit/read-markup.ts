import type { Pair } from "../bodies/pair.ts";
import { decoded } from "./decoded.ts";
import type { ReadRecord } from "./list-row.ts";
import type { ReadSettings } from "./read-cells.ts";
import { type ColumnRole, readHeading } from "./read-header.ts";
import { readLooseLine } from "./read-loose-line.ts";
import { readPair } from "./read-pair.ts";
import type { ListRecord } from "./split-records.ts";

const ENTITIES: Readonly<Record<string, string>> = {
  amp: "&",
  lt: "<",
  gt: ">",
  quot: '"',
  nbsp: " ",
  minus: "-",
  ndash: "-",
};

/**
 * Gives a function that reads the lines of a page (HTML) whose table rows stand on one line each; a heading before a table names its body.
 *
 * What stands in a page cannot be mended in its place.
 */
export function markupReader(settings: ReadSettings): (record: ListRecord) => ReadRecord {
  const context: { pair: Pair | null } = { pair: null };
  let columns: readonly (ColumnRole | null)[] | null = null;
  return (record) => {
    const text = decoded(record.text);
    const heading = /<(?:h[1-6]|caption)\b[^>]*>(.*?)<\/(?:h[1-6]|caption)>/i.exec(text)?.[1];
    if (heading !== undefined) {
      context.pair = readPair(plain(heading).replace(/ about the .*$/, "")) ?? context.pair;
      return { ...record, rows: [] };
    }
    const row = /<tr\b[^>]*>(.*)<\/tr>/i.exec(text)?.[1];
    if (row === undefined) return { ...record, rows: [] };
    const cells = [...row.matchAll(/<(t[hd])\b[^>]*>(.*?)<\/\1>/gi)];
    const values = cells.map(([, , content = ""]) => plain(content));
    if (cells.length > 0 && !/<td\b/i.test(row)) {
      columns = values.map(readHeading);
      return { ...record, rows: [] };
    }
    const places = values.map((value) => ({ value, start: 0, end: 0, quoted: false }));
    if (values.length < 2) return { ...record, rows: [] };
    return {
      ...record,
      rows: readLooseLine(record.line, values.join("  "), places, values, columns, settings, context),
    };
  };
}

function plain(markup: string): string {
  return markup
    .replace(/<[^>]*>/g, "")
    .replace(/&(\w+);/g, (entity, name: string) => ENTITIES[name] ?? entity)
    .replace(/\s+/g, " ")
    .trim();
}
