import type { ScaleLinear } from "d3-scale";
import { chartElement, chartText } from "./chart-element.ts";

/** A tick and what stands beside it. */
export interface ChartTick {
  readonly value: number;
  readonly label: string;
}

/** The frame of a panel: its edges in the chart's own units, and how values become places. */
export interface ChartPanel {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly x: ScaleLinear<number, number>;
  readonly y: ScaleLinear<number, number>;
}

/** How far the labels stand from the axes. */
const GAP = 8;

/**
 * Draws the axes of a panel: a line across for each tick of the vertical axis with its label on the left, and the labels of the
 * horizontal axis below.
 */
export function chartAxes(panel: ChartPanel, xTicks: readonly ChartTick[], yTicks: readonly ChartTick[]): string {
  const { left, right, top, bottom, x, y } = panel;
  const across = yTicks.map(({ value, label }) => {
    const at = y(value);
    return (
      chartElement("line", { class: value === 0 ? "zero" : "grid", x1: left, x2: right, y1: at, y2: at }) +
      chartText(label, left - GAP, at, { class: "tick", "text-anchor": "end", "dominant-baseline": "central" })
    );
  });
  const along = xTicks.map(({ value, label }) => {
    const at = x(value);
    return (
      chartElement("line", { class: "edge", x1: at, x2: at, y1: bottom, y2: bottom + 5 }) +
      chartText(label, at, bottom + GAP, { class: "tick", "text-anchor": "middle", "dominant-baseline": "hanging" })
    );
  });
  const edges =
    chartElement("line", { class: "edge", x1: left, x2: right, y1: bottom, y2: bottom }) +
    chartElement("line", { class: "edge", x1: left, x2: left, y1: top, y2: bottom });
  return chartElement("g", {}, ...across, edges, ...along);
}
