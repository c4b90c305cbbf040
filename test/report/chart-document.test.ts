import { expect, test } from "vitest";
import { chartDocument } from "../../src/report/chart-document.ts";

const chart = chartDocument({
  name: "trial",
  title: "Distances & dates",
  description: "Kilometres by day.",
  width: 720,
  height: 300,
  style: [".mark { fill: #123 }"],
  definitions: "",
  content: "<g/>",
});

test("a chart is an SVG file with title, description and a frame of its own", () => {
  expect(chart.startsWith('<?xml version="1.0" encoding="UTF-8"?>\n<svg xmlns="http://www.w3.org/2000/svg"')).toBe(
    true,
  );
  expect(chart).toContain('viewBox="0 0 720 300"');
  expect(chart).toContain('<title id="trial-title">Distances &amp; dates</title>');
  expect(chart).toContain('<desc id="trial-description">Kilometres by day.</desc>');
});

test("its style holds for nothing but itself, so that it may stand in a page", () => {
  const style = /<style>([\s\S]*)<\/style>/.exec(chart)?.[1] ?? "";
  const selectors = [...style.matchAll(/([^{}]+)\{/g)].map(([, selector = ""]) => selector.trim());
  for (const selector of selectors) expect(selector).toMatch(/^(\.trial |svg\.trial|@media)/);
});
