import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { brentMinimum } from "../../src/numeric/brent-minimum.ts";

function find(f: (x: number) => number, a: number, b: number, tolerance: number) {
  let evaluations = 0;
  let outside = false;
  const x = brentMinimum(
    (t) => {
      evaluations++;
      if (!(t > a && t < b)) outside = true;
      return f(t);
    },
    a,
    b,
    tolerance,
  );
  return { x, evaluations, outside };
}

/** The function of the book's ch. 5: Σ ((2i − 5)/(x − i²))², i = 1 … 20. */
function poles(x: number): number {
  let sum = 0;
  for (let i = 1; i <= 20; i++) sum += ((2 * i - 5) / (x - i * i)) ** 2;
  return sum;
}

/** Its minima between neighbouring poles i² and (i + 1)², and their values, as R. P. Brent (1973, ch. 5) prints them (from memory). */
const MINIMA: readonly (readonly [number, number])[] = [
  [3.0229153, 3.6766990169],
  [6.6837536, 1.11185001],
  [11.2387017, 1.2182217637],
  [19.6760001, 2.1621103109],
  [29.8282273, 3.0322905193],
  [41.9061162, 3.7583856477],
  [55.9535958, 4.3554103836],
  [71.9856656, 4.8482959563],
  [90.0088685, 5.25875854],
  [110.0265327, 5.6036524295],
  [132.0405517, 5.8956037976],
  [156.0521144, 6.1438861542],
  [182.0620604, 6.3550764593],
  [210.071101, 6.5333662003],
  [240.0800483, 6.6803639849],
  [272.0902669, 6.7938538365],
  [306.1051233, 6.8634981053],
  [342.1369454, 6.8539024631],
  [380.2687097, 6.6008470481],
];

/** Upper bounds of what was counted when this was written; a rise is a loss of speed. */
const EVALUATIONS = { polesWorst: 25, polesTotal: 320, power: 17, kink: 18, edge: 30 };

describe("brentMinimum on the function of Brent's book (1973, ch. 5)", () => {
  test("gives the nineteen minima between poles, in no more evaluations than recorded", () => {
    let total = 0;
    MINIMA.forEach(([at, value], index) => {
      const i = index + 1;
      const { x, evaluations, outside } = find(poles, i * i + 1e-9, (i + 1) ** 2 - 1e-9, 1e-8);
      expect(outside).toBe(false);
      // flatness: √(2 ε f / f″) is up to 6·10⁻⁷ here
      expect(Math.abs(x - at)).toBeLessThan(1e-6);
      expect(poles(x)).toBeCloseTo(value, 9); // the book prints ten decimals
      expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.polesWorst);
      total += evaluations;
    });
    expect(total).toBeLessThanOrEqual(EVALUATIONS.polesTotal);
  });
});

describe("brentMinimum on extrema that are flat, sharp or at an end", () => {
  test.each([2, 4, 8])("finds the minimum of x^%i in a bounded number of evaluations", (n) => {
    const { x, evaluations } = find((t) => t ** n, -1, 1.3, 1e-6);
    expect(Math.abs(x)).toBeLessThanOrEqual(1e-6);
    expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.power);
  });

  test("finds a kink, where no parabola fits", () => {
    const { x, evaluations } = find((t) => Math.abs(t - 0.3), 0, 1, 1e-6);
    expect(Math.abs(x - 0.3)).toBeLessThanOrEqual(1e-6);
    expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.kink);
  });

  test("gives some point of the flat part where the minimum is a plateau", () => {
    const { x } = find((t) => Math.max(0, Math.abs(t - 0.3) - 0.1), 0, 1, 1e-6);
    expect(Math.abs(x - 0.3)).toBeLessThanOrEqual(0.1 + 1e-6);
    const constant = find(() => 7, 0, 1, 1e-6);
    expect(constant.x).toBeGreaterThan(0);
    expect(constant.x).toBeLessThan(1);
  });

  test("approaches a minimum at either end to within the tolerance, and never evaluates the end", () => {
    for (const [slope, end] of [
      [1, 0],
      [-1, 1],
    ] as const) {
      const { x, outside, evaluations } = find((t) => slope * t, 0, 1, 1e-6);
      expect(outside).toBe(false);
      expect(Math.abs(x - end)).toBeLessThanOrEqual(2e-6);
      expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.edge);
    }
  });

  test("passes over a triple point, where slope and curvature vanish but the function goes on falling", () => {
    expect(find((t) => (t - 0.4) ** 3, 0, 1, 1e-6).x).toBeLessThanOrEqual(2e-6);
  });

  test("finds one of two minima where two are hidden", () => {
    const { x } = find((t) => ((t - 0.25) * (t - 0.75)) ** 2, 0, 1, 1e-6);
    expect(Math.min(Math.abs(x - 0.25), Math.abs(x - 0.75))).toBeLessThanOrEqual(1e-6);
  });

  test("survives infinite values", () => {
    const { x } = find((t) => (t < 0.5 ? Infinity : (t - 0.6) ** 2), 0, 1, 1e-6);
    expect(Math.abs(x - 0.6)).toBeLessThanOrEqual(1e-6);
  });

  test("gives NaN, soon, where the function gives NaN", () => {
    const { x, evaluations } = find(() => Number.NaN, 0, 1, 1e-6);
    expect(x).toBeNaN();
    expect(evaluations).toBe(1);
    expect(find((t) => (t > 0.5 ? Number.NaN : t), 0, 1, 1e-6).x).toBeNaN();
  });
});

describe("brentMinimum", () => {
  test("keeps an absolute tolerance at abscissae as large as 25 years of seconds", () => {
    // The square itself tells places apart to the spacing of numbers there, 1.2·10⁻⁷; no relative part may widen it.
    for (const at of [8e8, -8e8]) {
      expect(Math.abs(find((t) => (t - at) ** 2, at - 3e5, at + 5e5, 1e-3).x - at)).toBeLessThanOrEqual(1e-3);
    }
  });

  test("cannot tell the place better than the flatness of the function allows: seconds for a distance like the Earth's", () => {
    // r = 1.471·10⁸ km, r̈ = 740 km/d²: √(2 ε r / r̈) = 0.8 s, about J2000 + 25 years.
    const acceleration = 740 / 86400 ** 2;
    const { x } = find((t) => 1.471e8 + 0.5 * acceleration * (t - 8e8) ** 2, 8e8 - 1e6, 8e8 + 1.3e6, 0.05);
    expect(Math.abs(x - 8e8)).toBeLessThan(4 * 0.8);
  });

  test("lies within the tolerance of the minimum of any function that falls to it and rises from it", () => {
    const side = fc.double({ min: 1e-3, max: 1, noNaN: true });
    fc.assert(
      fc.property(
        fc.double({ min: -1e9, max: 1e9, noNaN: true }),
        side,
        side,
        fc.double({ min: 1e-3, max: 1, noNaN: true }),
        fc.constantFrom(1, 2, 3),
        fc.double({ min: 1e-3, max: 1e3, noNaN: true }),
        (at, below, above, tolerance, power, skew) => {
          const f = (t: number) => (t < at ? 1 : skew) * Math.abs(t - at) ** power;
          const { x, outside, evaluations } = find(f, at - below * 1e5, at + above * 1e5, tolerance);
          expect(outside).toBe(false);
          expect(Math.abs(x - at)).toBeLessThanOrEqual(tolerance + 8 * 2 ** -52 * Math.abs(at));
          expect(evaluations).toBeLessThanOrEqual(200);
        },
      ),
    );
  });
});
