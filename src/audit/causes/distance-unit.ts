import type { Case } from "../case.ts";
import type { DistanceCause, DistancePrediction } from "../distance-cause.ts";
import { DISTANCE_UNITS, type PublishedDistance } from "../read-distance.ts";

/** The number is right in another unit than the list says. */
export const distanceUnit: DistanceCause = Object.freeze({
  name: "distance-unit",
  share: 0.3,
  predict(row: Case, distance: PublishedDistance): DistancePrediction[] {
    const { distanceKm } = row.at.passage;
    return (["km", "au", "mi"] as const)
      .filter((unit) => unit !== distance.unit)
      .map((unit) => {
        const factor = DISTANCE_UNITS[distance.unit] / DISTANCE_UNITS[unit];
        return {
          detail: unit,
          share: 1 / 2,
          km: distanceKm * factor,
          unitKm: distance.unitKm,
          boundKm: row.at.kmBound * factor,
        };
      });
  },
  say: (detail: string) => `the number is right in ${detail}`,
});
