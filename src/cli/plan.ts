import type { Command } from "commander";
import { addSourceOptions, type SharedOptions } from "./options.ts";

/** The options of `plan`, as given. */
export interface PlanOptionsGiven extends SharedOptions {
  readonly site?: string;
  readonly sites?: string;
  readonly zone?: string;
  readonly from?: string;
  readonly to?: string;
  readonly kind?: string;
  readonly rank?: string;
  readonly within?: string;
  readonly minAltitude?: string;
  readonly dark?: string;
  readonly refraction?: boolean;
  readonly windowDays?: string;
  readonly matched?: boolean;
}

/** The forms of a plan. */
export const PLAN_FORMATS = ["text", "json", "ndjson", "csv", "ics"] as const;

/** Adds the command that plans the passages of a season for a site. */
export function addPlan(program: Command): void {
  const command = program
    .command("plan")
    .summary("plan a season's passages for a site: altitude, darkness, windows, calendar file")
    .description(
      "Tells for each passage how a site sees it: where the body stands, when it rises and sets, the best dark moment\n" +
        "within a day, and the windows in which it is near, up and in a dark sky.",
    )
    .argument("<pair>", "moon-earth, mars-sun …; of earth-sun and emb-sun the body is the Sun; *-ssb cannot be seen")
    .option(
      "--site <site>",
      "latitude,longitude,height (degrees, north and east positive; metres, default 0), or a name in --sites",
    )
    .option(
      "--sites <file>",
      "a JSON list of sites: name, latitude, longitude, height, zone; without --site all of them",
    )
    .option(
      "--zone <zone>",
      "tell local times in this zone as well (IANA name or offset), where a site has none of its own",
    )
    .option(
      "--from <when>",
      "beginning, included: ISO 8601 or a bare year; UTC (before 1972 UT1) unless an offset is given",
    )
    .option("--to <when>", "end, excluded")
    .option("--kind <kind>", "periapsis | apoapsis | both (default: both)")
    .option("--rank <rank>", "principal | all (default: all)")
    .option(
      "--within <limit>",
      "near means within so many km or % of the extreme distance, such as 500km or 0.1% (default: 1%)",
    )
    .option("--min-altitude <degrees>", "up means the centre is higher than this (default: 0)")
    .option(
      "--dark <degrees>",
      "dark means the Sun's centre is lower than this: -18, -12, -6 or any other (default: -18)",
    )
    .option("--refraction", "let standard air lift the bodies")
    .option("--window-days <days>", "look for windows so far from a passage (default: 60)")
    .option("--matched", "of one site's Moon or Sun: pairs of a near and a far picture alike in phase and altitude");
  addSourceOptions(command)
    .option("--format <form>", `${PLAN_FORMATS.join(" | ")} (default: text)`)
    .option("--out <file>", "write the answer to this file, whole or not at all")
    .addHelpText(
      "after",
      `
Altitude and azimuth are of the apparent place from the site (WGS 84). Rise and set are of the centre
through altitude 0. Values that begin with a minus are written --site=-33.9,18.5,10.

Examples:
  apsidary plan moon-earth --site 46.5,8.0,2100 --from 2027 --to 2028
  apsidary plan moon-earth --site 46.5,8.0,2100 --from 2027 --to 2028 --dark=-12 --min-altitude 20 --matched
  apsidary plan mars-sun --sites sites.json --from 2027 --to 2030 --format ndjson
  apsidary plan earth-sun --site=-33.9,18.5,10 --from 2027 --to 2028 --within 0.1% --format ics --out sun.ics`,
    )
    .action(async (pair: string, options: PlanOptionsGiven) => {
      const { runPlan } = await import("./run-plan.ts");
      await runPlan(pair, options);
    });
}
