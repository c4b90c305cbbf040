import type { DistanceCause } from "../distance-cause.ts";
import { distanceCoarse } from "./distance-coarse.ts";
import { distanceDigits } from "./distance-digits.ts";
import { distanceSurface } from "./distance-surface.ts";
import { distanceUnit } from "./distance-unit.ts";

/** Gives all causes of wrong distances. */
export function allDistanceCauses(): readonly DistanceCause[] {
  return [distanceUnit, distanceSurface, distanceDigits, distanceCoarse];
}
