import { DAY_SECONDS } from "../bodies/constants.ts";
import { trackPair, UNNAMED_POINT } from "../bodies/track-pair.ts";
import type { Accuracy, Motion } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { keplerMotion } from "./kepler-motion.ts";
import { DEVIATIONS, readStar, type Star, type StarGiven, type StarOrbit, starOrbit } from "./star.ts";
import { ALL_TIME, type Track, trackOf } from "./track.ts";

/** Speed of light, km/s; exact. */
const LIGHT = 299_792.458;
const RESOLUTION = 1e-6;
/** Below this the rounding of a state makes more of a range rate than the shape does. */
const LEAST_ECCENTRICITY = 1e-10;

/**
 * Makes a track from the orbit of a binary star: the distance of its stars, by the time at which the light of the first one arrives at the
 * solar-system barycentre.
 *
 * Light crosses the orbit too: the first star's is late by z/c (`starOrbit`), and the state told for an instant is the one that is seen then. Without
 * `k1KmS` and `argumentDeg` that delay is not known; then it is left out, and the most it could be is added to the uncertainty of apastron.
 * Errors are carried from the covariance by the derivatives of each epoch; half-widths are 1.96 deviations.
 *
 * @throws ApsidaryError `bad-input`, `bad-pair`
 */
export function starTrack(given: StarGiven | Star): Track {
  const star = "errorsGiven" in given ? given : readStar(given);
  const orbit = starOrbit(star.values);
  const { periodSeconds: period, eccentricity: e, semiMajorAxisKm: a } = orbit;
  if (e < LEAST_ECCENTRICITY) {
    throw new ApsidaryError("bad-input", `the orbit of ${star.name} is a circle to rounding: it has no periastron.`);
  }
  const meanMotion = (2 * Math.PI) / period;
  const extremes = [starEpoch(star.values, 1), a ** 3 * meanMotion ** 2, ...star.covariance.flat()];
  if (!extremes.every(Number.isFinite) || !(a ** 3 * meanMotion ** 2 > 0)) {
    throw new ApsidaryError(
      "bad-input",
      `the elements of ${star.name} go beyond what numbers hold. Check their units.`,
    );
  }
  const motion = seenMotion(star, orbit);
  const pair = trackPair({
    name: star.name,
    centre: UNNAMED_POINT,
    sampleSeconds: period / 10,
    halfPeriodSeconds: period / 2,
    toleranceSeconds: Math.min(8, (period / 6.3) * (1 - e) ** 1.5 * 1e-4),
    referenceRadiusKm: null,
    radiusSource: null,
  });
  const undone = Math.sqrt(varianceOf(star, (values) => values.eccentricity as number)) * DEVIATIONS >= e;
  const spread = (f: (values: Star["values"]) => number) => DEVIATIONS * Math.sqrt(varianceOf(star, f));
  const rangeKm = [1, -1].map((side) =>
    spread((v) => starOrbit(v).semiMajorAxisKm * (1 - side * (v.eccentricity as number))),
  );
  const unknownDelay = orbit.lightSeconds === null ? (2 * a) / LIGHT : 0;
  const accuracy = (tdb: number): Accuracy => {
    const halves = Math.round((2 * (tdb - star.epochTdb)) / period);
    const far = Math.abs(halves % 2) === 1;
    const seconds = Math.hypot(
      spread((values) => starEpoch(values, halves)),
      far ? unknownDelay : 0,
      RESOLUTION,
    );
    const km = Math.hypot(rangeKm[far ? 1 : 0] ?? 0, a * 1e-14);
    return {
      rangeKm: km,
      rangeRateKmS: meanMotion * Math.hypot(km, a * e * meanMotion * seconds),
      basis: star.errorsGiven ? "user" : "assumed",
      timeSeconds: seconds,
      existence: undone ? "uncertain" : "certain",
    };
  };
  const light =
    orbit.lightSeconds === null ? "light-travel time across the orbit not known" : "light-travel time counted";
  const title = `the binary ${star.name}, as its light arrives at the solar-system barycentre; ${light}`;
  return trackOf({ pair, id: "star", title, spans: [ALL_TIME], motion, accuracy });
}

