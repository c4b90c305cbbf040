import { scaleLinear } from "d3-scale";
import { chartAxes } from "../report/chart-axes.ts";
import { chartDocument } from "../report/chart-document.ts";
import { chartElement, chartText } from "../report/chart-element.ts";
import type { AuditRow } from "./audit-row.ts";
import { signedDuration } from "./judge-list.ts";

const WIDTH = 960;
const HEIGHT = 440;
const PANEL = { left: 110, right: 940, top: 60, bottom: 380 };

/** Steps of time that ticks may stand at, seconds. */
const STEPS = [0, 1, 10, 60, 600, 3600, 6 * 3600, 86_400, 10 * 86_400, 100 * 86_400];

/**
 * Draws what each row is off by, published minus computed, over the rows of the list; sizes are squeezed so that seconds and days are both seen.
 *
 * @param rows those with a difference
 */
export function residualChart(rows: readonly AuditRow[]): string {
  const first = rows[0]?.line ?? 1;
  const last = Math.max(first + 1, rows.at(-1)?.line ?? 2);
  const most = Math.max(60, ...rows.map(({ differenceSeconds }) => Math.abs(differenceSeconds ?? 0)));
  const top = squeezed(most) * 1.05;
  const x = scaleLinear()
    .domain([first, last])
    .range([PANEL.left + 12, PANEL.right - 12]);
  const y = scaleLinear().domain([-top, top]).range([PANEL.bottom, PANEL.top]);
  const panel = { ...PANEL, x, y };
  const sizes = STEPS.filter((seconds) => seconds === 0 || (squeezed(seconds) <= top && seconds * 2000 > most));
  const yTicks = sizes.flatMap((seconds) =>
    seconds === 0
      ? [{ value: 0, label: "0" }]
      : [
          { value: squeezed(seconds), label: `+${shortDuration(seconds)}` },
          { value: -squeezed(seconds), label: `−${shortDuration(seconds)}` },
        ],
  );
  const xTicks = x
    .ticks(8)
    .filter(Number.isInteger)
    .map((value) => ({ value, label: String(value) }));
  const points = rows.map((row) => {
    const seconds = row.differenceSeconds ?? 0;
    const at = { cx: x(row.line), cy: y(Math.sign(seconds) * squeezed(Math.abs(seconds))), r: 4 };
    const kind = row.timeVerdict === "agrees" || row.timeVerdict === "undecided" ? "right" : "wrong";
    return chartElement(
      "circle",
      { class: kind, ...at },
      chartElement("title", {}, `line ${row.line}: ${signedDuration(seconds)}`),
    );
  });
  return chartDocument({
    name: "residuals",
    title: "Published minus computed",
    description:
      "Each row of the list by its line; above nought it is late, below early. The scale of time is squeezed: its steps grow with size.",
    width: WIDTH,
    height: HEIGHT,
    style: [".right { fill: #1b6ca8; fill-opacity: 0.7 }", ".wrong { fill: #fff; stroke: #a3262a; stroke-width: 2.5 }"],
    definitions: "",
    content: [
      chartText("Published minus computed", PANEL.left, 30, { class: "title" }),
      chartAxes(panel, xTicks, yTicks),
      chartText("line of the list", (PANEL.left + PANEL.right) / 2, 425, { "text-anchor": "middle" }),
      chartElement("g", {}, ...points),
    ].join("\n"),
  });
}

/** Grows like the size at first and like its logarithm later: asinh of minutes. */
function squeezed(seconds: number): number {
  return Math.asinh(seconds / 20);
}

function shortDuration(seconds: number): string {
  if (seconds < 60) return `${seconds} s`;
  if (seconds < 3600) return `${seconds / 60} min`;
  return seconds < 86_400 ? `${seconds / 3600} h` : `${seconds / 86_400} d`;
}
