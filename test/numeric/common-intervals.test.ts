import { expect, test } from "vitest";
import { commonIntervals } from "../../src/numeric/common-intervals.ts";

test("commonIntervals gives what lies in one interval of each list", () => {
  const a = [
    { from: 0, to: 10 },
    { from: 20, to: 30 },
  ];
  const b = [
    { from: 5, to: 25 },
    { from: 28, to: 40 },
  ];
  expect(commonIntervals(a, b)).toEqual([
    { from: 5, to: 10 },
    { from: 20, to: 25 },
    { from: 28, to: 30 },
  ]);
});
