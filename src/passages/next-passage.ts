import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { TrackPair } from "../bodies/track-pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { type Moment, tdbOf } from "../time/tdb-of.ts";
import type { Passage, TrackPassage } from "./passage.ts";
import { passages } from "./passages.ts";
import { type SourceChoice, timelineFor } from "./timeline-for.ts";

/** What to look for besides the kind. */
export interface NeighbourOptions {
  readonly rank?: "principal" | "all";
  readonly source?: SourceChoice;
}

/**
 * Gives the first passage at or after a moment, or `null` where the sources end before one.
 *
 * @param ephemeris what `openSources` gave
 * @param pair      the pair's name
 * @param after     the moment, included
 * @param kind      which extreme; left out, either
 * @throws ApsidaryError as `passages`
 */
export function nextPassage(
  ephemeris: Ephemeris,
  pair: PairName | Pair,
  after: Moment,
  kind?: ApsisKind | "both",
  options?: NeighbourOptions,
): Passage | null;
export function nextPassage(
  ephemeris: Ephemeris,
  pair: TrackPair,
  after: Moment,
  kind?: ApsisKind | "both",
  options?: NeighbourOptions,
): TrackPassage | null;
export function nextPassage(
  ephemeris: Ephemeris,
  pair: PairName | Pair | TrackPair,
  after: Moment,
  kind?: ApsisKind | "both",
  options?: NeighbourOptions,
): Passage | TrackPassage | null;
export function nextPassage(
  ephemeris: Ephemeris,
  pair: PairName | Pair | TrackPair,
  after: Moment,
  kind: ApsisKind | "both" = "both",
  options: NeighbourOptions = {},
): Passage | TrackPassage | null {
  const from = tdbOf(after, ephemeris.leapSeconds);
  const covered = timelineFor(ephemeris, pairOf(pair), options.source ?? "auto").covered;
  const end = covered.find((span) => span.from <= from && from < span.to)?.to ?? from + 1; // outside, `passages` refuses
  const query = { from: { tdbSeconds: from }, to: { tdbSeconds: end }, kind, ...options };
  for (const passage of passages(ephemeris, pair, query)) return passage;
  return null;
}

/**
 * Gives the last passage before a moment, or `null` where the sources begin after one.
 *
 * @param ephemeris what `openSources` gave
 * @param pair      the pair's name
 * @param before    the moment, excluded
 * @param kind      which extreme; left out, either
 * @throws ApsidaryError as `passages`
 */
export function previousPassage(
  ephemeris: Ephemeris,
  pair: PairName | Pair,
  before: Moment,
  kind?: ApsisKind | "both",
  options?: NeighbourOptions,
): Passage | null;
export function previousPassage(
  ephemeris: Ephemeris,
  pair: TrackPair,
  before: Moment,
  kind?: ApsisKind | "both",
  options?: NeighbourOptions,
): TrackPassage | null;
export function previousPassage(
  ephemeris: Ephemeris,
  pair: PairName | Pair | TrackPair,
  before: Moment,
  kind?: ApsisKind | "both",
  options?: NeighbourOptions,
): Passage | TrackPassage | null;
export function previousPassage(
  ephemeris: Ephemeris,
  pair: PairName | Pair | TrackPair,
  before: Moment,
  kind: ApsisKind | "both" = "both",
  options: NeighbourOptions = {},
): Passage | TrackPassage | null {
  const to = tdbOf(before, ephemeris.leapSeconds);
  const known = typeof pair === "string" ? pairOf(pair) : pair;
  const covered = timelineFor(ephemeris, known, options.source ?? "auto").covered;
  const start = covered.find((span) => span.from < to && to <= span.to)?.from ?? to - 1;
  // Passages come in order of time only, so growing stretches before the moment are searched.
  for (let reach = 2 * known.halfPeriodSeconds; ; reach *= 2) {
    const from = Math.max(start, to - reach);
    let last: Passage | TrackPassage | null = null;
    const query = { from: { tdbSeconds: from }, to: { tdbSeconds: to }, kind, ...options };
    for (const passage of passages(ephemeris, known, query)) last = passage;
    if (last || from === start) return last;
  }
}
