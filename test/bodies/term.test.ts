import { describe, expect, test } from "vitest";
import { allPairs, pairOf } from "../../src/bodies/pair.ts";
import { termOf } from "../../src/bodies/term.ts";

// The trade's words: common practice, no source.
describe("termOf", () => {
  test("says perihelion and aphelion only about the Sun's centre", () => {
    for (const pair of allPairs()) {
      const terms = [termOf(pair, "periapsis", "principal"), termOf(pair, "apoapsis", null)];
      if (pair.name.endsWith("-sun")) expect(terms).toEqual(["perihelion", "aphelion"]);
      else for (const term of terms) expect(term).not.toMatch(/helion/);
    }
  });

  test("says perigee and apogee only about the Earth's centre", () => {
    for (const pair of allPairs()) {
      const terms = [termOf(pair, "periapsis", null), termOf(pair, "apoapsis", "principal")];
      if (pair.name === "moon-earth") expect(terms).toEqual(["perigee", "apogee"]);
      else for (const term of terms) expect(term).not.toMatch(/gee/);
    }
  });

  test("says periapsis and apoapsis about the barycentre and about Jupiter", () => {
    for (const name of ["earth-ssb", "neptune-ssb", "io-jupiter"] as const) {
      expect(termOf(pairOf(name), "periapsis", "principal")).toBe("periapsis");
      expect(termOf(pairOf(name), "apoapsis", "principal")).toBe("apoapsis");
    }
  });

  test("calls a secondary extremum a local minimum or maximum of distance, whatever the centre", () => {
    for (const pair of allPairs()) {
      expect(termOf(pair, "periapsis", "secondary")).toBe("local minimum of distance");
      expect(termOf(pair, "apoapsis", "secondary")).toBe("local maximum of distance");
    }
  });
});
