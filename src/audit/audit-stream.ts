import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { type AuditEnd, type AuditedRecord, type AuditorOptions, auditor } from "./auditor.ts";
import { isUnreadRow } from "./list-row.ts";
import { type ListReading, readList } from "./read-list.ts";

/** How a list is read and audited. */
export interface AuditOptions extends ListReading, AuditorOptions {}

/**
 * Audits a list as a stream: records come out judged, in their order, with all that is not a row of the list between them.
 *
 * Memory is flat whatever the list's length: the first 20 000 rows are held until what the list does throughout can be judged, the rest go through.
 *
 * @param ephemeris what `openSources` gave
 * @param list      the list's text in pieces, each character a byte (Latin-1)
 * @param options   what the list leaves unsaid, and which sources serve
 * @returns blocks of records; at its end what is known of the whole list
 * @throws ApsidaryError `bad-input` where it is no list, is empty, or none of its rows can be read
 */
export async function* auditStream(
  ephemeris: Ephemeris,
  list: AsyncIterable<string> | Iterable<string>,
  options: AuditOptions = {},
): AsyncGenerator<readonly AuditedRecord[], AuditEnd, undefined> {
  const judge = auditor(ephemeris, options);
  let read = 0;
  let lines = 0;
  let unread: { line: number; problem: string } | null = null;
  const usable = () => {
    if (read > 0) return;
    if (unread) {
      const { line, problem } = unread;
      throw new ApsidaryError("bad-input", `no row of the list can be read; line ${line}: ${problem}.`);
    }
    throw new ApsidaryError(
      "bad-input",
      lines === 0
        ? "the list is empty; give a heading such as pair,kind,when and a line for each passage."
        : "the list has no rows; give a line for each passage: its pair, its kind and its time.",
    );
  };
  for await (const records of readList(list, options)) {
    lines += records.length;
    for (const { rows } of records) {
      for (const row of rows) {
        if (!isUnreadRow(row)) read++;
        else unread ??= row;
      }
    }
    const judged = judge.push(records);
    if (judged.length > 0) {
      usable();
      yield judged;
    }
  }
  usable();
  yield judge.rest();
  return judge.end();
}
