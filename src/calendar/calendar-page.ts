import { DateTime } from "luxon";
import { pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { rangeAt } from "../passages/range-at.ts";
import type { SourceChoice } from "../passages/timeline-for.ts";
import { chartElement, escaped } from "../report/chart-element.ts";
import { DISTANCE_CHART_STYLE, distanceChart } from "../report/distance-chart.ts";
import { type HtmlColumn, htmlPage, htmlTable } from "../report/html-page.ts";
import { tdbOf } from "../time/tdb-of.ts";
import { zoneOf } from "../time/zone-of.ts";
import { pairWords, pointName } from "./body-names.ts";
import type { CalendarRow } from "./calendar-row.ts";
import type { CompleteStyle } from "./house-style.ts";
import { seenBody } from "./mean-distance.ts";
import { noteWords } from "./note-words.ts";
import { shownNumber, shownTime } from "./shown.ts";
import { type YearBlock, yearBlocks } from "./year-blocks.ts";

/** What a page is made of besides its rows. */
export interface CalendarPage {
  readonly title: string;
  readonly zone: string;
  readonly style: CompleteStyle;
  readonly source: SourceChoice;
  /** The years, first and last. */
  readonly years: readonly [number, number];
  /** Must be read: stand at the top. */
  readonly cautions: readonly string[];
  /** Gives what stands at the end, line by line, when all rows have been drawn. */
  readonly foot: () => readonly string[];
}

const STYLE = `
.cautions { background: var(--panel); border-left: 4px solid var(--accent); padding: 0.5rem 1rem; margin: 1rem 0 }
.cautions p { margin: 0.25rem 0 }
td.words { min-width: 13rem }
@media print { td.words { min-width: 0 } }`;

/** Points of a curve; the Moon's month has then 13 and more. */
const CURVE_POINTS = 366;

/**
 * Writes a calendar as one page of HTML that needs nothing else: a chart and a table for each body in each year.
 *
 * @param ephemeris what gave the rows; the curves are drawn from it
 * @param rows      in order of time
 */
export function calendarPage(
  ephemeris: Ephemeris,
  rows: Iterable<CalendarRow>,
  page: CalendarPage,
): Generator<string, void, undefined> {
  return htmlPage({
    title: page.title,
    description: `${page.title}: when each body is nearest and farthest, how sure that is, and how it looks.`,
    style: DISTANCE_CHART_STYLE + STYLE,
    body: bodyOf(ephemeris, rows, page),
  });
}

function* bodyOf(
  ephemeris: Ephemeris,
  rows: Iterable<CalendarRow>,
  page: CalendarPage,
): Generator<string, void, undefined> {
  const { title, zone, cautions, years } = page;
  const manyYears = years[0] !== years[1];
  yield "<header>\n";
  yield `${chartElement("h1", {}, escaped(title))}\n`;
  yield `${chartElement("p", {}, escaped(`Local times are those of ${zone}. Every time and distance is rounded to what is known.`))}\n`;
  yield "</header>\n<main>\n";
  if (cautions.length > 0) {
    const words = cautions.map((caution) => chartElement("p", {}, escaped(caution)));
    yield `${chartElement("aside", { class: "cautions", "aria-label": "Cautions" }, ...words)}\n`;
  }
  let year = "";
  let count = 0;
  for (const block of yearBlocks(rows)) {
    if (manyYears && block.year !== year) yield `${chartElement("h2", {}, escaped(block.year))}\n`;
    year = block.year;
    count++;
    yield* sectionOf(ephemeris, block, page, manyYears);
  }
  if (count === 0) yield "<p>No passage in this span.</p>\n";
  yield "</main>\n<footer>\n";
  for (const line of page.foot()) yield `${chartElement("p", {}, escaped(line))}\n`;
  yield "</footer>\n";
}

function* sectionOf(
  ephemeris: Ephemeris,
  block: YearBlock,
  page: CalendarPage,
  manyYears: boolean,
): Generator<string, void, undefined> {
  const id = `${block.pair}-${block.year}`;
  const words = pairWords(block.pair);
  yield `${chartElement("section", { "aria-labelledby": id }, "\n", ...pieces())}\n`;

  function* pieces() {
    const heading = manyYears
      ? chartElement("h3", { id }, escaped(`${words}, ${block.year}`))
      : chartElement("h2", { id }, escaped(words));
    yield `${heading}\n`;
    yield figureOf(ephemeris, block, page, id);
    const caption = `${words}: passages of ${block.year}, local time of ${page.zone}`;
    yield htmlTable(`${id}-table`, caption, columnsOf(block, page.style), block.rows);
  }
}

function figureOf(ephemeris: Ephemeris, { pair, year, rows }: YearBlock, page: CalendarPage, id: string): string {
  const start = DateTime.fromISO(`${year}-01-01`, { zone: zoneOf(page.zone) });
  const edge = (at: DateTime) => tdbOf(at, ephemeris.leapSeconds);
  const from = edge(start);
  const to = edge(start.plus({ years: 1 }));
  const inThousands = pair === "moon-earth" || pair.endsWith("-jupiter");
  const divisor = inThousands ? 1e3 : 1e6;
  const unit = inThousands ? "thousand km" : "million km";
  const curve = Array.from({ length: CURVE_POINTS + 1 }, (_, i): [number, number] => {
    const tdb = from + ((to - from) * i) / CURVE_POINTS;
    return [tdb, rangeAt(ephemeris, pairOf(pair), { tdbSeconds: tdb }, page.source).distanceKm / divisor];
  });
  const months = Array.from({ length: 12 }, (_, i) => {
    const middle = edge(start.plus({ months: i, days: 14 }));
    const label = new Intl.DateTimeFormat(page.style.language ?? "en-GB", { month: "narrow", timeZone: "UTC" });
    return { value: middle, label: label.format(new Date(Date.UTC(2000, i, 15))) };
  });
  const least = rows.filter(({ kind }) => kind === "periapsis");
  const greatest = rows.filter(({ kind }) => kind === "apoapsis");
  const told = [tell(least, "filled"), tell(greatest, "open")].filter((part) => part !== "").join(", ");
  const title = `${pairWords(pair).replace(" about ", " from ")}: distance in ${year}, ${unit}`;
  return `${chartElement(
    "figure",
    {},
    distanceChart({
      id: `${id}-chart`,
      title,
      description: `A curve over the months of ${year}. Marked: ${told}. All marks stand in the table below, with their distances.`,
      unit,
      curve,
      marks: rows.map((row) => ({
        at: row.tdbSeconds,
        distance: row.distanceKm / divisor,
        kind: row.kind === "periapsis" ? "least" : "greatest",
      })),
      xTicks: months,
    }),
    chartElement("figcaption", {}, escaped(`${title}. Marked: ${told}.`)),
  )}\n`;

  function tell(some: readonly CalendarRow[], mark: string): string {
    return some[0] ? `${some[0].term} (${mark} circle${some.length > 1 ? "s" : ""})` : "";
  }
}

function columnsOf({ pair, rows }: YearBlock, style: CompleteStyle): HtmlColumn<CalendarRow>[] {
  const seen = seenBody({ name: pair });
  const language = style.language !== null && style.months === "names" ? { lang: style.language } : {};
  const time = (iso: string, words: string) =>
    // the attribute knows years of four digits from 1 on, and no leap second
    /^(?!0000)\d{4}-/.test(iso)
      ? chartElement("time", { datetime: iso.replace(":60.", ":59."), ...language }, escaped(words))
      : escaped(words);
  const number = (title: string, cell: (row: CalendarRow) => string): HtmlColumn<CalendarRow> => {
    return { title, className: "number", cell: (row) => escaped(cell(row)) };
  };
  const besides = (rows[0]?.besides ?? []).map(
    ({ zone }, i): HtmlColumn<CalendarRow> => ({
      title: zone.slice(zone.lastIndexOf("/") + 1).replaceAll("_", " "),
      className: "whole",
      cell: (row) => {
        const { local = row.local, printed = "" } = row.besides?.[i] ?? {};
        return time(local, shownTime(printed, row.printedUnit, style));
      },
    }),
  );
  const columns: HtmlColumn<CalendarRow>[] = [
    {
      title: "Local time",
      cell: (row) => time(row.local, shownTime(row.printed, row.printedUnit, style, true)),
    },
    { title: "Passage", cell: ({ term }) => escaped(term.slice(0, 1).toUpperCase() + term.slice(1)) },
    { title: "Offset", cell: ({ local }) => escaped(local.slice(-6)) },
    ...besides,
    {
      title: rows.some(({ utcBasis }) => utcBasis === "delta-t") ? "UT" : "UTC",
      className: "whole",
      cell: (row) => time(row.utc, shownTime(row.printedUtc, row.printedUnit, style)),
    },
    number("Distance, km", (row) => shownNumber(Number(row.printedKm), 0, style)),
    number("au", ({ printedAu }) => {
      return shownNumber(Number(printedAu), printedAu.length - printedAu.indexOf(".") - 1, style);
    }),
  ];
  if (seen) {
    columns.push(
      number(`${pointName(seen.name)} across, ′`, ({ diameterArcmin }) =>
        diameterArcmin === null
          ? ""
          : shownNumber(diameterArcmin, pair === "moon-earth" || pair === "earth-sun" ? 2 : 1, style),
      ),
    );
  }
  columns.push(
    number("Size, %", (row) => shownNumber(row.sizePercent, 1, style, true)),
    number("Light, %", (row) => shownNumber(row.lightPercent, 1, style, true)),
    number("km/s", (row) => shownNumber(row.speedKmS, 2, style)),
    {
      title: "Notes",
      className: "words",
      cell: (row) => {
        const onlyOfYear = rows.filter(({ kind }) => kind === row.kind).length === 1;
        return escaped(noteWords(row, { onlyOfYear }).join("; "));
      },
    },
  );
  return columns;
}
