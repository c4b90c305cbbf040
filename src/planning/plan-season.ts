import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Passage } from "../passages/passage.ts";
import { type PassageQuery, passages } from "../passages/passages.ts";
import type { PlanOptions, PlanSite } from "./plan-options.ts";
import type { PlanRow } from "./plan-row.ts";
import { planner } from "./planner.ts";

/** What to plan. */
export interface SeasonQuery extends PassageQuery, Omit<PlanOptions, "source"> {
  readonly pair: PairName | Pair;
  readonly site: PlanSite;
}

/**
 * Gives the passages of a season as a site sees them, in order, one at a time and in constant memory.
 *
 * @param ephemeris what `openSources` gave
 * @param query     the pair, the site, the span (`from` included, `to` excluded), the sky, and what counts as near, up and dark
 * @throws ApsidaryError at the call, as `passages` and `planPassage`
 */
export function planSeason(ephemeris: Ephemeris, query: SeasonQuery): Generator<PlanRow, void, undefined> {
  const pair = pairOf(query.pair);
  const plan = planner(ephemeris, pair, query.site, query);
  return rows(passages(ephemeris, pair, query), plan);
}

function* rows(found: Iterable<Passage>, plan: (passage: Passage) => PlanRow): Generator<PlanRow, void, undefined> {
  for (const passage of found) yield plan(passage);
}
