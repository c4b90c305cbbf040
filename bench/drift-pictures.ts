/**
 * Draws the pictures of `docs/drift.md`.
 *
 *     npx tsx bench/drift-pictures.ts [folder]
 *
 * Made from the built-in kernel, passages of 1960–2059.
 */
import { writeFileSync } from "node:fs";
import { scaleLinear } from "d3-scale";
import { compareCentres } from "../src/drift/compare-centres.ts";
import { driftAccount } from "../src/drift/drift-account.ts";
import { driftChart } from "../src/drift/drift-chart.ts";
import type { DriftRow } from "../src/drift/drift-row.ts";
import { openSources } from "../src/node.ts";
import { passages } from "../src/passages/passages.ts";
import { type ChartPanel, type ChartTick, chartAxes } from "../src/report/chart-axes.ts";
import { chartDocument } from "../src/report/chart-document.ts";
import { chartElement, chartNumber, chartText } from "../src/report/chart-element.ts";
import { utcOf } from "../src/time/utc-of.ts";

const WIDTH = 720;
const LEFT = 84;
const RIGHT = 690;
const LINE = 32;
const STYLE = [
  ".perihelion { fill: #12406b; stroke: #fff; stroke-width: 0.8 }",
  ".aphelion { fill: #fff; stroke: #12406b; stroke-width: 1.6 }",
  ".diagonal { fill: none; stroke: #222; stroke-width: 1.2; stroke-dasharray: 6 4 }",
  ".from-sun { fill: none; stroke: #111; stroke-width: 2 }",
  ".from-ssb { fill: none; stroke: #5b86ad; stroke-width: 2; stroke-dasharray: 2 4 }",
];

type Point = readonly [x: number, y: number];

function panel(top: number, height: number, x: readonly [number, number], y: readonly [number, number]): ChartPanel {
  const bottom = top + height;
  return {
    left: LEFT,
    right: RIGHT,
    top,
    bottom,
    x: scaleLinear([...x], [LEFT + 8, RIGHT - 8]),
    y: scaleLinear([...y], [bottom - 8, top + 8]),
  };
}

function ticks(values: readonly number[], told: (value: number) => string = signed): ChartTick[] {
  return values.map((value) => ({ value, label: told(value) }));
}

function signed(value: number): string {
  return value === 0 ? "0" : `${value > 0 ? "+" : "−"}${Math.abs(value)}`;
}

function dots({ x, y }: ChartPanel, name: string, points: readonly Point[]): string {
  return points.map(([a, b]) => chartElement("circle", { class: name, cx: x(a), cy: y(b), r: 4 })).join("");
}

function path({ x, y }: ChartPanel, name: string, points: readonly Point[]): string {
  const places = points.map(([a, b]) => `${chartNumber(x(a))},${chartNumber(y(b))}`).join(" ");
  return chartElement("polyline", { class: name, points: places });
}

function key(y: number): string {
  return [
    chartElement("circle", { class: "perihelion", cx: LEFT + 12, cy: y, r: 6 }),
    chartText("perihelia", LEFT + 32, y, { "dominant-baseline": "central" }),
    chartElement("circle", { class: "aphelion", cx: 392, cy: y, r: 6 }),
    chartText("aphelia", 412, y, { "dominant-baseline": "central" }),
  ].join("");
}

function below({ right, bottom }: ChartPanel, words: string): string {
  return chartText(words, right, bottom + 1.8 * LINE, { "text-anchor": "end" });
}

