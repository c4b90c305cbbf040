import type { Case, Prediction } from "./case.ts";

/** Why a published value is off: the closed list. */
export type CauseName =
  | "rounded-down"
  | "rounded-up"
  | "scale-tt"
  | "zone"
  | "half-day"
  | "whole-days"
  | "emb-centre"
  | "ssb-centre"
  | "kind-swapped"
  | "year-copied"
  | "month-day-swapped"
  | "julian-calendar"
  | "light-time"
  | "coarse-model"
  | "distance-unit"
  | "distance-surface"
  | "distance-digits";

/** A cause of wrong times: what it predicts for a row. Frozen. */
export interface TimeCause {
  readonly name: CauseName;
  /**
   * Gives what each variant of the slip would be off by; none where the slip cannot have happened to this row.
   */
  predict(row: Case): readonly Prediction[];
  /** Says what happened, as the end of a sentence that begins with the row: `it is the time of zone +05:30`. */
  say(detail: string): string;
}
