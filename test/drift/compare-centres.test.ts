import { describe, expect, test } from "vitest";
import { compareCentres } from "../../src/drift/compare-centres.ts";
import { passages } from "../../src/passages/passages.ts";
import { findDe405 } from "../de405/fetch.ts";
import { openDe405 } from "../de405/read.ts";
import { truePassages } from "../de405/true-passages.ts";
import { builtIn, nearestTo } from "./sources.ts";

const ephemeris = await builtIn();
const perihelion2020 = [...passages(ephemeris, "earth-sun", { from: "2020", to: "2020-02" })][0];
if (!perihelion2020) throw new Error("2020 has a perihelion");

describe("the same passage about other centres", () => {
  test("has four instants and distances for the Earth, in one order, whichever is given", () => {
    const centres = compareCentres(ephemeris, perihelion2020);
    expect(centres.map(({ pair }) => pair)).toEqual(["earth-sun", "emb-sun", "earth-ssb", "emb-ssb"]);
    const [, barycentre] = passages(ephemeris, "emb-sun", { from: "2019-12", to: "2021", kind: "periapsis" });
    expect(barycentre).toBeUndefined();
    for (const given of passages(ephemeris, "emb-ssb", { from: "2019-12", to: "2020-02", kind: "periapsis" })) {
      expect(compareCentres(ephemeris, given)).toEqual(centres);
    }
  });

  test("tells differences from the first pair", () => {
    const [first, ...others] = compareCentres(ephemeris, perihelion2020);
    expect(first).toMatchObject({ laterHours: 0, fartherKm: 0 });
    for (const centre of others) {
      expect(centre.laterHours).toBeCloseTo(((centre.tdbSeconds ?? 0) - (first?.tdbSeconds ?? 0)) / 3600, 5);
      expect(centre.fartherKm).toBeCloseTo((centre.distanceKm ?? 0) - (first?.distanceKm ?? 0), 2);
    }
  });

  test("wanders from −33 to +35 days about the solar-system barycentre, 1960–2059", () => {
    const days = [...passages(ephemeris, "earth-sun", { from: "1960", to: "2060" })].map(
      (passage) => (compareCentres(ephemeris, passage)[2]?.laterHours ?? Number.NaN) / 24,
    );
    expect(Math.min(...days)).toBeCloseTo(-33, 0);
    expect(Math.max(...days)).toBeCloseTo(35.4, 0);
  });

  test("compares Sun's centre and barycentre for another planet", () => {
    for (const passage of passages(ephemeris, "jupiter-sun", { from: "2023", to: "2024" })) {
      const centres = compareCentres(ephemeris, passage);
      expect(centres.map(({ pair }) => pair)).toEqual(["jupiter-sun", "jupiter-ssb"]);
      expect(centres[0]?.tdbSeconds).toBeCloseTo(passage.tdbSeconds, 3);
    }
  });

  test("is null where the sources end before the passage", () => {
    for (const passage of passages(ephemeris, "neptune-sun", { from: "2049", to: "2050", source: "kernel" })) {
      expect(compareCentres(ephemeris, passage, "kernel")[1]).toEqual({
        pair: "neptune-ssb",
        tdbSeconds: null,
        distanceKm: null,
        laterHours: null,
        fartherKm: null,
        timeUncertaintySeconds: null,
        source: null,
      });
    }
  });

  test("refuses a pair that has one centre only, in one line", () => {
    const [perigee] = passages(ephemeris, "moon-earth", { from: "2020", to: "2020-02" });
    expect(() => perigee && compareCentres(ephemeris, perigee)).toThrow(/^centres are compared .* one centre only\.$/);
  });
});

const path = findDe405();

test.skipIf(!path)("the four instants are DE405's within 0.5 s, the distances within 10 m", () => {
  const de405 = openDe405(path as string);
  for (const passage of passages(ephemeris, "earth-sun", { from: "2000", to: "2030" })) {
    for (const { pair, tdbSeconds, distanceKm } of compareCentres(ephemeris, passage)) {
      const truth = nearestTo(truePassages(pair, de405), passage.kind, passage.tdbSeconds);
      expect(Math.abs((tdbSeconds ?? 0) - truth.tdb)).toBeLessThan(0.5);
      expect(Math.abs((distanceKm ?? 0) - truth.distanceKm)).toBeLessThan(0.01);
    }
  }
});
