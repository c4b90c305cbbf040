import { chartElement, escaped } from "./chart-element.ts";

/** A chart as a whole. */
export interface ChartDocument {
  /** Names the chart among others on a page; its style holds for it alone. */
  readonly name: string;
  readonly title: string;
  /** What is shown, and in which units, for those who do not see it. */
  readonly description: string;
  readonly width: number;
  readonly height: number;
  /** CSS rules for what is in the chart, their selectors without the chart's name. */
  readonly style: readonly string[];
  /** Markup of patterns and the like. */
  readonly definitions: string;
  readonly content: string;
}

/** Below this width, CSS pixels, the text is set larger against the drawing, so that it stays legible on a telephone. */
const NARROW = 560;

/** Rules that all charts share; sizes are in the chart's own units. */
const SHARED_STYLE = [
  "text { font-family: system-ui, sans-serif; font-size: 15px; fill: #222 }",
  ".title { font-size: 20px; font-weight: 600 }",
  ".grid { stroke: #ddd; stroke-width: 1 }",
  ".edge { stroke: #444; stroke-width: 1 }",
  ".zero { stroke: #222; stroke-width: 1.5 }",
];
const NARROW_STYLE = ["text { font-size: 24px }", ".title { font-size: 27px }"];
const PRINT_STYLE = ["text { font-size: 20px }", ".title { font-size: 24px }"];

/**
 * Writes a chart as an SVG file: it scales to the width it is given (960 pixels at most), stands on white, holds title and description,
 * and has neither script nor anything from elsewhere.
 */
export function chartDocument(chart: ChartDocument): string {
  const { name, title, description, width, height } = chart;
  const rules = (list: readonly string[]) => list.map((rule) => `.${name} ${rule}`).join("\n");
  const style = [
    `svg.${name} { width: 100%; max-width: 960px; height: auto; display: block; margin: 0 auto; background: #fff }`,
    rules([...SHARED_STYLE, ...chart.style]),
    `@media screen and (max-width: ${NARROW}px) {\n${rules(NARROW_STYLE)}\n}`,
    `@media print {\nsvg.${name} { max-height: 100vh }\n${rules(PRINT_STYLE)}\n}`, // a tall chart stays on one page
  ].join("\n");
  const svg = chartElement(
    "svg",
    {
      xmlns: "http://www.w3.org/2000/svg",
      class: name,
      viewBox: `0 0 ${width} ${height}`,
      width,
      height,
      role: "img",
      "aria-labelledby": `${name}-title ${name}-description`,
    },
    "\n",
    chartElement("title", { id: `${name}-title` }, escaped(title)),
    "\n",
    chartElement("desc", { id: `${name}-description` }, escaped(description)),
    "\n",
    chartElement("style", {}, `\n${style}\n`),
    "\n",
    chartElement("defs", {}, chart.definitions),
    "\n",
    chartElement("rect", { width, height, fill: "#fff" }),
    "\n",
    chart.content,
    "\n",
  );
  return `<?xml version="1.0" encoding="UTF-8"?>\n${svg}\n`;
}
