import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { rangeTrack, type TrackedRange } from "../passages/range-track.ts";
import { rounded } from "../report/rounded.ts";
import { utcText } from "../time/format-utc.ts";
import { julianText } from "../time/julian-text.ts";
import { answerPieces } from "./answer-pieces.ts";
import { edgeOf, requireOrder, tellingCalendar } from "./edge.ts";
import { openFor } from "./open-for.ts";
import { type Calendar, calendarOf, formatOf, JULIAN_TITLE, sourceChoiceOf } from "./options.ts";
import { pairsOf } from "./pairs.ts";
import { mayShowProgress, withProgress } from "./progress.ts";
import { provenanceOf } from "./provenance.ts";
import type { RangeOptions } from "./range.ts";
import { type RangeRow, rangeReport } from "./range-report.ts";
import { stepOf } from "./step-of.ts";
import { writeAnswer } from "./write-answer.ts";

const NAMES: readonly (keyof RangeRow)[] = [
  "utc",
  "tdbSeconds",
  "distanceKm",
  "rangeRateKmPerDay",
  "rangeAccelerationKmPerDay2",
  "share",
  "source",
];

/**
 * Answers `apsidary range`.
 *
 * @param word    the pair, as given
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used, before anything is written
 */
export async function runRange(word: string, options: RangeOptions): Promise<void> {
  const format = formatOf(options);
  const source = sourceChoiceOf(options);
  const calendar = calendarOf(options);
  const stepSeconds = stepOf(options.step);
  const [pair, another] = pairsOf([word]);
  if (!pair || another) throw new ApsidaryError("bad-pair", "range takes one pair at a time, such as moon-earth.");

  const ephemeris = await openFor(options);
  const from = edgeOf("--from", options.from, ephemeris.leapSeconds, calendar);
  const to = edgeOf("--to", options.to, ephemeris.leapSeconds, calendar);
  requireOrder(from, to, options);
  const asked = { from: { tdbSeconds: from }, to: { tdbSeconds: to }, stepSeconds, source };
  const track = tellingCalendar(calendar, () => rangeTrack(ephemeris, pair, asked));
  const made = await provenanceOf(ephemeris, { pairs: [pair], span: { from, to }, source });

  const watched = withProgress(track, (row) => row.tdbSeconds, from, to, mayShowProgress(options.out));
  const title = `Distance of ${pair.name}, ${options.from} to ${options.to}, every ${options.step}${calendar === "julian" ? JULIAN_TITLE : ""}`;
  const pieces = await answerPieces<RangeRow>(format, {
    head: { schema: "apsidary/range/1", made, pair: pair.name },
    names: calendar === "julian" ? [...NAMES, "utcJulian"] : NAMES,
    rows: rowsOf(watched, ephemeris, to, calendar),
    report: (rows) => rangeReport(title, pair, rows, ephemeris, made),
  });
  await writeAnswer(pieces, options.out);
}

function* rowsOf(
  track: Iterable<TrackedRange>,
  ephemeris: Ephemeris,
  to: number,
  calendar: Calendar,
): Generator<RangeRow, void, undefined> {
  for (const { tdbSeconds, distanceKm, rangeRateKmPerDay, rangeAccelerationKmPerDay2, share, source } of track) {
    // an answer tells milliseconds: a row that would bear the time of the end is not before it
    if (rounded(tdbSeconds, 3) >= rounded(to, 3)) return;
    const utc = utcText(tdbSeconds, 3, ephemeris.leapSeconds);
    yield {
      utc,
      tdbSeconds: rounded(tdbSeconds, 3),
      distanceKm: rounded(distanceKm, 3),
      rangeRateKmPerDay: rounded(rangeRateKmPerDay, 3),
      rangeAccelerationKmPerDay2: rounded(rangeAccelerationKmPerDay2, 3),
      share: share === null ? null : rounded(share, 9),
      source,
      ...(calendar === "julian" ? { utcJulian: julianText(utc) } : {}),
    };
  }
}
