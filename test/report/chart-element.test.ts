import { expect, test } from "vitest";
import { chartElement, chartNumber, chartText } from "../../src/report/chart-element.ts";

test("an element has its attributes in order, and closes itself where it is empty", () => {
  expect(chartElement("line", { class: "grid", x1: 1, x2: 2.345678 })).toBe('<line class="grid" x1="1" x2="2.35"/>');
  expect(chartElement("g", {}, "<a/>", "<b/>")).toBe("<g><a/><b/></g>");
});

test("what markup would take for its own is escaped in text and in attributes", () => {
  expect(chartText('a < b & "c"', 0, 0)).toBe('<text x="0" y="0">a &lt; b &amp; &quot;c&quot;</text>');
  expect(chartElement("g", { id: '"><script>' })).toBe('<g id="&quot;&gt;&lt;script&gt;"/>');
});

test("coordinates are written to a hundredth", () => {
  expect([1, 0.1 + 0.2, -12.3456, 1e-9].map(chartNumber)).toEqual(["1", "0.3", "-12.35", "0"]);
});
