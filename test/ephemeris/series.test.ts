import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { allPairs, pairOf } from "../../src/bodies/pair.ts";
import { openSeries } from "../../src/ephemeris/series.ts";
import { openedSeries, seriesBytes } from "./series-opened.ts";

const series = openedSeries();
const supplied = allPairs().filter((pair) => series.spans(pair).length > 0);
const seconds = (date: string) => (Date.parse(date) - Date.UTC(2000, 0, 1, 12)) / 1000;

describe("openSeries", () => {
  test("supplies the Moon, and the planets to Neptune, the Earth and the EMB from the Sun and from the barycentre", () => {
    const bodies = ["earth", "emb", "mercury", "venus", "mars", "jupiter", "saturn", "uranus", "neptune"];
    const names = ["moon-earth", ...bodies.map((b) => `${b}-sun`), ...bodies.map((b) => `${b}-ssb`)];
    expect(supplied.map((pair) => pair.name)).toEqual(names);
  });

  test("refuses Pluto and the moons of Jupiter, saying what there is", () => {
    for (const name of ["pluto-sun", "pluto-ssb", "io-jupiter"]) {
      expect(series.spans(pairOf(name))).toEqual([]);
      expect(() => series.motion(pairOf(name))).toThrow(
        expect.objectContaining({ code: "not-supplied", message: expect.stringContaining("moon-earth") }),
      );
    }
  });

  test("spans the years 1000 to 3000 with a day to spare, so that every clock's years lie inside", () => {
    expect(series.spans(pairOf("moon-earth"))).toEqual([
      { from: seconds("0999-12-31T00:00:00Z"), to: seconds("3001-01-02T00:00:00Z") },
    ]);
  });

  test.each(supplied.map((pair) => pair.name))("gives for %s the velocity with which its place changes", (name) => {
    const motion = series.motion(pairOf(name));
    const h = name === "moon-earth" ? 300 : 3000;
    const state = new Float64Array(6);
    const near = [-2, -1, 1, 2].map(() => new Float64Array(6));
    expect(motion.givesVelocity).toBe(true);
    for (const t of [
      seconds("1000-01-01T00:00:00Z"),
      seconds("1582-10-15T00:00:00Z"),
      0,
      seconds("3000-12-31T00:00:00Z"),
    ]) {
      motion.state(t, state);
      for (const [i, k] of [-2, -1, 1, 2].entries()) motion.state(t + k * h, near[i] as Float64Array);
      for (let k = 0; k < 3; k++) {
        const [a = 0, b = 0, c = 0, d = 0] = near.map((s) => s[k] as number);
        // five-point difference of numbers with 16 digits; the phases of the far centuries carry 1e-11 rad
        const rounding = (Math.hypot(state[0] as number, state[1] as number, state[2] as number) * 4e-11) / h;
        expect(Math.abs((a - 8 * b + 8 * c - d) / (12 * h) - (state[3 + k] as number))).toBeLessThan(rounding + 1e-9);
      }
    }
  });

  test("has the EMB on the way from the Earth to the Moon, 1 part in 82.30056 of it", () => {
    const [emb, earth, moon] = ["emb-sun", "earth-sun", "moon-earth"].map((name) => {
      const out = new Float64Array(6);
      series.motion(pairOf(name)).state(1e9, out);
      return out;
    });
    for (let k = 0; k < 6; k++) {
      const gap = (emb?.[k] as number) - (earth?.[k] as number) - (moon?.[k] as number) / 82.30056;
      // small terms of the Moon are left out here: 0.1 km each, over 82
      expect(Math.abs(gap)).toBeLessThan(k < 3 ? 0.05 : 1e-6);
    }
  });

  test("gives motions that do not disturb each other", () => {
    const [one, other] = [series.motion(pairOf("emb-ssb")), series.motion(pairOf("emb-ssb"))];
    const [a, b] = [new Float64Array(6), new Float64Array(6)];
    one.state(5e9, a);
    other.state(-5e9, b);
    one.state(5e9, b);
    expect(b).toEqual(a);
  });

  test("states an accuracy for every pair and year that never shrinks to nothing, and grows away from 1960–2060 for the Moon", () => {
    for (const pair of supplied) {
      for (let year = 1000; year <= 3000; year += 10) {
        const { rangeKm, rangeRateKmS } = series.accuracy(pair, (year - 2000) * 31557600);
        expect(rangeKm).toBeGreaterThan(0.02);
        expect(rangeRateKmS).toBeGreaterThan(1e-9);
        expect(Number.isFinite(rangeKm + rangeRateKmS)).toBe(true);
      }
    }
    const moon = (year: number) => series.accuracy(pairOf("moon-earth"), (year - 2000) * 31557600);
    expect(moon(2000).basis).toBe("measured");
    expect(moon(1900).basis).toBe("published");
    expect(moon(1000).rangeRateKmS).toBeGreaterThan(moon(1500).rangeRateKmS);
    expect(moon(1500).rangeRateKmS).toBeGreaterThan(moon(2000).rangeRateKmS);
  });

  test("tells the checksum of its two files, one after the other, and what they hold", async () => {
    const { planets, moon } = seriesBytes();
    expect(await series.checksum()).toBe(createHash("sha256").update(planets).update(moon).digest("hex"));
    expect(series.describe()).toContain("earth about sun: 2564 terms");
    expect(series.describe()).toContain("ELP/MPP02");
  });

  test("refuses files in each other's place", () => {
    const { planets, moon } = seriesBytes();
    expect(() => openSeries({ planets: moon, moon: planets })).toThrow(expect.objectContaining({ code: "bad-kernel" }));
    expect(() => openSeries({ planets, moon: planets })).toThrow(/moon.series.bin holds no series "moon"/);
  });
});
