import { DAY_SECONDS } from "../bodies/constants.ts";
import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import type { ApsisKind, ApsisRank } from "../bodies/term.ts";
import { isTrackPair, type TrackPair } from "../bodies/track-pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { type Moment, tdbOf } from "../time/tdb-of.ts";
import type { Passage, TrackPassage } from "./passage.ts";
import { timeUncertainty } from "./time-uncertainty.ts";
import type { SuppliedExtremum, Timeline } from "./timeline.ts";
import { type SourceChoice, timelineFor } from "./timeline-for.ts";

/** What to look for. */
export interface PassageQuery {
  /** First moment, included. */
  readonly from: Moment;
  /** Last moment, excluded. */
  readonly to: Moment;
  readonly kind?: ApsisKind | "both";
  /** `principal` leaves out what is known to be secondary. */
  readonly rank?: "principal" | "all";
  readonly source?: SourceChoice;
}

/**
 * Gives the passages of a pair in a span of time, in order, one at a time and in constant memory.
 *
 * The list does not depend on how a span is cut: joined, the lists of its parts are the list of the whole, to the bit.
 *
 * @param ephemeris what `openSources` gave
 * @param pair      a pair's name, such as `moon-earth`, or the pair that a track brought
 * @param query     the span, and what to leave out
 * @throws ApsidaryError at the call: `bad-pair`, `bad-date`, `bad-span` (from ≥ to), `not-supplied` (no source has the pair), `not-covered`
 *   (the span is not wholly inside the sources)
 *
 * Method: zeros of the range rate by Brent's method (`scanExtrema`), sources joined at their seams (`timelineOf`),
 * half-widths from the source's accuracy statement (`timeUncertainty`). An extremum is secondary where a more
 * extreme one of its kind lies within half a sidereal period on either side.
 */
export function passages(
  ephemeris: Ephemeris,
  pair: PairName | Pair,
  query: PassageQuery,
): Generator<Passage, void, undefined>;
export function passages(
  ephemeris: Ephemeris,
  pair: TrackPair,
  query: PassageQuery,
): Generator<TrackPassage, void, undefined>;
export function passages(
  ephemeris: Ephemeris,
  pair: PairName | Pair | TrackPair,
  query: PassageQuery,
): Generator<Passage | TrackPassage, void, undefined>;
export function passages(
  ephemeris: Ephemeris,
  pair: PairName | Pair | TrackPair,
  query: PassageQuery,
): Generator<Passage | TrackPassage, void, undefined> {
  const from = tdbOf(query.from, ephemeris.leapSeconds);
  const to = tdbOf(query.to, ephemeris.leapSeconds);
  if (!(from < to)) {
    throw new ApsidaryError(
      "bad-span",
      `the span begins ${formatTdb(from, 0)} and ends ${formatTdb(to, 0)} (TDB); its end must come after its beginning.`,
    );
  }
  const timeline = timelineFor(ephemeris, pairOf(pair), query.source ?? "auto");
  requireCovered(timeline, from, to);
  const kind = query.kind ?? "both";
  const keeps = (passage: Passage<string>) =>
    (kind === "both" || passage.kind === kind) && (query.rank !== "principal" || passage.rank !== "secondary");
  return passagesBetween(timeline, from, to, keeps);
}

function requireCovered(timeline: Timeline, from: number, to: number): void {
  if (timeline.covered.some((span) => span.from <= from && to <= span.to)) return;
  const spans = timeline.covered.map((span) => `${formatTdb(span.from, 0)} to ${formatTdb(span.to, 0)}`).join(", and ");
  throw new ApsidaryError(
    "not-covered",
    `${formatTdb(from, 0)} to ${formatTdb(to, 0)} is not wholly covered for ${timeline.pair.name}: the sources allowed here span ` +
      `${spans} (TDB). Ask inside that, or allow another source.`,
  );
}

/** The latest extrema of each kind are kept until no later one can outrank them. */
function* passagesBetween(
  timeline: Timeline,
  from: number,
  to: number,
  keeps: (passage: Passage<string>) => boolean,
): Generator<Passage | TrackPassage, void, undefined> {
  const { halfPeriodSeconds: reach } = timeline.pair;
  const covered = timeline.covered.find((span) => span.from <= from && from < span.to);
  if (!covered) return;
  // Where the span holds no extremum at all, nothing need be ranked: a slow planet is not followed for half its period.
  const any = timeline.extremaFrom(from, to);
  let first = any();
  while (first && first.tdb < from) first = any();
  if (!first || first.tdb >= to) return;
  const next = timeline.extremaFrom(Math.max(covered.from, from - reach));
  const window: Ranked[] = []; // from `reach` before the extremum that is ranked to `reach` after it
  const measures = new Float64Array(2);
  let centre = 0; // its place in the window
  let ended = false;
  for (;;) {
    while (
      !ended &&
      (window.length <= centre || (window.at(-1) as Ranked).tdb <= (window[centre] as Ranked).tdb + reach)
    ) {
      const found = next();
      if (found) window.push(rankedOf(found, measures));
      else ended = true;
    }
    const extremum = window[centre];
    if (!extremum || extremum.tdb >= to) return;
    while ((window[0] as Ranked).tdb < extremum.tdb - reach) {
      window.shift();
      centre--;
    }
    if (extremum.tdb >= from) {
      const passage = passageOf(timeline.pair, extremum, rankIn(window, extremum, reach, covered));
      if (keeps(passage)) yield passage;
    }
    centre++;
  }
}

interface Ranked extends SuppliedExtremum {
  readonly distance: number;
  /** km/s² */
  readonly acceleration: number;
}

function rankedOf({ kind, tdb, supply }: SuppliedExtremum, measures: Float64Array): Ranked {
  supply.range.measure(tdb, measures);
  return { kind, tdb, supply, distance: measures[0] as number, acceleration: measures[1] as number };
}

function rankIn(
  window: readonly Ranked[],
  it: Ranked,
  reach: number,
  covered: { from: number; to: number },
): ApsisRank {
  for (const other of window) {
    if (other === it || other.kind !== it.kind || Math.abs(other.tdb - it.tdb) > reach) continue;
    if (it.kind === "periapsis" ? other.distance < it.distance : other.distance > it.distance) return "secondary";
  }
  return it.tdb - reach < covered.from || it.tdb + reach > covered.to ? null : "principal";
}

function passageOf(
  pair: Pair<string>,
  { kind, tdb, supply, distance, acceleration }: Ranked,
  rank: ApsisRank,
): Passage | TrackPassage {
  const { source, range, span } = supply;
  const accuracy = source.accuracy(pair, tdb);
  const time =
    accuracy.timeSeconds === undefined
      ? timeUncertainty(
          range,
          span,
          tdb,
          acceleration,
          accuracy.rangeRateKmS,
          pair.sampleSeconds,
          pair.halfPeriodSeconds,
        )
      : { seconds: accuracy.timeSeconds, existence: accuracy.existence ?? "certain" };
  const passage = {
    pair: pair.name,
    kind,
    rank,
    existence: time.existence,
    tdbSeconds: tdb,
    distanceKm: distance,
    timeUncertaintySeconds: time.seconds,
    distanceUncertaintyKm: accuracy.rangeKm,
    rangeAccelerationKmPerDay2: acceleration * DAY_SECONDS * DAY_SECONDS,
    source: source.id,
    accuracyBasis: accuracy.basis,
  };
  // a pair that is not a track's is one of those known by name
  return isTrackPair(pair) ? Object.freeze({ ...passage, track: pair }) : Object.freeze(passage as Passage);
}
