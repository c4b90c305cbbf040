import { AU_KM } from "../../bodies/constants.ts";
import type { Case } from "../case.ts";
import type { DistanceCause, DistancePrediction } from "../distance-cause.ts";
import type { PublishedDistance } from "../read-distance.ts";
import { tdbNear } from "../wall-of.ts";

/** The distance is that of a coarse model, to its last digit. */
export const distanceCoarse: DistanceCause = Object.freeze({
  name: "coarse-model",
  share: 0.2,
  predict(row: Case, distance: PublishedDistance): DistancePrediction[] {
    if (row.at.passage.source === "engine") return [];
    const coarse = row.coarse?.nearest(row.pair, row.kind, tdbNear(row.scale, row.when.wallSeconds));
    if (!coarse) return [];
    return [
      {
        detail: "astronomy-engine",
        share: 1,
        km: coarse.passage.distanceKm,
        unitKm: distance.unitKm,
        boundKm: 0.01 + coarse.passage.distanceKm / AU_KM / 10,
      },
    ];
  },
  say: (detail: string) => `the distance is that of a coarse model (${detail})`,
});
