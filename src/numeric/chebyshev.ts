/**
 * Adds the sum of a Chebyshev series, and of its first and second derivative, to three places of an array.
 *
 * Clenshaw's recurrence, run at once for the value and both derivatives; no allocation.
 *
 * @param c       array that holds the coefficients c₀ … cₙ₋₁ of Σ cₖ Tₖ(s)
 * @param start   index of c₀ in `c`
 * @param n       number of coefficients, at least 1
 * @param s       abscissa, −1 … 1 inside the series' interval
 * @param scale   ds/dt: turns the derivatives from per unit of s into per unit of time
 * @param sign    +1 or −1: whether the sums are added or taken away
 * @param out     array to add to
 * @param at      index in `out` of the value; the first derivative goes to `at + stride`, the second to `at + 2·stride`
 * @param stride  distance between value, first and second derivative in `out`
 * @param order   0, 1 or 2: the highest derivative wanted
 *
 * Source: C. W. Clenshaw, *A note on the summation of Chebyshev series*, Math. Tables Aids Comput. 9 (1955) 118–120;
 * the derivatives follow by differentiating the recurrence.
 */
export function addChebyshev(
  c: Float64Array,
  start: number,
  n: number,
  s: number,
  scale: number,
  sign: number,
  out: Float64Array,
  at: number,
  stride: number,
  order: number,
): void {
  const twoS = 2 * s;
  let b1 = 0;
  let b2 = 0;
  let d1 = 0;
  let d2 = 0;
  let e1 = 0;
  let e2 = 0;
  if (order > 1) {
    for (let k = start + n - 1; k > start; k--) {
      const e = twoS * e1 - e2 + 4 * d1;
      e2 = e1;
      e1 = e;
      const d = twoS * d1 - d2 + 2 * b1;
      d2 = d1;
      d1 = d;
      const b = twoS * b1 - b2 + (c[k] as number);
      b2 = b1;
      b1 = b;
    }
    out[at + 2 * stride] = (out[at + 2 * stride] as number) + sign * scale * scale * (s * e1 - e2 + 2 * d1);
  } else if (order > 0) {
    for (let k = start + n - 1; k > start; k--) {
      const d = twoS * d1 - d2 + 2 * b1;
      d2 = d1;
      d1 = d;
      const b = twoS * b1 - b2 + (c[k] as number);
      b2 = b1;
      b1 = b;
    }
  } else {
    for (let k = start + n - 1; k > start; k--) {
      const b = twoS * b1 - b2 + (c[k] as number);
      b2 = b1;
      b1 = b;
    }
  }
  if (order > 0) out[at + stride] = (out[at + stride] as number) + sign * scale * (s * d1 - d2 + b1);
  out[at] = (out[at] as number) + sign * (s * b1 - b2 + (c[start] as number));
}
