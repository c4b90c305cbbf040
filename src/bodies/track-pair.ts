import { ApsidaryError } from "../error.ts";
import { allPairs, type Pair } from "./pair.ts";
import type { PointId } from "./point.ts";

/** The pair of a track: a moving point of the caller's own, and the centre from which its distance is measured. Frozen. */
export interface TrackPair extends Pair<string> {
  /** The radius that heights are above, km; `null` where none is known. */
  readonly referenceRadiusKm: number | null;
  /** What radius that is. */
  readonly radiusSource: string | null;
}

/** Stands for a point that has no SPK id: the least number of SPK's integers, which no body has. Rows tell `null`. */
export const UNNAMED_POINT: PointId = -2_147_483_648;

/** Seconds; instants resolve a microsecond, and what is quicker is a slip of units. */
const LEAST_HALF_PERIOD = 1;

/** Tells whether a pair is that of a track. */
export function isTrackPair(pair: Pair<string>): pair is TrackPair {
  return "referenceRadiusKm" in pair;
}

/**
 * Makes the pair of a track.
 *
 * @param given its name, such as `probe-earth`: letters, digits and `. _ -`, not the name of a pair that the library knows; the times by
 *   which it is searched, seconds, above zero
 * @throws ApsidaryError `bad-pair`, `bad-option`
 */
export function trackPair(given: Omit<TrackPair, "target"> & { readonly target?: PointId }): TrackPair {
  const { name, sampleSeconds, halfPeriodSeconds } = given;
  if (typeof name !== "string" || !/^[\p{L}\p{N}][\p{L}\p{N}._-]{0,59}$/u.test(name)) {
    throw new ApsidaryError(
      "bad-pair",
      `${JSON.stringify(String(name).slice(0, 60))} cannot name a track: write the moving point, then the centre, such as probe-earth ` +
        "(letters, digits, dots, hyphens, up to 60).",
    );
  }
  if (allPairs().some((pair) => pair.name === name)) {
    throw new ApsidaryError("bad-pair", `${name} is a pair that the library knows; give your track another name.`);
  }
  for (const [what, seconds] of Object.entries({ sampleSeconds, halfPeriodSeconds })) {
    if (seconds > 0 && Number.isFinite(seconds)) continue;
    throw new ApsidaryError("bad-option", `${what} of ${name} must be above zero seconds, not ${seconds}.`);
  }
  if (halfPeriodSeconds < LEAST_HALF_PERIOD) {
    throw new ApsidaryError(
      "bad-option",
      `${name} goes round in ${2 * halfPeriodSeconds} s; an orbit must take ${2 * LEAST_HALF_PERIOD} s at the least. Check the units.`,
    );
  }
  return Object.freeze({ ...given, target: given.target ?? UNNAMED_POINT });
}
