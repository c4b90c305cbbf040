import type { BodyName } from "../bodies/physical.ts";
import { POINTS, type PointId } from "../bodies/point.ts";
import { type TrackPair, UNNAMED_POINT } from "../bodies/track-pair.ts";
import type { Accuracy, Motion, Source, Span } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";

/** A source of the caller's own, and the pair that it alone supplies. Frozen. */
export interface Track extends Source {
  readonly kind: "track";
  readonly pair: TrackPair;
}

/** What a track is made from. */
export interface TrackParts {
  readonly pair: TrackPair;
  /** What rows say; left out, the pair's name. */
  readonly id?: string;
  /** One line for people. */
  readonly title: string;
  readonly spans: readonly Span[];
  readonly motion: Motion;
  readonly accuracy: (tdb: number) => Accuracy;
  readonly description?: string;
}

/** Gives the track of a motion: a source that supplies its own pair and no other. */
export function trackOf({ pair, id = pair.name, title, spans, motion, accuracy, description }: TrackParts): Track {
  const own = Object.freeze([...spans]);
  const none: readonly Span[] = Object.freeze([]);
  return Object.freeze({
    id,
    kind: "track" as const,
    title,
    pair,
    spans: (asked) => (asked.name === pair.name ? own : none),
    motion(asked) {
      if (asked.name === pair.name) return motion;
      throw new ApsidaryError("not-supplied", `the track ${id} supplies ${pair.name} alone, not ${asked.name}.`);
    },
    accuracy: (_, tdb) => accuracy(tdb),
    checksum: async () => null,
    describe: () => description ?? title,
  } satisfies Track);
}

/** The years −9999 to 9999, TDB seconds past J2000. */
export const ALL_TIME: Span = Object.freeze({ from: -3.7865e11, to: 2.5245e11 });

/** SPK id of a body's own centre; `UNNAMED_POINT` where none is named. */
export function centreOf(about: BodyName | null): PointId {
  if (about === null) return UNNAMED_POINT;
  const known = POINTS[about];
  return known <= POINTS.pluto ? known * 100 + 99 : known; // a planet's own centre, not its system's barycentre
}
