import { PASSAGE_FIELDS } from "../passages/passage-fields.ts";
import type { PlanRow } from "./plan-row.ts";

/** A row with its windows as one text, for tables. */
export type PlanRecord = Omit<PlanRow, "windows"> & { readonly windows: string };

/** Gives a row as a table holds it: windows as ISO 8601 intervals, `from/to`, between spaces. */
export function planRecord(row: PlanRow): PlanRecord {
  return { ...row, windows: row.windows.map(({ fromUtc, toUtc }) => `${fromUtc}/${toUtc}`).join(" ") };
}

/** The fields of a row, in order. */
export const PLAN_NAMES = [
  ...PASSAGE_FIELDS,
  "site",
  "zone",
  "local",
  "altitudeDeg",
  "azimuthDeg",
  "sunAltitudeDeg",
  "turnUncertaintyDeg",
  "up",
  "dark",
  "topocentricDistanceKm",
  "geocentricDistanceKm",
  "topocentricLeastUtc",
  "topocentricGreatestUtc",
  "topocentricExtremeKm",
  "diameterArcmin",
  "geocentricDiameterArcmin",
  "illuminatedFraction",
  "lightTimeSeconds",
  "riseUtc",
  "transitUtc",
  "setUtc",
  "whyNoRise",
  "whyNoTransit",
  "bestUtc",
  "bestLocal",
  "bestAltitudeDeg",
  "bestDiameterArcmin",
  "whyNoBest",
  "nearFromUtc",
  "nearToUtc",
  "nearCut",
  "whyNoNear",
  "windows",
  "windowsCut",
  "whyNot",
] as const satisfies readonly (keyof PlanRow)[];
