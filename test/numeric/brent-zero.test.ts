import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { brentZero } from "../../src/numeric/brent-zero.ts";

/** Runs the finder and counts: evaluations include the two at the ends, as the book counts them. */
function find(f: (x: number) => number, a: number, b: number, tolerance: number) {
  let evaluations = 2;
  let outside = false;
  const x = brentZero(
    (t) => {
      evaluations++;
      if (t < Math.min(a, b) || t > Math.max(a, b)) outside = true;
      return f(t);
    },
    a,
    f(a),
    b,
    f(b),
    tolerance,
  );
  return { x, evaluations, outside };
}

/** Derivative of the function of ch. 5, eq. (4.1) of the book: −2 Σ (2i − 5)² / (x − i²)³, i = 1 … 20. */
function polesSlope(x: number): number {
  let sum = 0;
  for (let i = 1; i <= 20; i++) sum += (2 * i - 5) ** 2 / (x - i * i) ** 3;
  return -2 * sum;
}

/** Its zeros between neighbouring poles i² and (i + 1)², as R. P. Brent (1973) prints them (from memory; they check against the function). */
const ZEROS_BETWEEN_POLES = [
  3.0229153, 6.6837536, 11.2387017, 19.6760001, 29.8282273, 41.9061162, 55.9535958, 71.9856656, 90.0088685, 110.0265327,
  132.0405517, 156.0521144, 182.0620604, 210.071101, 240.0800483, 272.0902669, 306.1051233, 342.1369454, 380.2687097,
];

/** Upper bounds of what was counted when this was written; a rise is a loss of speed. */
const EVALUATIONS = { betweenPolesWorst: 15, betweenPolesTotal: 220, power: 86, flat: 18, sine: 9, exponential: 12 };

describe("brentZero on the problems of Brent's book (1973, ch. 4)", () => {
  test("gives the nineteen zeros between poles to the digits printed, in no more evaluations than recorded", () => {
    let total = 0;
    ZEROS_BETWEEN_POLES.forEach((zero, index) => {
      const i = index + 1;
      const { x, evaluations } = find(polesSlope, i * i + 1e-9, (i + 1) ** 2 - 1e-9, 1e-10);
      expect(x).toBeCloseTo(zero, 6); // the book prints seven decimals
      expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.betweenPolesWorst);
      total += evaluations;
    });
    expect(total).toBeLessThanOrEqual(EVALUATIONS.betweenPolesTotal);
  });

  test.each([3, 5, 7, 9, 19])(
    "finds the zero of x^%i, where all low derivatives vanish, within a bounded number of evaluations",
    (n) => {
      const { x, evaluations } = find((t) => t ** n, -1, 1.1, 1e-9);
      expect(Math.abs(x)).toBeLessThanOrEqual(2e-9);
      expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.power);
    },
  );

  test("finds the zero of x·exp(−1/x²), where every derivative vanishes", () => {
    const { x, evaluations } = find((t) => (t === 0 ? 0 : t * Math.exp(-1 / (t * t))), -1, 4, 1e-9);
    expect(Math.abs(x)).toBeLessThan(0.04); // below 0.036 the function underflows to zero, so any such point is a zero
    expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.flat);
  });
});

describe("brentZero on problems of G. E. Alefeld, F. A. Potra and Y. Shi (ACM TOMS 21 (1995) 327; from memory)", () => {
  test("solves sin x = x/2 between π/2 and π", () => {
    const { x, evaluations } = find((t) => Math.sin(t) - t / 2, Math.PI / 2, Math.PI, 1e-13);
    expect(x).toBeCloseTo(1.895494267033981, 13);
    expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.sine);
  });

  test.each([1, 2, 5, 15, 20])("solves 2x·exp(−n) + 1 = 2·exp(−nx), n = %i, between 0 and 1", (n) => {
    const f = (t: number) => 2 * t * Math.exp(-n) + 1 - 2 * Math.exp(-n * t);
    const { x, evaluations } = find(f, 0, 1, 1e-14);
    expect(Math.abs(f(x))).toBeLessThan(1e-12);
    expect(evaluations).toBeLessThanOrEqual(EVALUATIONS.exponential);
  });
});

