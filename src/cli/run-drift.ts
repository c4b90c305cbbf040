import { resolve } from "node:path";
import { type Pair, pairOf } from "../bodies/pair.ts";
import { type CentrePassage, compareCentres } from "../drift/compare-centres.ts";
import { type DriftQuery, driftAccount } from "../drift/drift-account.ts";
import type { DriftRow } from "../drift/drift-row.ts";
import { type Season, seasonOf } from "../drift/season-of.ts";
import { whyNoSplit } from "../drift/why-no-split.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import type { Passage } from "../passages/passage.ts";
import { passages } from "../passages/passages.ts";
import type { SourceChoice } from "../passages/timeline-for.ts";
import { rounded } from "../report/rounded.ts";
import { openSky } from "../sky/open-sky.ts";
import { answerPieces } from "./answer-pieces.ts";
import { choiceOf, shown } from "./choice-of.ts";
import { openDestination } from "./destination.ts";
import type { DriftOptions } from "./drift-command.ts";
import { driftReport } from "./drift-report.ts";
import { edgeOf, requireOrder } from "./edge.ts";
import { openFor } from "./open-for.ts";
import { formatOf, sourceChoiceOf } from "./options.ts";
import { pairsOf } from "./pairs.ts";
import { provenanceOf } from "./provenance.ts";
import { writeAnswer } from "./write-answer.ts";

/** A row of the account with what was asked for besides. */
export interface ToldRow extends DriftRow {
  readonly centres?: readonly CentrePassage[];
  readonly season?: Season;
}

const NAMES: readonly (keyof DriftRow)[] = [
  "kind",
  "term",
  "utc",
  "tdbSeconds",
  "bodyMinusBarycentreHours",
  "barycentreMinusMeanHours",
  "bodyMinusMeanHours",
  "stepDays",
  "dateStepHours",
  "calendarHours",
  "planetsHours",
  "moonHours",
  "moonElongationDeg",
  "firstOrderHours",
  "source",
  "timeUncertaintySeconds",
  "previousSource",
  "previousTimeUncertaintySeconds",
  "sentence",
];

/**
 * Answers `apsidary drift`.
 *
 * @param word    the pair, as given
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used, before anything is written
 */
export async function runDrift(word: string, options: DriftOptions): Promise<void> {
  const format = formatOf(options);
  const source = sourceChoiceOf(options);
  const kind = choiceOf("--kind", options.kind ?? "both", ["periapsis", "apoapsis", "both"]);
  const [pair, another] = pairsOf([word]);
  if (!pair || another) throw new ApsidaryError("bad-pair", "drift takes one pair at a time, such as earth-sun.");
  requireFit(pair, options);

  const ephemeris = await openFor(options);
  const from = edgeOf("--from", options.from, ephemeris.leapSeconds);
  const to = edgeOf("--to", options.to, ephemeris.leapSeconds);
  requireOrder(from, to, options);
  const query = { pair, kind, source, from: { tdbSeconds: from }, to: { tdbSeconds: to } };
  const account = driftAccount(ephemeris, query);
  const rows = await withMore(account, ephemeris, query, options);
  const chart = options.chart === undefined ? null : await chartOf(account, ephemeris);
  const pairs = pairsUsed(pair, rows);
  const span = { from: from - 2 * pair.halfPeriodSeconds, to }; // the passage before the first one counts
  const made = await provenanceOf(ephemeris, { pairs, span, source });
  const note = whyNoSplit(pair);
  const title = `Drift of ${pair.name}, ${options.from} to ${options.to}`;
  const flat = format === "csv" ? rows.map(flatRow) : null;
  const pieces = await answerPieces<object>(format, {
    head: { schema: "apsidary/drift/1", made, pair: pair.name, ...(note === null ? {} : { note }) },
    names: (flat ? [...new Set([...NAMES, ...flat.flatMap(Object.keys)])] : NAMES) as never[],
    rows: flat ?? rows,
    report: () => driftReport(title, pair, rows, ephemeris, made),
  });
  await writeBoth(pieces, options, chart);
}

