export { type MatchedPair, matchedPairs } from "./matched-pairs.ts";
export { planIcs } from "./plan-ics.ts";
export type { PlanOptions, PlanSite } from "./plan-options.ts";
export { planPassage } from "./plan-passage.ts";
export type { PlanRow, PlanWindow, WhyNoRise, WhyNoTransit, WhyNot } from "./plan-row.ts";
export { planSeason, type SeasonQuery } from "./plan-season.ts";
export { siteFromText, sitesFromJson } from "./site-from.ts";
