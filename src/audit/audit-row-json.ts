import type { PassageRow } from "../passages/to-row.ts";
import type { AuditRow } from "./audit-row.ts";

/** Gives a function that writes rows as JSON; a passage that many rows are held against is written once. */
export function auditRowJson(): (row: AuditRow) => string {
  const written = new WeakMap<PassageRow, string>();
  return ({ passage, sentence, ...row }) => {
    let text = passage ? written.get(passage) : "null";
    if (text === undefined) {
      text = JSON.stringify(passage);
      if (passage) written.set(passage, text);
    }
    return `${JSON.stringify(row).slice(0, -1)},"passage":${text},"sentence":${JSON.stringify(sentence)}}`;
  };
}
