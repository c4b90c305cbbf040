/**
 * Gives the complete elliptic integrals of the first and second kind, K(k) and E(k), by the arithmetic-geometric mean.
 *
 * @param complement k′² = 1 − k², above 0 and up to 1; given so that k near 1 loses no digits
 * @returns `[K, E]`
 *
 * Method: M. Abramowitz and I. Stegun, *Handbook of Mathematical Functions* (1964), 17.6.
 */
export function completeEllipticIntegrals(complement: number): readonly [number, number] {
  let a = 1;
  let b = Math.sqrt(complement);
  let c2 = 1 - complement;
  let sum = c2 / 2; // Σ 2ⁿ⁻¹ cₙ²
  let power = 0.5;
  while (c2 > 2 ** -54 * a * a) {
    const c = (a - b) / 2;
    const mean = (a + b) / 2;
    b = Math.sqrt(a * b);
    a = mean;
    c2 = c * c;
    power *= 2;
    sum += power * c2;
  }
  const k = Math.PI / (2 * a);
  return [k, k * (1 - sum)];
}

/**
 * Gives the circumference of an ellipse, 4 a E(e).
 *
 * @param semiMajorAxis      a, in any unit
 * @param semiMinorAxisShare (b/a)² = 1 − e², above 0 and up to 1
 * @returns the circumference in the unit of `semiMajorAxis`
 */
export function ellipseCircumference(semiMajorAxis: number, semiMinorAxisShare: number): number {
  return 4 * semiMajorAxis * completeEllipticIntegrals(semiMinorAxisShare)[1];
}
