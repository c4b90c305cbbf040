import { expect, test } from "vitest";
import { printedHalfWidth } from "../../src/report/half-width.ts";

// Common practice, after JCGM 100:2008, 7.2.6: one or two significant digits, the value to the same place.
test.each([
  [0.3, 0.3, 1],
  [0.27, 0.3, 1],
  [0.02, 0.02, 2],
  [0.0121, 0.013, 3],
  [0.95, 1.0, 1],
  [1.5, 1.5, 1],
  [3000, 3000, -3],
  [150, 150, -1],
  [470, 500, -2],
])("printedHalfWidth of %d is %d, with the value to %d decimals", (given, value, digits) => {
  expect(printedHalfWidth(given)).toEqual({ value, digits });
});

test("printedHalfWidth never gives less than the half-width and never more than half as much again", () => {
  for (let u = 0.003; u < 1e6; u *= 1.0137) {
    const { value } = printedHalfWidth(u);
    expect(value).toBeGreaterThanOrEqual(u * (1 - 1e-8));
    expect(value).toBeLessThanOrEqual(1.5 * u);
  }
});

test("printedHalfWidth stops at the finest place", () => {
  expect(printedHalfWidth(0.00001)).toEqual({ value: 0.001, digits: 3 });
  expect(printedHalfWidth(0)).toEqual({ value: 0, digits: 3 });
});
