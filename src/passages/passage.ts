import type { PairName } from "../bodies/pair.ts";
import type { ApsisKind, ApsisRank } from "../bodies/term.ts";
import type { TrackPair } from "../bodies/track-pair.ts";
import type { AccuracyBasis } from "../ephemeris/source.ts";

/** One passage through an extreme of a pair's distance. Frozen; times in TDB seconds past J2000, distances in km. */
export interface Passage<Name extends string = PairName> {
  readonly pair: Name;
  readonly kind: ApsisKind;
  readonly rank: ApsisRank;
  /** `uncertain` where the source's error could merge this extremum with its neighbour. */
  readonly existence: "certain" | "uncertain";
  readonly tdbSeconds: number;
  readonly distanceKm: number;
  /** Half-width that at least 95 % of such passages keep. */
  readonly timeUncertaintySeconds: number;
  /** Half-width that at least 95 % of such passages keep. */
  readonly distanceUncertaintyKm: number;
  /** Second derivative of the distance at the passage: above zero at a periapsis, below at an apoapsis. */
  readonly rangeAccelerationKmPerDay2: number;
  /** Id of the source that supplied all the states of this passage. */
  readonly source: string;
  readonly accuracyBasis: AccuracyBasis;
}

/** A passage of a track, with the pair that the track brought. */
export interface TrackPassage extends Passage<string> {
  readonly track: TrackPair;
}

/** Tells whether a passage is that of a track. */
export function isTrackPassage(passage: Passage | TrackPassage): passage is TrackPassage {
  return "track" in passage;
}
