import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, test } from "vitest";
import { auditList, type GivenRow, type ListAudit } from "../../src/audit/audit-list.ts";
import type { AuditOptions } from "../../src/audit/audit-stream.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";

// Values that others published, recalled from memory (as the file says of each), as lists in their own scale and precision.
const book = JSON.parse(readFileSync(new URL("../reference/handbook-values.json", import.meta.url), "utf8"));

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

/** No row is wrong without a cause, none is wrong with one, and nothing is said to run through the list. */
function holds(rows: readonly GivenRow[], options: AuditOptions): ListAudit {
  const audit = auditList(ephemeris, rows, options);
  const accused = audit.rows.filter(({ verdict }) => !["agrees", "undecided", "last-digit"].includes(verdict));
  expect(accused).toEqual([]);
  expect(audit.list.cause).toBeNull();
  expect(audit.rows.length).toBe(rows.length);
  return audit;
}

describe("the audit of published values (from memory)", () => {
  test("J. Meeus, Astronomical Algorithms, 2nd ed., ch. 38: the Earth 1991–2010 in TD to a hundredth of an hour, distances to 1e-6 au", () => {
    const months = ["", "Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul"];
    const rows = (book.earthHandbook.rows as (number | null)[][]).flatMap((row): GivenRow[] => {
      const [year, pm = 0, pd, ph, pr, am = 0, ad, ah, ar] = row as number[];
      const au = (value: number | undefined | null) => (typeof value === "number" ? `${value.toFixed(6)} au` : null);
      return [
        {
          pair: "earth-sun",
          kind: "perihelion",
          when: `${year} ${months[pm]} ${pd} ${ph?.toFixed(2)} h`,
          distance: au(pr),
        },
        {
          pair: "earth-sun",
          kind: "aphelion",
          when: `${year} ${months[am]} ${ad} ${ah?.toFixed(2)} h`,
          distance: au(ar),
        },
      ];
    });
    const audit = holds(rows, { scale: "tt" });
    // the complete VSOP87 and DE405 are up to 50 s apart, a unit is 36 s
    expect(audit.summary["last-digit"]).toBeLessThanOrEqual(15);
    expect(audit.rows.every(({ distanceVerdict }) => distanceVerdict === null || distanceVerdict === "agrees")).toBe(
      true,
    );
    expect(audit.missing).toEqual([]);
  });

  test("J. Meeus's times are told to be dynamical time when they are read as UT", () => {
    const rows = (book.earthHandbook.rows as number[][]).flatMap(
      ([year, , day, hours, , , far, farHours]): GivenRow[] => [
        { pair: "earth-sun", kind: "perihelion", when: `${year} Jan ${day} ${hours?.toFixed(2)} h` },
        { pair: "earth-sun", kind: "aphelion", when: `${year} Jul ${far} ${farHours?.toFixed(2)} h` },
      ],
    );
    const { list } = auditList(ephemeris, rows, { scale: "utc" });
    expect([list.cause, list.causeDetail]).toEqual(["scale-tt", "TT"]);
  });

  test("U.S. Naval Observatory, Earth's Seasons: 2020–2026 in UT to the minute, all agree", () => {
    const rows = (["perihelion", "aphelion"] as const).flatMap((kind) =>
      (book.earthOffice[kind] as string[]).map((when): GivenRow => ({ pair: "earth-sun", kind, when })),
    );
    expect(holds(rows, { scale: "utc" }).summary.agrees).toBe(14);
  });

  test("IMCCE note on the perihelion of 2006: the hour, 0.983326979 au and 147 103 622 km", () => {
    const row = { pair: "earth-sun", kind: "perihelion", when: `${book.earthNote2006.utcHour}` };
    holds([{ ...row, distance: `${book.earthNote2006.distanceAu} au` }], { scale: "utc" });
    expect(holds([{ ...row, distance: `${book.earthNote2006.distanceKm} km` }], {}).summary.agrees).toBe(1);
  });

  test("J. Meeus, extreme perigees and apogees of the Moon, Sky & Telescope 1981 and Astronomical Algorithms ch. 50: days and kilometres", () => {
    const rows = [
      ...Object.entries(book.moonExtremes.perigee).map(([when, km]) => ({
        pair: "moon-earth",
        kind: "perigee",
        when,
        distance: `${km} km`,
      })),
      ...Object.entries(book.moonExtremes.apogee).map(([when, km]) => ({
        pair: "moon-earth",
        kind: "apogee",
        when,
        distance: `${km} km`,
      })),
    ];
    holds(rows, { scale: "tt" });
  });

  test("J. Meeus, Astronomical Algorithms, example 50.a: the apogee of 1988-10-07 20:30 TD", () => {
    const row = { pair: "moon-earth", kind: "apogee", when: book.moonWorkedExample.td };
    expect(holds([row], { scale: "tt" }).summary.agrees).toBe(1);
  });

  test("J. Meeus, Astronomical Algorithms, ch. 38: Venus and Mars to the hour, Saturn and Uranus to the day (TD)", () => {
    const { planets } = book;
    const rows: GivenRow[] = [
      { pair: "venus-sun", kind: "perihelion", when: `${planets.venusPerihelion}h` },
      { pair: "mars-sun", kind: "aphelion", when: `${planets.marsAphelion}h` },
      ...["saturn", "uranus"].flatMap((planet) =>
        ["perihelion", "aphelion"].flatMap((kind) =>
          (planets[planet][kind] as string[]).map((when): GivenRow => ({ pair: `${planet}-sun`, kind, when })),
        ),
      ),
    ];
    holds(rows, { scale: "tt" });
  });
});
