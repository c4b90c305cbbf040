import type { Case } from "./case.ts";
import type { CauseName } from "./cause.ts";
import type { PublishedDistance } from "./read-distance.ts";

/** What a cause would have printed in a distance's place, km of the list's own unit. */
export interface DistancePrediction {
  readonly detail: string;
  readonly share: number;
  readonly km: number;
  /** What the last digit is then worth, and how far the value may be off, km. */
  readonly unitKm: number;
  readonly boundKm: number;
}

/** A cause of wrong distances. Frozen. */
export interface DistanceCause {
  readonly name: CauseName;
  readonly share: number;
  predict(row: Case, distance: PublishedDistance): readonly DistancePrediction[];
  say(detail: string): string;
}
