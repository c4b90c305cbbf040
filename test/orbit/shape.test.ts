import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Shape, shapesWith } from "../../src/orbit/shape.ts";

const powers = fc.constantFrom(-3, -2, -1.5, -1, -0.5, 0, 0.5, 1, 1.5, 2, 3);

describe("shapesWith", () => {
  test("finds the shape that a product of powers of 1 + e and |1 − e| came from, among those that have it", () => {
    fc.assert(
      fc.property(powers, powers, fc.boolean(), fc.double({ min: 1e-7, max: 1, noNaN: true }), (c, d, closed, x) => {
        fc.pre(c !== 0 || d !== 0);
        const minus = closed ? x : x * 10;
        const e = closed ? 1 - minus : 1 + minus;
        const value = (closed ? 2 - minus : 2 + minus) ** c * minus ** d;
        const found = shapesWith(c, d, value);
        const distance = (s: Shape) => (s.closed === closed ? Math.abs(s.e - e) : Infinity);
        // 10⁻⁷: where the product turns, or at the circle, half of the digits are lost
        expect(Math.min(...found.map(distance), Infinity)).toBeLessThan(1e-6);
        for (const shape of found) {
          const again = shape.plus ** c * (d === 0 ? 1 : shape.minus ** d);
          expect(Math.abs(again / value - 1)).toBeLessThan(1e-11);
          if (shape.e < 2) expect(shape.plus + (shape.closed ? 1 : -1) * shape.minus).toBeCloseTo(2, 14);
        }
      }),
      { numRuns: 1000 },
    );
  });

  test("gives both shapes where the product turns between them", () => {
    // (1 + e)³ (1 − e) is largest at e = 1/2 with 27/16, and 1.5 on both sides of it
    const found = shapesWith(3, 1, 1.5).filter((s) => s.closed);
    expect(found.length).toBe(2);
    for (const { e } of found) expect((1 + e) ** 3 * (1 - e)).toBeCloseTo(1.5, 12);
    expect(
      shapesWith(3, 1, 27 / 16)
        .filter((s) => s.closed)
        .map((s) => s.e),
    ).toEqual([expect.closeTo(0.5, 7)]);
    expect(shapesWith(3, 1, 1.7).filter((s) => s.closed)).toEqual([]);
  });

  test("takes for a circle what only rounding carries past it, and nothing else", () => {
    for (const [c, d] of [
      [1, 0],
      [0, 1],
      [1, 1],
      [1, -1],
      [2, -1],
    ] as const) {
      const past = c > 0 && d <= 0 ? 1 - 1e-15 : 1 + 1e-15;
      expect(shapesWith(c, d, past)[0]?.e).toBeLessThan(1e-7);
      const far = c > 0 && d <= 0 ? 0.9 : 1.1;
      expect(shapesWith(c, d, far).filter((s) => s.closed)).toEqual([]);
    }
  });
});
