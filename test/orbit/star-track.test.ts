import { describe, expect, test } from "vitest";
import { readStar, type StarGiven } from "../../src/orbit/star.ts";
import { parseStarFile } from "../../src/orbit/star-file.ts";
import { starEpoch, starTrack } from "../../src/orbit/star-track.ts";
import { messageOf, passagesOf } from "./bare.ts";

const DAY = 86400;
/** An invented binary: a₁ sin i is 734 light-seconds. */
const BINARY: StarGiven = {
  name: "star-b-star-a",
  periastronAt: "JD 2455000.25",
  periodDays: 1000,
  eccentricity: 0.6,
  argumentDeg: 65,
  k1KmS: 20,
  k2KmS: 30,
  inclinationDeg: 70,
};
const EPOCH = (2455000.25 - 2451545) * DAY;

describe("a track from the orbit of a binary star", () => {
  test.each([65, 180, 290])(
    "for ω = %i° passes its apsides when an integration of the motion and of the light says, within 0.1 s",
    async (argumentDeg) => {
      const track = starTrack({ ...BINARY, argumentDeg });
      const period = 1000 * DAY;
      const found = await passagesOf(track, EPOCH - 0.25 * period, EPOCH + 1.75 * period);
      expect(found.map((passage) => passage.kind)).toEqual(["periapsis", "apoapsis", "periapsis", "apoapsis"]);

      // the first star about the barycentre, integrated by the classical Runge–Kutta method from its periastron
      const a = (20 * period * 0.8) / (2 * Math.PI);
      const mu = a ** 3 * ((2 * Math.PI) / period) ** 2;
      const rates = ([x = 0, y = 0, vx = 0, vy = 0]: number[]) => {
        const pull = -mu / Math.hypot(x, y) ** 3;
        return [vx, vy, pull * x, pull * y];
      };
      const moved = (state: number[], by: number[], h: number) => state.map((value, i) => value + h * (by[i] ?? 0));
      let state = [a * 0.4, 0, 0, Math.sqrt((mu * 1.6) / (a * 0.4))];
      const steps = 40_000; // half a period
      const h = period / 2 / steps;
      const angle = (argumentDeg * Math.PI) / 180;
      const late = ([x = 0, y = 0]: number[]) => (x * Math.sin(angle) + y * Math.cos(angle)) / 299792.458;
      const first = late(state);
      for (let i = 0; i < steps; i++) {
        const k1 = rates(state);
        const k2 = rates(moved(state, k1, h / 2));
        const k3 = rates(moved(state, k2, h / 2));
        const k4 = rates(moved(state, k3, h));
        state = state.map(
          (value, j) => value + (h / 6) * ((k1[j] ?? 0) + 2 * (k2[j] ?? 0) + 2 * (k3[j] ?? 0) + (k4[j] ?? 0)),
        );
      }
      expect(Math.abs((state[1] ?? 0) / a)).toBeLessThan(1e-6); // it has come to its apastron
      const apastron = EPOCH + period / 2 + late(state) - first;
      expect(Math.abs((found[0]?.tdbSeconds ?? 0) - EPOCH)).toBeLessThan(0.01);
      expect(Math.abs((found[1]?.tdbSeconds ?? 0) - apastron)).toBeLessThan(0.1);
      expect(Math.abs((found[2]?.tdbSeconds ?? 0) - EPOCH - period)).toBeLessThan(0.01);
      if (argumentDeg === 65) expect(Math.abs(apastron - EPOCH - period / 2)).toBeGreaterThan(1000); // it is no small matter
    },
  );

  test("has the velocity of what is seen", () => {
    const track = starTrack(BINARY);
    const motion = track.motion(track.pair);
    const [s, before, after] = [new Float64Array(9), new Float64Array(6), new Float64Array(6)];
    for (let days = -400; days < 600; days += 90) {
      const tdb = EPOCH + days * DAY;
      motion.stateAndAcceleration?.(tdb, s);
      motion.state(tdb - 2000, before);
      motion.state(tdb + 2000, after);
      for (let i = 0; i < 6; i++) {
        const slope = ((after[i] ?? 0) - (before[i] ?? 0)) / 4000;
        const size = i < 3 ? 50 : 1e-5;
        expect(Math.abs(slope - (s[i + 3] ?? 0))).toBeLessThan(1e-6 * size);
      }
    }
  });

  test("carries the covariance of its elements to every epoch as draws from it do, within 5 %", async () => {
    // days, days, –, degrees, km/s; the epoch and the period are correlated as in a fit whose epoch lies off its middle
    const [sT, sP, rho] = [0.8, 0.05, -0.7];
    const given: StarGiven = {
      ...BINARY,
      covariance: {
        fields: ["periastronAt", "periodDays", "k1KmS", "argumentDeg"],
        matrix: [
          [sT * sT, rho * sT * sP, 0, 0],
          [rho * sT * sP, sP * sP, 0, 0],
          [0, 0, 0.25, 0],
          [0, 0, 0, 9],
        ],
      },
    };
    const star = readStar(given);
    const track = starTrack(star);
    let seed = 11;
    const uniform = () => {
      seed = (seed * 48271) % 2147483647;
      return seed / 2147483647;
    };
    const normal = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
    for (const halves of [0, 1, 12, 21, 40]) {
      const at = EPOCH + starEpoch(star.values, halves);
      const [passage] = await passagesOf(track, at - DAY, at + DAY);
      expect(passage?.kind).toBe(halves % 2 === 0 ? "periapsis" : "apoapsis");
      let [sum, squares] = [0, 0];
      const draws = 6000;
      for (let i = 0; i < draws; i++) {
        const [u, v] = [normal(), normal()];
        const epoch = starEpoch(
          {
            ...star.values,
            periastronAt: sT * u,
            periodDays: 1000 + sP * (rho * u + Math.sqrt(1 - rho * rho) * v),
            k1KmS: 20 + 0.5 * normal(),
            argumentDeg: 65 + 3 * normal(),
          },
          halves,
        );
        sum += epoch;
        squares += epoch * epoch;
      }
      const deviation = Math.sqrt(squares / draws - (sum / draws) ** 2);
      expect(Math.abs((passage?.timeUncertaintySeconds ?? 0) / (1.96 * deviation) - 1)).toBeLessThan(0.05);
      expect(passage?.accuracyBasis).toBe("user");
    }
  });

  test("takes its size from parallax and apparent axis, from both velocities, or from one", async () => {
    const distance = async (given: StarGiven) =>
      (await passagesOf(starTrack(given), EPOCH - DAY, EPOCH + DAY))[0]?.distanceKm;
    const { k1KmS, k2KmS, inclinationDeg, ...bare } = BINARY;
    const visual = { ...bare, semiMajorAxisArcsec: 0.5, parallaxMas: 100 };
    expect((await distance(visual)) ?? 0).toBeCloseTo(5 * 149597870.7 * 0.4, 1);
    const perVelocity = (1000 * DAY * 0.8) / (2 * Math.PI);
    expect((await distance(BINARY)) ?? 0).toBeCloseTo((0.4 * 50 * perVelocity) / Math.sin((70 * Math.PI) / 180), 0);
    expect((await distance({ ...bare, k1KmS: 20 })) ?? 0).toBeCloseTo(0.4 * 20 * perVelocity, 0);
    // without velocities the delay is not known: apastron says so by twice the orbit's light time
    const track = starTrack({ ...visual, sigma: { periastronAt: 0.0001 } });
    const [apastron] = await passagesOf(track, EPOCH + 499 * DAY, EPOCH + 501 * DAY);
    expect(apastron?.timeUncertaintySeconds).toBeGreaterThan(5 * 998);
    expect(track.title).toContain("not known");
  });

  test("of an eccentricity that its error reaches says that the passage is uncertain", async () => {
    const track = starTrack({ ...BINARY, eccentricity: 0.02, sigma: { eccentricity: 0.015 } });
    expect((await passagesOf(track, EPOCH - DAY, EPOCH + DAY))[0]?.existence).toBe("uncertain");
  });

  test.each([
    ["no period", { periodDays: undefined }, /periodDays is missing/],
    ["a circle", { eccentricity: 0 }, /is a circle to rounding: it has no periastron/],
    ["no size", { k1KmS: null }, /the size is missing/],
    ["an open orbit", { eccentricity: 1.1 }, /eccentricity is 1\.1; a binary's is 0 up to 1/],
    ["a misspelt element", { excentricity: 1 }, /did you mean "eccentricity"/],
    ["a text for a number", { periodDays: "long" }, /periodDays is "long", no number/],
    ["an error of nothing", { sigma: { parallaxMas: 1 } }, /error of "parallaxMas" but no such element/],
    ["a matrix that is none", { covariance: { fields: ["periodDays"], matrix: [] } }, /a row and a column for each/],
    [
      "a correlation above one",
      {
        covariance: {
          fields: ["periastronAt", "periodDays"],
          matrix: [
            [1, 2],
            [2, 1],
          ],
        },
      },
      /no covariance: that of periastronAt and periodDays/,
    ],
  ])("is refused for %s, in one line", (_, more, says) => {
    expect(messageOf(() => starTrack({ ...BINARY, ...more } as StarGiven))).toMatch(says);
  });

  test("is read from a file of one or several", () => {
    expect(parseStarFile(JSON.stringify(BINARY))).toEqual([BINARY]);
    expect(parseStarFile(JSON.stringify([BINARY, BINARY]))).toHaveLength(2);
    expect(messageOf(() => parseStarFile("{"))).toMatch(/it is no JSON/);
    expect(messageOf(() => parseStarFile("[]"))).toMatch(/holds 0 stars/);
  });
});
