import { type Pair, pairOf } from "../bodies/pair.ts";
import type { CentrePassage } from "../drift/compare-centres.ts";
import { meanLineOf } from "../drift/mean-line.ts";
import { whyNoSplit } from "../drift/why-no-split.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Column } from "../report/column.ts";
import { printedHalfWidth } from "../report/half-width.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
import { formatUtc } from "../time/format-utc.ts";
import { utcOf } from "../time/utc-of.ts";
import { cautionsOf } from "./cautions.ts";
import { footOf } from "./foot.ts";
import { printedUtc } from "./printed-utc.ts";
import type { Provenance } from "./provenance.ts";
import type { ToldRow } from "./run-drift.ts";

/** Half-width of a date, seconds, up to which tenths of an hour mean something. */
const TENTH_LIMIT = 450;

/**
 * Writes an account as a report for people: a table whose rows end with a sentence, the centres and the seasons where they were asked for,
 * and a foot that explains what stands in it.
 *
 * @param title     what was asked
 * @param pair      the pair
 * @param rows      of the pair
 * @param ephemeris the sources that the rows name
 * @param made      the provenance
 */
export function* driftReport(
  title: string,
  pair: Pair,
  rows: readonly ToldRow[],
  ephemeris: Ephemeris,
  made: Provenance,
): Generator<string, void, undefined> {
  const why = whyNoSplit(pair);
  yield `${title}\n\n`;
  if (rows.length === 0) yield "No passage in this span that has one of its kind before it.\n";
  else {
    yield* textTable([...begin(ephemeris), ...(why === null ? SPLIT : STEPS), SENTENCE], rows);
    yield "\n";
  }
  if (rows.some(({ centres }) => centres)) yield* centresTable(rows, ephemeris);
  if (rows.some(({ season }) => season)) yield* seasonsTable(rows, ephemeris);
  for (const note of notesOf(pair, rows, why)) yield wrapped(note, 100, "  ");
  for (const note of cautionsOf({ targetPoint: pair.target, centrePoint: pair.centre })) yield wrapped(note, 100, "  ");
  yield footOf(made, { deltaT: rows.some(({ tdbSeconds }) => isDeltaT(tdbSeconds, ephemeris)), zones: false });
}

function begin(ephemeris: Ephemeris): Column<ToldRow>[] {
  return [
    {
      title: "UTC",
      unit: "",
      values: ({ tdbSeconds, timeUncertaintySeconds }) => utcAt(tdbSeconds, timeUncertaintySeconds, ephemeris),
      digits: 0,
    },
    { title: "passage", unit: "", values: ({ term }) => term, digits: 0 },
  ];
}

const digits = ({ timeUncertaintySeconds, previousTimeUncertaintySeconds }: ToldRow): number =>
  Math.max(timeUncertaintySeconds, previousTimeUncertaintySeconds) > TENTH_LIMIT ? 0 : 1;

const SPLIT: readonly Column<ToldRow>[] = [
  { title: "date step", unit: "h", values: (row) => row.dateStepHours, digits },
  { title: "calendar", unit: "h", values: (row) => row.calendarHours, digits },
  { title: "planets", unit: "h", values: (row) => row.planetsHours, digits },
  { title: "Moon", unit: "h", values: (row) => row.moonHours, digits },
  { title: "elongation", unit: "°", values: (row) => row.moonElongationDeg, digits: 0 },
];

const STEPS: readonly Column<ToldRow>[] = [
  { title: "step", unit: "d", values: (row) => row.stepDays, digits: (row) => digits(row) + 1 },
  { title: "off the line", unit: "h", values: (row) => row.bodyMinusMeanHours, digits },
];

const SENTENCE: Column<ToldRow> = { title: "in words", unit: "", values: ({ sentence }) => sentence, digits: 0 };

interface CentreLine extends CentrePassage {
  readonly term: string;
  readonly kilometres: number;
}

