import { AUDIT_FIELDS, flatAuditRow } from "../audit/audit-fields.ts";
import { auditReport, MOST_SHOWN } from "../audit/audit-report.ts";
import type { AuditRow } from "../audit/audit-row.ts";
import { auditRowJson } from "../audit/audit-row-json.ts";
import { type AuditOptions, auditStream } from "../audit/audit-stream.ts";
import type { AuditEnd, AuditedRecord } from "../audit/auditor.ts";
import { isUnreadRow } from "../audit/list-row.ts";
import { mendedRecord } from "../audit/mend.ts";
import type { Pair } from "../bodies/pair.ts";
import { pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { csvLines } from "../report/csv-lines.ts";
import { zoneOf } from "../time/zone-of.ts";
import { AUDIT_FORMATS, type AuditCommandOptions } from "./audit.ts";
import { auditInput } from "./audit-input.ts";
import { choiceOf } from "./choice-of.ts";
import { type Destination, openDestination, ReaderGone } from "./destination.ts";
import { footOf } from "./foot.ts";
import { openFor } from "./open-for.ts";
import { sourceChoiceOf } from "./options.ts";
import { mayShowProgress } from "./progress.ts";
import { type Provenance, provenanceOf } from "./provenance.ts";

/** Exit status where some row does not agree. */
const SOME_WRONG = 1;
/** Rows whose residuals a page's chart holds. */
const MOST_CHARTED = 5000;

/** What gathers while rows go through. */
interface Gathered {
  readonly toMend: AuditRow[];
  readonly charted: AuditRow[];
}

/**
 * Answers `apsidary audit`.
 *
 * Rows are judged and written as they are read; a list that turns out to be unusable after its first 20 000 rows has been answered so far
 * on standard output, though never in a file.
 *
 * @param file    the list's path, or `-`
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used
 */
export async function runAudit(file: string, options: AuditCommandOptions): Promise<void> {
  const format = choiceOf("--format", options.format ?? "text", AUDIT_FORMATS);
  const source = sourceChoiceOf(options);
  const reading = readingOf(options);
  if (options.corrected === "-" || (options.corrected !== undefined && options.corrected === options.out)) {
    throw new ApsidaryError("bad-option", "--corrected needs a file of its own.");
  }
  const list = await auditInput(file);
  const ephemeris = await openFor(options);
  const destination = await openDestination(options.out);
  let mended: Destination | null = null;
  try {
    mended = options.corrected === undefined ? null : await openDestination(options.corrected);
    const stream = auditStream(ephemeris, list, { ...reading, source });
    const gathered: Gathered = { toMend: [], charted: [] };
    const jsonOf = auditRowJson();
    const progress = progressOf(mayShowProgress(options.out));
    let made: Provenance | null = null;
    let count = 0;
    let end: AuditEnd | null = null;
    for (;;) {
      const next = await stream.next();
      if (next.done) {
        end = next.value;
        break;
      }
      made ??= await provenanceFor(ephemeris, next.value, source);
      const rows = next.value.flatMap(({ rows }) => rows.map(({ row }) => row));
      gather(gathered, rows);
      if (format === "json") await destination.write(jsonRows(rows.map(jsonOf), count, made));
      else if (format === "ndjson") await destination.write(rows.map((row) => `${jsonOf(row)}\n`).join(""));
      else if (format === "csv") await destination.write(csvRows(rows, count === 0));
      count += rows.length;
      if (mended) await mended.write(bytesOf(next.value));
      progress.tell(count);
    }
    progress.end();
    made ??= await provenanceFor(ephemeris, [], source);
    if (format === "json") await destination.write(jsonEnd(end, count, made));
    else if (format === "text") {
      for (const piece of auditReport(file === "-" ? "The list" : file, gathered.toMend, end))
        await destination.write(piece);
      await destination.write(footOf(made, { deltaT: false, zones: false }));
    } else if (format === "html") {
      const { auditPage } = await import("../audit/audit-page.ts");
      await destination.write(auditPage(file === "-" ? "The list" : file, gathered, end, made));
    }
    await mended?.finish();
    await destination.finish();
    if (count > end.summary.agrees + end.summary.undecided) process.exitCode = SOME_WRONG;
  } catch (error) {
    await mended?.abandon();
    await destination.abandon();
    if (!(error instanceof ReaderGone)) throw error;
  }
}

function readingOf(options: AuditCommandOptions): AuditOptions {
  if (options.zone !== undefined && options.scale !== undefined) {
    throw new ApsidaryError("bad-option", "--zone and --scale exclude each other: a zone is told in UTC.");
  }
  if (options.zone !== undefined) zoneOf(options.zone);
  const scale =
    options.scale === undefined
      ? options.zone
      : choiceOf("--scale", options.scale.toLowerCase(), ["utc", "ut1", "tt", "tai", "tdb"]);
  return {
    ...(scale === undefined ? {} : { scale }),
    ...(options.pair === undefined ? {} : { pair: pairOf(options.pair) }),
    ...(options.precision === undefined
      ? {}
      : { precision: choiceOf("--precision", options.precision, ["second", "minute", "hour", "day"]) }),
  };
}

function gather({ toMend, charted }: Gathered, rows: readonly AuditRow[]): void {
  for (const row of rows) {
    if (charted.length < MOST_CHARTED && row.differenceSeconds !== null) charted.push(row);
    if (row.verdict !== "agrees" && row.verdict !== "undecided" && toMend.length < MOST_SHOWN) toMend.push(row);
  }
}

/** The sources that serve the pairs and the years of the first rows. */
async function provenanceFor(
  ephemeris: Ephemeris,
  records: readonly AuditedRecord[],
  source: ReturnType<typeof sourceChoiceOf>,
): Promise<Provenance> {
  const pairs = new Set<Pair>();
  let from = Infinity;
  let to = -Infinity;
  for (const { record, rows } of records) {
    for (const row of record.rows) if (!isUnreadRow(row)) pairs.add(row.pair);
    for (const { row } of rows) {
      if (!row.passage) continue;
      from = Math.min(from, row.passage.tdbSeconds);
      to = Math.max(to, row.passage.tdbSeconds);
    }
  }
  if (!(from <= to)) return provenanceOf(ephemeris, { pairs: [], span: { from: 0, to: 1 }, source });
  return provenanceOf(ephemeris, { pairs: [...pairs], span: { from, to }, source });
}

function jsonRows(rows: readonly string[], before: number, made: Provenance): string {
  const head = before === 0 ? jsonHead(made) : "";
  return head + rows.map((row, i) => `${before + i === 0 ? "" : ","}\n${row}`).join("");
}

function jsonHead(made: Provenance): string {
  return `{"schema": "apsidary/audit/1",\n"made": ${JSON.stringify(made)},\n"rows": [`;
}

function jsonEnd(end: AuditEnd, count: number, made: Provenance): string {
  const fields = (["list", "missing", "duplicates", "summary"] as const).map(
    (name) => `,\n${JSON.stringify(name)}: ${JSON.stringify(end[name])}`,
  );
  return `${count === 0 ? jsonHead(made) : "\n"}]${fields.join("")}}\n`;
}

function csvRows(rows: readonly AuditRow[], first: boolean): string {
  const text = [...csvLines(AUDIT_FIELDS, rows.map(flatAuditRow))].join("");
  return first ? text : text.slice(text.indexOf("\r\n") + 2);
}

/** The records with their cells mended. A destination takes bytes as well as text, and these need not be UTF-8. */
function bytesOf(records: readonly AuditedRecord[]): Uint8Array {
  const text = records
    .map(({ record, rows }) =>
      mendedRecord(
        record.text,
        rows.flatMap(({ mends }) => mends),
      ),
    )
    .join("");
  return Buffer.from(text, "latin1");
}

function progressOf(shownToUser: boolean): { tell(rows: number): void; end(): void } {
  let last = performance.now() + 1500;
  let told = false;
  return {
    tell(rows) {
      if (!shownToUser || performance.now() < last) return;
      last = performance.now() + 500;
      told = true;
      process.stderr.write(`\r\u001b[K${rows} rows`);
    },
    end() {
      if (told) process.stderr.write("\r\u001b[K");
    },
  };
}
