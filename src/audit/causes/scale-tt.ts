import { auditScale, UTC_SCALE } from "../audit-scale.ts";
import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";
import { offsetSeconds } from "../wall-of.ts";

/**
 * The time was left in TT (which TDB follows within 2 ms) where civil time was due, or the other way round: 69 s off today.
 *
 * For a list in a zone: the zone was applied to TT.
 */
export const scaleTt: TimeCause = Object.freeze({
  name: "scale-tt",
  predict(row: Case): Prediction[] {
    if (row.scale.kind === "tt" || row.scale.kind === "tdb") {
      const other = readOtherwise(row, { scale: UTC_SCALE });
      return other ? [{ detail: "UTC", share: 1, ...other }] : [];
    }
    if (row.scale.kind === "tai") return [];
    const offset = offsetSeconds(row.scale, row.at.utcWall);
    const other = readOtherwise(row, { scale: auditScale("tt"), wallSeconds: row.when.wallSeconds - offset });
    return other ? [{ detail: "TT", share: 1, residual: other.residual, bound: other.bound }] : [];
  },
  say: (detail: string) => `the time is ${detail}${detail === "TT" ? ", not civil time" : ", not dynamical time"}`,
});
