import { scaleLinear } from "d3-scale";
import { DAY_SECONDS } from "../bodies/constants.ts";
import { ApsidaryError } from "../error.ts";
import { type ChartPanel, type ChartTick, chartAxes } from "../report/chart-axes.ts";
import { chartDocument } from "../report/chart-document.ts";
import { chartElement, chartNumber, chartText, escaped } from "../report/chart-element.ts";
import { stackedParts } from "../report/chart-stack.ts";
import { dayOfGregorian, gregorianOfDay } from "../time/civil-calendar.ts";
import type { LeapSecondList } from "../time/leap-seconds.ts";
import { utcOf } from "../time/utc-of.ts";
import type { DriftRow } from "./drift-row.ts";

const WIDTH = 720;
const LEFT = 84;
const RIGHT = 690;
const DATES_HEIGHT = 220;
const BARS_HEIGHT = 240;
/** Height of a line of text on a narrow screen, where it is largest. */
const LINE = 32;
/** Years of one kind beyond which bars and dates run into each other. */
const MOST_YEARS = 200;

const STYLE = [
  ".earth { fill: #12406b; stroke: #fff; stroke-width: 1 }",
  ".barycentre { fill: #fff; stroke: #12406b; stroke-width: 1.8 }",
  ".moon-share { stroke: #12406b; stroke-width: 1.2 }",
  ".mean { fill: none; stroke: #222; stroke-width: 1.5; stroke-dasharray: 6 4 }",
  ".calendar { fill: #f3dc94; stroke: #6b5a1e; stroke-width: 0.8 }",
  ".planets { fill: url(#drift-hatch); stroke: #333; stroke-width: 0.8 }",
  ".moon { fill: #12406b; stroke: #12406b; stroke-width: 0.8 }",
  ".sum { fill: #fff; stroke: #000; stroke-width: 1.8 }",
];

const HATCH = chartElement(
  "pattern",
  { id: "drift-hatch", width: 5, height: 5, patternUnits: "userSpaceOnUse", patternTransform: "rotate(45)" },
  chartElement("rect", { width: 5, height: 5, fill: "#fff" }),
  chartElement("rect", { width: 2, height: 5, fill: "#333" }),
);

const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/**
 * Draws an account of the Earth's dates as an SVG file.
 *
 * For perihelia and for aphelia, as far as the rows have them: the dates of the Earth's centre and of the barycentre, a line between
 * the two, and the straight line; below, the parts of each step as stacked bars, and their sum.
 *
 * @param rows   of `earth-sun`, as `driftAccount` gives them; those without an account are left out
 * @param scales the leap-second list by which dates are told: an `Ephemeris` will do
 * @throws ApsidaryError `bad-input` where there is nothing to draw; `bad-span` for more than 200 years
 */
export function driftChart(rows: readonly DriftRow[], scales?: { readonly leapSeconds: LeapSecondList }): string {
  const kinds = (["periapsis", "apoapsis"] as const)
    .map((kind) => rows.filter((row) => row.kind === kind).flatMap((row) => accountOf(row) ?? []))
    .filter((accounts) => accounts.length > 0);
  if (kinds.length === 0) {
    throw new ApsidaryError(
      "bad-input",
      "there is no step to draw; ask for a span that holds a perihelion or an aphelion.",
    );
  }
  const most = Math.max(...kinds.map((accounts) => accounts.length));
  if (most > MOST_YEARS) {
    throw new ApsidaryError(
      "bad-span",
      `a chart holds ${MOST_YEARS} years at most, not ${most}; ask for a shorter span.`,
    );
  }
  let top = 0;
  const parts: string[] = [];
  const titles: string[] = [];
  for (const accounts of kinds) {
    const drawn = drawKind(accounts, top, scales?.leapSeconds);
    parts.push(drawn.content);
    titles.push(drawn.title);
    top = drawn.bottom;
  }
  return chartDocument({
    name: "drift",
    title: titles.join("; "),
    description:
      "Above, by year: the calendar date in UTC on which the Earth's centre passes, and the one on which the barycentre of the Earth and the " +
      "Moon passes, joined by a line, and the straight line that the barycentre's passages keep to. Below, in hours: how much later (above nought) " +
      "or earlier (below) the date is than the year before, as a stack of three parts, from the calendar, the planets and the Moon, and their sum.",
    width: WIDTH,
    height: top,
    style: STYLE,
    definitions: HATCH,
    content: parts.join("\n"),
  });
}

