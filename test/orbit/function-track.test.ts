import { describe, expect, test } from "vitest";
import { elementsTrack } from "../../src/orbit/elements-track.ts";
import { functionTrack } from "../../src/orbit/function-track.ts";
import { messageOf, passagesOf } from "./bare.ts";

const PERIOD = 1e5;
const N = (2 * Math.PI) / PERIOD;
/** An ellipse about its middle: extrema every quarter of the period. */
const ellipse = (t: number) => [
  7000 * Math.cos(N * t),
  8000 * Math.sin(N * t),
  0,
  -7000 * N * Math.sin(N * t),
  8000 * N * Math.cos(N * t),
  0,
];
const span = { from: 0, to: 1e6 };
const track = (state: (t: number) => ArrayLike<number>) =>
  functionTrack({ name: "probe-x", state, span, periodSeconds: PERIOD / 2 });

describe("a track from a function of time", () => {
  test.each([
    ["position and velocity", 6],
    ["positions alone", 3],
  ])("passes its extrema where Kepler has them, given %s", async (_, count) => {
    const T = 7.5e8;
    const kepler = elementsTrack({
      name: "kepler-earth",
      about: "earth",
      semiMajorAxisKm: 60000,
      eccentricity: 0.4,
      periapsisAt: T,
    });
    const half = kepler.pair.halfPeriodSeconds;
    const motion = kepler.motion(kepler.pair);
    const out = new Float64Array(6);
    const given = functionTrack({
      name: "probe-earth",
      about: "earth",
      span: { from: T + 0.3 * half, to: T + 9.5 * half },
      periodSeconds: 2 * half,
      state: (tdb) => {
        motion.state(tdb, out);
        return out.subarray(0, count);
      },
    });
    const found = await passagesOf(given, T + 0.4 * half, T + 9.4 * half);
    expect(found).toHaveLength(9);
    found.forEach((passage, i) => {
      expect(Math.abs(passage.tdbSeconds - (T + (i + 1) * half))).toBeLessThan(1e-4);
      expect(passage.timeUncertaintySeconds).toBeGreaterThan(1e-3); // a millionth is assumed, and said to be
      expect(passage.accuracyBasis).toBe("assumed");
    });
  });

  test.each([
    ["throws", (t: number) => (t > 5e5 ? JSON.parse("no") : ellipse(t)), /threw \(.*\) at 2000-01-07T0[67]:/],
    [
      "gives NaN",
      (t: number) => (t > 5e5 ? [Number.NaN, 0, 0, 0, 0, 0] : ellipse(t)),
      /gave NaN, no number, at 2000-01-07T0/,
    ],
    ["gives two numbers", () => [1, 2], /gave 2 numbers, not 3 or 6, at 2000-01-01T12:00:00/],
    ["gives nothing", () => undefined as unknown as number[], /gave no array/],
    [
      "gives three numbers, then six",
      (t: number) => ellipse(t).slice(0, t > 5e5 ? 6 : 3),
      /gave 6 numbers, and 3 before/,
    ],
    [
      "jumps by three kilometres",
      (t: number) => ellipse(t).map((x, i) => (i === 0 && t > 512345 ? x + 3 : x)),
      /jumps at 2000-01-07T10:19:05/,
    ],
    [
      "jumps, without velocity",
      (t: number) =>
        ellipse(t)
          .slice(0, 3)
          .map((x, i) => (i === 0 && t > 512345 ? x + 3 : x)),
      /jumps at 2000-01-07T10:19:05/,
    ],
    [
      "tells velocities in m/s",
      (t: number) => ellipse(t).map((x, i) => (i > 2 ? 1000 * x : x)),
      /velocity of probe-x contradicts/,
    ],
    [
      "has velocities one in ten thousand too large",
      (t: number) => ellipse(t).map((x, i) => (i > 2 ? 1.0001 * x : x)),
      /velocity of probe-x contradicts its position at 2000-01-01T12:00:00/,
    ],
    [
      "begins to contradict itself later",
      (t: number) => ellipse(t).map((x, i) => (i > 2 && t > 7e5 ? 1.01 * x : x)),
      /velocity of probe-x contradicts its position at 2000-01-09T1[45]:/,
    ],
  ])("is refused when it %s, with the time where it does", (_, state, says) => {
    expect(messageOf(() => track(state))).toMatch(says);
  });

  test("is taken when its velocity is off by a millionth, as rounding makes it", () => {
    expect(messageOf(() => track((t) => ellipse(t).map((x, i) => (i > 2 ? x * (1 + 1e-6) : x))))).toBe("accepted");
  });
});
