import { describe, expect, test } from "vitest";
import { ApsidaryError } from "../../src/error.ts";
import { rangeFunction } from "../../src/passages/range-function.ts";
import { type Extremum, scanExtrema } from "../../src/passages/scan-extrema.ts";
import { moon, syntheticSource } from "./synthetic.ts";

const DAY = 86400;

function extrema(
  distance: (t: number) => number,
  rate: ((t: number) => number) | undefined,
  span: { from: number; to: number },
  step: number,
): Extremum[] {
  const source = syntheticSource("made", [span], distance, rate);
  const next = scanExtrema(rangeFunction(source.motion(moon), "made"), span, { sampleSeconds: step }, span.from);
  const found: Extremum[] = [];
  for (let e = next(); e; e = next()) found.push(e);
  return found;
}

describe("the scan for extrema", () => {
  test("finds two extrema that hide between samples because the range rate only dips across zero", () => {
    // ρ̇ = 1 − d/(1 + (t/w)²) dips below zero for |t| < w √(d − 1): narrower here than the step
    const width = 2 * DAY;
    const depth = 1.05;
    const rate = (t: number) => 1 - depth / (1 + ((t - 0.3 * DAY) / width) ** 2);
    const distance = (t: number) => 1e9 + t - depth * width * Math.atan((t - 0.3 * DAY) / width);
    const half = width * Math.sqrt(depth - 1);
    for (const step of [2 * DAY, 4 * DAY]) {
      const found = extrema(distance, rate, { from: -50 * DAY, to: 50 * DAY }, step);
      expect(found.map((e) => e.kind)).toEqual(["apoapsis", "periapsis"]);
      expect(found[0]?.tdb).toBeCloseTo(0.3 * DAY - half, 1);
      expect(found[1]?.tdb).toBeCloseTo(0.3 * DAY + half, 1);
    }
  });

  test("finds no extremum where the range rate turns just short of zero", () => {
    const rate = (t: number) => 1 - 0.999 / (1 + (t / DAY) ** 2);
    expect(extrema((t) => 1e9 + t, rate, { from: -50 * DAY, to: 50 * DAY }, DAY)).toEqual([]);
  });

  test("finds two extrema that hide in the first or last step of the span", () => {
    const rate = (t: number) => 1 - 1.2 / (1 + ((t - 0.4 * DAY) / (0.5 * DAY)) ** 2);
    expect(extrema((t) => 1e9 + t, rate, { from: 0, to: 30 * DAY }, 3 * DAY)).toHaveLength(2);
    const late = (t: number) => rate(30 * DAY - t);
    expect(extrema((t) => 1e9 + t, late, { from: 0, to: 30 * DAY }, 3 * DAY)).toHaveLength(2);
  });

  test("finds extrema that fall on a sample", () => {
    const n = Math.PI / (10 * DAY);
    const found = extrema(
      (t) => 1e6 - 1e4 * Math.cos(n * t),
      (t) => 1e4 * n * Math.sin(n * t),
      { from: -25 * DAY, to: 25 * DAY },
      DAY,
    );
    expect(found.map((e) => Math.round(e.tdb / DAY))).toEqual([-20, -10, 0, 10, 20]);
    expect(found.map((e) => e.kind)).toEqual(["periapsis", "apoapsis", "periapsis", "apoapsis", "periapsis"]);
  });

  test("finds the same extrema on distances alone, to what their flatness allows", () => {
    const n = (2 * Math.PI) / (27.55 * DAY);
    const found = extrema(
      (t) => 384400 - 20000 * Math.cos(n * t),
      undefined,
      { from: -40 * DAY, to: 40 * DAY },
      2.75 * DAY,
    );
    expect(found.map((e) => e.kind)).toEqual(["periapsis", "apoapsis", "periapsis", "apoapsis", "periapsis"]);
    // √(2 ε r / r̈) with r = 404 400 km, r̈ = 20 000 n² km/s²: 0.03 s; and the tolerance of 0.05 s
    for (const [i, e] of found.entries()) expect(Math.abs(e.tdb - (i - 2) * 13.775 * DAY)).toBeLessThan(0.1);
  });

  test("says which source gave no number, and when, instead of skipping it", () => {
    const rate = (t: number) => (t > 5 * DAY ? Number.NaN : 1);
    let error: unknown;
    try {
      extrema((t) => 1e9 + t, rate, { from: 0, to: 10 * DAY }, DAY);
    } catch (caught) {
      error = caught;
    }
    expect(error).toBeInstanceOf(ApsidaryError);
    expect((error as ApsidaryError).code).toBe("bad-state");
    expect((error as ApsidaryError).message).toMatch(/^made gave no number for 518400 s/);
  });
});
