import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";

/** The time is that of the other kind of passage: perihelion under aphelion, perigee under apogee. */
export const kindSwapped: TimeCause = Object.freeze({
  name: "kind-swapped",
  predict(row: Case): Prediction[] {
    const kind = row.kind === "periapsis" ? "apoapsis" : "periapsis";
    const other = readOtherwise(row, { kind });
    return other ? [{ detail: kind, share: 1, residual: other.residual, bound: other.bound }] : [];
  },
  say: (detail: string) => `the time is that of the ${detail}`,
});
