import type { Pair } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { type SourceChoice, timelineFor } from "../passages/timeline-for.ts";

/** What is remembered of a passage that another one is held against. */
export interface PastPassage {
  /** TDB seconds past J2000. */
  readonly tdb: number;
  readonly kind: ApsisKind;
  readonly distanceKm: number;
  /** Half-width of the distance, km. */
  readonly uncertaintyKm: number;
}

/** The passages of a pair, looked up where they are asked for and kept. */
export interface PassageHistory {
  /** Where the sources hold the pair, TDB seconds past J2000. */
  readonly from: number;
  readonly to: number;
  /** Gives the passages of a kind before an instant, the latest first. */
  before(tdb: number, kind: ApsisKind): Generator<PastPassage, void, undefined>;
  /** Gives the passages of a kind after an instant, the earliest first. */
  after(tdb: number, kind: ApsisKind): Generator<PastPassage, void, undefined>;
}

/** Periods of a stretch that is searched at a time. */
const PER_STRETCH = 24;
/** An instant found again may differ by rounding. */
const SAME = 1;

/**
 * Makes the history of a pair about an instant; stretches of time are searched when they are first needed, and each once.
 *
 * Extrema are taken without their rank: a secondary one is never the most extreme of its neighbours.
 */
export function passageHistory(ephemeris: Ephemeris, pair: Pair, near: number, choice: SourceChoice): PassageHistory {
  const timeline = timelineFor(ephemeris, pair, choice);
  const { from, to } = timeline.covered.find((span) => span.from <= near && near <= span.to) ?? {
    from: near,
    to: near,
  };
  const stretch = 2 * pair.halfPeriodSeconds * PER_STRETCH;
  const known = new Map<number, readonly PastPassage[]>();
  const inStretch = (index: number): readonly PastPassage[] => {
    let found = known.get(index);
    if (!found) {
      found = passagesIn(Math.max(from, index * stretch), Math.min(to, (index + 1) * stretch));
      known.set(index, found);
    }
    return found;
  };
  const passagesIn = (start: number, end: number): PastPassage[] => {
    const found: PastPassage[] = [];
    const next = timeline.extremaFrom(start, end);
    for (let it = next(); it && it.tdb < end; it = next()) {
      if (it.tdb < start) continue;
      found.push({
        tdb: it.tdb,
        kind: it.kind,
        distanceKm: it.supply.range.distance(it.tdb),
        uncertaintyKm: it.supply.source.accuracy(pair, it.tdb).rangeKm,
      });
    }
    return found;
  };
  return {
    from,
    to,
    *before(tdb, kind) {
      for (let index = Math.floor(tdb / stretch); (index + 1) * stretch > from; index--) {
        const found = inStretch(index);
        for (let i = found.length - 1; i >= 0; i--) {
          const passage = found[i] as PastPassage;
          if (passage.kind === kind && passage.tdb < tdb - SAME) yield passage;
        }
      }
    },
    *after(tdb, kind) {
      for (let index = Math.floor(tdb / stretch); index * stretch < to; index++) {
        for (const passage of inStretch(index)) {
          if (passage.kind === kind && passage.tdb > tdb + SAME) yield passage;
        }
      }
    },
  };
}
