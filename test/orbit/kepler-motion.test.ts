import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { AU_KM, DAY_SECONDS } from "../../src/bodies/constants.ts";
import { keplerMotion } from "../../src/orbit/kepler-motion.ts";

/** Distance and true anomaly, degrees. */
function placeAt(q: number, e: number, gm: number, seconds: number): [number, number] {
  const out = new Float64Array(6);
  keplerMotion({ periapsisKm: q, eccentricity: e, gmKm3S2: gm, periapsisTdb: 0 }).state(seconds, out);
  const [x = 0, y = 0] = out;
  return [Math.hypot(x, y), (((Math.atan2(y, x) * 180) / Math.PI) % 360) + (y < 0 ? 360 : 0)];
}

/** Zero of a growing function by halving. */
function zeroOf(f: (x: number) => number, low: number, high: number): number {
  let [a, b] = [low, high];
  for (let i = 0; i < 200; i++) {
    const m = (a + b) / 2;
    if (f(m) < 0) a = m;
    else b = m;
  }
  return (a + b) / 2;
}

describe("Kepler's motion", () => {
  // J. Meeus, Astronomical Algorithms, 2nd ed. (1998), ch. 35, the table of near-parabolic orbits (from memory);
  // Gaussian constant 0.01720209895. The last digits of the table set the tolerances.
  test.each([
    [0.921326, 1, 138.4783, 102.74426, 2.364192],
    [0.1, 0.987, 254.9, 164.50029, 4.063777],
    [0.123456, 0.99997, -30.47, 221.9119, 0.965053],
    [3.363943, 1.05731, 1237.1, 109.40598, 10.668551],
    [0.5871018, 0.9672746, 20, 52.85331, 0.729116],
  ])("agrees with the tables for q = %f au, e = %f, %f days from perihelion", (q, e, days, degrees, au) => {
    const gm = (0.01720209895 ** 2 * AU_KM ** 3) / DAY_SECONDS ** 2;
    const [r, v] = placeAt(q * AU_KM, e, gm, days * DAY_SECONDS);
    expect(Math.abs(v - degrees)).toBeLessThan(1e-5);
    expect(Math.abs(r / AU_KM - au)).toBeLessThan(1e-6);
  });

  test("obeys Kepler's equation solved by halving, for every ellipse and hyperbola", () => {
    fc.assert(
      fc.property(
        fc.oneof(
          fc.double({ min: 1e-7, max: 0.99999, noNaN: true }),
          fc.double({ min: 1.00001, max: 30, noNaN: true }),
        ),
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        (e, part) => {
          const [q, gm] = [7000, 398600.4355];
          const a = q / Math.abs(1 - e);
          const n = Math.sqrt(gm / a ** 3);
          const mean = e < 1 ? part * Math.PI : part * 20;
          const anomaly =
            e < 1
              ? zeroOf((u) => u - e * Math.sin(u) - mean, 0, Math.PI)
              : zeroOf((u) => e * Math.sinh(u) - u - mean, 0, 50);
          // the form that loses no digits near the periapsis: 1 − cos u = 2 sin²(u/2)
          const half = e < 1 ? Math.sin(anomaly / 2) : Math.sinh(anomaly / 2);
          const expected = q + 2 * a * e * half * half;
          const [r] = placeAt(q, e, gm, mean / n);
          // near the parabola mean anomaly itself loses digits in `u − e sin u`: 1e-16 over (1 − e)
          expect(Math.abs(r / expected - 1)).toBeLessThan(1e-12 + 2e-15 / Math.abs(1 - e));
        },
      ),
      { numRuns: 400 },
    );
  });

  test("keeps energy and angular momentum to thirteen digits all along, and has the velocity of its position", () => {
    for (const e of [1e-6, 0.3, 0.999, 1, 1.7]) {
      const [q, gm] = [1e8, 1.327e11];
      const motion = keplerMotion({ periapsisKm: q, eccentricity: e, gmKm3S2: gm, periapsisTdb: 5e8 });
      const [s, before, after] = [new Float64Array(9), new Float64Array(6), new Float64Array(6)];
      for (let days = -400; days <= 400; days += 37) {
        const tdb = 5e8 + days * DAY_SECONDS;
        motion.stateAndAcceleration?.(tdb, s);
        const [x = 0, y = 0, , vx = 0, vy = 0] = s;
        const energy = (vx * vx + vy * vy) / 2 - gm / Math.hypot(x, y);
        expect(Math.abs(energy + (gm * (1 - e)) / (2 * q))).toBeLessThan((1e-13 * gm) / q);
        expect((x * vy - y * vx) / Math.sqrt(gm * q * (1 + e))).toBeCloseTo(1, 13);
        motion.state(tdb - 500, before);
        motion.state(tdb + 500, after);
        for (let i = 0; i < 3; i++) {
          const slope = ((after[i] ?? 0) - (before[i] ?? 0)) / 1000;
          expect(Math.abs(slope - (s[i + 3] ?? 0))).toBeLessThan(2e-5); // the third derivative over 500 s
        }
      }
    }
  });
});
