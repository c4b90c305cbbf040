import type { Motion } from "../ephemeris/source.ts";
import { intervalAt } from "../numeric/interval-at.ts";

/** A table of states: times in TDB seconds past J2000, growing; positions km, three by three; velocities km/s or none. */
export interface StateTable {
  readonly times: Float64Array;
  readonly positions: Float64Array;
  readonly velocities: Float64Array | null;
}

/** An interpolated motion, and what the interpolation may be off by. */
export interface TableMotion extends Motion {
  /** Writes to `out[0]` and `out[1]` by how much range (km) and range rate (km/s) change when two conditions fewer are met. */
  doubt(tdb: number, out: Float64Array): void;
}

/** Conditions that a polynomial meets: eight positions, or four positions and velocities. */
const CONDITIONS = 8;

/**
 * Interpolates a table of states.
 *
 * A polynomial of the seventh degree is laid through eight positions about the time, or through four positions with their velocities
 * (Hermite). Its doubt is by how much the polynomial with two conditions fewer differs, which for a smooth motion is far more than
 * what the full one is off by.
 *
 * Method: Newton's divided differences, with nodes repeated where a velocity is known; E. Isaacson and H. B. Keller, *Analysis of Numerical
 * Methods* (1966), ch. 6 (from memory).
 */
export function interpolateTable({ times, positions, velocities }: StateTable): TableMotion {
  const repeat = velocities ? 2 : 1;
  const count = Math.min(CONDITIONS / repeat, times.length);
  const order = count * repeat;
  const nodes = new Float64Array(order);
  const coefficients = [new Float64Array(order), new Float64Array(order), new Float64Array(order)] as const;
  let first = -1; // the first of the nodes whose polynomial is held
  let middle = 0;
  const sums = new Float64Array(9);

  /** Orders nodes from the middle outwards, so that the last ones are those farthest off. */
  const build = (start: number): void => {
    first = start;
    middle = times[start + (count >> 1)] as number;
    for (let k = 0; k < order; k++) {
      const j = Math.floor(k / repeat);
      nodes[k] = start + (count >> 1) + (j % 2 === 0 ? j / 2 : -(j + 1) / 2);
    }
    for (let axis = 0; axis < 3; axis++) {
      const c = coefficients[axis] as Float64Array;
      for (let k = 0; k < order; k++) c[k] = positions[3 * (nodes[k] as number) + axis] as number;
      for (let level = 1; level < order; level++) {
        for (let k = order - 1; k >= level; k--) {
          const [near, far] = [nodes[k - level] as number, nodes[k] as number];
          c[k] =
            near === far
              ? ((velocities as Float64Array)[3 * near + axis] as number)
              : ((c[k] as number) - (c[k - 1] as number)) / ((times[far] as number) - (times[near] as number));
        }
      }
    }
    for (let k = 0; k < order; k++) nodes[k] = (times[nodes[k] as number] as number) - middle;
  };

  const hold = (tdb: number): void => {
    const low = intervalAt(times, tdb);
    const start = Math.max(0, Math.min(low - (count >> 1) + 1, times.length - count));
    if (start !== first) build(start);
  };

  /** Position, velocity and acceleration of the polynomial with so many conditions, into `sums`. */
  const evaluate = (tdb: number, conditions: number): void => {
    const t = tdb - middle;
    for (let axis = 0; axis < 3; axis++) {
      const c = coefficients[axis] as Float64Array;
      let [p, v, a] = [0, 0, 0];
      for (let k = conditions - 1; k >= 0; k--) {
        const d = t - (nodes[k] as number);
        a = a * d + 2 * v;
        v = v * d + p;
        p = p * d + (c[k] as number);
      }
      sums[axis] = p;
      sums[axis + 3] = v;
      sums[axis + 6] = a;
    }
  };

  const rangeAndRate = (): [number, number] => {
    const [x = 0, y = 0, z = 0, vx = 0, vy = 0, vz = 0] = sums;
    const range = Math.hypot(x, y, z);
    return [range, (x * vx + y * vy + z * vz) / range];
  };

  return {
    givesVelocity: true,
    state(tdb, out) {
      hold(tdb);
      evaluate(tdb, order);
      for (let i = 0; i < 6; i++) out[i] = sums[i] as number;
    },
    stateAndAcceleration(tdb, out) {
      hold(tdb);
      evaluate(tdb, order);
      for (let i = 0; i < 9; i++) out[i] = sums[i] as number;
    },
    doubt(tdb, out) {
      hold(tdb);
      evaluate(tdb, order);
      const [range, rate] = rangeAndRate();
      evaluate(tdb, Math.max(1, order - 2));
      const [coarser, coarserRate] = rangeAndRate();
      out[0] = Math.abs(range - coarser);
      out[1] = Math.abs(rate - coarserRate);
    },
  };
}
