import { AU_KM } from "../bodies/constants.ts";
import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import { type ApsisKind, type ApsisRank, termOf } from "../bodies/term.ts";
import { UNNAMED_POINT } from "../bodies/track-pair.ts";
import type { AccuracyBasis } from "../ephemeris/source.ts";
import { rounded } from "../report/rounded.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { formatUtc } from "../time/format-utc.ts";
import type { LeapSecondList } from "../time/leap-seconds.ts";
import { type UtcBasis, utcOf } from "../time/utc-of.ts";
import { isTrackPassage, type Passage, type TrackPassage } from "./passage.ts";

/** A passage as it is given out: with its words, its civil time and both units of distance. Numbers are rounded to 1 ms, 1 m, 1e-12 au. */
export interface PassageRow {
  readonly pair: PairName;
  /** SPK id of the moving point. */
  readonly targetPoint: number;
  /** SPK id of the centre. */
  readonly centrePoint: number;
  readonly kind: ApsisKind;
  readonly term: string;
  readonly rank: ApsisRank;
  readonly existence: "certain" | "uncertain";
  readonly tdbSeconds: number;
  readonly tdb: string;
  /** ISO 8601; UT1 where the basis is `delta-t`. */
  readonly utc: string;
  readonly utcBasis: UtcBasis;
  readonly distanceKm: number;
  readonly distanceAu: number;
  /** Of `tdbSeconds`: what at least 95 % of such passages keep. */
  readonly timeUncertaintySeconds: number;
  readonly distanceUncertaintyKm: number;
  /** With the time scale's own added, as the root of the sum of squares. */
  readonly utcUncertaintySeconds: number;
  readonly rangeAccelerationKmPerDay2: number;
  readonly source: string;
  readonly accuracyBasis: AccuracyBasis;
}

/** The row of a track's passage: the name is the caller's, and the height stands beside the distance. */
export interface TrackRow extends Omit<PassageRow, "pair" | "targetPoint" | "centrePoint"> {
  readonly pair: string;
  /** `null` where the moving point has no SPK id. */
  readonly targetPoint: number | null;
  /** `null` where no body is named. */
  readonly centrePoint: number | null;
  /** Distance less the reference radius; `null` where none is known. */
  readonly heightKm: number | null;
}

/**
 * Gives the row of a passage.
 *
 * @param passage the passage
 * @param scales  the leap-second list by which UTC is told: an `Ephemeris` will do; left out, the built-in list
 */
export function toRow(passage: Passage, scales?: Scales): PassageRow;
export function toRow(passage: TrackPassage, scales?: Scales): TrackRow;
export function toRow(passage: Passage | TrackPassage, scales?: Scales): PassageRow | TrackRow;
export function toRow(passage: Passage | TrackPassage, scales?: Scales): PassageRow | TrackRow {
  if (!isTrackPassage(passage)) return Object.freeze(rowOf(passage, pairOf(passage.pair), scales));
  const { target, centre, referenceRadiusKm } = passage.track;
  return Object.freeze({
    ...rowOf(passage, passage.track, scales),
    targetPoint: target === UNNAMED_POINT ? null : target,
    centrePoint: centre === UNNAMED_POINT ? null : centre,
    heightKm: referenceRadiusKm === null ? null : rounded(passage.distanceKm - referenceRadiusKm, 3),
  });
}

/** The leap-second list by which UTC is told. */
interface Scales {
  readonly leapSeconds: LeapSecondList;
}

function rowOf<Name extends string>(
  passage: Passage<Name>,
  pair: Pair<Name>,
  scales: Scales | undefined,
): Omit<PassageRow, "pair"> & { readonly pair: Name } {
  const { kind, rank, tdbSeconds, distanceKm } = passage;
  const utc = utcOf(tdbSeconds, scales?.leapSeconds);
  return {
    pair: pair.name,
    targetPoint: pair.target,
    centrePoint: pair.centre,
    kind,
    term: termOf(pair, kind, rank),
    rank,
    existence: passage.existence,
    tdbSeconds: rounded(tdbSeconds, 3),
    tdb: formatTdb(tdbSeconds, 3),
    utc: formatUtc(utc, 3),
    utcBasis: utc.basis,
    distanceKm: rounded(distanceKm, 3),
    distanceAu: rounded(distanceKm / AU_KM, 12),
    timeUncertaintySeconds: roundedUp(passage.timeUncertaintySeconds),
    distanceUncertaintyKm: roundedUp(passage.distanceUncertaintyKm),
    utcUncertaintySeconds: roundedUp(Math.hypot(passage.timeUncertaintySeconds, utc.uncertaintySeconds)),
    rangeAccelerationKmPerDay2: rounded(passage.rangeAccelerationKmPerDay2, 6),
    source: passage.source,
    accuracyBasis: passage.accuracyBasis,
  };
}

/** A half-width is never rounded to less than it is. */
function roundedUp(value: number): number {
  return Math.ceil(value * 1e3) / 1e3;
}