describe("brentZero", () => {
  test("gives an end that is itself a zero without evaluating anything", () => {
    const never = () => {
      throw new Error("evaluated");
    };
    expect(brentZero(never, 3, 0, 5, 1, 1e-9)).toBe(3);
    expect(brentZero(never, 3, -1, 5, 0, 1e-9)).toBe(5);
  });

  test("takes the ends in either order", () => {
    const f = (t: number) => Math.cos(t) - t;
    // the fixed point of the cosine, 0.739085133215160641… (OEIS A003957)
    expect(find(f, 0, 1, 1e-14).x).toBeCloseTo(0.7390851332151607, 13);
    expect(find(f, 1, 0, 1e-14).x).toBeCloseTo(0.7390851332151607, 13);
  });

  test("gives NaN, and evaluates nothing, where the signs do not differ or an end is NaN", () => {
    let calls = 0;
    const f = () => ++calls;
    expect(brentZero(f, -1, 1, 1, 1, 1e-9)).toBeNaN(); // x² does not change sign at its double zero
    expect(brentZero(f, -1, -1, 1, -1, 1e-9)).toBeNaN();
    expect(brentZero(f, -1, Number.NaN, 1, 1, 1e-9)).toBeNaN();
    expect(brentZero(f, -1, -1, 1, Number.NaN, 1e-9)).toBeNaN();
    expect(calls).toBe(0);
  });

  test("gives NaN, soon, where the function gives NaN inside the bracket", () => {
    const { x, evaluations } = find((t) => (Math.abs(t) === 1 ? t : Number.NaN), -1, 1, 1e-9);
    expect(x).toBeNaN();
    expect(evaluations).toBe(3);
  });

  test("keeps an absolute tolerance at abscissae as large as 25 years of seconds", () => {
    for (const zero of [8e8, -8e8, 8e8 + 0.123456789]) {
      const { x } = find((t) => Math.sin((t - zero) / 4e5), zero - 3e5, zero + 5e5, 1e-6);
      // tolerance, plus the step from one number to the next at 8·10⁸ (1.2·10⁻⁷)
      expect(Math.abs(x - zero)).toBeLessThan(2.5e-6);
    }
  });

  test("follows the chord of the last bracket, so that a smooth zero is far nearer than the tolerance", () => {
    const zero = 123_456_789;
    const { x, evaluations } = find((t) => Math.sin((t - zero) / 4e5), zero - 3e5, zero + 2e5, 8);
    expect(Math.abs(x - zero)).toBeLessThan(1e-4);
    expect(evaluations).toBeLessThanOrEqual(8);
  });

  test("closes in on a jump through zero, and on a pole, as if it were a zero", () => {
    expect(Math.abs(find((t) => (t < 0.3 ? -1 : 1), 0, 1, 1e-9).x - 0.3)).toBeLessThanOrEqual(2e-9);
    expect(Math.abs(find((t) => 1 / (t - 0.3), 0, 1, 1e-9).x - 0.3)).toBeLessThanOrEqual(2e-9);
  });

  test("lies within twice the tolerance of the zero, inside the bracket, for any function that rises through it", () => {
    const unit = fc.double({ min: 1e-6, max: 1, noNaN: true });
    fc.assert(
      fc.property(
        fc.double({ min: -1e9, max: 1e9, noNaN: true }),
        unit,
        unit,
        fc.double({ min: 1e-6, max: 1e3, noNaN: true }),
        fc.constantFrom(1, 3, 9),
        fc.double({ min: 1e-9, max: 1e9, noNaN: true }),
        (zero, below, above, tolerance, power, skew) => {
          // steep on one side and shallow on the other
          const f = (t: number) => (t < zero ? 1 : skew) * ((t - zero) / 1e6) ** power;
          const { x, outside, evaluations } = find(f, zero - below * 1e6, zero + above * 1e6, tolerance);
          expect(outside).toBe(false);
          if (x !== zero) {
            const spacing = 2 ** -52 * Math.max(Math.abs(x), Math.abs(zero));
            expect(Math.abs(x - zero)).toBeLessThanOrEqual(2 * tolerance + 8 * spacing);
          }
          expect(evaluations).toBeLessThanOrEqual(200);
        },
      ),
    );
  });
});
