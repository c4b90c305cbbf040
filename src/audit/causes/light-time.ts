import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";

/** Speed of light, km/s. Exact, by the definition of the metre. */
export const LIGHT_KM_S = 299_792.458;

/** The time light takes over the distance was added or taken off: 8.2 min at the Earth's perihelion, 1.2 s at the Moon's. */
export const lightTime: TimeCause = Object.freeze({
  name: "light-time",
  predict(row: Case): Prediction[] {
    const seconds = row.at.passage.distanceKm / LIGHT_KM_S;
    const found: Prediction[] = [];
    for (const sign of [1, -1]) {
      const other = readOtherwise(row, { wallSeconds: row.when.wallSeconds - sign * seconds });
      if (!other) continue;
      found.push({
        detail: sign > 0 ? "added" : "taken off",
        share: 0.5,
        residual: other.residual,
        bound: other.bound,
      });
    }
    return found;
  },
  say: (detail: string) => `the time that light takes over the distance was ${detail}`,
});
