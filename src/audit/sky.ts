import { DAY_SECONDS } from "../bodies/constants.ts";
import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import type { Passage } from "../passages/passage.ts";
import { passages } from "../passages/passages.ts";
import { type SourceChoice, timelineFor } from "../passages/timeline-for.ts";
import { type PassageRow, toRow } from "../passages/to-row.ts";
import { tdbMinusTt } from "../time/tdb-minus-tt.ts";
import { J2000_DAY, utcOf } from "../time/utc-of.ts";
import { LIST_BOUND } from "./bound.ts";

/** A passage with the readings of the clocks by which lists tell it. */
export interface SkyPassage {
  readonly passage: Passage;
  /** Seconds since Modified Julian day 0 on a UTC clock (UT1 before 1972). */
  readonly utcWall: number;
  /** The same on a TT clock. */
  readonly ttWall: number;
  /** How far the instant may be off, 99.9 %, seconds: by UTC, and by TT. */
  readonly utcBound: number;
  readonly ttBound: number;
  /** How far the distance may be off, 99.9 %, km. */
  readonly kmBound: number;
  /** Whether UTC is UT1 here. */
  readonly isUt1: boolean;
  /** The row that answers give; made when first asked for. */
  row(): PassageRow;
}

/** The passages of all pairs, looked up by nearness and kept in blocks. */
export interface Sky {
  /** The passage of a kind nearest to a time (TDB seconds past J2000), `null` where the sources do not reach it. */
  nearest(pair: Pair, kind: ApsisKind, tdb: number): SkyPassage | null;
  /** The next passage of the same kind after (1) or before (−1) one. */
  neighbour(pair: Pair, kind: ApsisKind, tdb: number, side: 1 | -1): SkyPassage | null;
  /** Whether any source has the pair. */
  supplies(pair: Pair): boolean;
}

/** J2000.0, noon of 2000-01-01, on a wall clock. */
export const J2000_WALL = J2000_DAY * DAY_SECONDS + DAY_SECONDS / 2;

interface Kinds {
  readonly periapsis: SkyPassage[];
  readonly apoapsis: SkyPassage[];
}

/** Blocks that are kept at most: the oldest goes first. */
const MOST_BLOCKS = 1500;
const YEAR = 365.25 * DAY_SECONDS;

/**
 * Gives a sky over an ephemeris.
 *
 * Passages are found in blocks of some tens of passages (ten years of the Moon's) when first asked for, so that a row costs a search in a sorted
 * array; memory is bounded by the number of blocks.
 *
 * @param source      which sources serve
 * @param shortBlocks whether few passages are asked for and each costs much: a tenth of the passages in a block
 */
export function skyOf(ephemeris: Ephemeris, source: SourceChoice, shortBlocks = false): Sky {
  const blocks = new Map<string, Kinds>();
  const spans = new Map<PairName, readonly { readonly from: number; readonly to: number }[]>();

  const coveredOf = (pair: Pair) => {
    let covered = spans.get(pair.name);
    if (!covered) {
      try {
        covered = timelineFor(ephemeris, pair, source).covered;
      } catch (error) {
        if (!(error instanceof ApsidaryError) || error.code !== "not-supplied") throw error;
        covered = [];
      }
      spans.set(pair.name, covered);
    }
    return covered;
  };

  const blockOf = (pair: Pair, length: number, index: number): Kinds => {
    const key = `${pair.name} ${index}`;
    let block = blocks.get(key);
    if (block) return block;
    block = { periapsis: [], apoapsis: [] };
    for (const span of coveredOf(pair)) {
      const from = Math.max(index * length, span.from);
      const to = Math.min((index + 1) * length, span.to);
      if (!(from < to)) continue;
      const query = { from: { tdbSeconds: from }, to: { tdbSeconds: to }, source };
      for (const passage of passages(ephemeris, pair, query)) block[passage.kind].push(skyPassage(passage, ephemeris));
    }
    if (blocks.size >= MOST_BLOCKS) blocks.delete(blocks.keys().next().value as string);
    blocks.set(key, block);
    return block;
  };

  /** The last passage at or before a time (side −1), or the first after it. */
  const beside = (pair: Pair, kind: ApsisKind, tdb: number, side: 1 | -1): SkyPassage | null => {
    const length = blockLength(pair, shortBlocks);
    const covered = coveredOf(pair);
    const first = covered[0];
    const last = covered.at(-1);
    if (!first || !last || !Number.isFinite(tdb)) return null;
    const lowest = Math.floor(first.from / length);
    const highest = Math.floor(last.to / length);
    let index = Math.min(Math.max(Math.floor(tdb / length), lowest), highest);
    for (let tries = 0; tries < 6 && index >= lowest && index <= highest; tries++, index += side) {
      const list = blockOf(pair, length, index)[kind];
      const at = countUpTo(list, tdb);
      const found = side < 0 ? list[at - 1] : list[at];
      if (found) return found;
    }
    return null;
  };

  return Object.freeze({
    nearest(pair: Pair, kind: ApsisKind, tdb: number) {
      if (!coveredOf(pair).some((span) => span.from <= tdb && tdb <= span.to)) return null;
      const before = beside(pair, kind, tdb, -1);
      const after = beside(pair, kind, tdb, 1);
      if (!before || !after) return before ?? after;
      return tdb - before.passage.tdbSeconds <= after.passage.tdbSeconds - tdb ? before : after;
    },
    neighbour(pair: Pair, kind: ApsisKind, tdb: number, side: 1 | -1) {
      return beside(pair, kind, tdb + side, side);
    },
    supplies: (pair: Pair) => coveredOf(pair).length > 0,
  });
}

/** Seconds of a block: ten years for the Moon, thirty for the Earth, four periods for the others but not more than 350 years; short ones a tenth, but a period. */
function blockLength(pair: Pair, short: boolean): number {
  const period = 2 * pair.halfPeriodSeconds;
  const long = period < 40 * DAY_SECONDS ? 130 * period : Math.min(Math.max(4 * period, 30 * YEAR), 350 * YEAR);
  return short ? Math.max(period, long / 10) : long;
}

/** How many passages of a sorted list lie at or before a time. */
function countUpTo(list: readonly SkyPassage[], tdb: number): number {
  let low = 0;
  let high = list.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((list[middle] as SkyPassage).passage.tdbSeconds <= tdb) low = middle + 1;
    else high = middle;
  }
  return low;
}

function skyPassage(passage: Passage, ephemeris: Ephemeris): SkyPassage {
  const utc = utcOf(passage.tdbSeconds, ephemeris.leapSeconds);
  let made: PassageRow | null = null;
  return {
    passage,
    utcWall: utc.day * DAY_SECONDS + utc.secondsOfDay,
    ttWall: J2000_WALL + passage.tdbSeconds - tdbMinusTt(passage.tdbSeconds),
    utcBound: LIST_BOUND * Math.hypot(passage.timeUncertaintySeconds, utc.uncertaintySeconds),
    ttBound: LIST_BOUND * passage.timeUncertaintySeconds,
    kmBound: LIST_BOUND * passage.distanceUncertaintyKm,
    isUt1: utc.basis === "delta-t",
    row() {
      made ??= toRow(passage, ephemeris);
      return made;
    },
  };
}

/** Gives the pair of a name that is known to exist. */
export function knownPair(name: PairName): Pair {
  return pairOf(name);
}
