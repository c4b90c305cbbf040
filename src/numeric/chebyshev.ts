/**
 * Adds the sums of three Chebyshev series (a vector's x, y, z), and of their derivatives, to an array.
 *
 * Clenshaw's recurrence, run at once for the three components and for value and derivatives; no allocation. The three
 * chains do not wait for each other, which makes this several times as fast as one component after the other.
 *
 * @param c      array that holds the coefficients c₀ … cₙ₋₁ of Σ cₖ Tₖ(s), x's first, then y's, then z's
 * @param start  index of x's c₀ in `c`
 * @param n      number of coefficients of a component, at least 1
 * @param s      abscissa, −1 … 1 inside the series' interval
 * @param scale  ds/dt: turns the derivatives from per unit of s into per unit of time
 * @param sign   +1 or −1: whether the sums are added or taken away
 * @param order  0, 1 or 2: the highest derivative wanted
 * @param out    array to add to: values to `out[at … at + 2]`, first derivatives to the three places after them, second ones to the next three
 * @param at     index of x's value in `out`
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
  order: number,
  out: Float64Array,
  at: number,
): void {
  const twoS = 2 * s;
  const y = start + n;
  const z = y + n;
  // bₖ, its derivative dₖ and its second derivative eₖ, of x, y, z; `1` is the newest, `2` the one before
  let bx1 = 0;
  let bx2 = 0;
  let by1 = 0;
  let by2 = 0;
  let bz1 = 0;
  let bz2 = 0;
  let dx1 = 0;
  let dx2 = 0;
  let dy1 = 0;
  let dy2 = 0;
  let dz1 = 0;
  let dz2 = 0;
  let ex1 = 0;
  let ex2 = 0;
  let ey1 = 0;
  let ey2 = 0;
  let ez1 = 0;
  let ez2 = 0;
  let next = 0;
  for (let k = n - 1; k > 0; k--) {
    if (order > 1) {
      next = twoS * ex1 - ex2 + 4 * dx1;
      ex2 = ex1;
      ex1 = next;
      next = twoS * ey1 - ey2 + 4 * dy1;
      ey2 = ey1;
      ey1 = next;
      next = twoS * ez1 - ez2 + 4 * dz1;
      ez2 = ez1;
      ez1 = next;
    }
    if (order > 0) {
      next = twoS * dx1 - dx2 + 2 * bx1;
      dx2 = dx1;
      dx1 = next;
      next = twoS * dy1 - dy2 + 2 * by1;
      dy2 = dy1;
      dy1 = next;
      next = twoS * dz1 - dz2 + 2 * bz1;
      dz2 = dz1;
      dz1 = next;
    }
    next = twoS * bx1 - bx2 + (c[start + k] as number);
    bx2 = bx1;
    bx1 = next;
    next = twoS * by1 - by2 + (c[y + k] as number);
    by2 = by1;
    by1 = next;
    next = twoS * bz1 - bz2 + (c[z + k] as number);
    bz2 = bz1;
    bz1 = next;
  }
  out[at] = (out[at] as number) + sign * (s * bx1 - bx2 + (c[start] as number));
  out[at + 1] = (out[at + 1] as number) + sign * (s * by1 - by2 + (c[y] as number));
  out[at + 2] = (out[at + 2] as number) + sign * (s * bz1 - bz2 + (c[z] as number));
  if (order < 1) return;
  const first = sign * scale;
  out[at + 3] = (out[at + 3] as number) + first * (s * dx1 - dx2 + bx1);
  out[at + 4] = (out[at + 4] as number) + first * (s * dy1 - dy2 + by1);
  out[at + 5] = (out[at + 5] as number) + first * (s * dz1 - dz2 + bz1);
  if (order < 2) return;
  const second = first * scale;
  out[at + 6] = (out[at + 6] as number) + second * (s * ex1 - ex2 + 2 * dx1);
  out[at + 7] = (out[at + 7] as number) + second * (s * ey1 - ey2 + 2 * dy1);
  out[at + 8] = (out[at + 8] as number) + second * (s * ez1 - ez2 + 2 * dz1);
}