/**
 * Gives seconds from the star's own `periastronAt` to the arrival of the light of an apsis.
 *
 * @param values the elements
 * @param halves half periods from it: even for periastron, odd for apastron
 */
export function starEpoch(values: Star["values"], halves: number): number {
  const { periodSeconds, apastronDelay } = starOrbit(values);
  const delay = Math.abs(halves % 2) === 1 ? apastronDelay : 0;
  return (values.periastronAt as number) * DAY_SECONDS + (halves * periodSeconds) / 2 + delay;
}

/** Variance of a function of the elements, by its central differences over a tenth of each deviation. */
function varianceOf({ values, fields, covariance }: Star, f: (values: Star["values"]) => number): number {
  const slopes = fields.map((field, i) => {
    const step = 0.1 * Math.sqrt(covariance[i]?.[i] ?? 0);
    if (step === 0) return 0;
    const value = values[field] as number;
    const rise = f({ ...values, [field]: value + step }) - f({ ...values, [field]: value - step });
    return rise / (2 * step);
  });
  let sum = 0;
  slopes.forEach((one, i) => {
    slopes.forEach((other, j) => {
      sum += one * other * (covariance[i]?.[j] ?? 0);
    });
  });
  return Math.max(0, sum);
}

/** The motion as it is seen: the state at the instant that the light left, found by Newton's method on t + z(t)/c. */
function seenMotion({ epochTdb }: Star, orbit: StarOrbit): Motion {
  const { periodSeconds: period, eccentricity: e, semiMajorAxisKm: a, lightSeconds, argument } = orbit;
  const [sine, cosine] = [Math.sin(argument), Math.cos(argument)];
  const light = (lightSeconds ?? 0) / a; // seconds for a kilometre of the orbit told
  const truth = keplerMotion({
    periapsisKm: a * (1 - e),
    eccentricity: e,
    gmKm3S2: a ** 3 * ((2 * Math.PI) / period) ** 2,
    periapsisTdb: epochTdb - light * a * (1 - e) * sine,
  });
  if (light === 0) return truth;
  const s = new Float64Array(9);
  const leave = (tdb: number): number => {
    let t = tdb;
    for (let i = 0; i < 20; i++) {
      truth.stateAndAcceleration?.(t, s);
      const [x = 0, y = 0, , vx = 0, vy = 0] = s;
      const step = (t + light * (x * sine + y * cosine) - tdb) / (1 + light * (vx * sine + vy * cosine));
      t -= step;
      if (Math.abs(step) < 1e-7) break;
    }
    truth.stateAndAcceleration?.(t, s);
    return t;
  };
  const at = (i: number) => s[i] as number;
  return {
    givesVelocity: true,
    state(tdb, out) {
      leave(tdb);
      const pace = 1 / (1 + light * (at(3) * sine + at(4) * cosine));
      for (let i = 0; i < 3; i++) {
        out[i] = at(i);
        out[i + 3] = at(i + 3) * pace;
      }
    },
    stateAndAcceleration(tdb, out) {
      leave(tdb);
      // with t' = 1/(1 + ż/c): x' = v t', x'' = a t'² + v t'', t'' = −(z̈/c) t'³
      const pace = 1 / (1 + light * (at(3) * sine + at(4) * cosine));
      const slowing = -light * (at(6) * sine + at(7) * cosine) * pace ** 3;
      for (let i = 0; i < 3; i++) {
        out[i] = at(i);
        out[i + 3] = at(i + 3) * pace;
        out[i + 6] = at(i + 6) * pace * pace + at(i + 3) * slowing;
      }
    },
  };
}
