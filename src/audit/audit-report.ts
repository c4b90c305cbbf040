import type { PassageRow } from "../passages/to-row.ts";
import type { Column } from "../report/column.ts";
import { groupedNumber } from "../report/grouped-number.ts";
import { printedTime } from "../report/printed-time.ts";
import { printedUnit } from "../report/printed-unit.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
import type { AuditRow, Verdict } from "./audit-row.ts";
import type { AuditEnd } from "./auditor.ts";

/** Rows, missing passages and duplicates that a report shows; the rest is counted. */
export const MOST_SHOWN = 1000;

/** The verdicts as a count of rows says them. */
export const VERDICT_WORDS: Readonly<Record<Verdict, string>> = {
  agrees: "agree",
  undecided: "cannot be decided",
  "last-digit": "off in the last digit",
  explained: "wrong, with the cause",
  disagrees: "wrong, without a cause",
  unmatched: "fit no passage or cannot be read",
};

const COLUMNS: readonly Column<AuditRow>[] = [
  { title: "line", unit: "", values: ({ line }) => String(line), digits: 0 },
  { title: "published", unit: "", values: ({ published }) => published.when.slice(0, 40), digits: 0 },
  {
    title: "passage",
    unit: "",
    values: ({ passage }) => (passage ? `${passage.pair} ${passage.term}` : null),
    digits: 0,
  },
  { title: "verdict", unit: "", values: ({ verdict, cause }) => cause ?? verdict, digits: 0 },
  { title: "what to do", unit: "", values: ({ sentence }) => sentence, digits: 0 },
];

/**
 * Writes the audit for people: what the list does throughout, then the rows to mend, each with what to do, then what is missing or told twice.
 *
 * @param title  the list
 * @param toMend rows that neither agree nor are undecided, the first `MOST_SHOWN` of them
 * @param end    what is known of the whole list
 */
export function* auditReport(
  title: string,
  toMend: readonly AuditRow[],
  end: AuditEnd,
): Generator<string, void, undefined> {
  const counts = (Object.keys(VERDICT_WORDS) as Verdict[]).filter((verdict) => end.summary[verdict] > 0);
  const total = counts.reduce((sum, verdict) => sum + end.summary[verdict], 0);
  const parts = counts.map((verdict) => `${groupedNumber(end.summary[verdict], 0)} ${VERDICT_WORDS[verdict]}`);
  yield wrapped(`${title}: ${end.list.sentence}`);
  yield wrapped(`${groupedNumber(total, 0)} row${total === 1 ? "" : "s"}: ${parts.join(", ")}.`);
  if (end.list.cause !== null) {
    yield wrapped(`Cause: ${end.list.cause}${end.list.causeDetail ? ` (${end.list.causeDetail})` : ""}.`);
  }
  if (toMend.length > 0) {
    yield "\nRows to mend\n\n";
    yield* textTable(COLUMNS, toMend);
    const bad = total - end.summary.agrees - end.summary.undecided;
    if (bad > toMend.length) yield `… and ${groupedNumber(bad - toMend.length, 0)} more.\n`;
  }
  if (end.missing.length > 0) {
    yield `\nMissing from the list: ${groupedNumber(end.missing.length, 0)} of the passages between its first and last\n\n`;
    for (const row of end.missing.slice(0, 50)) yield `${missingLine(row)}\n`;
    if (end.missing.length > 50) yield `… and ${groupedNumber(end.missing.length - 50, 0)} more.\n`;
  }
  if (end.duplicates.length > 0) {
    yield "\nTold twice\n\n";
    for (const [first, again] of end.duplicates.slice(0, 50)) yield `line ${again} has the passage of line ${first}\n`;
    if (end.duplicates.length > 50) yield `… and ${groupedNumber(end.duplicates.length - 50, 0)} more.\n`;
  }
  yield "\nTimes are right as they stand when some instant within the computed one's bound (99.9 %) rounds to them.\n";
}

/** A passage that a list has not: `2024-07-05 05:06 UTC  earth-sun aphelion`. */
export function missingLine(row: PassageRow): string {
  const at = printedTime(Date.parse(row.utc), printedUnit(row.utcUncertaintySeconds));
  return `${at} ${row.utcBasis === "delta-t" ? "UT" : "UTC"}  ${row.pair} ${row.term}`;
}
