import type { Motion } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";

/** Distance of a moving point from its centre as a function of time, with its derivatives; times in TDB seconds past J2000. */
export interface RangeFunction {
  /** Whether `rate` may be called. */
  readonly givesRate: boolean;
  /** Distance, km. */
  distance(tdb: number): number;
  /** Range rate, km/s. */
  rate(tdb: number): number;
  /** Writes distance (km) and range acceleration (km/s²) to `out[0]` and `out[1]`, from one evaluation where the source allows. */
  measure(tdb: number, out: Float64Array): void;
}

/** Step by which a range rate is differenced where a source gives no acceleration, seconds. */
const RATE_STEP = 600;
/** Step by which a distance is differenced where a source gives no velocity, seconds. */
const DISTANCE_STEP = 3600;

/**
 * Makes the distance function of a motion. It keeps one array and allocates nothing afterwards.
 *
 * Method: ρ = |x|, ρ̇ = x·v/ρ, ρ̈ = (v·v + x·a − ρ̇²)/ρ; central differences where the source gives no acceleration.
 *
 * @param motion the source's motion for the pair
 * @param label  pair and source, for the message when a state is not a number
 * @throws ApsidaryError `bad-state`, from its methods, where the source yields what is not a number
 */
export function rangeFunction(motion: Motion, label: string): RangeFunction {
  const s = new Float64Array(9);
  const x = (i: number) => s[i] as number;
  const norm = () => Math.sqrt(x(0) * x(0) + x(1) * x(1) + x(2) * x(2));
  const finite = (value: number, tdb: number): number => {
    if (Number.isFinite(value)) return value;
    throw new ApsidaryError("bad-state", `${label} gave no number for ${tdb} s past J2000 (TDB).`);
  };
  const distance = (tdb: number): number => {
    motion.state(tdb, s);
    return finite(norm(), tdb);
  };
  const rate = (tdb: number): number => {
    motion.state(tdb, s);
    return finite((x(0) * x(3) + x(1) * x(4) + x(2) * x(5)) / norm(), tdb);
  };
  const exact = (tdb: number, out: Float64Array): void => {
    motion.stateAndAcceleration?.(tdb, s);
    const range = norm();
    const rangeRate = (x(0) * x(3) + x(1) * x(4) + x(2) * x(5)) / range;
    const speed2 = x(3) * x(3) + x(4) * x(4) + x(5) * x(5);
    out[0] = range;
    out[1] = finite((speed2 + x(0) * x(6) + x(1) * x(7) + x(2) * x(8) - rangeRate * rangeRate) / range, tdb);
  };
  const differencedRate = (tdb: number, out: Float64Array): void => {
    out[0] = distance(tdb);
    out[1] = (rate(tdb + RATE_STEP) - rate(tdb - RATE_STEP)) / (2 * RATE_STEP);
  };
  const differencedDistance = (tdb: number, out: Float64Array): void => {
    const here = distance(tdb);
    out[0] = here;
    out[1] = (distance(tdb + DISTANCE_STEP) - 2 * here + distance(tdb - DISTANCE_STEP)) / DISTANCE_STEP ** 2;
  };
  const { givesVelocity } = motion;
  return {
    givesRate: givesVelocity,
    distance,
    rate,
    measure: motion.stateAndAcceleration ? exact : givesVelocity ? differencedRate : differencedDistance,
  };
}
