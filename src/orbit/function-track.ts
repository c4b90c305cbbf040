import { type BodyName, physicalBody } from "../bodies/physical.ts";
import { trackPair } from "../bodies/track-pair.ts";
import type { Accuracy, Motion, Span } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { checkMotion } from "./check-motion.ts";
import { differencedMotion } from "./differenced-motion.ts";
import { centreOf, type Track, trackOf } from "./track.ts";

/** A motion that a caller gives as a function of time. */
export interface FunctionGiven {
  /** What to call the pair: the moving point, then the centre, such as `probe-earth`. */
  readonly name: string;
  /**
   * Gives position (km) or position and velocity (km/s) as seen from the centre, in any axes that do not turn.
   * @param tdb TDB seconds past J2000
   */
  readonly state: (tdb: number) => ArrayLike<number>;
  /** Where the function holds, TDB seconds past J2000. */
  readonly span: Span;
  /** About how long one revolution takes, seconds: it is sampled a tenth of that apart. */
  readonly periodSeconds: number;
  /** The body at the centre; it gives the radius that heights are above. */
  readonly about?: BodyName | undefined;
  /** Half-widths that at least 95 % of true errors keep; left out, a millionth of distance and speed is assumed. */
  readonly accuracy?: { readonly rangeKm: number; readonly rangeRateKmS: number } | undefined;
}

const SAMPLES_PER_PERIOD = 10;
/** Steps of the differences by which a function without velocity is differentiated, in a sample: (2π/20 000)⁴/30 of the speed is lost. */
const STEPS_PER_SAMPLE = 2000;
const ASSUMED = 1e-6;

/**
 * Makes a track from a function of time.
 *
 * The whole span is looked over once, at the samples of the search: a function that throws, gives what is no number, jumps, or has
 * a velocity that contradicts its position is refused with the time where it does. Where it gives positions alone, velocity is
 * their central difference of the fourth order.
 *
 * @throws ApsidaryError `bad-state` as told; `bad-span`, `bad-option`, `bad-pair`
 */
export function functionTrack({ name, state, span, periodSeconds, about, accuracy }: FunctionGiven): Track {
  if (!(span.from < span.to) || !Number.isFinite(span.to - span.from)) {
    throw new ApsidaryError("bad-span", `the span of ${name} must end after it begins: ${span.from} to ${span.to}.`);
  }
  const pair = trackPair({
    name,
    centre: centreOf(about ?? null),
    sampleSeconds: periodSeconds / SAMPLES_PER_PERIOD,
    halfPeriodSeconds: periodSeconds / 2,
    toleranceSeconds: Math.min(8, periodSeconds * 1e-5),
    referenceRadiusKm: about === undefined ? null : physicalBody(about).equatorialRadiusKm,
    radiusSource: about === undefined ? null : physicalBody(about).radiusSource,
  });
  const step = pair.sampleSeconds / STEPS_PER_SAMPLE;
  const guarded = guard(name, state, span);
  const length = guarded(span.from, new Float64Array(6));
  const given: Motion = { givesVelocity: length === 6, state: (tdb, out) => void guarded(tdb, out) };
  // differences need room on either side
  const inner: Span = { from: span.from + 22 * step, to: span.to - 22 * step };
  if (!(inner.from < inner.to)) {
    throw new ApsidaryError("bad-span", `the span of ${name} is shorter than its search needs; give a longer one.`);
  }
  checkMotion(name, given, span, pair.sampleSeconds, accuracy?.rangeRateKmS ?? 0);
  const motion = length === 6 ? withAcceleration(given, step) : differencedMotion(given, step);
  const place = new Float64Array(9);
  const title = `a function of time for ${name}`;
  return trackOf({
    pair,
    id: "function",
    title,
    spans: [inner],
    motion,
    accuracy: (tdb): Accuracy => {
      if (accuracy) return { ...accuracy, basis: "user" };
      motion.state(tdb, place);
      const [x = 0, y = 0, z = 0, vx = 0, vy = 0, vz = 0] = place;
      return {
        rangeKm: ASSUMED * Math.hypot(x, y, z),
        rangeRateKmS: ASSUMED * Math.hypot(vx, vy, vz),
        basis: "assumed",
      };
    },
  });
}

/** Calls the function and refuses what is no state; writes it to `out` and gives its length, 3 or 6. */
function guard(name: string, state: FunctionGiven["state"], span: Span) {
  const refuse = (tdb: number, why: string) =>
    new ApsidaryError("bad-state", `the function of ${name} ${why} at ${formatTdb(tdb)} TDB (${tdb} s past J2000).`);
  let length = 0;
  return (tdb: number, out: Float64Array): number => {
    const at = Math.min(Math.max(tdb, span.from), span.to);
    let values: ArrayLike<number>;
    try {
      values = state(at);
    } catch (error) {
      throw refuse(at, `threw (${error instanceof Error ? error.message.slice(0, 80) : String(error).slice(0, 80)})`);
    }
    const count = values?.length;
    if (count !== 3 && count !== 6) {
      throw refuse(at, `gave ${count === undefined ? "no array" : `${count} numbers`}, not 3 or 6,`);
    }
    if (length !== 0 && count !== length) throw refuse(at, `gave ${count} numbers, and ${length} before,`);
    length = count;
    for (let i = 0; i < count; i++) {
      const value = values[i];
      if (typeof value !== "number" || !Number.isFinite(value)) throw refuse(at, `gave ${String(value)}, no number,`);
      out[i] = value;
    }
    return count;
  };
}

function withAcceleration(given: Motion, step: number): Motion {
  const before = new Float64Array(6);
  const after = new Float64Array(6);
  return {
    givesVelocity: true,
    state: given.state,
    stateAndAcceleration(tdb, out) {
      given.state(tdb - step, before);
      given.state(tdb + step, after);
      given.state(tdb, out);
      for (let i = 0; i < 3; i++) out[6 + i] = ((after[3 + i] as number) - (before[3 + i] as number)) / (2 * step);
    },
  };
}
