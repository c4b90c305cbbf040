import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, test } from "vitest";
import type { ApsisKind } from "../../src/bodies/term.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { nextPassage } from "../../src/passages/next-passage.ts";
import type { Passage } from "../../src/passages/passage.ts";
import { toRow } from "../../src/passages/to-row.ts";

// Values that others published, recalled from memory (as the file says of each); sources stand in the file and in the tests' names.
const book = JSON.parse(readFileSync(new URL("../reference/handbook-values.json", import.meta.url), "utf8"));

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

/** TDB seconds past J2000 of a calendar date in TT (which TDB follows within 2 ms). */
function tt(year: number, month: number, dayWithHours: number): number {
  return (Date.UTC(year, month - 1, 1) - Date.UTC(2000, 0, 1, 12)) / 1000 + (dayWithHours - 1) * 86400;
}

function around(
  pair: "earth-sun" | "moon-earth" | "venus-sun" | "mars-sun" | "saturn-sun" | "uranus-sun",
  tdb: number,
  days: number,
  kind: ApsisKind,
): Passage {
  const found = nextPassage(ephemeris, pair, { tdbSeconds: tdb - days * 86400 }, kind);
  if (!found) throw new Error(`no ${kind} of ${pair} near ${tdb}`);
  return found;
}

describe("against published values (from memory)", () => {
  const rows = book.earthHandbook.rows as (number | null)[][];
  test.each(rows)(
    "J. Meeus, Astronomical Algorithms, 2nd ed., ch. 38 (complete VSOP87): Earth %i within 60 s, distance in its last digit",
    (...row) => {
      const [year, pm, pd, ph, pr, am, ad, ah, ar] = row as number[];
      for (const [kind, month, day, hour, au] of [
        ["periapsis", pm, pd, ph, pr],
        ["apoapsis", am, ad, ah, ar],
      ] as [ApsisKind, number, number, number, number | null][]) {
        const published = tt(year as number, month, day + hour / 24);
        const passage = around("earth-sun", published, 10, kind);
        expect(Math.abs(passage.tdbSeconds - published)).toBeLessThan(60);
        if (au !== null) expect(Math.abs(toRow(passage).distanceAu - au)).toBeLessThan(1e-6);
      }
    },
  );

  const office = book.earthOffice as { perihelion: string[]; aphelion: string[] };
  test.each([
    ...office.perihelion.map((text) => [text, "periapsis"] as const),
    ...office.aphelion.map((text) => [text, "apoapsis"] as const),
  ])("U.S. Naval Observatory, Earth's Seasons: %s UT printed alike (%s)", (text, kind) => {
    const when = Date.parse(`${text.replace(" ", "T")}Z`);
    const found = nextPassage(ephemeris, "earth-sun", new Date(when - 10 * 86400e3), kind);
    const minute = new Date(Math.round(Date.parse(toRow(found as Passage).utc) / 60e3) * 60e3);
    expect(minute.toISOString().slice(0, 16).replace("T", " ")).toBe(text);
  });

  test("IMCCE note on the perihelion of 2006: 15 h UTC on 4 January, 0.983326979 au, 147 103 622 km", () => {
    const found = nextPassage(ephemeris, "earth-sun", "2006-01-01", "periapsis") as Passage;
    const row = toRow(found);
    expect(row.utc.slice(0, 13)).toBe("2006-01-04T15");
    expect(Math.abs(row.distanceAu - book.earthNote2006.distanceAu)).toBeLessThan(2e-9);
    expect(Math.abs(row.distanceKm - book.earthNote2006.distanceKm)).toBeLessThan(1);
  });

  // Only what the built-in kernel spans is held to the kilometre here.
  const perigees = Object.entries(book.moonExtremes.perigee as Record<string, number>);
  const apogees = Object.entries(book.moonExtremes.apogee as Record<string, number>);
  const extremes = [
    ...perigees.map(([day, km]) => [day, km, "periapsis"] as const),
    ...apogees.map(([day, km]) => [day, km, "apoapsis"] as const),
  ].filter(([day]) => day > "1960" && day < "2060");
  test.each(extremes)("J. Meeus, extreme perigees and apogees of the Moon: %s, %i km (%s)", (day, km, kind) => {
    const found = nextPassage(ephemeris, "moon-earth", `${day}T00:00:00Z`, kind) as Passage;
    expect(toRow(found).utc.slice(0, 10)).toBe(day);
    // the published series and DE405 may round to neighbouring kilometres: 2034's is 356 445.4 by DE405
    expect(Math.abs(found.distanceKm - km)).toBeLessThan(1);
  });

  test("J. Meeus, Astronomical Algorithms, example 50.a: apogee of 1988-10-07 20:30 TD, parallax 3240.679″", () => {
    const found = around("moon-earth", tt(1988, 10, 7 + 20.5 / 24), 5, "apoapsis");
    expect(Math.abs(found.tdbSeconds - tt(1988, 10, 7 + 20.5 / 24))).toBeLessThan(60);
    // the example takes the parallax from a shorter series: DE405 gives 3240.672″
    const parallax = (Math.asin(6378.14 / found.distanceKm) * 180 * 3600) / Math.PI;
    expect(Math.abs(parallax - book.moonWorkedExample.equatorialHorizontalParallaxArcsec)).toBeLessThan(0.01);
  });

  test("J. Meeus, Astronomical Algorithms, ch. 38: Venus's perihelion 1978-12-31 4 h, Mars's aphelion 2032-10-24 23 h", () => {
    const venus = around("venus-sun", tt(1978, 12, 31 + 4 / 24), 20, "periapsis");
    expect(Math.abs(venus.tdbSeconds - tt(1978, 12, 31 + 4 / 24))).toBeLessThan(1800);
    const mars = around("mars-sun", tt(2032, 10, 24 + 23 / 24), 20, "apoapsis");
    expect(Math.abs(mars.tdbSeconds - tt(2032, 10, 24 + 23 / 24))).toBeLessThan(1800);
  });

  const planetDays = (["saturn", "uranus"] as const).flatMap((planet) =>
    (["perihelion", "aphelion"] as const).flatMap((term) =>
      (book.planets[planet][term] as string[])
        .filter((day) => day > "1960" && day < "2060")
        .map((day) => [planet, term, day] as const),
    ),
  );
  test.each(planetDays)("J. Meeus, Astronomical Algorithms, ch. 38: %s, %s on %s (TD)", (planet, term, day) => {
    const [y, m, d] = day.split("-").map(Number) as [number, number, number];
    const found = around(`${planet}-sun`, tt(y, m, d), 400, term === "perihelion" ? "periapsis" : "apoapsis");
    expect(toRow(found).tdb.slice(0, 10)).toBe(day);
  });
});
