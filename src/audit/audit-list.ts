import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { AuditRow } from "./audit-row.ts";
import { auditScale, UTC_SCALE } from "./audit-scale.ts";
import type { AuditOptions } from "./audit-stream.ts";
import { type AuditEnd, auditor } from "./auditor.ts";
import { readJsonRow } from "./read-json-row.ts";

/** A row as a caller gives it: the names are those of a list's columns, in plain variants. */
export type GivenRow = Readonly<Record<string, string | number | null | undefined>>;

/** The audit of a whole list. Frozen. */
export interface ListAudit extends AuditEnd {
  readonly rows: readonly AuditRow[];
}

const UNIT_SECONDS = { second: 1, minute: 60, hour: 3600, day: 86_400 } as const;

/**
 * Audits a list that is at hand as values.
 *
 * @param ephemeris what `openSources` gave
 * @param rows      `{ pair: "earth-sun", kind: "perihelion", when: "2026-01-03 17:16", distance: "147099894 km" }` …; lines count from 1
 * @param options   what the rows leave unsaid, and which sources serve
 * @throws ApsidaryError `bad-zone` for a scale that there is not
 */
export function auditList(ephemeris: Ephemeris, rows: Iterable<GivenRow>, options: AuditOptions = {}): ListAudit {
  const judge = auditor(ephemeris, options);
  const settings = {
    scale: options.scale === undefined ? UTC_SCALE : auditScale(options.scale),
    pair: options.pair ?? null,
    unitSeconds: options.precision === undefined ? null : UNIT_SECONDS[options.precision],
    dayFirst: null,
  };
  const judged: AuditRow[] = [];
  let line = 0;
  const keep = (records: ReturnType<typeof judge.push>) => {
    for (const record of records) for (const { row } of record.rows) judged.push(row);
  };
  for (const given of rows) {
    line++;
    const text = JSON.stringify(given);
    keep(judge.push([{ line, text, rows: readJsonRow({ line, text }, settings) }]));
  }
  keep(judge.rest());
  return Object.freeze({ rows: Object.freeze(judged), ...judge.end() });
}
