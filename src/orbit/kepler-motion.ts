import type { Motion } from "../ephemeris/source.ts";
import { stumpff } from "./stumpff.ts";

/** A conic and when it is run through. */
export interface KeplerOrbit {
  /** Distance of the periapsis, km. */
  readonly periapsisKm: number;
  readonly eccentricity: number;
  /** Gravitational parameter, km³/s². */
  readonly gmKm3S2: number;
  /** A passage through the periapsis, TDB seconds past J2000. */
  readonly periapsisTdb: number;
  /** The axes of the orbit's plane in ICRF: towards the periapsis, and 90° on in the sense of motion; left out, x and y. */
  readonly axes?: OrbitAxes;
}

/** Unit vectors towards the periapsis and 90° on. */
export interface OrbitAxes {
  readonly p: readonly [number, number, number];
  readonly q: readonly [number, number, number];
}

const PLANE: OrbitAxes = { p: [1, 0, 0], q: [0, 1, 0] };

/**
 * Makes Kepler's motion: two bodies alone, for every eccentricity from the circle to the hyperbola, the parabola included.
 *
 * Method: universal variables about the periapsis. With s from ds = dt/r and α = μ(1 − e)/q,
 *
 *     t − T = q s + μ e s³ c₃(αs²),   r = q + μ e s² c₂(αs²),
 *
 * in which neither e near 0 nor e near 1 loses digits. The left side is convex and growing in s up to the apoapsis, so that Newton's
 * method from an upper bound comes down to the root without overshooting. K. Stumpff (1959); R. H. Battin, *An Introduction to the
 * Mathematics and Methods of Astrodynamics* (1987), ch. 4 (from memory).
 */
export function keplerMotion({
  periapsisKm: q,
  eccentricity: e,
  gmKm3S2: mu,
  periapsisTdb,
  axes = PLANE,
}: KeplerOrbit): Motion {
  const alpha = (mu * (1 - e)) / q;
  const root = Math.sqrt(Math.abs(alpha));
  const period = e < 1 ? (2 * Math.PI * mu) / (alpha * root) : Infinity;
  const side = Math.sqrt(mu * q * (1 + e)); // angular momentum
  const c = new Float64Array(4);
  const [px, py, pz] = axes.p;
  const [qx, qy, qz] = axes.q;

  /** s of a time from the periapsis, zero or more and at most half a period; leaves c₀ … c₃ of αs² in `c`. */
  const solve = (dt: number): number => {
    let s = Math.min(dt / q, Math.cbrt(((e < 1 ? Math.PI * Math.PI : 6) * dt) / (mu * e)));
    if (e < 1) s = Math.min(s, Math.PI / root);
    else if (e > 1) s = Math.min(s, Math.asinh((dt * root * root * root) / (mu * (e - 1))) / root);
    for (let i = 0; i < 60; i++) {
      stumpff(alpha * s * s, c);
      const r = q + mu * e * s * s * (c[2] as number);
      const step = (s * (q + mu * e * s * s * (c[3] as number)) - dt) / r;
      const next = s - step;
      if (!(next < s) || next <= 0) break;
      s = next;
    }
    stumpff(alpha * s * s, c);
    return s;
  };

  const state = (tdb: number, out: Float64Array): void => {
    let dt = tdb - periapsisTdb;
    if (e < 1) dt -= Math.round(dt / period) * period;
    const late = dt < 0 ? -1 : 1;
    const s = dt === 0 ? 0 : solve(Math.abs(dt));
    if (s === 0) stumpff(0, c);
    const c1 = c[1] as number;
    const lift = mu * s * s * (c[2] as number);
    const r = q + e * lift;
    const x = q - lift;
    const y = late * side * s * c1;
    const vx = (-late * mu * s * c1) / r;
    const vy = (side * (c[0] as number)) / r;
    out[0] = px * x + qx * y;
    out[1] = py * x + qy * y;
    out[2] = pz * x + qz * y;
    out[3] = px * vx + qx * vy;
    out[4] = py * vx + qy * vy;
    out[5] = pz * vx + qz * vy;
  };

  return Object.freeze({
    givesVelocity: true,
    state,
    stateAndAcceleration(tdb: number, out: Float64Array): void {
      state(tdb, out);
      const [x = 0, y = 0, z = 0] = out;
      const r2 = x * x + y * y + z * z;
      const pull = -mu / (r2 * Math.sqrt(r2));
      out[6] = pull * x;
      out[7] = pull * y;
      out[8] = pull * z;
    },
  });
}
