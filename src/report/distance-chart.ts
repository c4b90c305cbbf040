import { scaleLinear } from "d3-scale";
import { type ChartTick, chartAxes } from "./chart-axes.ts";
import { chartElement, chartNumber, chartText, escaped } from "./chart-element.ts";

/** A distance over time, with marks where it is extreme. */
export interface DistanceChart {
  /** Unique on the page. */
  readonly id: string;
  readonly title: string;
  /** For those who do not see it. */
  readonly description: string;
  /** What the vertical axis counts, such as `thousand km`. */
  readonly unit: string;
  /** Instants and distances in the unit of the axis, in order of time. */
  readonly curve: readonly (readonly [at: number, distance: number])[];
  readonly marks: readonly DistanceMark[];
  readonly xTicks: readonly ChartTick[];
}

/** A mark on the curve: filled at the least distance, open at the greatest. */
export interface DistanceMark {
  readonly at: number;
  readonly distance: number;
  readonly kind: "least" | "greatest";
}

const WIDTH = 760;
const HEIGHT = 250;
const FRAME = { left: 92, right: 746, top: 34, bottom: 214 };

/** Rules for all such charts on a page, in the page's own colours. */
export const DISTANCE_CHART_STYLE = `
figure { margin: 0.5rem 0 }
figcaption { color: var(--soft); font-size: 0.875rem }
svg.distance { display: block; width: 100%; max-width: 60rem; height: auto }
svg.distance text { font: 15px system-ui, sans-serif; fill: var(--ink) }
svg.distance .grid, svg.distance .zero { stroke: var(--line); stroke-width: 1 }
svg.distance .edge { stroke: var(--soft); stroke-width: 1 }
svg.distance .curve { fill: none; stroke: var(--accent); stroke-width: 2 }
svg.distance .least { fill: var(--accent); stroke: var(--ground); stroke-width: 1.5 }
svg.distance .greatest { fill: var(--ground); stroke: var(--accent); stroke-width: 2.5 }
@media print { svg.distance { max-width: 150mm } }
@media screen and (max-width: 600px) { svg.distance text { font-size: 25px } }`;

/** Draws a distance over time as an SVG element for a page that has `DISTANCE_CHART_STYLE`. */
export function distanceChart({ id, title, description, unit, curve, marks, xTicks }: DistanceChart): string {
  const { left, right, top, bottom } = FRAME;
  const times = curve.map(([at]) => at);
  const distances = [...curve.map(([, distance]) => distance), ...marks.map(({ distance }) => distance)];
  const x = scaleLinear([Math.min(...times), Math.max(...times)], [left, right]);
  const y = scaleLinear([Math.min(...distances), Math.max(...distances)], [bottom - 8, top + 8]);
  const yTicks = y.ticks(4).map((value) => ({ value, label: y.tickFormat(4)(value).replaceAll(",", " ") }));
  const path = curve.map(
    ([at, distance], i) => `${i === 0 ? "M" : "L"}${chartNumber(x(at))} ${chartNumber(y(distance))}`,
  );
  return chartElement(
    "svg",
    { class: "distance", viewBox: `0 0 ${WIDTH} ${HEIGHT}`, role: "img", "aria-labelledby": `${id}-title ${id}-desc` },
    chartElement("title", { id: `${id}-title` }, escaped(title)),
    chartElement("desc", { id: `${id}-desc` }, escaped(description)),
    chartText(unit, 4, 20),
    chartAxes({ ...FRAME, x, y }, xTicks, yTicks),
    chartElement("path", { class: "curve", d: path.join("") }),
    ...marks.map((mark) => chartElement("circle", { class: mark.kind, cx: x(mark.at), cy: y(mark.distance), r: 5.5 })),
  );
}
