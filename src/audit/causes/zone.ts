import { type AuditScale, auditScale, UTC_SCALE } from "../audit-scale.ts";
import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";
import { wallOf } from "../wall-of.ts";
import { CIVIL_OFFSETS, offsetText, SUMMER_ZONES } from "./civil-offsets.ts";

/** Share of the fixed offsets, UTC among them; the rest goes to zones with summer time. */
const FIXED = 0.7;

/**
 * The time is that of another zone than the list says: one of the 39 civil offsets, UTC, or a zone with summer time.
 *
 * A list that is told in TT or TDB has no zone to be mistaken, and gets no prediction.
 */
export const zone: TimeCause = Object.freeze({
  name: "zone",
  predict(row: Case): Prediction[] {
    if (row.scale.kind !== "utc" && row.scale.kind !== "ut1" && row.scale.kind !== "zone") return [];
    const own = Math.round((wallOf(row.scale, row.at) - row.at.utcWall) / 60);
    const found: Prediction[] = [];
    const read = (scale: AuditScale, detail: string, share: number) => {
      const other = readOtherwise(row, { scale });
      if (other) found.push({ detail, share, residual: other.residual, bound: other.bound });
    };
    const shareOfOne = FIXED / (CIVIL_OFFSETS.length + 1);
    if (own !== 0) read(UTC_SCALE, "+00:00", shareOfOne);
    for (const minutes of CIVIL_OFFSETS) {
      if (minutes !== own) read(auditScale(offsetText(minutes)), offsetText(minutes), shareOfOne);
    }
    for (const name of SUMMER_ZONES) {
      if (row.scale.name !== name) read(auditScale(name), name, (1 - FIXED) / SUMMER_ZONES.length);
    }
    return found;
  },
  say: (detail: string) => (detail === "+00:00" ? "the time is UTC" : `the time is that of zone ${detail}`),
});

/** Gives the scale that a detail of this cause names. */
export function scaleOfDetail(detail: string): AuditScale {
  return auditScale(detail);
}
