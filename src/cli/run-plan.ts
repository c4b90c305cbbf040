import { readFile } from "node:fs/promises";
import { type Pair, pairOf } from "../bodies/pair.ts";
import { POINTS } from "../bodies/point.ts";
import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";
import type { Nearness } from "../passages/near-window.ts";
import { matchedPairs } from "../planning/matched-pairs.ts";
import { type PlanSite, siteLabel } from "../planning/plan-options.ts";
import { PLAN_NAMES, planRecord } from "../planning/plan-record.ts";
import type { PlanRow } from "../planning/plan-row.ts";
import { planSeason } from "../planning/plan-season.ts";
import { siteFromText, sitesFromJson } from "../planning/site-from.ts";
import { jsonAnswer } from "../report/json-answer.ts";
import { jsonLines } from "../report/json-lines.ts";
import { rounded } from "../report/rounded.ts";
import { openSky } from "../sky/open-sky.ts";
import { zoneOf } from "../time/zone-of.ts";
import { choiceOf, shown } from "./choice-of.ts";
import { edgeOf, requireOrder } from "./edge.ts";
import { openFor } from "./open-for.ts";
import { sourceChoiceOf } from "./options.ts";
import { PLAN_FORMATS, type PlanOptionsGiven } from "./plan.ts";
import { planReport } from "./plan-report.ts";
import { mayShowProgress, withProgress } from "./progress.ts";
import { provenanceOf } from "./provenance.ts";
import { writeAnswer } from "./write-answer.ts";

/**
 * Answers `apsidary plan`.
 *
 * @param word    the pair, as given
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used, before anything is written
 */
export async function runPlan(word: string, options: PlanOptionsGiven): Promise<void> {
  const format = choiceOf("--format", options.format ?? "text", PLAN_FORMATS);
  const source = sourceChoiceOf(options);
  const kind = choiceOf("--kind", options.kind ?? "both", ["periapsis", "apoapsis", "both"]);
  const rank = choiceOf("--rank", options.rank ?? "all", ["principal", "all"]);
  const how = {
    within: nearnessOf(options.within ?? "1%"),
    minAltitudeDeg: numberOf("--min-altitude", options.minAltitude ?? "0"),
    darkBelowDeg: numberOf("--dark", options.dark ?? "-18"),
    refraction: options.refraction === true,
    windowDays: numberOf("--window-days", options.windowDays ?? "60"),
  };
  if (options.zone !== undefined) zoneOf(options.zone);
  const pair = pairOf(word);
  const { sites, heightAssumed } = await sitesOf(options);
  if (options.matched && (sites.length > 1 || !(format === "json" || format === "text"))) {
    throw new ApsidaryError("bad-option", "--matched takes one site, and --format text or json.");
  }

  const [ephemeris, sky] = await Promise.all([openFor(options), openSky()]);
  const from = edgeOf("--from", options.from, ephemeris.leapSeconds);
  const to = edgeOf("--to", options.to, ephemeris.leapSeconds);
  requireOrder(from, to, options);
  const query = { pair, from: { tdbSeconds: from }, to: { tdbSeconds: to }, kind, rank, source, sky, ...how };
  const [first, ...others] = sites.map((site) => () => planSeason(ephemeris, { ...query, site }));
  const opened = first?.(); // refuses what cannot be answered
  let done = 0;
  const all = function* (): Generator<PlanRow, void, undefined> {
    if (opened) yield* opened;
    for (const season of others) {
      done++;
      yield* season();
    }
  };
  const made = await provenanceOf(ephemeris, { pairs: pairsUsed(pair), span: { from, to }, source });
  const share = (row: PlanRow) => (done + (row.tdbSeconds - from) / (to - from)) / sites.length;
  const rows = withProgress(all(), share, 0, 1, mayShowProgress(options.out));
  const held = options.matched ? [...rows] : null;
  const matched = held && matchedPairs(held, ephemeris, sky);
  const head = {
    schema: "apsidary/plan/1",
    made,
    pair: pair.name,
    ...how,
    sites: sites.map((site) => {
      const { dipDeg } = sky.horizon(site);
      return {
        name: siteLabel(site),
        latitudeDeg: site.latitudeDeg,
        longitudeDeg: site.longitudeDeg,
        heightM: site.heightM,
        zone: site.zone ?? null,
        horizonDipDeg: dipDeg === null ? null : rounded(dipDeg, 4),
        whyNoDip: dipDeg === null ? "below-sea-level" : null,
      };
    }),
    ...(matched ? { matched } : {}),
  };

  const pieces = async (): Promise<Iterable<string>> => {
    switch (format) {
      case "json":
        return jsonAnswer(head, held ?? rows);
      case "ndjson":
        return jsonLines(rows);
      case "csv": {
        const { csvLines } = await import("../report/csv-lines.ts"); // brings a library that the other forms do without
        return csvLines(PLAN_NAMES, records(rows));
      }
      case "ics": {
        const { planIcs } = await import("../planning/plan-ics.ts"); // ditto
        return [planIcs(rows, `Plan of ${pair.name}`)];
      }
      default:
        return planReport(held ?? rows, {
          title: `Plan of ${pair.name}, ${options.from} to ${options.to}`,
          made,
          sites,
          heightAssumed,
          matched,
          ...how,
        });
    }
  };
  await writeAnswer(await pieces(), options.out);
}

