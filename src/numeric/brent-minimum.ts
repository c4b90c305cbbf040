const GOLDEN = 0.5 * (3 - Math.sqrt(5)); // the square of the inverse of the golden ratio
const ROOT_EPSILON = 2 ** -26;

/**
 * Finds a local minimum of a function inside an interval.
 *
 * Each step is to the vertex of the parabola through the three best points where that is safe, a golden section where
 * it is not. The ends themselves are never evaluated: a minimum at an end is approached to within the tolerance.
 *
 * What no minimiser can do: near a minimum the function is flat, so values tell the place only to about
 * √(2 ε |f| / f″). For a distance r with acceleration r̈ that is 0.03 s for the Moon, 0.8 s for the Earth, minutes for
 * Neptune; where a derivative is at hand, find its zero instead (`brentZero`).
 *
 * @param f  the function
 * @param a  the lower end
 * @param b  the upper end, above `a`
 * @param tolerance  absolute, in the unit of `a`, above zero
 * @returns the abscissa of the least value seen; `NaN` where `f` gave `NaN`
 *
 * Method: R. P. Brent, *Algorithms for Minimization without Derivatives* (1973), ch. 5, procedure `localmin`; the names
 * are the book's: `x` the best point so far, `w` the second best, `v` the one that was second before, `u` the newest.
 */
export function brentMinimum(f: (x: number) => number, a: number, b: number, tolerance: number): number {
  let x = a + GOLDEN * (b - a);
  let w = x;
  let v = x;
  let fx = f(x);
  let fw = fx;
  let fv = fx;
  let d = 0; // the step to take
  let e = 0; // the step before the last
  for (;;) {
    if (Number.isNaN(fx)) return Number.NaN;
    const m = 0.5 * (a + b);
    // The book's relative part is √ε|x|, meant for |x| near the interval's size; here it is taken from the interval.
    const tol = ROOT_EPSILON * Math.abs(b - a) + 2 ** -52 * Math.abs(x) + tolerance / 3;
    const t2 = 2 * tol;
    if (Math.abs(x - m) <= t2 - 0.5 * (b - a)) return x;
    let p = 0;
    let q = 0;
    let r = 0;
    if (Math.abs(e) > tol) {
      // fit a parabola
      r = (x - w) * (fx - fv);
      q = (x - v) * (fx - fw);
      p = (x - v) * q - (x - w) * r;
      q = 2 * (q - r);
      if (q > 0) p = -p;
      else q = -q;
      r = e;
      e = d;
    }
    if (Math.abs(p) < Math.abs(0.5 * q * r) && p > q * (a - x) && p < q * (b - x)) {
      d = p / q; // to the vertex
      const u = x + d;
      if (u - a < t2 || b - u < t2) d = x < m ? tol : -tol; // not too near an end
    } else {
      e = (x < m ? b : a) - x; // golden section of the longer side
      d = GOLDEN * e;
    }
    const u = x + (Math.abs(d) >= tol ? d : d > 0 ? tol : -tol);
    const fu = f(u);
    if (Number.isNaN(fu)) return Number.NaN;
    if (fu <= fx) {
      if (u < x) b = x;
      else a = x;
      v = w;
      fv = fw;
      w = x;
      fw = fx;
      x = u;
      fx = fu;
    } else {
      if (u < x) a = u;
      else b = u;
      if (fu <= fw || w === x) {
        v = w;
        fv = fw;
        w = u;
        fw = fu;
      } else if (fu <= fv || v === x || v === w) {
        v = u;
        fv = fu;
      }
    }
  }
}