/** A row whose account is whole. */
interface Account {
  readonly row: DriftRow;
  readonly bodyMinusBarycentre: number;
  readonly barycentreMinusMean: number;
  readonly parts: readonly [number, number, number];
  readonly sum: number;
}

function accountOf(row: DriftRow): Account | null {
  const { bodyMinusBarycentreHours: body, barycentreMinusMeanHours: barycentre, dateStepHours: sum } = row;
  const { calendarHours, planetsHours, moonHours } = row;
  if (body === null || barycentre === null || sum === null) return null;
  if (calendarHours === null || planetsHours === null || moonHours === null) return null;
  return {
    row,
    bodyMinusBarycentre: body,
    barycentreMinusMean: barycentre,
    parts: [calendarHours, planetsHours, moonHours],
    sum,
  };
}

/** The three dates of a year, as days since the first of a month. */
interface Dates {
  readonly year: number;
  readonly earth: number;
  readonly barycentre: number;
  readonly mean: number;
}

function drawKind(accounts: readonly Account[], top: number, leaps: LeapSecondList | undefined) {
  const first = accounts[0] as Account;
  const { kind } = first.row;
  const [, planets, moon] = first.parts;
  const points = [
    // the passage before the first one, so that a single step shows both its dates
    {
      tdb: first.row.tdbSeconds - first.row.stepDays * DAY_SECONDS,
      body: first.bodyMinusBarycentre - moon,
      barycentre: first.barycentreMinusMean - planets,
    },
    ...accounts.map(({ row, bodyMinusBarycentre, barycentreMinusMean }) => ({
      tdb: row.tdbSeconds,
      body: bodyMinusBarycentre,
      barycentre: barycentreMinusMean,
    })),
  ];
  const month = gregorianOfDay(utcOf(points[1]?.tdb ?? 0, leaps).day).month;
  const dates = points.map(({ tdb, body, barycentre }): Dates => {
    const ofBarycentre = tdb - body * 3600;
    const year = yearOf(tdb, month, leaps);
    const since = (at: number) => daysSince(at, year, month, leaps);
    return {
      year,
      earth: since(tdb),
      barycentre: since(ofBarycentre),
      mean: since(ofBarycentre - barycentre * 3600),
    };
  });
  const years = dates.map(({ year }) => year);
  const from = Math.min(...years);
  const to = Math.max(...years);
  const x = scaleLinear([from - 0.6, to + 0.6], [LEFT, RIGHT]);
  const xTicks = yearTicks(from, to);
  const word = kind === "periapsis" ? "Perihelion" : "Aphelion";
  const title = `${word} of the Earth, ${from} to ${to}`;

  const titleAt = top + 36;
  const datesTop = titleAt + 4 * LINE;
  const datesPanel = panelOf(
    x,
    datesTop,
    DATES_HEIGHT,
    extentOf(dates.flatMap((date) => [date.earth, date.barycentre, date.mean])),
  );
  const barsCaptionAt = datesPanel.bottom + 3.4 * LINE;
  const stacks = accounts.map(({ parts }) => stackedParts(parts));
  const ends = stacks.flat().flatMap((part) => [part.from, part.to]);
  const barsPanel = panelOf(x, barsCaptionAt + 3 * LINE, BARS_HEIGHT, extentOf([0, ...ends]));
  const content = [
    chartText(title, LEFT, titleAt, { class: "title" }),
    chartText("Date (UTC)", LEFT, titleAt + LINE),
    datesKey(titleAt + 2 * LINE),
    chartAxes(datesPanel, xTicks, dateTicks(datesPanel, month)),
    yearCaption(datesPanel),
    drawDates(datesPanel, dates),
    chartText("Hours later (+) or earlier (−) than the year before", LEFT, barsCaptionAt),
    barsKey(barsCaptionAt + LINE),
    chartAxes(barsPanel, xTicks, hourTicks(barsPanel)),
    yearCaption(barsPanel),
    drawBars(barsPanel, accounts, stacks, years.slice(1)),
  ].join("\n");
  return { content, title, bottom: barsPanel.bottom + 2.5 * LINE };
}

