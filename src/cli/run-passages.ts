import type { Pair } from "../bodies/pair.ts";
import type { TrackPair } from "../bodies/track-pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import type { ElementsGiven } from "../orbit/elements.ts";
import type { Track } from "../orbit/track.ts";
import { mergedPassages } from "../passages/merged-passages.ts";
import type { Passage, TrackPassage } from "../passages/passage.ts";
import { PASSAGE_FIELDS } from "../passages/passage-fields.ts";
import type { PassageQuery } from "../passages/passages.ts";
import { timelineFor } from "../passages/timeline-for.ts";
import { toRow } from "../passages/to-row.ts";
import { julianText } from "../time/julian-text.ts";
import { answerPieces } from "./answer-pieces.ts";
import { choiceOf, shown } from "./choice-of.ts";
import { edgeOf, requireOrder, tellingCalendar } from "./edge.ts";
import { openFor } from "./open-for.ts";
import { type Calendar, calendarOf, formatOf, JULIAN_TITLE, sourceChoiceOf } from "./options.ts";
import { refuseDecayed, tracksOf } from "./orbit-tracks.ts";
import { pairsOf } from "./pairs.ts";
import type { PassagesOptions } from "./passages.ts";
import { type ListedPassage, passagesReport } from "./passages-report.ts";
import { mayShowProgress, withProgress } from "./progress.ts";
import { provenanceOf } from "./provenance.ts";
import { writeAnswer } from "./write-answer.ts";

/**
 * Answers `apsidary passages`.
 *
 * @param words   the pairs, as given
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used, before anything is written
 */
export async function runPassages(words: readonly string[], options: PassagesOptions): Promise<void> {
  requirePairs(words, options);
  const format = formatOf(options);
  const source = sourceChoiceOf(options);
  const kind = choiceOf("--kind", options.kind ?? "both", ["periapsis", "apoapsis", "both"]);
  const rank = choiceOf("--rank", options.rank ?? "all", ["principal", "all"]);
  const calendar = calendarOf(options);
  const count = countOf(options);
  const tracks = await tracksOf(options, options.perturbed ? await pulledBy(options, calendar) : null);
  const pairs = [...(words.length > 0 ? pairsOf(words) : []), ...tracks.map((track) => track.pair)];

  const ephemeris = await openFor(options, tracks);
  const edge = (option: "--from" | "--to", given?: string) => edgeOf(option, given, ephemeris.leapSeconds, calendar);
  const from = edge("--from", options.from);
  const what = { kind, rank, source };
  const to =
    count === null
      ? edge("--to", options.to)
      : tellingCalendar(calendar, () => endOfNext(ephemeris, pairs, from, count, what));
  requireOrder(from, to, options);
  refuseDecayed(tracks, to);
  const span = { from: { tdbSeconds: from }, to: { tdbSeconds: to } };
  const found = tellingCalendar(calendar, () => mergedPassages(ephemeris, pairs, { ...span, ...what }));
  const made = await provenanceOf(ephemeris, { pairs, span: { from, to }, source });

  const watched = withProgress(found, (passage) => passage.tdbSeconds, from, to, mayShowProgress(options.out));
  const pieces = await answerPieces<ListedPassage>(format, {
    head: { schema: "apsidary/passages/1", made },
    names: [
      ...PASSAGE_FIELDS,
      ...(tracks.length > 0 ? (["heightKm"] as const) : []),
      ...(calendar === "julian" ? (["utcJulian"] as const) : []),
    ],
    rows: rowsOf(watched, ephemeris, count ?? Infinity, calendar, tracks.length > 0),
    report: (rows) => passagesReport(titleOf(pairs, options), rows, made, tracks.length > 0),
  });
  await writeAnswer(pieces, options.out);
}

/** Asks for a pair where neither a pair nor a track is named. @throws ApsidaryError `bad-input` */
function requirePairs(words: readonly string[], { elements, table, omm, tle, star }: PassagesOptions): void {
  if (words.length > 0 || [elements, table, omm, tle, star].some((file) => file !== undefined)) return;
  throw new ApsidaryError(
    "bad-input",
    "the argument <pairs> is missing; name a pair such as moon-earth, or give --elements, --omm, --tle, --star or --table. See: apsidary passages --help",
  );
}

