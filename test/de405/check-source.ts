import type { PairName } from "../../src/bodies/pair.ts";
import { pairOf } from "../../src/bodies/pair.ts";
import type { Ephemeris } from "../../src/ephemeris/open-sources.ts";
import type { Passage } from "../../src/passages/passage.ts";
import { passages } from "../../src/passages/passages.ts";
import type { SourceChoice } from "../../src/passages/timeline-for.ts";
import type { De405 } from "./read.ts";
import { DE405_PAIRS, TRUE_FROM, TRUE_TO, type TruePassage, truePassages } from "./true-passages.ts";

/** A passage that was found and the true one that it stands for: found minus true. */
export interface PassageError {
  readonly seconds: number;
  readonly km: number;
  readonly statedSeconds: number;
  readonly statedKm: number;
}

/** How a source's passages of a pair compare with DE405's. */
export interface PairCheck {
  readonly pair: string;
  /** Passages that DE405 has from 1960 to 2059. */
  readonly trueCount: number;
  readonly errors: readonly PassageError[];
  /** True passages that the source has not. */
  readonly missed: readonly TruePassage[];
  /** Passages of the source that stand for no true one. */
  readonly extra: readonly Passage[];
}

/** How far past the span a source is searched, so that a passage whose error carries it over the edge is found: at most this, seconds. */
const MARGIN = 2 * 365.25 * 86400;

/**
 * Holds the passages that the product finds with one kind of source, 1960–2059, against DE405's own.
 *
 * A found passage and a true one belong together where each is the other's nearest of its kind, within half a period.
 *
 * @returns a check for each pair that both supply over the whole span
 */
export function* checkSource(ephemeris: Ephemeris, source: SourceChoice, de405: De405): Generator<PairCheck> {
  for (const pair of DE405_PAIRS) {
    const spans = ephemeris.sources.filter(({ kind }) => kind === source).flatMap((s) => s.spans(pairOf(pair)));
    const span = spans.find(({ from, to }) => from <= TRUE_FROM && TRUE_TO <= to);
    if (!span) continue;
    const reach = pairOf(pair).halfPeriodSeconds;
    const margin = Math.min(MARGIN, reach);
    const from = { tdbSeconds: Math.max(span.from, TRUE_FROM - margin) };
    const to = { tdbSeconds: Math.min(span.to, TRUE_TO + margin) };
    const found = [...passages(ephemeris, pair as PairName, { from, to, source })];
    const truth = truePassages(pair, de405);

    const errors: PassageError[] = [];
    const missed: TruePassage[] = [];
    const used = new Set<Passage>();
    for (const passage of truth) {
      const twin = nearest(found, (it) => it.tdbSeconds, passage.tdb, passage.kind);
      const back = twin && nearest(truth, (it) => it.tdb, twin.tdbSeconds, twin.kind);
      if (!twin || back !== passage || Math.abs(twin.tdbSeconds - passage.tdb) > reach) {
        missed.push(passage);
        continue;
      }
      used.add(twin);
      errors.push({
        seconds: twin.tdbSeconds - passage.tdb,
        km: twin.distanceKm - passage.distanceKm,
        statedSeconds: twin.timeUncertaintySeconds,
        statedKm: twin.distanceUncertaintyKm,
      });
    }
    const inside = (it: Passage) => it.tdbSeconds >= TRUE_FROM && it.tdbSeconds < TRUE_TO;
    const extra = found.filter((it) => !used.has(it) && inside(it));
    yield { pair, trueCount: truth.length, errors, missed, extra };
  }
}

function nearest<T extends { readonly kind: string }>(
  list: readonly T[],
  tdbOf: (it: T) => number,
  tdb: number,
  kind: string,
): T | undefined {
  let best: T | undefined;
  for (const it of list) {
    if (it.kind === kind && (!best || Math.abs(tdbOf(it) - tdb) < Math.abs(tdbOf(best) - tdb))) best = it;
  }
  return best;
}
