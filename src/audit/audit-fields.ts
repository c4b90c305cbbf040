import type { AuditRow } from "./audit-row.ts";

/** A row of the audit laid flat, for CSV: what lies in a field's field is named with a point between. */
export type FlatAuditRow = Readonly<Record<(typeof AUDIT_FIELDS)[number], string | number | null>>;

/** The columns of the audit's CSV, in order. */
export const AUDIT_FIELDS = [
  "line",
  "published.when",
  "published.scale",
  "published.unitSeconds",
  "published.distanceKm",
  "verdict",
  "timeVerdict",
  "distanceVerdict",
  "differenceSeconds",
  "differenceKm",
  "cause",
  "causeDetail",
  "alternatives",
  "passage.pair",
  "passage.kind",
  "passage.tdbSeconds",
  "passage.utc",
  "passage.distanceKm",
  "passage.utcUncertaintySeconds",
  "passage.source",
  "sentence",
] as const;

/** Lays a row flat; alternatives become words with their odds. */
export function flatAuditRow(row: AuditRow): FlatAuditRow {
  const { published, passage } = row;
  return {
    line: row.line,
    "published.when": published.when,
    "published.scale": published.scale,
    "published.unitSeconds": published.unitSeconds,
    "published.distanceKm": published.distanceKm,
    verdict: row.verdict,
    timeVerdict: row.timeVerdict,
    distanceVerdict: row.distanceVerdict,
    differenceSeconds: row.differenceSeconds,
    differenceKm: row.differenceKm,
    cause: row.cause,
    causeDetail: row.causeDetail,
    alternatives:
      row.alternatives
        .map(({ cause, causeDetail, odds }) => `${cause}${causeDetail ? ` ${causeDetail}` : ""} (${odds}:1)`)
        .join("; ") || null,
    "passage.pair": passage?.pair ?? null,
    "passage.kind": passage?.kind ?? null,
    "passage.tdbSeconds": passage?.tdbSeconds ?? null,
    "passage.utc": passage?.utc ?? null,
    "passage.distanceKm": passage?.distanceKm ?? null,
    "passage.utcUncertaintySeconds": passage?.utcUncertaintySeconds ?? null,
    "passage.source": passage?.source ?? null,
    sentence: row.sentence,
  };
}
