import type { Pair } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { AuditScale } from "./audit-scale.ts";
import type { PublishedWhen } from "./published-when.ts";
import type { PublishedDistance } from "./read-distance.ts";

/** Where a value stands in its record. */
export interface CellPlace {
  readonly start: number;
  readonly end: number;
  /** How it is written there: bare, in CSV quotes, or as a JSON string or number. */
  readonly form: "bare" | "quoted" | "json";
}

/** One passage as a list gives it. Frozen. */
export interface ListRow {
  readonly line: number;
  readonly pair: Pair;
  readonly kind: ApsisKind;
  readonly when: PublishedWhen;
  readonly scale: AuditScale;
  readonly distance: PublishedDistance | null;
  /** Where to write when a cell is mended; date and time may stand in two cells. */
  readonly places: {
    readonly when: readonly { readonly place: CellPlace; readonly text: string }[];
    readonly kind: { readonly place: CellPlace; readonly text: string } | null;
    readonly distance: CellPlace | null;
  };
}

/** A row that cannot be read. Frozen. */
export interface UnreadRow {
  readonly line: number;
  /** What stood in the place of the time. */
  readonly when: string;
  /** What is wrong, and what was expected. */
  readonly problem: string;
}

/** A record of the input with what was read from it: no row (a heading, a comment, a blank line), one, or two of a wide list. */
export interface ReadRecord {
  readonly line: number;
  /** As in the input, each character a byte. */
  readonly text: string;
  readonly rows: readonly (ListRow | UnreadRow)[];
}

/** Tells whether a row could not be read. */
export function isUnreadRow(row: ListRow | UnreadRow): row is UnreadRow {
  return "problem" in row;
}
