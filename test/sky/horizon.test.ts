import { expect, test } from "vitest";
import { engineLibrary } from "../../src/ephemeris/engine-library.ts";
import { LOOK } from "../../src/sky/horizon.ts";
import { earthTurn } from "../../src/sky/horizon-turn.ts";
import { ut1Days, ut1Uncertainty } from "../../src/sky/horizon-ut1.ts";
import { openSky } from "../../src/sky/open-sky.ts";
import { topocentricFrame } from "../../src/sky/topocentric-frame.ts";
import { builtInLeapSeconds } from "../../src/time/leap-seconds.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";

// ERFA 2.0.0.1, gd2gc for WGS 84.
test.each([
  [46.5, 8, 2100, [4356.801376662339, 612.3085021086532, 4605.203684824752]],
  [-90, 0, 2835, [0, 0, -6359.587314245179]],
  [0, 180, -430, [-6377.707, 0, 0]],
  [31.5, -110.25, 8849, [-1886.6069238735906, -5113.871836351837, 3317.9106073597]],
])("the site %f, %f, %f m stands where ERFA puts it, to a micrometre", (latitudeDeg, longitudeDeg, heightM, wanted) => {
  const { place, up, north, east } = topocentricFrame({ latitudeDeg, longitudeDeg, heightM });
  place.forEach((x, i) => {
    expect(Math.abs(x - (wanted[i] as number))).toBeLessThan(1e-9);
  });
  const dot = (a: readonly number[], b: readonly number[]) => a.reduce((sum, x, i) => sum + x * (b[i] as number), 0);
  for (const v of [up, north, east]) expect(dot(v, v)).toBeCloseTo(1, 14);
  for (const [a, b] of [
    [up, north],
    [up, east],
    [north, east],
  ] as const)
    expect(dot(a, b)).toBeCloseTo(0, 14);
});

test("the Earth of 2026-01-03 00:00 UTC stands within 0.8″ of ERFA's (pnm06a, gst06a, UT1 − UTC of IERS C04)", async () => {
  const m = new Float64Array(9);
  earthTurn(await engineLibrary(), builtInLeapSeconds()).matrix(tdbOf("2026-01-03"), m);
  // ERFA 2.0.0.1: rz(gst06a, pnm06a) with UT1 − UTC = 0.0743754 s
  const wanted = [
    -0.21301694348921035, 0.9770483723058357, 0.0005098637381628228, -0.9770452085798659, -0.21301755134358627,
    0.0024866062633627376, 0.002538144527206391, 3.152934348210623e-5, 0.9999967784089403,
  ];
  // seasons of ΔT, 0.05 s, are 0.75″: the table is half-yearly
  wanted.forEach((x, i) => {
    expect(Math.abs((m[i] as number) - x)).toBeLessThan(4e-6);
  });
});

test("the Earth's clock is TT − ΔT up to 2026, UTC after it, and says how far it may be off", () => {
  const leaps = builtInLeapSeconds();
  // IERS C04: UT1 − UTC is 0.0743754 s on 2026-01-03
  const dut1 = (utc: string, days: number) => (ut1Days(tdbOf(utc), leaps) - days) * 86_400;
  expect(Math.abs(dut1("2026-01-03", 9498.5) - 0.0743754)).toBeLessThan(0.05);
  expect(Math.abs(dut1("2040-01-01", 14_609.5))).toBeLessThan(1e-4);
  expect(ut1Uncertainty(tdbOf("2010"), leaps)).toBeLessThan(0.1);
  expect(ut1Uncertainty(tdbOf("2040"), leaps)).toBeGreaterThanOrEqual(0.9);
  expect(ut1Uncertainty(tdbOf("-000500"), leaps)).toBeGreaterThan(100);
});

test("a place is told the same whatever was asked before, and the altitude alone is that of the whole look", async () => {
  const sky = await openSky();
  const site = { latitudeDeg: 46.5, longitudeDeg: 8, heightM: 2100 };
  const [one, other] = [sky.horizon(site), sky.horizon(site)];
  const place = Float64Array.of(2e5, -2.5e5, 1e5);
  const [a, b] = [new Float64Array(4), new Float64Array(4)];
  for (let i = 0; i < 3000; i++) other.look(8e8 + i * 10_000, place, b);
  for (const tdb of [820_732_607, 820_732_607 - 512 * 21_600, -5e9]) {
    one.look(tdb, place, a);
    other.look(tdb, place, b);
    expect([...b]).toEqual([...a]);
    expect(one.altitude(tdb, place)).toBeCloseTo(a[LOOK.altitude] as number, 11);
  }
});

test("the site's place in space turns with the sky: a body in its zenith line stands 90° up and as far as it is high", async () => {
  const sky = await openSky();
  const horizon = sky.horizon({ latitudeDeg: 0, longitudeDeg: 77, heightM: 0 });
  const [place, seen] = [new Float64Array(3), new Float64Array(4)];
  horizon.place(8e8, place);
  for (let i = 0; i < 3; i++) place[i] = 2 * (place[i] as number);
  horizon.look(8e8, place, seen);
  expect(seen[LOOK.altitude]).toBeCloseTo(90, 5);
  expect(seen[LOOK.distance]).toBeCloseTo(6378.137, 6);
});
