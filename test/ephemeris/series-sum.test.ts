import { describe, expect, test } from "vitest";
import type { PoissonSeries } from "../../src/ephemeris/series-file.ts";
import { seriesSum } from "../../src/ephemeris/series-sum.ts";
import { thinnedSeries } from "../../src/ephemeris/series-thinned.ts";

/** Bases 0, a = 3T + 0.2T², b = 5T; sums a + b, a + b − b, and 2a. */
const small: PoissonSeries = {
  name: "small",
  degree: 2,
  rates: Float64Array.from([0, 0, 3, 0.2, 5, 0]),
  bases: 3,
  first: Uint16Array.from([1, 3, 1]),
  second: Uint16Array.from([2, 2, 1]),
  signs: Float64Array.from([1, -1, 1]),
  blocks: [
    { variable: 0, power: 0, places: Uint16Array.from([0, 3]), coefficients: Float64Array.from([7, 0, 1, 2]) },
    { variable: 0, power: 2, places: Uint16Array.from([4]), coefficients: Float64Array.from([0.5, -0.25]) },
    { variable: 1, power: 1, places: Uint16Array.from([5, 2]), coefficients: Float64Array.from([2, 0, 0.001, 0]) },
    { variable: 2, power: 3, places: Uint16Array.from([0]), coefficients: Float64Array.from([4, 0]) },
  ],
};

/** The same, written out. */
function written(t: number): number[] {
  const a = 3 * t + 0.2 * t * t;
  const b = 5 * t;
  return [
    7 + Math.cos(a + b) + 2 * Math.sin(a + b) + t * t * (0.5 * Math.cos(a) - 0.25 * Math.sin(a)),
    t * (2 * Math.cos(2 * a) + 0.001 * Math.cos(b)),
    4 * t ** 3,
  ];
}

describe("seriesSum", () => {
  const sum = seriesSum(small);
  const out = new Float64Array(6);

  test.each([-10, -0.37, 0, 0.001, 1, 9.5])("gives the sums that the series stands for at T = %f", (t) => {
    sum(t, out);
    // a few roundings of arguments up to 50 rad
    for (const [i, value] of written(t).entries()) expect(out[i]).toBeCloseTo(value, Math.abs(t) > 1 ? 10 : 13);
  });

  test.each([-2, -0.37, 0, 0.8])("gives the sums' own rates at T = %f", (t) => {
    sum(t, out);
    const h = 1e-4;
    const [a, b, c, d] = [written(t - 2 * h), written(t - h), written(t + h), written(t + 2 * h)];
    for (let i = 0; i < 3; i++) {
      // five-point difference: its error is about h⁴ times the fifth derivative
      const rate =
        ((a?.[i] as number) - 8 * (b?.[i] as number) + 8 * (c?.[i] as number) - (d?.[i] as number)) / (12 * h);
      expect(out[3 + i]).toBeCloseTo(rate, 8);
    }
  });

  test("does not remember the call before", () => {
    sum(0.3, out);
    const once = [...out];
    sum(-7, out);
    sum(0.3, out);
    expect([...out]).toEqual(once);
  });
});

describe("thinnedSeries", () => {
  test("drops the terms below their limit, and with them the points that nothing needs", () => {
    const thinned = thinnedSeries(small, [3, 0.1, 0], 1);
    const out = new Float64Array(6);
    seriesSum(thinned)(0.7, out);
    const a = 3 * 0.7 + 0.2 * 0.49;
    expect(out[0]).toBeCloseTo(7, 13);
    expect(out[1]).toBeCloseTo(0.7 * 2 * Math.cos(2 * a), 13);
    expect(out[2]).toBeCloseTo(4 * 0.343, 13);
    expect([thinned.bases, thinned.first.length]).toEqual([2, 1]);
  });

  test("counts a term with its power of the greatest T", () => {
    const kept = (reach: number) =>
      thinnedSeries(small, [0, 0.5, 0], reach).blocks.find((b) => b.variable === 1)?.places.length;
    expect(kept(1)).toBe(1);
    expect(kept(1000)).toBe(2);
  });

  test("leaves a series as it is where nothing lies below the limits", () => {
    const out = new Float64Array(6);
    const other = new Float64Array(6);
    seriesSum(small)(1.3, out);
    seriesSum(thinnedSeries(small, [0, 0, 0], 1))(1.3, other);
    expect(other).toEqual(out);
  });
});
