/** Below this the closed forms lose digits and the series serve. */
const SERIES_BELOW = 1;

/**
 * Writes Stumpff's functions c₀ … c₃ of x to `out[0 … 3]`: cos √x, sin √x / √x, (1 − cos √x)/x, (√x − sin √x)/√x³, for x below zero with
 * the hyperbolic functions. Each is good to a few units of the last place.
 *
 * Source: K. Stumpff, *Himmelsmechanik* I (1959); the series are those of cosine and sine.
 */
export function stumpff(x: number, out: Float64Array): void {
  if (Math.abs(x) < SERIES_BELOW) {
    // by Horner's scheme: c₂ = 1/2! − x/4! + x²/6! …, c₃ = 1/3! − x/5! + …
    let c2 = 1;
    let c3 = 1;
    for (let k = 8; k > 0; k--) {
      c2 = 1 - (x * c2) / ((2 * k + 1) * (2 * k + 2));
      c3 = 1 - (x * c3) / ((2 * k + 2) * (2 * k + 3));
    }
    c2 /= 2;
    c3 /= 6;
    out[0] = 1 - x * c2;
    out[1] = 1 - x * c3;
    out[2] = c2;
    out[3] = c3;
    return;
  }
  const root = Math.sqrt(Math.abs(x));
  const half = x > 0 ? Math.sin(root / 2) : Math.sinh(root / 2);
  const c1 = (x > 0 ? Math.sin(root) : Math.sinh(root)) / root;
  out[0] = x > 0 ? Math.cos(root) : Math.cosh(root);
  out[1] = c1;
  out[2] = (2 * half * half) / Math.abs(x);
  out[3] = (1 - c1) / x;
}
