export { auditList, type GivenRow, type ListAudit } from "./audit-list.ts";
export type { Alternative, AuditRow, ListFinding, Verdict } from "./audit-row.ts";
export { type AuditOptions, auditStream } from "./audit-stream.ts";
export type { AuditEnd, AuditedRecord } from "./auditor.ts";
export type { CauseName } from "./cause.ts";
