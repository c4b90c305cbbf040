const MACHINE_EPSILON = 2 ** -52;

/**
 * Finds a zero of a continuous function between two points where its signs differ.
 *
 * Each step is inverse quadratic interpolation or the secant where that is safe, bisection where it is not; the
 * function is never evaluated outside the bracket, and the number of evaluations is bounded by about the square of
 * what bisection would need.
 *
 * @param f    the function; called with the unit of `a` and `b`
 * @param a    one end of the bracket
 * @param fa   `f(a)`, so that a value already known is not computed again
 * @param b    the other end
 * @param fb   `f(b)`; its sign must differ from that of `fa`, or one of them be zero
 * @param tolerance  absolute, in the unit of `a`; the zero lies within twice it (plus the resolution of the number) of the result
 * @returns a point of the last bracket, which is at most twice the tolerance wide; `NaN` where the signs do not differ
 *
 * Method: R. P. Brent, *Algorithms for Minimization without Derivatives* (1973), ch. 4, procedure `zero`; the names are
 * the book's: `b` the best point so far, `a` the one before it, `c` the end on the other side, `m` half of what is left.
 * One departure: the book returns `b`; here the chord over the last bracket is followed to zero, which costs no
 * evaluation, stays inside the bracket, and for a smooth function makes the error of the order of tolerance squared.
 */
export function brentZero(
  f: (x: number) => number,
  a: number,
  fa: number,
  b: number,
  fb: number,
  tolerance: number,
): number {
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(fa < 0 !== fb < 0) || Number.isNaN(fa) || Number.isNaN(fb)) return Number.NaN;
  let c = a;
  let fc = fa;
  let d = b - a; // the step to take
  let e = d; // the step before it
  for (;;) {
    // b must be the better end, and the zero between b and c
    if (Math.abs(fc) < Math.abs(fb)) {
      a = b;
      b = c;
      c = a;
      fa = fb;
      fb = fc;
      fc = fa;
    }
    const tol = 2 * MACHINE_EPSILON * Math.abs(b) + tolerance;
    const m = 0.5 * (c - b);
    if (fb === 0) return b;
    if (Math.abs(m) <= tol) return b - (fb * (c - b)) / (fc - fb);
    if (Math.abs(e) < tol || Math.abs(fa) <= Math.abs(fb)) {
      d = e = m; // bisection: the steps have become small, or the last one made it worse
    } else {
      let s = fb / fa;
      let p: number;
      let q: number;
      if (a === c) {
        // the secant
        p = 2 * m * s;
        q = 1 - s;
      } else {
        // inverse quadratic interpolation
        q = fa / fc;
        const r = fb / fc;
        p = s * (2 * m * q * (q - r) - (b - a) * (r - 1));
        q = (q - 1) * (r - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      else p = -p;
      s = e;
      e = d;
      if (2 * p < 3 * m * q - Math.abs(tol * q) && p < Math.abs(0.5 * s * q)) d = p / q;
      else d = e = m;
    }
    a = b;
    fa = fb;
    if (Math.abs(d) > tol) b += d;
    else b += m > 0 ? tol : -tol;
    fb = f(b);
    if (Number.isNaN(fb)) return Number.NaN;
    if (fb > 0 === fc > 0) {
      c = a;
      fc = fa;
      d = e = b - a;
    }
  }
}