function* records(rows: Iterable<PlanRow>) {
  for (const row of rows) yield planRecord(row);
}

/** The pairs whose sources tell where the body stands. */
function pairsUsed(pair: Pair): Pair[] {
  const names = ["earth-sun", ...(pair.centre === POINTS.sun || pair.centre === POINTS.earth ? [] : ["jupiter-sun"])];
  return [pair, ...names.map((name) => pairOf(name)).filter((other) => other.name !== pair.name)];
}

async function sitesOf(options: PlanOptionsGiven): Promise<{ sites: PlanSite[]; heightAssumed: boolean }> {
  const { site, sites: file, zone } = options;
  const zoned = (one: PlanSite): PlanSite => (zone === undefined || one.zone !== undefined ? one : { ...one, zone });
  if (file === undefined) {
    if (site === undefined) {
      throw new ApsidaryError(
        "bad-input",
        "--site is missing; give latitude, east longitude and height, such as --site 46.5,8.0,2100, or a file with --sites.",
      );
    }
    return { sites: [zoned(siteGiven(site))], heightAssumed: site.split(",").length < 3 };
  }
  const known = sitesFromJson(await textOf(file), file);
  if (site === undefined) return { sites: known.map(zoned), heightAssumed: false };
  const named = known.find(({ name }) => name === site);
  if (!named) {
    const names = known.flatMap(({ name }) => (name === undefined ? [] : [name]));
    const near = nearestName(site, names);
    throw new ApsidaryError(
      "bad-input",
      `${file} has no site ${shown(site)}${near ? `; did you mean ${near}?` : `; it has ${shown(names.slice(0, 8).join(", "))}.`}`,
    );
  }
  return { sites: [zoned(named)], heightAssumed: false };
}

function siteGiven(text: string): PlanSite {
  try {
    return siteFromText(text);
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    throw new ApsidaryError(error.code, `--site: ${error.message}`);
  }
}

async function textOf(file: string): Promise<string> {
  try {
    return await readFile(file, "utf8");
  } catch (error) {
    const { code, message } = error as NodeJS.ErrnoException;
    const why = code === "ENOENT" ? "there is no such file" : code === "EISDIR" ? "it is a directory" : message;
    throw new ApsidaryError("unreadable", `--sites ${shown(file)} cannot be read: ${why}.`);
  }
}

function nearnessOf(given: string): Nearness {
  const [, number, unit] = /^(\d+(?:\.\d+)?)\s*(km|%)$/.exec(given) ?? [];
  const value = Number(number);
  if (value > 0) return unit === "km" ? { km: value } : { percent: value };
  throw new ApsidaryError(
    "bad-option",
    `--within ${shown(given)} is no nearness; give kilometres or percent of the extreme distance, such as 500km or 0.1%.`,
  );
}

function numberOf(option: string, given: string): number {
  if (/^[+-]?(\d+\.?\d*|\.\d+)$/.test(given)) return Number(given);
  throw new ApsidaryError(
    "bad-option",
    `${option} ${shown(given)} is not a number; write it as ${option}=-12 or ${option} 20.`,
  );
}
