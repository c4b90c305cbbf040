import { addChebyshev } from "../../../numeric/chebyshev.ts";

/** Writes x, y, z (km) and their rates (km/s) at the time `from + offset` (seconds) to `out[0 … 5]`. */
export type Path = (from: number, offset: number, out: Float64Array) => void;

/** Turns a path on an interval into Chebyshev coefficients. */
export interface Fitter {
  /**
   * @param path the path
   * @param from start of the interval, seconds
   * @returns the coefficients of x, then y, then z
   */
  fit(path: Path, from: number): Float64Array;
}

/**
 * Makes the least-squares fit of Chebyshev series to positions and velocities.
 *
 * Positions and velocities at both ends are kept exactly, so neighbouring records join without a step; in between the
 * squares of the errors of position and of velocity (times half the interval, and a weight) are least, at equally spaced times.
 *
 * @param seconds length of a record
 * @param n       coefficients a component, at least 5
 * @param weight  of velocities against positions
 *
 * Method: X X Newhall, *Numerical representation of planetary ephemerides*, Celestial Mechanics 45 (1989) 305, who
 * took the weight 0.4; 0.1 gives slightly smaller errors of velocity here.
 */
export function makeFitter(seconds: number, n: number, weight = 0.1): Fitter {
  const points = 3 * n + 1;
  const size = n + 4;
  // The normal equations with four conditions (multipliers); right-hand sides for a unit in each of the data.
  const matrix = Array.from({ length: size }, () => new Float64Array(size + 2 * points));
  const t = new Float64Array(n);
  const dt = new Float64Array(n);
  const at = (row: number) => matrix[row] as Float64Array;
  const add = (row: number, column: number, value: number) => {
    at(row)[column] = (at(row)[column] as number) + value;
  };
  for (let j = 0; j < points; j++) {
    polynomials((2 * j) / (points - 1) - 1, t, dt);
    for (let i = 0; i < n; i++) {
      const ti = t[i] as number;
      const di = weight * weight * (dt[i] as number);
      for (let k = 0; k < n; k++) add(i, k, ti * (t[k] as number) + di * (dt[k] as number));
      add(i, size + j, ti);
      add(i, size + points + j, di);
    }
    if (j > 0 && j < points - 1) continue;
    const condition = j === 0 ? n : n + 2;
    for (let k = 0; k < n; k++) {
      add(condition, k, t[k] as number);
      add(k, condition, t[k] as number);
      add(condition + 1, k, dt[k] as number);
      add(k, condition + 1, dt[k] as number);
    }
    add(condition, size + j, 1);
    add(condition + 1, size + points + j, 1);
  }
  eliminate(matrix, size);
  const operator = matrix.slice(0, n).map((row) => row.subarray(size));

  const data = new Float64Array(2 * points * 3);
  const state = new Float64Array(6);
  const half = seconds / 2;
  return {
    fit(path, from) {
      for (let j = 0; j < points; j++) {
        path(from, (seconds * j) / (points - 1), state);
        for (let axis = 0; axis < 3; axis++) {
          data[axis * 2 * points + j] = state[axis] as number;
          data[axis * 2 * points + points + j] = (state[axis + 3] as number) * half;
        }
      }
      const result = new Float64Array(3 * n);
      for (let axis = 0; axis < 3; axis++) {
        for (let k = 0; k < n; k++) {
          const row = operator[k] as Float64Array;
          let sum = 0;
          for (let i = 0; i < 2 * points; i++) sum += (row[i] as number) * (data[axis * 2 * points + i] as number);
          result[axis * n + k] = sum;
        }
      }
      return result;
    },
  };
}

/** Writes T₀ … Tₙ₋₁ and their derivatives. */
function polynomials(s: number, t: Float64Array, dt: Float64Array): void {
  t[0] = 1;
  t[1] = s;
  dt[0] = 0;
  dt[1] = 1;
  for (let k = 2; k < t.length; k++) {
    t[k] = 2 * s * (t[k - 1] as number) - (t[k - 2] as number);
    dt[k] = 2 * s * (dt[k - 1] as number) + 2 * (t[k - 1] as number) - (dt[k - 2] as number);
  }
}

/** Gauss–Jordan elimination with row exchange: leaves the solutions in the columns from `size` on. */
function eliminate(matrix: Float64Array[], size: number): void {
  for (let column = 0; column < size; column++) {
    let pivot = column;
    const value = (row: number) => (matrix[row] as Float64Array)[column] as number;
    for (let row = column + 1; row < size; row++) if (Math.abs(value(row)) > Math.abs(value(pivot))) pivot = row;
    const chosen = matrix[pivot] as Float64Array;
    matrix[pivot] = matrix[column] as Float64Array;
    matrix[column] = chosen;
    const scale = 1 / (chosen[column] as number);
    for (let i = 0; i < chosen.length; i++) chosen[i] = (chosen[i] as number) * scale;
    matrix.forEach((row, index) => {
      const factor = row[column] as number;
      if (index === column || factor === 0) return;
      for (let i = 0; i < row.length; i++) row[i] = (row[i] as number) - factor * (chosen[i] as number);
    });
  }
}

/**
 * Measures a fit against its path: the largest distance between the two, km, and between their velocities, km/s.
 * @param checks how many times inside the interval are compared
 */
export function fitError(
  path: Path,
  from: number,
  seconds: number,
  fit: Float64Array,
  checks: number,
): [number, number] {
  const n = fit.length / 3;
  const truth = new Float64Array(6);
  const got = new Float64Array(6);
  let position = 0;
  let velocity = 0;
  for (let i = 0; i <= checks; i++) {
    const s = (2 * i) / checks - 1;
    path(from, (seconds * i) / checks, truth);
    got.fill(0);
    addChebyshev(fit, 0, n, s, 2 / seconds, 1, 1, got, 0);
    const off = (k: number) => (got[k] as number) - (truth[k] as number);
    position = Math.max(position, Math.hypot(off(0), off(1), off(2)));
    velocity = Math.max(velocity, Math.hypot(off(3), off(4), off(5)));
  }
  return [position, velocity];
}
