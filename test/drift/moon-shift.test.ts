import { expect, test } from "vitest";
import { pairOf } from "../../src/bodies/pair.ts";
import { driftAccount } from "../../src/drift/drift-account.ts";
import { moonShift } from "../../src/drift/moon-shift.ts";
import { supplyOf } from "../../src/drift/supply-near.ts";
import { rangeFunction } from "../../src/passages/range-function.ts";
import { builtIn, correlation, rms } from "./sources.ts";

const ephemeris = await builtIn();
const century = driftAccount(ephemeris, { from: "1960", to: "2060" });

function shiftOf(row: (typeof century)[number]) {
  const tdb = row.tdbSeconds - (row.bodyMinusBarycentreHours ?? 0) * 3600;
  const supply = supplyOf(ephemeris, "earth-sun", row.source, tdb, "auto");
  if (!supply) throw new Error("the kernel supplies the Earth");
  return { tdb, supply, shift: moonShift(supply.range, tdb) };
}

test("the Moon swings the Earth's range acceleration between 522 and 1009 km/d² at perihelion", () => {
  const accelerations = century
    .filter((row) => row.kind === "periapsis")
    .map((row) => shiftOf(row).shift.rangeAccelerationKmPerDay2);
  expect(Math.min(...accelerations)).toBeCloseTo(522, -0.5);
  expect(Math.max(...accelerations)).toBeCloseTo(1009, -0.5);
});

test("the first order is off by 0.7 h in the mean at perihelion; over the barycentre's acceleration it would be 3 h", () => {
  const rows = century.filter((row) => row.kind === "periapsis");
  const exact = rows.map((row) => row.bodyMinusBarycentreHours ?? Number.NaN);
  const own = rows.map((row) => shiftOf(row).shift.firstOrderHours);
  expect(rms(own.map((hours, i) => hours - (exact[i] ?? 0)))).toBeCloseTo(0.67, 1);
  const barycentres = rows.map((row) => {
    const { tdb, shift } = shiftOf(row);
    const measures = new Float64Array(2);
    supplyOf(ephemeris, "emb-sun", row.source, tdb, "auto")?.range.measure(tdb, measures);
    return (-shift.rangeRateKmPerDay / ((measures[1] as number) * 86400 ** 2)) * 24;
  });
  expect(correlation(barycentres, exact)).toBeCloseTo(0.991, 3);
  expect(rms(barycentres.map((hours, i) => hours - (exact[i] ?? 0)))).toBeCloseTo(3, 0);
});

test("one term more leaves two to three minutes", () => {
  for (const kind of ["periapsis", "apoapsis"] as const) {
    const rows = century.filter((row) => row.kind === kind);
    const minutes = rows.map((row) => (shiftOf(row).shift.secondOrderHours - (row.bodyMinusBarycentreHours ?? 0)) * 60);
    // measured on DE405: rms 1.9 min at perihelion, 2.8 at aphelion
    expect(rms(minutes)).toBeLessThan(3);
    expect(Math.max(...minutes.map(Math.abs))).toBeLessThan(9);
  }
});

test("a source without velocities gives the same shift within a second", () => {
  const row = century[120];
  if (!row) throw new Error("a century has more rows");
  const { tdb, supply, shift } = shiftOf(row);
  const motion = supply.source.motion(pairOf("earth-sun"));
  const positions = rangeFunction({ givesVelocity: false, state: motion.state }, "positions alone");
  expect(Math.abs(moonShift(positions, tdb).firstOrderHours - shift.firstOrderHours) * 3600).toBeLessThan(1);
});
