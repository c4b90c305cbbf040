import { DAY_SECONDS } from "../bodies/constants.ts";
import { trackPair } from "../bodies/track-pair.ts";
import type { Accuracy } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { type Elements, type ElementsGiven, meanMotionOf, readElements } from "./elements.ts";
import { keplerMotion } from "./kepler-motion.ts";
import { ALL_TIME, centreOf, type Track, trackOf } from "./track.ts";

/** Parts of a period from sample to sample: an extremum each half of it, and none between. */
const SAMPLES_PER_PERIOD = 10;
/** An open orbit has one extremum: any step finds it. */
const OPEN_STEP = 90 * DAY_SECONDS;
/** What an instant of some 10⁹ s resolves, seconds, with room for a division. */
const RESOLUTION = 1e-6;
const EPSILON = 2 ** -52;
/** Below this the rounding of a state makes more of a range rate than the shape does. */
const LEAST_ECCENTRICITY = 1e-10;

/**
 * Makes a track from osculating elements: Kepler's motion, two bodies alone, for all time.
 *
 * Its passages carry what the elements' own errors come to (`Elements`): an epoch's error stays, a period's grows with the count of
 * revolutions. The pull of other bodies is not in them, and the title says so.
 *
 * @param given elements as a caller writes them, or as `readElements` gave them
 * @throws ApsidaryError `bad-input`, `bad-pair`
 */
export function elementsTrack(given: ElementsGiven | Elements): Track {
  const elements = "orbit" in given && "error" in given ? given : readElements(given);
  const { orbit, periapsisTdb, error } = elements;
  const meanMotion = meanMotionOf(orbit);
  const { periodSeconds: period, eccentricity } = orbit;
  const motion = keplerMotion({
    periapsisKm: orbit.periapsisKm,
    eccentricity,
    gmKm3S2: orbit.gravitationalParameterKm3S2,
    periapsisTdb,
    ...(elements.axes === null ? {} : { axes: elements.axes }),
  });
  if (eccentricity < LEAST_ECCENTRICITY) {
    throw new ApsidaryError(
      "bad-input",
      `the orbit of ${elements.name} is a circle to rounding (eccentricity ${eccentricity}): it has no nearest and no farthest point.`,
    );
  }
  // how fast the range rate turns at the periapsis sets how closely its zero is bracketed
  const turn = Math.sqrt(orbit.periapsisKm ** 3 / orbit.gravitationalParameterKm3S2);
  const pair = trackPair({
    name: elements.name,
    centre: centreOf(orbit.about),
    sampleSeconds: period === null ? OPEN_STEP : period / SAMPLES_PER_PERIOD,
    halfPeriodSeconds: period === null ? OPEN_STEP : period / 2,
    toleranceSeconds: Math.min(8, turn * 1e-4),
    referenceRadiusKm: orbit.equatorialRadiusKm,
    radiusSource: orbit.radiusSource,
  });
  const undone = error.eccentricity >= eccentricity;
  const rounding = RESOLUTION + (8 * EPSILON) / (Math.max(eccentricity, EPSILON) * meanMotion);
  const place = new Float64Array(9);
  const accuracy = (tdb: number): Accuracy => {
    motion.stateAndAcceleration?.(tdb, place);
    const [x = 0, y = 0, z = 0, vx = 0, vy = 0, vz = 0, ax = 0, ay = 0, az = 0] = place;
    const range = Math.hypot(x, y, z);
    const rate = (x * vx + y * vy + z * vz) / range;
    const acceleration = (vx * vx + vy * vy + vz * vz + x * ax + y * ay + z * az - rate * rate) / range;
    const revolutions = period === null ? 0 : (tdb - elements.epochTdb) / period;
    const seconds = Math.hypot(error.periapsisSeconds, revolutions * error.periodSeconds, rounding);
    const far = period !== null && acceleration < 0;
    const km = far ? error.apoapsisKm : error.periapsisKm;
    const floor = 16 * EPSILON * range;
    return {
      rangeKm: Math.hypot(km, rate * seconds, floor),
      rangeRateKmS: Math.hypot(acceleration * seconds, meanMotion * km),
      basis: error.basis,
      timeSeconds: seconds,
      existence: undone ? "uncertain" : "certain",
    };
  };
  const title = `osculating elements of ${elements.name}, two bodies alone`;
  return trackOf({
    pair,
    id: "elements",
    title,
    spans: [ALL_TIME],
    motion,
    accuracy,
    description: `${title}\n  ${orbit.conic}, eccentricity ${eccentricity}, periapsis ${orbit.periapsisKm} km`,
  });
}