function yearCaption({ right, bottom }: ChartPanel): string {
  return chartText("year", right, bottom + 1.8 * LINE, { "text-anchor": "end" });
}

function panelOf(x: ChartPanel["x"], top: number, height: number, [low, high]: readonly [number, number]): ChartPanel {
  const bottom = top + height;
  return { left: LEFT, right: RIGHT, top, bottom, x, y: scaleLinear([low, high], [bottom - 10, top + 10]) };
}

function extentOf(values: readonly number[]): readonly [number, number] {
  return [Math.min(...values), Math.max(...values)];
}

/** The year whose month of that number is nearest: a perihelion of December belongs to the January after it. */
function yearOf(tdb: number, month: number, leaps: LeapSecondList | undefined): number {
  const { day } = utcOf(tdb, leaps);
  const { year } = gregorianOfDay(day);
  const off = (candidate: number) => Math.abs(day - dayOfGregorian(candidate, month, 1));
  return [year, year + 1, year - 1].reduce((best, candidate) => (off(candidate) < off(best) ? candidate : best));
}

function daysSince(tdb: number, year: number, month: number, leaps: LeapSecondList | undefined): number {
  const { day, secondsOfDay } = utcOf(tdb, leaps);
  return day - dayOfGregorian(year, month, 1) + secondsOfDay / DAY_SECONDS;
}

/** Labels of years that stand apart even where the text is largest. */
const MOST_YEAR_LABELS = 8;

function yearTicks(from: number, to: number): ChartTick[] {
  const scale = scaleLinear([from, to], [0, 1]);
  let years: number[] = [];
  for (let count = MOST_YEAR_LABELS; count > 0; count--) {
    years = scale.ticks(count).filter(Number.isInteger);
    if (years.length <= MOST_YEAR_LABELS) break;
  }
  return years.map((value) => ({ value, label: String(value) }));
}

function dateTicks({ y }: ChartPanel, month: number): ChartTick[] {
  return y
    .ticks(5)
    .filter(Number.isInteger)
    .map((value) => {
      // 2001 is no leap year; a date is told by its distance from the first of a month
      const date = gregorianOfDay(dayOfGregorian(2001, month, 1) + value);
      return { value, label: `${date.day} ${MONTHS[date.month - 1] ?? ""}` };
    });
}

function hourTicks({ y }: ChartPanel): ChartTick[] {
  const [low = 0, high = 0] = y.domain();
  const step = [1, 2, 3, 6, 12, 24, 48].find((candidate) => (high - low) / candidate <= 6) ?? 96;
  const ticks: ChartTick[] = [];
  for (let i = Math.ceil(low / step); i * step <= high; i++) {
    ticks.push({ value: i * step, label: signed(i * step, 0) });
  }
  return ticks;
}

function signed(value: number, digits: number): string {
  const text = Math.abs(value).toFixed(digits);
  return Number(text) === 0 ? text : `${value > 0 ? "+" : "−"}${text}`;
}