/** Refuses what a pair cannot have, and two files of one name, before anything is opened. */
function requireFit(pair: Pair, { chart, seasons, out }: DriftOptions): void {
  const why = whyNoSplit(pair);
  if (chart !== undefined && why !== null)
    throw new ApsidaryError("bad-option", `--chart draws the split of earth-sun; ${why}`);
  if (seasons && pair.name !== "earth-sun" && pair.name !== "emb-sun") {
    throw new ApsidaryError("bad-option", `--seasons is for earth-sun and emb-sun; ${pair.name} has no solstice.`);
  }
  if (chart !== undefined && out !== undefined && resolve(chart) === resolve(out)) {
    throw new ApsidaryError("bad-option", `--chart and --out name the same file ${shown(out)}; give two names.`);
  }
}

/** Adds the centres and the season, where asked for, to each row. */
async function withMore(
  account: readonly DriftRow[],
  ephemeris: Ephemeris,
  query: DriftQuery & { readonly pair: Pair; readonly source: SourceChoice },
  { centres, seasons }: DriftOptions,
): Promise<readonly ToldRow[]> {
  if (!centres && !seasons) return account;
  const { pair, source } = query;
  const sky = seasons ? await openSky() : null;
  const byRow = new Map<string, Passage>();
  for (const passage of passages(ephemeris, pair, { ...query, rank: "principal" })) {
    byRow.set(`${passage.kind} ${rounded(passage.tdbSeconds, 3)}`, passage);
  }
  return account.map((row) => {
    const passage = byRow.get(`${row.kind} ${row.tdbSeconds}`);
    if (!passage) return row;
    return {
      ...row,
      ...(centres ? { centres: compareCentres(ephemeris, passage, source) } : {}),
      ...(sky ? { season: seasonOf(sky, ephemeris, passage, source) } : {}),
    };
  });
}

/** Draws the chart; its library is loaded only here. */
async function chartOf(account: readonly DriftRow[], ephemeris: Ephemeris): Promise<string> {
  const { driftChart } = await import("../drift/drift-chart.ts");
  return driftChart(account, ephemeris);
}

/** The pairs whose states the answer was made from. */
function pairsUsed(pair: Pair, rows: readonly ToldRow[]): Pair[] {
  const ofSplit = whyNoSplit(pair) === null ? (["emb-sun", "moon-earth"] as const) : [];
  const ofCentres = rows.flatMap(({ centres }) => centres?.map((centre) => centre.pair) ?? []);
  return [...new Set([pair.name, ...ofSplit, ...ofCentres])].map((name) => pairOf(name));
}

/** A row of the CSV: what is nested gets names such as `centres.emb-sun.distanceKm` and `season.solsticeUtc`. */
function flatRow({ centres, season, ...row }: ToldRow): Record<string, string | number | null> {
  const flat: Record<string, string | number | null> = { ...row };
  for (const { pair, ...centre } of centres ?? []) {
    for (const [name, value] of Object.entries(centre)) flat[`centres.${pair}.${name}`] = value;
  }
  for (const [name, value] of Object.entries(season ?? {})) flat[`season.${name}`] = value;
  return flat;
}

/** Writes answer and chart; where one of them cannot be written, neither is. */
async function writeBoth(
  pieces: Iterable<string>,
  { out, chart: file }: DriftOptions,
  chart: string | null,
): Promise<void> {
  if (chart === null || file === undefined) {
    await writeAnswer(pieces, out);
    return;
  }
  const destination = await namingChart(() => openDestination(file));
  try {
    await namingChart(() => destination.write(chart));
    await writeAnswer(pieces, out);
  } catch (error) {
    await destination.abandon();
    throw error;
  }
  await namingChart(() => destination.finish());
}

/** Says `--chart` where a message about a file says `--out`. */
async function namingChart<T>(act: () => Promise<T>): Promise<T> {
  try {
    return await act();
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    throw new ApsidaryError(error.code, error.message.replace(/^--out (.*?)(; leave --out .*)?$/, "--chart $1"));
  }
}
