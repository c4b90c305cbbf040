import { expect, test } from "vitest";
import { stackedParts } from "../../src/report/chart-stack.ts";

test("parts above nought are stacked upwards, those below it downwards, each from nought on", () => {
  expect(stackedParts([6, -2, 37, -3])).toEqual([
    { from: 0, to: 6 },
    { from: 0, to: -2 },
    { from: 6, to: 43 },
    { from: -2, to: -5 },
  ]);
});

test("the ends of the stack leave the sum between them", () => {
  const ends = stackedParts([-17.8, -1.6, 58.8]).map(({ to }) => to);
  expect(Math.max(...ends) + Math.min(...ends)).toBeCloseTo(-17.8 - 1.6 + 58.8, 12);
});
