// What a user's program takes from the package, from the sources.
export { openSources } from "../../src/node.ts";
export { planSeason } from "../../src/planning/plan-season.ts";
export { openSky } from "../../src/sky/open-sky.ts";
