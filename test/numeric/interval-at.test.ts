import { expect, test } from "vitest";
import { intervalAt } from "../../src/numeric/interval-at.ts";

test("intervalAt gives the interval that holds a number, and the first or last one for numbers outside", () => {
  const values = Float64Array.of(1, 2, 4, 8);
  expect([0, 1, 1.9, 2, 3, 4, 7.9, 8, 9].map((x) => intervalAt(values, x))).toEqual([0, 0, 0, 1, 1, 2, 2, 2, 2]);
});