/** Gives what makes a track of elements with the planets' pull over the span asked for. @throws ApsidaryError `bad-option`, as `edgeOf` */
async function pulledBy(options: PassagesOptions, calendar: Calendar): Promise<(given: ElementsGiven) => Track> {
  if (options.elements === undefined) {
    throw new ApsidaryError("bad-option", "--perturbed goes with --elements: it adds the planets' pull to them.");
  }
  if (options.to === undefined) {
    throw new ApsidaryError(
      "bad-option",
      "--perturbed integrates over the span: give its end, such as --to 2028, instead of --next.",
    );
  }
  const { perturbedTrack } = await import("../orbit/perturbed-track.ts");
  const ephemeris = await openFor(options);
  const from = edgeOf("--from", options.from, ephemeris.leapSeconds, calendar);
  const to = edgeOf("--to", options.to, ephemeris.leapSeconds, calendar);
  requireOrder(from, to, options);
  return (given) => perturbedTrack(ephemeris, given, { from, to });
}

function* rowsOf(
  found: Iterable<Passage | TrackPassage>,
  ephemeris: Ephemeris,
  most: number,
  calendar: Calendar,
  heights: boolean,
): Generator<ListedPassage, void, undefined> {
  let count = 0;
  for (const passage of found) {
    if (count === most) return;
    count++;
    const told = toRow(passage, ephemeris);
    const row = heights ? { ...told, heightKm: "heightKm" in told ? told.heightKm : null } : told;
    yield calendar === "julian" ? { ...row, utcJulian: julianText(row.utc) } : row;
  }
}

/** The number of `--next`, or `null` where there is none. */
function countOf({ next, to }: PassagesOptions): number | null {
  if (next === undefined) {
    if (to !== undefined) return null;
    throw new ApsidaryError(
      "bad-span",
      "--to is missing; give an end such as --to 2028, or a number of passages such as --next 5.",
    );
  }
  if (to !== undefined) throw new ApsidaryError("bad-option", "--next and --to exclude each other; give one of them.");
  const count = /^\d{1,9}$/.test(next) ? Number(next) : 0;
  if (count > 0) return count;
  throw new ApsidaryError(
    "bad-option",
    `--next ${shown(next)} is not a number of passages; give a whole number from 1 to 999999999.`,
  );
}

/**
 * An end of the span just past the passage that is the last of so many; the end of the sources where they hold fewer.
 *
 * So many passages are found twice, which keeps memory constant and lets the provenance name the sources of these rows alone.
 */
function endOfNext(
  ephemeris: Ephemeris,
  pairs: readonly (Pair | TrackPair)[],
  from: number,
  count: number,
  what: Pick<PassageQuery, "kind" | "rank" | "source">,
): number {
  const ends = pairs.map((pair) => {
    const { covered } = timelineFor(ephemeris, pair, what.source ?? "auto");
    return covered.find((span) => span.from <= from && from < span.to)?.to ?? from + 1; // outside, the search refuses
  });
  const end = Math.min(...ends);
  let found = 0;
  for (const passage of mergedPassages(ephemeris, pairs, {
    from: { tdbSeconds: from },
    to: { tdbSeconds: end },
    ...what,
  })) {
    found++;
    if (found === count) return Math.min(passage.tdbSeconds + 1, end);
  }
  process.stderr.write(`apsidary: only ${found} of ${count} passages; the sources end there.\n`);
  return end;
}

function titleOf(pairs: readonly Pair<string>[], { from = "", to, next, calendar }: PassagesOptions): string {
  const which = pairs.map((pair) => pair.name).join(", ");
  const when = to === undefined ? `: ${next} from ${from} on` : `, ${from} to ${to}`;
  return `Passages of ${which}${when}${calendar === "julian" ? JULIAN_TITLE : ""}`;
}
