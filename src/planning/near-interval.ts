import { pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { brentZero } from "../numeric/brent-zero.ts";
import { type Nearness, nearWindow } from "../passages/near-window.ts";
import type { Passage } from "../passages/passage.ts";
import { timelineFor } from "../passages/timeline-for.ts";

/** Why the near interval has no end: the sources end first, or the distance does not leave the limit within ten periods. */
export type WhyNoNear = "no-data" | "stays-near";

/** The stretch around a passage in which the distance stays within a limit of its extreme, TDB seconds past J2000. */
export interface NearInterval {
  readonly from: number | null;
  readonly to: number | null;
  /** `null` where both ends are there. */
  readonly why: WhyNoNear | null;
}

/** Half-periods over which the limit may be kept. A distance that leaves it at all does so at the first apsis of the other kind, or within a year or so where the Sun makes orbits breathe. */
const MOST_HALF_PERIODS = 20;
/** Seconds. */
const TOLERANCE = 0.01;

/**
 * Gives the near interval of a passage as `nearWindow` does, but gives up where the distance stays within the limit for ten periods: a nearly
 * round orbit may stay within a percent for ever, and the search would go on to the end of the sources.
 *
 * @throws ApsidaryError `bad-option`
 */
export function nearInterval(ephemeris: Ephemeris, passage: Passage, nearness: Nearness): NearInterval {
  const km = "km" in nearness ? nearness.km : (passage.distanceKm * nearness.percent) / 100;
  if (!(km > 0) || !Number.isFinite(km)) {
    throw new ApsidaryError(
      "bad-option",
      `the nearness must be above zero: { km: 500 } or { percent: 1 }, not ${JSON.stringify(nearness)}.`,
    );
  }
  const outward = passage.kind === "periapsis" ? 1 : -1;
  const limit = passage.distanceKm + outward * km;
  const pair = pairOf(passage.pair);
  const timeline = timelineFor(ephemeris, pair, "auto");
  const excess = (t: number): number | null => {
    const supply = timeline.supplyAt(t);
    return supply && outward * (supply.range.distance(t) - limit);
  };
  /** The two samples between which the limit is left. */
  const left = (side: 1 | -1): readonly [number, number] | WhyNoNear => {
    const step = (side * pair.sampleSeconds) / 4;
    const steps = Math.ceil((MOST_HALF_PERIODS * pair.halfPeriodSeconds) / Math.abs(step));
    for (let i = 1; i <= steps; i++) {
      const t = passage.tdbSeconds + i * step;
      const there = excess(t);
      if (there === null) return "no-data";
      if (there >= 0) return [t - step, t];
    }
    return "stays-near";
  };
  const before = left(-1);
  const after = left(1);
  // the search by `nearWindow` ends soon on both sides: where the limit is left, or where the data end before that
  if (before !== "stays-near" && after !== "stays-near") {
    const { from, to, cut } = nearWindow(ephemeris, passage, nearness);
    return { from, to, why: cut ? "no-data" : null };
  }
  const edge = (bracket: readonly [number, number] | WhyNoNear): number | null => {
    if (typeof bracket === "string") return null;
    const [inside, outside] = bracket;
    const value = (t: number) => excess(t) ?? Number.NaN;
    return brentZero(value, inside, value(inside), outside, value(outside), TOLERANCE);
  };
  return { from: edge(before), to: edge(after), why: "stays-near" };
}
