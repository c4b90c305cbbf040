import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { completeEllipticIntegrals, ellipseCircumference } from "../../src/orbit/ellipse-circumference.ts";

describe("the complete elliptic integrals", () => {
  test("have the values of M. Abramowitz and I. Stegun, tables 17.1 and 17.2 (from memory)", () => {
    const [k, e] = completeEllipticIntegrals(0.5);
    expect(k).toBeCloseTo(1.85407467730137, 14);
    expect(e).toBeCloseTo(1.35064388104768, 14);
    // K(1/2) = Γ(1/4)² / (4 √π), with Γ(1/4) = 3.625609908221908
    expect(k).toBeCloseTo(3.625609908221908 ** 2 / (4 * Math.sqrt(Math.PI)), 14);
    expect(completeEllipticIntegrals(1)).toEqual([Math.PI / 2, Math.PI / 2]);
  });

  test("keep Legendre's relation E K′ + E′ K − K K′ = π/2 to rounding, however long the ellipse", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-14, max: 0.5, noNaN: true }), (m) => {
        const [k, e] = completeEllipticIntegrals(m);
        const [k1, e1] = completeEllipticIntegrals(1 - m);
        expect(Math.abs(e * k1 + e1 * k - k * k1 - Math.PI / 2)).toBeLessThan(1e-13);
      }),
    );
  });
});

describe("ellipseCircumference", () => {
  test("is 2πa for a circle and nears 4a for a needle", () => {
    expect(ellipseCircumference(7, 1)).toBe(14 * Math.PI);
    expect(ellipseCircumference(1, 1e-14)).toBeCloseTo(4, 10);
  });

  test("agrees with S. Ramanujan's second approximation (1914) to the order that he gives", () => {
    for (const b of [0.99, 0.8, 0.5]) {
      const h = ((1 - b) / (1 + b)) ** 2;
      const approximation = Math.PI * (1 + b) * (1 + (3 * h) / (10 + Math.sqrt(4 - 3 * h)));
      // the error is 3 h⁵ / 2¹⁷ of the circumference
      expect(Math.abs(ellipseCircumference(1, b * b) / approximation - 1)).toBeLessThan(1e-15 + (4 * h ** 5) / 2 ** 17);
    }
  });
});
