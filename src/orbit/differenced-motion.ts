import type { Motion } from "../ephemeris/source.ts";

/**
 * Gives positions their velocities and accelerations, by central differences: of the fourth order with `step`, of the second with twenty of it.
 *
 * @param given positions; asked up to twenty steps to either side
 * @param step  seconds
 */
export function differencedMotion(given: Motion, step: number): Motion {
  const [a, b, c, d] = [new Float64Array(6), new Float64Array(6), new Float64Array(6), new Float64Array(6)];
  const around = (tdb: number, out: Float64Array): void => {
    given.state(tdb - 2 * step, a);
    given.state(tdb - step, b);
    given.state(tdb + step, c);
    given.state(tdb + 2 * step, d);
    given.state(tdb, out);
    for (let i = 0; i < 3; i++) {
      out[3 + i] = (8 * ((c[i] as number) - (b[i] as number)) - ((d[i] as number) - (a[i] as number))) / (12 * step);
    }
  };
  // a second difference over so small a step is all rounding: the acceleration takes a step twenty times as wide
  const wide = 20 * step;
  const [before, after] = [new Float64Array(6), new Float64Array(6)];
  return {
    givesVelocity: true,
    state: around,
    stateAndAcceleration(tdb, out) {
      given.state(tdb - wide, before);
      given.state(tdb + wide, after);
      around(tdb, out);
      for (let i = 0; i < 3; i++) {
        out[6 + i] = ((after[i] as number) - 2 * (out[i] as number) + (before[i] as number)) / (wide * wide);
      }
    },
  };
}
