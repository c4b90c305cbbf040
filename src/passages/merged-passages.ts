import type { Pair, PairName } from "../bodies/pair.ts";
import type { TrackPair } from "../bodies/track-pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Passage, TrackPassage } from "./passage.ts";
import { type PassageQuery, passages } from "./passages.ts";

/**
 * Gives the passages of several pairs, merged by time; of equal instants the pair named first comes first.
 *
 * @param ephemeris what `openSources` gave
 * @param pairs     the pairs' names; one named twice counts once
 * @param query     the span, and what to leave out
 * @throws ApsidaryError as `passages`, for each pair, at the call
 */
export function mergedPassages(
  ephemeris: Ephemeris,
  pairs: Iterable<PairName | Pair>,
  query: PassageQuery,
): Generator<Passage, void, undefined>;
export function mergedPassages(
  ephemeris: Ephemeris,
  pairs: Iterable<PairName | Pair | TrackPair>,
  query: PassageQuery,
): Generator<Passage | TrackPassage, void, undefined>;
export function mergedPassages(
  ephemeris: Ephemeris,
  pairs: Iterable<PairName | Pair | TrackPair>,
  query: PassageQuery,
): Generator<Passage | TrackPassage, void, undefined> {
  return merge([...new Set(pairs)].map((pair) => passages(ephemeris, pair, query)));
}

function* merge(
  streams: Generator<Passage | TrackPassage, void, undefined>[],
): Generator<Passage | TrackPassage, void, undefined> {
  const heads = streams.map((stream) => stream.next().value);
  for (;;) {
    let first = -1;
    heads.forEach((head, i) => {
      if (head && (first < 0 || head.tdbSeconds < (heads[first] as Passage | TrackPassage).tdbSeconds)) first = i;
    });
    const head = heads[first];
    if (!head) return;
    yield head;
    heads[first] = streams[first]?.next().value;
  }
}
