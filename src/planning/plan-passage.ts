import { pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Passage } from "../passages/passage.ts";
import type { PlanOptions, PlanSite } from "./plan-options.ts";
import type { PlanRow } from "./plan-row.ts";
import { planner } from "./planner.ts";

/**
 * Gives how a site sees a passage: where the body stands, when it is near, up and in a dark sky, and when it is best.
 *
 * For many passages of one site take `planSeason`, which prepares the site once.
 *
 * @param ephemeris what `openSources` gave
 * @param passage   a passage that it gave
 * @param site      geodetic latitude, east longitude, height
 * @param options   the sky, and what counts as near, up and dark
 * @throws ApsidaryError `bad-pair` for `*-ssb`, `not-supplied`, `not-covered`, `bad-input` for a site that is none, `bad-zone`, `bad-option`
 */
export function planPassage(ephemeris: Ephemeris, passage: Passage, site: PlanSite, options: PlanOptions): PlanRow {
  return planner(ephemeris, pairOf(passage.pair), site, options)(passage);
}