function* centresTable(rows: readonly ToldRow[], ephemeris: Ephemeris): Generator<string, void, undefined> {
  const accuracy = ({ pair, tdbSeconds, source }: CentrePassage) =>
    ephemeris.sources.find(({ id }) => id === source)?.accuracy(pairOf(pair), tdbSeconds ?? 0);
  const lines = rows.flatMap(({ term, centres = [] }) =>
    centres.map((centre, i): CentreLine => {
      return {
        ...centre,
        term: i === 0 ? term : "",
        kilometres: printedHalfWidth(accuracy(centre)?.rangeKm ?? 1).digits,
      };
    }),
  );
  yield "The same passage about other centres\n\n";
  yield* textTable<CentreLine>(
    [
      { title: "passage", unit: "", values: ({ term }) => term, digits: 0 },
      { title: "pair", unit: "", values: ({ pair }) => pair, digits: 0 },
      {
        title: "UTC",
        unit: "",
        values: ({ tdbSeconds, timeUncertaintySeconds }) =>
          tdbSeconds === null ? null : utcAt(tdbSeconds, timeUncertaintySeconds ?? 0, ephemeris),
        digits: 0,
      },
      { title: "later by", unit: "h", values: ({ laterHours }) => laterHours, digits: 1 },
      { title: "distance", unit: "km", values: ({ distanceKm }) => distanceKm, digits: ({ kilometres }) => kilometres },
      { title: "farther by", unit: "km", values: ({ fartherKm }) => fartherKm, digits: ({ kilometres }) => kilometres },
    ],
    lines,
  );
  yield "\n";
}

function* seasonsTable(rows: readonly ToldRow[], ephemeris: Ephemeris): Generator<string, void, undefined> {
  yield "Seasons\n\n";
  yield* textTable<ToldRow>(
    [
      ...begin(ephemeris),
      {
        title: "solstice before",
        unit: "",
        values: ({ season }) => (season ? utcAt(season.solsticeTdbSeconds, SOLSTICE_SECONDS, ephemeris) : null),
        digits: 0,
      },
      {
        title: "after it",
        unit: "",
        values: ({ season }) => (season ? daysAndHours(season.daysAfterSolstice) : null),
        digits: 0,
      },
      { title: "mean", unit: "°", values: ({ season }) => season?.meanPerihelionLongitudeDeg ?? null, digits: 3 },
      {
        title: "osculating",
        unit: "°",
        values: ({ season }) => season?.osculatingPerihelionLongitudeDeg ?? null,
        digits: 3,
      },
    ],
    rows,
  );
  yield "\n";
}

/** Half-width of a solstice, seconds; see `openSky`. */
const SOLSTICE_SECONDS = 100;

function daysAndHours(days: number): string {
  const hours = Math.round(days * 24);
  return `${Math.floor(hours / 24)} d ${hours % 24} h`;
}

function notesOf(pair: Pair, rows: readonly ToldRow[], why: string | null): string[] {
  if (rows.length === 0) return [];
  const line = meanLineOf(pair.name, "periapsis");
  const about = line ? `${Math.round(line.slopeDays * 1e4) / 1e4} d from passage to passage` : "";
  const notes =
    why === null
      ? [
          "Hours above nought: later than the year before. date step: how far the date and its clock time moved; calendar + planets + Moon.",
          `calendar: a mean year (${about}) less the 365 or 366 days since the same date a year before; planets: how far the barycentre ` +
            "of the Earth and the Moon moved against a straight line; Moon: how far the Earth's centre moved against the barycentre.",
          "elongation: of the Moon from the Sun at the barycentre's passage; 0° new, 90° first quarter, 180° full, 270° last quarter.",
        ]
      : [
          why,
          line
            ? `off the line: above nought later than the straight line through the passages of ${line.years.join(" to ")}, ${about}.`
            : `${pair.name} has no straight line to be held against.`,
        ];
  if (rows.some(({ source, previousSource }) => source !== previousSource)) {
    notes.push("A step between two sources holds what they differ by; it must not be taken for motion.");
  }
  if (rows.some(({ season }) => season)) {
    notes.push(
      "mean, osculating: longitude of perihelion from the equinox of date, of the mean orbit and of the barycentre's two-body orbit at its passage.",
    );
  }
  return notes;
}

function isDeltaT(tdb: number, ephemeris: Ephemeris): boolean {
  return utcOf(tdb, ephemeris.leapSeconds).basis === "delta-t";
}

function utcAt(tdb: number, uncertaintySeconds: number, ephemeris: Ephemeris): string {
  const utc = utcOf(tdb, ephemeris.leapSeconds);
  return printedUtc(formatUtc(utc, 3), Math.hypot(uncertaintySeconds, utc.uncertaintySeconds));
}