function drawDates({ x, y, left, right }: ChartPanel, dates: readonly Dates[]): string {
  const radius = Math.min(6, Math.max(2, ((right - left) / dates.length) * 0.22));
  const mean = dates.map((date) => `${chartNumber(x(date.year))},${chartNumber(y(date.mean))}`).join(" ");
  const marks = dates.map((date) => {
    const at = x(date.year);
    return [
      chartElement("line", { class: "moon-share", x1: at, x2: at, y1: y(date.barycentre), y2: y(date.earth) }),
      chartElement("circle", { class: "barycentre", cx: at, cy: y(date.barycentre), r: radius }),
      chartElement("circle", { class: "earth", cx: at, cy: y(date.earth), r: radius }),
    ].join("");
  });
  return chartElement("g", {}, chartElement("polyline", { class: "mean", points: mean }), ...marks);
}

const PART_CLASSES = ["calendar", "planets", "moon"] as const;

function drawBars(
  { x, y }: ChartPanel,
  accounts: readonly Account[],
  stacks: readonly ReturnType<typeof stackedParts>[],
  years: readonly number[],
): string {
  const width = (x(1) - x(0)) * 0.68;
  const bars = accounts.map(({ parts, sum }, i) => {
    const year = years[i] ?? 0;
    const at = x(year);
    const told = PART_CLASSES.map((name, k) => `${name} ${signed(parts[k] ?? 0, 1)}`).join(", ");
    const stack = (stacks[i] ?? []).map(({ from, to }, k) =>
      chartElement("rect", {
        class: PART_CLASSES[k] ?? "",
        x: at - width / 2,
        y: Math.min(y(from), y(to)),
        width,
        height: Math.abs(y(to) - y(from)),
      }),
    );
    return chartElement(
      "g",
      {},
      chartElement("title", {}, escaped(`${year}: ${signed(sum, 1)} h = ${told}`)),
      ...stack,
      diamond(at, y(sum), Math.min(6, width / 2)),
    );
  });
  return chartElement("g", {}, ...bars);
}

function diamond(x: number, y: number, size: number): string {
  const corners = [
    [x, y - size],
    [x + size, y],
    [x, y + size],
    [x - size, y],
  ] as const;
  return chartElement("polygon", {
    class: "sum",
    points: corners.map(([cx, cy]) => `${chartNumber(cx)},${chartNumber(cy)}`).join(" "),
  });
}

/** Where the second column of a key begins. */
const SECOND = 380;

function keyEntry(mark: (x: number, y: number) => string, words: string, x: number, y: number): string {
  return mark(x + 12, y) + chartText(words, x + 32, y, { "dominant-baseline": "central" });
}

function datesKey(y: number): string {
  const line = (name: string) => (x: number, at: number) =>
    chartElement("line", { class: name, x1: x - 12, x2: x + 12, y1: at, y2: at });
  return [
    keyEntry((x, at) => chartElement("circle", { class: "earth", cx: x, cy: at, r: 6 }), "Earth's centre", LEFT, y),
    keyEntry(
      (x, at) => chartElement("circle", { class: "barycentre", cx: x, cy: at, r: 6 }),
      "Earth–Moon barycentre",
      SECOND,
      y,
    ),
    keyEntry(line("mean"), "straight line", LEFT, y + LINE),
    keyEntry(
      (x, at) => chartElement("line", { class: "moon-share", x1: x, x2: x, y1: at - 10, y2: at + 10 }),
      "the Moon's doing",
      SECOND,
      y + LINE,
    ),
  ].join("");
}

function barsKey(y: number): string {
  const box = (name: string) => (x: number, at: number) =>
    chartElement("rect", { class: name, x: x - 10, y: at - 8, width: 20, height: 16 });
  return [
    keyEntry(box("calendar"), "calendar", LEFT, y),
    keyEntry(box("planets"), "planets", SECOND, y),
    keyEntry(box("moon"), "Moon", LEFT, y + LINE),
    keyEntry((x, at) => diamond(x, at, 6), "all three together", SECOND, y + LINE),
  ].join("");
}
