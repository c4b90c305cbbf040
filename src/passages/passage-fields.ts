import type { PassageRow } from "./to-row.ts";

/** The fields of a passage's row, in order: the header of its CSV, and the beginning of those that add to it. */
export const PASSAGE_FIELDS = [
  "pair",
  "targetPoint",
  "centrePoint",
  "kind",
  "term",
  "rank",
  "existence",
  "tdbSeconds",
  "tdb",
  "utc",
  "utcBasis",
  "distanceKm",
  "distanceAu",
  "timeUncertaintySeconds",
  "distanceUncertaintyKm",
  "utcUncertaintySeconds",
  "rangeAccelerationKmPerDay2",
  "source",
  "accuracyBasis",
] as const satisfies readonly (keyof PassageRow)[];
