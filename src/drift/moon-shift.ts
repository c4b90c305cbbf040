import { DAY_SECONDS } from "../bodies/constants.ts";
import type { RangeFunction } from "../passages/range-function.ts";

/** How far the Moon shifts a passage of the Earth's centre from that of the barycentre, told from the motion at the barycentre's passage alone. */
export interface MoonShift {
  /** The rate that the Moon gives the Earth's distance from the Sun, where the barycentre's own rate is nought. */
  readonly rangeRateKmPerDay: number;
  /** The Earth's own; the Moon swings it between about 500 and 1000 km/d². */
  readonly rangeAccelerationKmPerDay2: number;
  /** Rate over acceleration, with the opposite sign: above zero, the Earth's centre passes later. */
  readonly firstOrderHours: number;
  /** One term more. */
  readonly secondOrderHours: number;
}

/** Step by which rate and acceleration are differenced, seconds. */
const STEP = 600;

/**
 * Tells how far the Moon shifts a passage of the Earth's centre, in first order and with one term more.
 *
 * @param earth distance function of the Earth's centre from the Sun's
 * @param tdb   passage of the barycentre, TDB seconds past J2000; ten minutes on either side must be covered
 *
 * Method: at that instant the barycentre's range rate is nought, so the Earth's range rate ρ̇ is all the Moon's. One step of
 * Newton's method towards ρ̇ = 0 gives −ρ̇/ρ̈; Halley's, which takes the change of ρ̈ into account, gives −ρ̇ρ̈ / (ρ̈² − ρ̇ρ⃛/2).
 */
export function moonShift(earth: RangeFunction, tdb: number): MoonShift {
  const measures = new Float64Array(2);
  const acceleration = (at: number): number => {
    earth.measure(at, measures);
    return measures[1] as number;
  };
  const rate = earth.givesRate
    ? earth.rate(tdb)
    : (earth.distance(tdb + STEP) - earth.distance(tdb - STEP)) / (2 * STEP);
  const here = acceleration(tdb);
  const change = (acceleration(tdb + STEP) - acceleration(tdb - STEP)) / (2 * STEP);
  return {
    rangeRateKmPerDay: rate * DAY_SECONDS,
    rangeAccelerationKmPerDay2: here * DAY_SECONDS ** 2,
    firstOrderHours: -rate / here / 3600,
    secondOrderHours: (-rate * here) / (here * here - (rate * change) / 2) / 3600,
  };
}
