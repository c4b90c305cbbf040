import type { PoissonSeries } from "./series-file.ts";

/**
 * Makes the function that sums a series.
 *
 * Sine and cosine are computed for the bases alone; each further argument takes one complex product, so the error of
 * a point is that of the bases' phases times the few multiples of them that it holds (below 1e-10 rad where |T| ≤ 10
 * centuries). Rates are exact derivatives of the same sums. No allocation; one function must not be called from
 * inside itself.
 *
 * @param series three variables
 * @returns a function that, for T in the series' unit, writes the three variables to `out[0 … 2]` and their rates, per
 *   unit of T, to `out[3 … 5]`
 */
export function seriesSum(series: PoissonSeries): (t: number, out: Float64Array) => void {
  const { degree, rates, bases, first, second, signs } = series;
  const blocks = series.blocks.filter((block) => block.places.length > 0);
  const sums = first.length;
  const points = new Float64Array(3 * (bases + sums)); // by point: cosine, sine, rate of the argument
  return (t, out) => {
    for (let i = 0; i < bases; i++) {
      let phase = 0;
      let rate = 0;
      for (let k = degree - 1; k >= 0; k--) {
        rate = rate * t + phase;
        phase = phase * t + (rates[i * degree + k] as number);
      }
      rate = rate * t + phase;
      phase *= t;
      points[3 * i] = Math.cos(phase);
      points[3 * i + 1] = Math.sin(phase);
      points[3 * i + 2] = rate;
    }
    for (let i = 0, at = 3 * bases; i < sums; i++, at += 3) {
      const p = 3 * (first[i] as number);
      const q = 3 * (second[i] as number);
      const sign = signs[i] as number;
      const c1 = points[p] as number;
      const s1 = points[p + 1] as number;
      const c2 = points[q] as number;
      const s2 = sign * (points[q + 1] as number);
      points[at] = c1 * c2 - s1 * s2;
      points[at + 1] = s1 * c2 + c1 * s2;
      points[at + 2] = (points[p + 2] as number) + sign * (points[q + 2] as number);
    }
    for (let i = 0; i < 6; i++) out[i] = 0;
    for (let b = 0; b < blocks.length; b++) {
      const { variable, power, places, coefficients } = blocks[b] as (typeof blocks)[number];
      let sum = 0;
      let rate = 0;
      for (let i = 0; i < places.length; i++) {
        const at = 3 * (places[i] as number);
        const c = coefficients[2 * i] as number;
        const s = coefficients[2 * i + 1] as number;
        const cosine = points[at] as number;
        const sine = points[at + 1] as number;
        sum += c * cosine + s * sine;
        rate += (points[at + 2] as number) * (s * cosine - c * sine);
      }
      let scale = 1;
      let slope = 0; // of T to the block's power
      for (let k = 0; k < power; k++) {
        slope = slope * t + scale;
        scale *= t;
      }
      out[variable] = (out[variable] as number) + sum * scale;
      out[variable + 3] = (out[variable + 3] as number) + rate * scale + sum * slope;
    }
  };
}
