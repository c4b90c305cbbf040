import { pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { brentZero } from "../numeric/brent-zero.ts";
import { isTrackPassage, type Passage, type TrackPassage } from "./passage.ts";
import { timelineFor } from "./timeline-for.ts";

/** How far the distance may be from its extreme. */
export type Nearness = { readonly km: number } | { readonly percent: number };

/** Why an end is missing: the sources end first, or the distance has not left the limit within ten periods. */
export type WhyNoEnd = "no-data" | "stays-near";

/** The interval around a passage in which the distance stays near its extreme. Frozen; TDB seconds past J2000. */
export interface NearWindow {
  /** `null` where the distance is not seen to come into the limit. */
  readonly from: number | null;
  /** `null` where it is not seen to leave it. */
  readonly to: number | null;
  /** Whether an end is missing. */
  readonly cut: boolean;
  /** Why; `stays-near` where the two ends are missing for different reasons, `null` where both are there. */
  readonly why: WhyNoEnd | null;
  /** The distance at the ends, km. */
  readonly limitKm: number;
}

const TOLERANCE_SECONDS = 0.01;

/**
 * Half-periods over which the limit may be kept before the search is given up: a nearly round orbit may stay within a percent for ever.
 * A distance that leaves the limit at all does so at the first apsis of the other kind, or within a year or so where the Sun makes orbits breathe.
 */
const MOST_HALF_PERIODS = 20;

/**
 * Gives the interval during which the distance stays within a limit of a passage's extreme.
 *
 * The ends are found as roots of distance − limit, by Brent's method between samples. (The parabola of the range acceleration would be
 * ten percent short for the Earth, whose acceleration the Moon swings.) The passage's own source serves as far as it reaches, then the next.
 *
 * @param ephemeris what `openSources` gave
 * @param passage   a passage that it gave
 * @param nearness  kilometres, or percent of the extreme distance; above zero
 * @throws ApsidaryError `bad-option`
 */
export function nearWindow(ephemeris: Ephemeris, passage: Passage | TrackPassage, nearness: Nearness): NearWindow {
  const km = "km" in nearness ? nearness.km : (passage.distanceKm * nearness.percent) / 100;
  if (!(km > 0) || !Number.isFinite(km)) {
    throw new ApsidaryError(
      "bad-option",
      `the nearness must be above zero: { km: 500 } or { percent: 1 }, not ${JSON.stringify(nearness)}.`,
    );
  }
  const outward = passage.kind === "periapsis" ? 1 : -1;
  const limitKm = passage.distanceKm + outward * km;
  const pair = isTrackPassage(passage) ? passage.track : pairOf(passage.pair);
  const timeline = timelineFor(ephemeris, pair, "auto");
  const supplyOf = (tdb: number) => {
    const own = timeline.supplyAt(tdb);
    if (own?.source.id === passage.source) return own;
    return (
      timeline.supplies.find(
        ({ source, span }) => source.id === passage.source && span.from <= tdb && tdb <= span.to,
      ) ?? own
    );
  };
  const edge = (side: 1 | -1): number | WhyNoEnd => {
    const step = (side * pair.sampleSeconds) / 4;
    let at = passage.tdbSeconds;
    let supply = supplyOf(at);
    const last = at + side * MOST_HALF_PERIODS * pair.halfPeriodSeconds;
    while (supply) {
      const { range, span } = supply;
      const excess = (t: number) => outward * (range.distance(t) - limitKm);
      const next = Math.min(Math.max(at + step, span.from), span.to);
      const after = excess(next);
      if (after >= 0) {
        const start = excess(at);
        return start >= 0 ? at : brentZero(excess, at, start, next, after, TOLERANCE_SECONDS);
      }
      if (next === at) {
        // the end of this source: go on with the one that covers what lies beyond
        const beyond = timeline.supplyAt(at + side);
        if (!beyond || beyond === supply) return "no-data";
        supply = beyond;
      }
      if (side * (next - last) > 0) return "stays-near";
      at = next;
    }
    return "no-data";
  };
  const ends = [edge(-1), edge(1)];
  const [from = null, to = null] = ends.map((end) => (typeof end === "number" ? end : null));
  const why = ends.find((end) => end === "stays-near") ?? ends.find((end) => end === "no-data") ?? null;
  return Object.freeze({ from, to, cut: why !== null, why, limitKm });
}
