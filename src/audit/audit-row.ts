import type { PassageRow } from "../passages/to-row.ts";
import type { CauseName } from "./cause.ts";

/** What the audit says of a value. */
export type Verdict = "agrees" | "last-digit" | "explained" | "disagrees" | "undecided" | "unmatched";

/** The verdicts, the best first: of two the later one counts. */
export const VERDICTS: readonly Verdict[] = Object.freeze([
  "agrees",
  "undecided",
  "last-digit",
  "explained",
  "disagrees",
  "unmatched",
]);

/** A cause that fits as well, with its odds against an error of no known kind. */
export interface Alternative {
  readonly cause: CauseName;
  readonly causeDetail: string | null;
  readonly odds: number;
}

/** What a list says, and what the audit says of it. Frozen; the times and kilometres are rounded to 1 ms and 1 m. */
export interface AuditRow {
  readonly line: number;
  readonly published: {
    readonly when: string;
    readonly scale: string | null;
    readonly unitSeconds: number | null;
    readonly distanceKm: number | null;
  };
  readonly verdict: Verdict;
  readonly timeVerdict: Verdict;
  readonly distanceVerdict: Verdict | null;
  readonly differenceSeconds: number | null;
  readonly differenceKm: number | null;
  readonly cause: CauseName | null;
  readonly causeDetail: string | null;
  readonly alternatives: readonly Alternative[];
  readonly passage: PassageRow | null;
  readonly sentence: string;
}

/** What the audit says of a list as a whole. */
export interface ListFinding {
  readonly cause: CauseName | null;
  readonly causeDetail: string | null;
  readonly sentence: string;
  readonly rowsJudged: number;
  readonly alternatives: readonly Alternative[];
}
