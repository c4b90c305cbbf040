import type { Pair } from "../bodies/pair.ts";
import { ApsidaryError } from "../error.ts";
import { auditScale, UTC_SCALE } from "./audit-scale.ts";
import { decoded } from "./decoded.ts";
import { type ListFormat, listFormat, SEPARATORS } from "./list-format.ts";
import type { ListRow, ReadRecord, UnreadRow } from "./list-row.ts";
import { type ReadSettings, readCells } from "./read-cells.ts";
import { eventReader } from "./read-events.ts";
import { type ColumnRole, readHeading } from "./read-header.ts";
import { readJsonRow } from "./read-json-row.ts";
import { readKind } from "./read-kind.ts";
import { readLooseLine } from "./read-loose-line.ts";
import { markupReader } from "./read-markup.ts";
import { readPair } from "./read-pair.ts";
import { splitCells } from "./split-cells.ts";
import { splitObjects } from "./split-objects.ts";
import { type ListRecord, splitRecords } from "./split-records.ts";

/** What a list itself may leave unsaid. */
export interface ListReading {
  /** The scale or zone of times that name none; left out, UTC. */
  readonly scale?: string;
  /** The pair of rows that name none. */
  readonly pair?: Pair;
  /** The precision of the times, where it is not that of their last digit. */
  readonly precision?: "second" | "minute" | "hour" | "day";
}

/** Characters that are looked at before the format is decided. */
const BEGINNING = 8192;
const UNIT_SECONDS = { second: 1, minute: 60, hour: 3600, day: 86_400 } as const;

/**
 * Reads a list: CSV, TSV, semicolons, JSON, a JSON object a line, loose columns of text, a calendar file or a page; told apart by its beginning.
 *
 * @param chunks  text, each character a byte (Latin-1); what is not ASCII is taken for UTF-8 where it is valid, else for Latin-1
 * @param reading what the list leaves unsaid
 * @returns blocks of records: all of them joined are the input, so that a mended list keeps everything else
 * @throws ApsidaryError `bad-input` where it is no list at all, `bad-zone`
 */
export async function* readList(
  chunks: AsyncIterable<string> | Iterable<string>,
  reading: ListReading = {},
): AsyncGenerator<readonly ReadRecord[], void, undefined> {
  const settings: ReadSettings = {
    scale: reading.scale === undefined ? UTC_SCALE : auditScale(reading.scale),
    pair: reading.pair ?? null,
    unitSeconds: reading.precision === undefined ? null : UNIT_SECONDS[reading.precision],
    dayFirst: null,
  };
  const { beginning, all } = await peeked(chunks);
  const format = listFormat(beginning);
  if (format === "json") {
    for await (const block of splitObjects(all)) yield block.map((record) => readJsonRecord(record, settings));
    return;
  }
  settings.dayFirst = dateOrder(beginning);
  if (format === "events" || format === "markup") {
    const readLine = format === "events" ? eventReader(settings) : markupReader(settings);
    for await (const block of splitRecords(all, () => false)) yield block.map(readLine);
    return;
  }
  const read = lineReader(format, settings, hasHeading(beginning, format));
  for await (const block of splitRecords(all, () => format !== "text")) yield block.map(read);
}

/** Holds back the first chunks until the format can be told. */
async function peeked(chunks: AsyncIterable<string> | Iterable<string>) {
  const iterator = asAsync(chunks)[Symbol.asyncIterator]();
  let beginning = "";
  let over = false;
  while (beginning.length < BEGINNING && !over) {
    const next = await iterator.next();
    over = next.done === true;
    if (!next.done) beginning += next.value;
  }
  const all = (async function* () {
    if (beginning) yield beginning;
    while (!over) {
      const next = await iterator.next();
      if (next.done) return;
      yield next.value;
    }
  })();
  return { beginning: beginning.slice(0, 65_536), all };
}

async function* asAsync(chunks: AsyncIterable<string> | Iterable<string>) {
  yield* chunks;
}

/** Which number comes first in 03/04/2026: a number above 12 tells; `null` where none does. */
function dateOrder(beginning: string): boolean | null {
  let day = 0;
  let month = 0;
  for (const [, a, b] of beginning.matchAll(/(?<![\d/.-])(\d{1,2})[./-](\d{1,2})[./-]\d{4}/g)) {
    if (Number(a) > 12) day++;
    if (Number(b) > 12) month++;
  }
  return day === month ? null : day > month;
}

function readJsonRecord(record: ListRecord, settings: ReadSettings): ReadRecord {
  if (!record.text.startsWith("{") || record.text.trimEnd().endsWith("[")) return { ...record, rows: [] };
  return { ...record, rows: readJsonRow(record, settings) };
}

/** Whether a heading comes, so that what stands before it is a title. */
function hasHeading(beginning: string, format: ListFormat): boolean {
  const lines = beginning.split(/\r\n|\n|\r/).slice(0, 60);
  return lines.some(
    (line) => headingOf(splitCells(line, SEPARATORS[format], 200).map(({ value }) => decoded(value))) !== null,
  );
}

/** Keeps what lines before have said: the heading, a year, a body that stands over its rows. */
function lineReader(format: ListFormat, settings: ReadSettings, heading: boolean): (record: ListRecord) => ReadRecord {
  let columns: readonly (ColumnRole | null)[] | null = null;
  let headed = false;
  const context: { pair: Pair | null } = { pair: null };
  return (record) => {
    const line = bodyOf(record);
    const bare = line.trim();
    if (bare === "" || /^[#%]/.test(bare) || /^[-=_+|*\s]+$/.test(bare)) return { ...record, rows: [] };
    const cells = splitCells(line, SEPARATORS[format]);
    const values = cells.map(({ value }) => decoded(value));
    if (!headed || format === "text") {
      const found = headingOf(values);
      if (found) {
        columns = found;
        headed = true;
        return { ...record, rows: [] };
      }
    }
    let rows: readonly (ListRow | UnreadRow)[];
    if (format === "text") rows = readLooseLine(record.line, line, cells, values, columns, settings, context);
    else if (columns) rows = readCells(record.line, cells, values, columns, settings);
    else if (heading)
      rows = []; // a title before the heading
    else {
      throw new ApsidaryError(
        "bad-input",
        `line ${record.line} should name the columns, such as pair,kind,when,distance; it is ${JSON.stringify(decoded(bare).slice(0, 60))}.`,
      );
    }
    return { ...record, rows };
  };
}

/** The line without its ending; a byte order mark is blanked so that places stay right. */
function bodyOf({ text, line }: ListRecord): string {
  const body = text.replace(/[\r\n]+$/, "");
  return line === 1 ? body.replace(/^(?:\u00ef\u00bb\u00bf)/, "   ").replace(/^\ufeff/, " ") : body;
}

/** A heading names a time, or a body and a kind, and is no row itself. */
function headingOf(values: readonly string[]): readonly (ColumnRole | null)[] | null {
  if (values.some((value) => /\d{4}-\d\d|\d:\d\d/.test(value))) return null;
  const columns = values.map(readHeading);
  const roles = new Set(columns.map((column) => column?.role));
  const named = columns.filter((column) => column !== null).length;
  if (!roles.has("when") && !roles.has("date") && !(roles.has("year") && roles.has("time"))) return null;
  // a row of loose text may hold the word perihelion alone
  if (named === 1 && values.length > 1 && values.some((value) => readPair(value) && !readKind(value))) return null;
  if (values.length === 1) return null; // prose
  return columns;
}
