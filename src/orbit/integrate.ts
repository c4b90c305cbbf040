/** Writes the acceleration at a time and state: `a(t, state, out)`, `state` and the rates in `out` of six numbers. */
export type Rates = (t: number, state: Float64Array, out: Float64Array) => void;

/** Nodes of an integration: times, and six numbers for each. */
export interface Nodes {
  readonly times: readonly number[];
  readonly states: readonly Float64Array[];
}

const C = [0, 1 / 5, 3 / 10, 4 / 5, 8 / 9, 1, 1] as const;
const A: readonly (readonly number[])[] = [
  [],
  [1 / 5],
  [3 / 40, 9 / 40],
  [44 / 45, -56 / 15, 32 / 9],
  [19372 / 6561, -25360 / 2187, 64448 / 6561, -212 / 729],
  [9017 / 3168, -355 / 33, 46732 / 5247, 49 / 176, -5103 / 18656],
  [35 / 384, 0, 500 / 1113, 125 / 192, -2187 / 6784, 11 / 84],
];
const ERROR = [71 / 57600, 0, -71 / 16695, 71 / 1920, -17253 / 339200, 22 / 525, -1 / 40] as const;

/**
 * Integrates a motion from one time to another, forwards or backwards, with steps that keep a relative tolerance.
 *
 * @param rates     position's and velocity's rates
 * @param t0        start
 * @param start     position (km) and velocity (km/s)
 * @param t1        end
 * @param tolerance of a step, of the distance and of the speed
 * @param largest   step at the most, in the unit of time
 * @returns the nodes, from `t0` to `t1`
 *
 * Method: J. R. Dormand and P. J. Prince, *A family of embedded Runge–Kutta formulae*, J. Comput. Appl. Math. 6 (1980) 19, order 5(4).
 */
export function integrate(
  rates: Rates,
  t0: number,
  start: Float64Array,
  t1: number,
  tolerance: number,
  largest: number,
): Nodes {
  const times = [t0];
  const states = [start.slice()];
  if (t1 === t0) return { times, states };
  const k = C.map(() => new Float64Array(6));
  const trial = new Float64Array(6);
  let y = start.slice();
  let t = t0;
  let h = (t1 > t0 ? 1 : -1) * Math.min(largest, Math.abs(t1 - t0)) * 0.1;
  rates(t, y, k[0] as Float64Array);
  for (;;) {
    if ((h > 0 && t + h > t1) || (h < 0 && t + h < t1)) h = t1 - t;
    for (let s = 1; s < 7; s++) {
      const row = A[s] as readonly number[];
      for (let i = 0; i < 6; i++) {
        let sum = 0;
        for (let j = 0; j < row.length; j++) sum += (row[j] as number) * ((k[j] as Float64Array)[i] as number);
        trial[i] = (y[i] as number) + h * sum;
      }
      rates(t + (C[s] as number) * h, trial, k[s] as Float64Array);
    }
    let worst = 0;
    for (let part = 0; part < 2; part++) {
      let error = 0;
      let size = 0;
      for (let i = 3 * part; i < 3 * part + 3; i++) {
        let sum = 0;
        for (let s = 0; s < 7; s++) sum += (ERROR[s] as number) * ((k[s] as Float64Array)[i] as number);
        error += (h * sum) ** 2;
        size += (trial[i] as number) ** 2;
      }
      worst = Math.max(worst, Math.sqrt(error / size) / tolerance);
    }
    if (worst <= 1) {
      t = h === t1 - t ? t1 : t + h;
      y = trial.slice();
      times.push(t);
      states.push(y);
      if (t === t1) return { times, states };
      (k[0] as Float64Array).set(k[6] as Float64Array);
    }
    const factor = Math.min(4, Math.max(0.2, 0.9 * (worst || 1e-10) ** -0.2));
    h = Math.sign(h) * Math.min(largest, Math.abs(h) * factor);
  }
}
