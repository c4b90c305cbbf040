import { describe, expect, test } from "vitest";
import { departureSeconds, meanLineOf, passageNumber } from "../../src/drift/mean-line.ts";
import { findDe405 } from "../de405/fetch.ts";
import { openDe405 } from "../de405/read.ts";
import { truePassages } from "../de405/true-passages.ts";

const KINDS = ["periapsis", "apoapsis"] as const;
const DAY = 86_400;

describe("the straight line through the barycentre's passages", () => {
  test("has slopes of 365.2597 d within 0.0003 d, and so has the textbook's anomalistic year of 365.25964 d", () => {
    // 365.25964 d: P. K. Seidelmann (ed.), Explanatory Supplement to the Astronomical Almanac (1992), from memory
    for (const kind of KINDS) {
      const slope = meanLineOf("emb-sun", kind)?.slopeDays ?? Number.NaN;
      expect(Math.abs(slope - 365.2597)).toBeLessThan(0.0003);
      expect(Math.abs(slope - 365.25964)).toBeLessThan(0.0003);
    }
  });

  test("is the Earth's as well", () => {
    for (const kind of KINDS) expect(meanLineOf("earth-sun", kind)).toEqual(meanLineOf("emb-sun", kind));
  });

  test("numbers passages from the one nearest to J2000, and tells how much later than expected one is", () => {
    const line = { slopeDays: 10, interceptSeconds: 1000, years: [1960, 2059] } as const;
    expect(passageNumber(line, 1000 + 30 * DAY + 500)).toBe(3);
    expect(departureSeconds(line, 1000 + 30 * DAY + 500)).toBeCloseTo(500, 6);
    expect(departureSeconds(line, 1000 - 20 * DAY - 7)).toBeCloseTo(-7, 6);
  });

  test("is missing for Pluto, for the moons of Jupiter and about the solar-system barycentre", () => {
    for (const pair of ["pluto-sun", "io-jupiter", "earth-ssb"] as const) {
      expect(meanLineOf(pair, "periapsis")).toBeNull();
    }
  });
});

const path = findDe405();

describe.skipIf(!path)("the straight lines against DE405 as JPL made it", () => {
  const of = (pair: string, kind: string) =>
    truePassages(pair, openDe405(path as string))
      .filter((passage) => passage.kind === kind)
      .map(({ tdb }) => tdb);

  test("leave departures of 0.185 d at most for perihelia of the barycentre and 0.178 d for aphelia", () => {
    for (const [kind, most] of [
      ["periapsis", 0.185],
      ["apoapsis", 0.178],
    ] as const) {
      const line = meanLineOf("emb-sun", kind);
      const days = of("emb-sun", kind).map((tdb) => (line ? departureSeconds(line, tdb) / DAY : Number.NaN));
      expect(Math.max(...days.map(Math.abs))).toBeCloseTo(most, 3);
    }
  });

  test.each(["emb-sun", "mercury-sun", "venus-sun", "mars-sun", "moon-earth"] as const)(
    "are least squares for %s: the departures have neither mean nor trend",
    (pair) => {
      for (const kind of KINDS) {
        const line = meanLineOf(pair, kind);
        expect(line).not.toBeNull();
        if (!line) continue;
        const passages = of(pair, kind);
        const numbers = passages.map((tdb) => passageNumber(line, tdb));
        const seconds = passages.map((tdb) => departureSeconds(line, tdb));
        // no passage is skipped or told twice, and the line begins nearest to J2000
        expect(numbers.every((number, i) => i === 0 || number === (numbers[i - 1] ?? 0) + 1)).toBe(true);
        expect(numbers).toContain(0);
        const middle = numbers.reduce((sum, k) => sum + k, 0) / numbers.length;
        const trend =
          seconds.reduce((sum, s, i) => sum + s * ((numbers[i] ?? 0) - middle), 0) /
          numbers.reduce((sum, k) => sum + (k - middle) ** 2, 0);
        // the intercept is kept to 1 ms, the slope to 1e-10 d
        expect(Math.abs(seconds.reduce((sum, s) => sum + s, 0) / seconds.length)).toBeLessThan(0.01);
        expect(Math.abs(trend)).toBeLessThan(1e-4);
      }
    },
  );

  test("keep the outer planets' passages of the century within what two thousand years of VSOP87 depart by", () => {
    // days; the largest departures of the fit, years 1001 to 2998
    const most = { "jupiter-sun": 16.8, "saturn-sun": 124, "uranus-sun": 200 } as const;
    for (const [pair, days] of Object.entries(most)) {
      for (const kind of KINDS) {
        const line = meanLineOf(pair as keyof typeof most, kind);
        const departures = of(pair, kind).map((tdb) =>
          line ? Math.abs(departureSeconds(line, tdb)) / DAY : Number.NaN,
        );
        expect(Math.max(...departures)).toBeLessThan(days);
      }
    }
  });
});