/** How far the Moon shifts the date, by its elongation, and in first order against exactly. */
function firstOrderPicture(rows: readonly DriftRow[]): string {
  const of = (kind: DriftRow["kind"], x: (row: DriftRow) => number): Point[] =>
    rows.filter((row) => row.kind === kind).map((row) => [x(row), row.bodyMinusBarycentreHours ?? 0]);
  const elongation = (row: DriftRow) => row.moonElongationDeg ?? 0;
  const firstOrder = (row: DriftRow) => row.firstOrderHours ?? 0;
  const hours = [-36, -24, -12, 0, 12, 24, 36];
  const upper = panel(36 + 3.2 * LINE, 240, [0, 360], [-36, 36]);
  const captionAt = upper.bottom + 3.4 * LINE;
  const lower = panel(captionAt + LINE, 300, [-38, 38], [-36, 36]);
  const content = [
    chartText("What the Moon does to the date", LEFT, 36, { class: "title" }),
    key(36 + 1.2 * LINE),
    chartText("Hours later (+) or earlier (−) than the barycentre", LEFT, 36 + 2.4 * LINE),
    chartAxes(upper, ticks([0, 90, 180, 270, 360], String), ticks(hours)),
    dots(upper, "perihelion", of("periapsis", elongation)),
    dots(upper, "aphelion", of("apoapsis", elongation)),
    below(upper, "elongation of the Moon, degrees"),
    chartText("The same against the first order", LEFT, captionAt),
    chartAxes(lower, ticks(hours), ticks(hours)),
    path(lower, "diagonal", [
      [-36, -36],
      [36, 36],
    ]),
    dots(lower, "perihelion", of("periapsis", firstOrder)),
    dots(lower, "aphelion", of("apoapsis", firstOrder)),
    below(lower, "first order, hours"),
  ];
  return chartDocument({
    name: "first-order",
    title: "What the Moon does to the date of perihelion and aphelion, 1960 to 2059",
    description:
      "Above: hours by which the Earth's centre passes later than the barycentre, against the Moon's elongation in degrees. Perihelia are latest near " +
      "first quarter and earliest near last quarter, aphelia the other way. Below: the same hours against their first order, along the diagonal.",
    width: WIDTH,
    height: lower.bottom + 2.5 * LINE,
    style: STYLE,
    definitions: "",
    content: content.join("\n"),
  });
}

/** How far the date of perihelion wanders about the Sun's centre and about the barycentre of the solar system. */
function centresPicture(sun: readonly Point[], ssb: readonly Point[]): string {
  const years = panel(36 + 3.2 * LINE, 300, [1960, 2060], [-36, 36]);
  const entry = (name: string, words: string, x: number) => [
    chartElement("line", { class: name, x1: x, x2: x + 26, y1: 36 + 1.2 * LINE, y2: 36 + 1.2 * LINE }),
    chartText(words, x + 34, 36 + 1.2 * LINE, { "dominant-baseline": "central" }),
  ];
  const content = [
    chartText("The Earth's perihelion, by centre", LEFT, 36, { class: "title" }),
    ...entry("from-sun", "the Sun's centre", LEFT),
    ...entry("from-ssb", "solar-system barycentre", 360),
    chartText("Days later (+) or earlier (−) than the straight line", LEFT, 36 + 2.4 * LINE),
    chartAxes(years, ticks([1960, 1980, 2000, 2020, 2040], String), ticks([-30, -20, -10, 0, 10, 20, 30])),
    path(years, "from-ssb", ssb),
    path(years, "from-sun", sun),
    below(years, "year"),
  ];
  return chartDocument({
    name: "centres",
    title:
      "Perihelion of the Earth's centre about the Sun's centre and about the barycentre of the solar system, 1960 to 2059",
    description:
      "Days by which the perihelion is later than the straight line through the passages of the Earth–Moon barycentre about the Sun. About the Sun's " +
      "centre it stays within a day and a half, about the barycentre of the solar system it wanders from 33 days early to 35 days late.",
    width: WIDTH,
    height: years.bottom + 2.5 * LINE,
    style: STYLE,
    definitions: "",
    content: content.join("\n"),
  });
}

const folder = process.argv[2] ?? "docs";
const ephemeris = await openSources();
const rows = driftAccount(ephemeris, { from: "1960", to: "2060" });
writeFileSync(`${folder}/drift-first-order.svg`, firstOrderPicture(rows));
writeFileSync(
  `${folder}/drift-perihelia.svg`,
  driftChart(driftAccount(ephemeris, { from: "2016", to: "2030", kind: "periapsis" }), ephemeris),
);
const sun: Point[] = [];
const ssb: Point[] = [];
for (const passage of passages(ephemeris, "earth-sun", { from: "1960", to: "2060", kind: "periapsis" })) {
  const row = rows.find(
    ({ kind, tdbSeconds }) => kind === "periapsis" && Math.abs(tdbSeconds - passage.tdbSeconds) < 1,
  );
  const { day } = utcOf(passage.tdbSeconds, ephemeris.leapSeconds);
  const year = 2000 + (day - 51_544) / 365.25;
  const off = (row?.bodyMinusMeanHours ?? 0) / 24;
  const later = compareCentres(ephemeris, passage)[2]?.laterHours ?? 0;
  sun.push([year, off]);
  ssb.push([year, off + later / 24]);
}
writeFileSync(`${folder}/drift-centres.svg`, centresPicture(sun, ssb));
