import { DAY_SECONDS } from "../bodies/constants.ts";
import type { PoissonSeries } from "./series-file.ts";
import { elpToIcrf, rotateInPlace } from "./series-frame.ts";
import { type StateWriter, sphericalToRectangular } from "./series-spherical.ts";
import { seriesSum } from "./series-sum.ts";

/** Seconds in a Julian century, ELP's unit of time. */
const CENTURY_SECONDS = 36_525 * DAY_SECONDS;

/**
 * Motion of the mean ecliptic of date against that of J2000: P = sin(π/2) sin Π and Q = sin(π/2) cos Π by powers 1 …
 * 5 of Julian centuries. J. Laskar, *Secular terms of classical planetary theories using the results of general
 * theory*, Astron. Astrophys. 157 (1986) 59, as ELP/MPP02 takes them.
 */
const P = [0.10180391e-4, 0.47020439e-6, -0.5417367e-9, -0.2507948e-11, 0.463486e-14] as const;
const Q = [-0.113469002e-3, 0.12372674e-6, 0.1265417e-8, -0.1371808e-11, -0.320334e-14] as const;

/**
 * Makes the function that gives the Moon from the Earth's centre by ELP/MPP02 with the constants fitted to DE405.
 *
 * @param series longitude and latitude (rad) and distance (km) by Julian centuries, inertial mean ecliptic of date
 *
 * Source: J. Chapront and G. Francou, *The lunar theory ELP revisited. Introduction of new planetary perturbations*,
 * Astron. Astrophys. 404 (2003) 735.
 */
export function moonFromEarth(series: PoissonSeries): StateWriter {
  const sum = seriesSum(series);
  const turn = elpToIcrf();
  return (tdb, out) => {
    const t = tdb / CENTURY_SECONDS;
    sum(t, out);
    sphericalToRectangular(out, 1, 1 / CENTURY_SECONDS);
    toEclipticOfJ2000(t, out);
    rotateInPlace(turn, out, 0);
    rotateInPlace(turn, out, 3);
  };
}

/**
 * From the ecliptic of date to that of J2000: the rotation by π about the node, and the motion of that node with
 * time.
 */
function toEclipticOfJ2000(t: number, out: Float64Array): void {
  const p = powers(P, t);
  const q = powers(Q, t);
  const dp = slope(P, t) / CENTURY_SECONDS;
  const dq = slope(Q, t) / CENTURY_SECONDS;
  const w = Math.sqrt(1 - p * p - q * q);
  const dw = -(p * dp + q * dq) / w;
  const x = out[0] as number;
  const y = out[1] as number;
  const z = out[2] as number;
  const vx = out[3] as number;
  const vy = out[4] as number;
  const vz = out[5] as number;
  // the matrix of the rotation, gathered by the two sums that recur in it
  const s = -p * x + q * y + w * z;
  const ds = -p * vx + q * vy + w * vz - dp * x + dq * y + dw * z;
  const u = p * x - q * y;
  const du = p * vx - q * vy + dp * x - dq * y;
  out[0] = x + 2 * p * s;
  out[1] = y - 2 * q * s;
  out[2] = z - 2 * w * u - 2 * (p * p + q * q) * z;
  out[3] = vx + 2 * (p * ds + dp * s);
  out[4] = vy - 2 * (q * ds + dq * s);
  out[5] = vz - 2 * (w * du + dw * u) - 2 * (p * p + q * q) * vz - 4 * (p * dp + q * dq) * z;
}

function powers(c: readonly number[], t: number): number {
  let sum = 0;
  for (let k = c.length - 1; k >= 0; k--) sum = (sum + (c[k] as number)) * t;
  return sum;
}

function slope(c: readonly number[], t: number): number {
  let sum = 0;
  for (let k = c.length - 1; k >= 0; k--) sum = sum * t + (k + 1) * (c[k] as number);
  return sum;
}
