import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { addChebyshev } from "../../src/numeric/chebyshev.ts";

/** Σ cₖ Tₖ and its derivatives from Tₖ(cos θ) = cos kθ: T′ = k sin kθ / sin θ, T″ = (x T′ − k² T)/(1 − x²). */
function byDefinition(c: readonly number[], s: number): [number, number, number] {
  const theta = Math.acos(s);
  const sums: [number, number, number] = [0, 0, 0];
  c.forEach((ck, k) => {
    const t = Math.cos(k * theta);
    const d = (k * Math.sin(k * theta)) / Math.sin(theta);
    sums[0] += ck * t;
    sums[1] += ck * d;
    sums[2] += (ck * (s * d - k * k * t)) / (1 - s * s);
  });
  return sums;
}

/** Value and derivatives of one series, summed as each of a vector's components with other series beside it. */
function sums(c: ArrayLike<number>, s: number, order = 2): number[] {
  const n = c.length;
  const zeros = new Float64Array(n);
  const found = [0, 1, 2].map((axis) => {
    const words = new Float64Array(3 * n);
    for (let i = 0; i < 3; i++) words.set(i === axis ? Array.from(c) : zeros, i * n);
    const out = new Float64Array(9);
    addChebyshev(words, 0, n, s, 1, 1, order, out, 0);
    for (let i = 0; i < 9; i++) if (i % 3 !== axis) expect(out[i]).toBe(0);
    return [out[axis], out[axis + 3], out[axis + 6]] as number[];
  });
  expect(found[1]).toEqual(found[0]);
  expect(found[2]).toEqual(found[0]);
  return found[0] as number[];
}

const coefficients = fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 1, maxLength: 20 });

describe("addChebyshev", () => {
  test("gives the polynomials T₀ … T₅ and their derivatives (M. Abramowitz and I. Stegun, 22.3: explicit forms)", () => {
    const explicit: ((x: number) => [number, number, number])[] = [
      () => [1, 0, 0],
      (x) => [x, 1, 0],
      (x) => [2 * x ** 2 - 1, 4 * x, 4],
      (x) => [4 * x ** 3 - 3 * x, 12 * x ** 2 - 3, 24 * x],
      (x) => [8 * x ** 4 - 8 * x ** 2 + 1, 32 * x ** 3 - 16 * x, 96 * x ** 2 - 16],
      (x) => [16 * x ** 5 - 20 * x ** 3 + 5 * x, 80 * x ** 4 - 60 * x ** 2 + 5, 320 * x ** 3 - 120 * x],
    ];
    for (const [k, polynomial] of explicit.entries()) {
      const c = new Float64Array(k + 1);
      c[k] = 1;
      for (const x of [-1, -0.7, 0, 0.3, 1]) {
        const out = sums(c, x);
        polynomial(x).forEach((value, i) => {
          expect(out[i]).toBeCloseTo(value, 12);
        });
      }
    }
  });

  test("agrees with sums of cos(k·acos s) and their derivatives, for any series", () => {
    fc.assert(
      fc.property(coefficients, fc.double({ min: -0.99, max: 0.99, noNaN: true }), (c, s) => {
        const out = sums(c, s);
        // rounding: up to 20 terms of size k⁰, k², k⁴; the definition itself loses 1/(1 − s²) near the ends
        byDefinition(c, s).forEach((value, i) => {
          expect(Math.abs((out[i] as number) - value)).toBeLessThan([1e-13, 1e-10, 1e-7][i] as number);
        });
      }),
    );
  });

  test("gives exact end values: Tₖ(±1) = (±1)ᵏ, Tₖ′(±1) = (±1)ᵏ⁺¹ k², Tₖ″(±1) = (±1)ᵏ k²(k² − 1)/3", () => {
    for (let k = 0; k <= 14; k++) {
      const c = new Float64Array(k + 1);
      c[k] = 1;
      for (const end of [1, -1]) {
        const out = sums(c, end);
        const expected = [end ** k, end ** (k + 1) * k * k, (end ** k * k * k * (k * k - 1)) / 3];
        expect([...out].map((x, i) => x - (expected[i] as number))).toEqual([0, 0, 0]);
      }
    }
  });

  test("turns derivatives into per unit of time with `scale`, adds or takes away with `sign`, and keeps to its places", () => {
    const series = [0.5, -0.25, 0.125];
    const c = Float64Array.from([99, ...series, ...series, ...series, 99]);
    const out = new Float64Array(13).fill(1000);
    addChebyshev(c, 1, 3, 0.4, 10, 1, 2, out, 2);
    const [value, first, second] = byDefinition(series, 0.4);
    for (const axis of [0, 1, 2]) {
      expect(out[2 + axis]).toBeCloseTo(1000 + value, 10);
      expect(out[5 + axis]).toBeCloseTo(1000 + 10 * first, 10);
      expect(out[8 + axis]).toBeCloseTo(1000 + 100 * second, 10);
    }
    expect([0, 1, 11, 12].map((i) => out[i])).toEqual(Array(4).fill(1000));
    addChebyshev(c, 1, 3, 0.4, 10, -1, 2, out, 2);
    for (const x of out) expect(x).toBeCloseTo(1000, 10);
  });

  test("gives the same value and derivatives at each order, and nothing above the order asked for", () => {
    fc.assert(
      fc.property(coefficients, fc.double({ min: -1, max: 1, noNaN: true }), (c, s) => {
        const [zeroth, first, second] = [0, 1, 2].map((order) => sums(c, s, order));
        expect(zeroth).toEqual([second?.[0], 0, 0]);
        expect(first).toEqual([second?.[0], second?.[1], 0]);
      }),
    );
  });

  test("leaves the coefficients untouched and yields NaN for a NaN among them", () => {
    const c = Float64Array.from([1, Number.NaN, 3, 1, 2, 3, 1, 2, 3]);
    const out = new Float64Array(3);
    addChebyshev(c, 0, 3, 0.2, 1, 1, 0, out, 0);
    expect(out[0]).toBeNaN();
    expect(out[1]).not.toBeNaN();
    expect([...c.subarray(0, 3)]).toEqual([1, Number.NaN, 3]);
  });
});
