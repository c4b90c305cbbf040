import { describe, expect, it } from "vitest";
import { openSky } from "../../src/sky/open-sky.ts";

const sky = await openSky();
const DAY = 86_400;
const names: readonly [string, string] = ["astronomia", "astronomia/data/vsop87Bearth"]; // without types
const tdb = (text: string) => (Date.parse(`${text}Z`) - Date.UTC(2000, 0, 1, 12)) / 1000;

/** Seconds: the Sun's longitude is good to 2″ from 1900 to 2100, and the Sun takes 24 s for 1″. */
const TOLERANCE = 50;

describe("solsticeBefore", () => {
  it("finds the June solstice of a published example", () => {
    // J. Meeus, Astronomical Algorithms (2nd ed., 1998), example 27.b, with the complete VSOP87: 1962 June 21, 21:24:42 TD.
    const found = sky.solsticeBefore(tdb("1962-12-31T00:00:00"), "june");
    expect(Math.abs(found - tdb("1962-06-21T21:24:42"))).toBeLessThan(TOLERANCE);
  });

  it.each([
    // Meeus, table 27.E, TD; from memory.
    ["june", "2000-06-21T01:48:46"],
    ["june", "2003-06-21T19:11:32"],
    ["june", "2005-06-21T06:47:12"],
    ["december", "1996-12-21T14:06:56"],
    ["december", "2000-12-21T13:38:30"],
    ["december", "2004-12-21T12:42:40"],
  ] as const)("finds the %s solstice of %s", (which, text) => {
    expect(Math.abs(sky.solsticeBefore(tdb(text) + 100 * DAY, which) - tdb(text))).toBeLessThan(TOLERANCE);
  });

  it("agrees with the package astronomia, which has the complete VSOP87, from 1900 to 2100", async () => {
    const { planetposition, solstice: published } = (await import(names[0])) as {
      planetposition: { Planet: new (series: unknown) => object };
      solstice: Record<"june2" | "december2", (year: number, earth: object) => number>;
    };
    const { default: series } = (await import(names[1])) as { default: unknown };
    const earth = new planetposition.Planet(series);
    for (let year = 1900; year <= 2100; year += 7) {
      const newYear = tdb(`${year + 1}-01-01T00:00:00`);
      for (const [which, julian] of [
        ["june", published.june2(year, earth)],
        ["december", published.december2(year, earth)],
      ] as const) {
        const difference = sky.solsticeBefore(newYear, which) - (julian - 2_451_545) * DAY;
        expect(Math.abs(difference), `${which} ${year}`).toBeLessThan(TOLERANCE);
      }
    }
  });

  it("gives the last one at or before the instant, to the second", () => {
    const solstice = sky.solsticeBefore(tdb("2027-01-01T00:00:00"), "december");
    expect(Math.abs(sky.solsticeBefore(solstice + 1, "december") - solstice)).toBeLessThan(0.5);
    const before = sky.solsticeBefore(solstice - 1, "december");
    expect(solstice - before).toBeGreaterThan(365.2 * DAY);
    expect(solstice - before).toBeLessThan(365.3 * DAY);
    for (let i = 0; i < 300; i++) {
      const at = (i - 150) * 1.2345 * DAY * 2000;
      for (const which of ["june", "december"] as const) {
        const found = sky.solsticeBefore(at, which);
        expect(found).toBeLessThanOrEqual(at);
        expect(at - found).toBeLessThan(365.3 * DAY);
      }
    }
  });
});
