import { describe, expect, test } from "vitest";
import { DAY_SECONDS } from "../../src/bodies/constants.ts";
import { allPairs, type PairName, pairOf } from "../../src/bodies/pair.ts";
import { JUPITER_CENTRE, POINTS, pointLabel } from "../../src/bodies/point.ts";
import { ApsidaryError } from "../../src/error.ts";

describe("pairs", () => {
  test("are the Moon about the Earth, Earth, EMB, planets and Pluto about Sun and SSB, and Jupiter's four large moons", () => {
    const orbiters = ["earth", "emb", "mercury", "venus", "mars", "jupiter", "saturn", "uranus", "neptune", "pluto"];
    const expected = [
      "moon-earth",
      ...orbiters.flatMap((o) => [`${o}-sun`, `${o}-ssb`]),
      ...["io", "europa", "ganymede", "callisto"].map((moon) => `${moon}-jupiter`),
    ];
    expect(
      allPairs()
        .map((pair) => pair.name as string)
        .sort(),
    ).toEqual(expected.sort());
  });

  test("carry the SPK ids of moving point and centre (NAIF integer id codes)", () => {
    const ids = (name: PairName) => [pairOf(name).target, pairOf(name).centre];
    expect(ids("moon-earth")).toEqual([301, 399]);
    expect(ids("earth-sun")).toEqual([399, 10]);
    expect(ids("emb-ssb")).toEqual([3, 0]);
    expect(ids("jupiter-sun")).toEqual([5, 10]); // the system's barycentre, not the planet's centre
    expect(ids("io-jupiter")).toEqual([501, 599]); // about the planet's own centre
  });

  test("are sampled several times in each half period", () => {
    for (const pair of allPairs()) {
      expect(pair.sampleSeconds).toBeGreaterThan(0);
      expect(pair.sampleSeconds).toBeLessThan(pair.halfPeriodSeconds / 4);
    }
    // half the sidereal month, 27.321661 d (Explanatory Supplement to the Astronomical Almanac; from memory)
    expect(pairOf("moon-earth").halfPeriodSeconds / DAY_SECONDS).toBeCloseTo(27.321661 / 2, 4);
  });

  test("are frozen, survive structuredClone and come back as they are when asked for with themselves", () => {
    for (const pair of allPairs()) {
      expect(Object.isFrozen(pair)).toBe(true);
      expect(structuredClone(pair)).toEqual(pair);
      expect(pairOf(pair)).toBe(pair);
      expect(pairOf(pair.name)).toBe(pair);
    }
  });

  test.each([
    ["moon-eart", "moon-earth"],
    ["jupitre-sun", "jupiter-sun"],
    ["Earth-Sun", "earth-sun"],
    ["eath-ssb", "earth-ssb"],
  ])("suggest for %s the nearest name %s", (given, near) => {
    expect(() => pairOf(given)).toThrow(`unknown pair "${given}"; did you mean "${near}"?`);
  });

  test.each(["", "sun", "toString", "__proto__", "moon-earth\nrm", "x".repeat(1_000_000)])(
    "refuse anything else in one short line that shows how a pair is written (case %#)",
    (given) => {
      try {
        pairOf(given);
        expect.unreachable();
      } catch (error) {
        expect(error).toBeInstanceOf(ApsidaryError);
        const { code, message } = error as ApsidaryError;
        expect(code).toBe("bad-pair");
        expect(message).toMatch(/^unknown pair ".*moon-earth, earth-sun.*$/);
        expect(message.length).toBeLessThan(300);
      }
    },
  );
});

describe("pointLabel", () => {
  test("names the points that have a name, and numbers the others", () => {
    expect(pointLabel(POINTS.moon)).toBe("moon");
    expect(pointLabel(0)).toBe("ssb");
    expect(pointLabel(JUPITER_CENTRE)).toBe("jupiter's own centre");
    expect(pointLabel(-31)).toBe("point -31");
  });
});
