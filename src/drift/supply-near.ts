import { DAY_SECONDS } from "../bodies/constants.ts";
import { type PairName, pairOf } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { scanExtrema } from "../passages/scan-extrema.ts";
import type { Supply } from "../passages/timeline.ts";
import { type SourceChoice, timelineFor } from "../passages/timeline-for.ts";

/** An extremum and the supply that gave it. */
export interface SuppliedInstant {
  /** TDB seconds past J2000. */
  readonly tdb: number;
  readonly supply: Supply;
}

/** The barycentre passes within a day and a half of the Earth's centre; so far on either side it is looked for. */
const REACH = 10 * DAY_SECONDS;

/**
 * Gives what supplies a pair at an instant: the source that is named where it does, else the best one; `null` where none does.
 *
 * Two passages that are held against each other must come from one source, or the difference of the sources enters.
 */
export function supplyOf(
  ephemeris: Ephemeris,
  pair: PairName,
  sourceId: string,
  tdb: number,
  choice: SourceChoice,
): Supply | null {
  const timeline = timelineFor(ephemeris, pairOf(pair), choice);
  const own = timeline.supplies.find(
    ({ source, span }) => source.id === sourceId && span.from <= tdb && tdb <= span.to,
  );
  return own ?? timeline.supplyAt(tdb);
}

/**
 * Gives the extremum of a pair and kind nearest to an instant, within ten days, from the source that is named where it reaches so far,
 * else from the best one that does; `null` where none does.
 */
export function extremumNear(
  ephemeris: Ephemeris,
  pair: PairName,
  kind: ApsisKind,
  tdb: number,
  sourceId: string,
  choice: SourceChoice,
): SuppliedInstant | null {
  const { supplies } = timelineFor(ephemeris, pairOf(pair), choice);
  const own = supplies.filter(({ source }) => source.id === sourceId);
  for (const supply of [...own, ...supplies]) {
    if (tdb + REACH < supply.span.from || tdb - REACH > supply.span.to) continue;
    const next = scanExtrema(supply.range, supply.span, pairOf(pair), tdb - REACH);
    let nearest = Number.POSITIVE_INFINITY;
    for (let found = next(); found && found.tdb <= tdb + REACH; found = next()) {
      if (found.kind === kind && Math.abs(found.tdb - tdb) < Math.abs(nearest - tdb)) nearest = found.tdb;
    }
    if (Math.abs(nearest - tdb) <= REACH) return { tdb: nearest, supply };
  }
  return null;
}
