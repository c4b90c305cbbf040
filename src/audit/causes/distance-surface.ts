import { physicalBody } from "../../bodies/physical.ts";
import { POINTS } from "../../bodies/point.ts";
import type { Case } from "../case.ts";
import type { DistanceCause, DistancePrediction } from "../distance-cause.ts";
import type { PublishedDistance } from "../read-distance.ts";

/** The distance is one from surface to surface, from centre to surface, or from the surface to the centre. */
export const distanceSurface: DistanceCause = Object.freeze({
  name: "distance-surface",
  share: 0.2,
  predict(row: Case, distance: PublishedDistance): DistancePrediction[] {
    const radii: (readonly [string, number])[] = [];
    const { target, centre } = row.pair;
    if (centre === POINTS.earth) {
      const { equatorialRadiusKm: earth } = physicalBody("earth");
      const { equatorialRadiusKm: moon } = physicalBody("moon");
      radii.push(["the Earth's surface", earth], ["the Moon's surface", moon], ["surface to surface", earth + moon]);
      radii.push(["the Earth's surface (mean radius)", MEAN_EARTH_RADIUS_KM]);
    } else if (centre === POINTS.sun) {
      const { equatorialRadiusKm: sun } = physicalBody("sun");
      radii.push(["the Sun's surface", sun]);
      if (target === POINTS.earth) {
        const { equatorialRadiusKm: earth } = physicalBody("earth");
        radii.push(["the Earth's surface", earth], ["surface to surface", earth + sun]);
      }
    }
    return radii.map(([detail, km]) => ({
      detail,
      share: 1 / radii.length,
      km: row.at.passage.distanceKm - km,
      unitKm: distance.unitKm,
      boundKm: row.at.kmBound + 0.5,
    }));
  },
  say: (detail: string) => `the distance is reckoned to ${detail.replace(/^surface to/, "the near surface,")}`,
});

/** Mean radius of the Earth, km. B. A. Archinal et al. 2018, from memory. */
const MEAN_EARTH_RADIUS_KM = 6371.0084;
