import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import type { TrackPair } from "../bodies/track-pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { tdbMinusTt } from "../time/tdb-minus-tt.ts";
import { type Moment, tdbOf } from "../time/tdb-of.ts";
import { previousPassage } from "./next-passage.ts";
import type { Passage, TrackPassage } from "./passage.ts";
import { passages } from "./passages.ts";
import { type Range, rangeAt } from "./range-at.ts";
import { type SourceChoice, timelineFor } from "./timeline-for.ts";

/** A distance among the extremes on its two sides. */
export interface TrackedRange extends Range {
  /** 0 at the periapsis before or after, 1 at the apoapsis, by distance; `null` where the sources hold no passage on one side. */
  readonly share: number | null;
}

/** Where to tell the distance. */
export interface TrackQuery {
  /** First moment, included. */
  readonly from: Moment;
  /** Last moment, excluded. */
  readonly to: Moment;
  /** Seconds from row to row, above zero. */
  readonly stepSeconds: number;
  readonly source?: SourceChoice;
}

/**
 * Gives the distance of a pair at equal steps of time, each with its share of the way from periapsis to apoapsis.
 *
 * @param ephemeris what `openSources` gave
 * @param pair      the pair's name
 * @param query     span and step
 * @throws ApsidaryError at the call: as `passages`, and `bad-option` for a step that is not above zero
 */
export function rangeTrack(
  ephemeris: Ephemeris,
  pair: PairName | Pair | TrackPair,
  query: TrackQuery,
): Generator<TrackedRange, void, undefined> {
  const { stepSeconds, source = "auto" } = query;
  if (!(stepSeconds > 0) || !Number.isFinite(stepSeconds)) {
    throw new ApsidaryError("bad-option", `the step must be above zero seconds, not ${stepSeconds}.`);
  }
  const known = typeof pair === "string" ? pairOf(pair) : pair;
  const from = tdbOf(query.from, ephemeris.leapSeconds);
  const to = tdbOf(query.to, ephemeris.leapSeconds);
  passages(ephemeris, known, { ...query, source }); // refuses what cannot be answered, at the call
  return track(ephemeris, known, from, to, stepSeconds, source);
}

/** Seconds within which an instant counts as the end; numbers of this size resolve 10⁻⁷ s. */
const RESOLUTION = 1e-6;

function* track(
  ephemeris: Ephemeris,
  pair: Pair | TrackPair,
  from: number,
  to: number,
  step: number,
  source: SourceChoice,
): Generator<TrackedRange, void, undefined> {
  const end = timelineFor(ephemeris, pair, source).covered.find((span) => span.from <= from && to <= span.to)?.to ?? to;
  let before = previousPassage(ephemeris, pair, { tdbSeconds: from }, "both", { source });
  const later = passages(ephemeris, pair, { from: { tdbSeconds: from }, to: { tdbSeconds: end }, source });
  let after: Passage | TrackPassage | null = later.next().value ?? null;
  // Steps are equal on clocks, that is in TT, from which TDB swings by 2 ms in a year.
  const start = from - tdbMinusTt(from);
  for (let i = 0; ; i++) {
    const tt = start + i * step;
    const tdb = tt + tdbMinusTt(tt);
    if (tdb >= to - RESOLUTION) return;
    while (after && after.tdbSeconds <= tdb) {
      before = after;
      after = later.next().value ?? null;
    }
    const range = rangeAt(ephemeris, pair, { tdbSeconds: tdb }, source);
    yield Object.freeze({ ...range, share: shareOf(range.distanceKm, before, after) });
  }
}

function shareOf(km: number, before: Passage<string> | null, after: Passage<string> | null): number | null {
  if (!before || !after || before.kind === after.kind) return null;
  const least = Math.min(before.distanceKm, after.distanceKm);
  return (km - least) / (Math.max(before.distanceKm, after.distanceKm) - least);
}
