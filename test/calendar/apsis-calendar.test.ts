import { readFileSync } from "node:fs";
import { DateTime } from "luxon";
import { beforeAll, describe, expect, test } from "vitest";
import { apsisCalendar, CALENDAR_PAIRS, type CalendarQuery } from "../../src/calendar/apsis-calendar.ts";
import { CALENDAR_FIELDS, type CalendarRow } from "../../src/calendar/calendar-row.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { openSky } from "../../src/sky/open-sky.ts";

const handbook = JSON.parse(readFileSync(new URL("../reference/handbook-values.json", import.meta.url), "utf8"));

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

function calendar(query: CalendarQuery): CalendarRow[] {
  return [...apsisCalendar(ephemeris, query)];
}

function only(rows: readonly CalendarRow[]): CalendarRow {
  expect(rows).toHaveLength(1);
  return rows[0] as CalendarRow;
}

describe("a calendar", () => {
  // U.S. Naval Observatory, Earth's Seasons (from memory): printed to the minute, UT.
  test("prints the national office's minutes of perihelion and aphelion for 2020 to 2026", () => {
    const rows = calendar({ years: [2020, 2026], zone: "UTC", pairs: ["earth-sun"] });
    const printed = (term: string) => rows.filter((row) => row.term === term).map((row) => row.printed);
    expect(printed("perihelion")).toEqual(handbook.earthOffice.perihelion);
    expect(printed("aphelion")).toEqual(handbook.earthOffice.aphelion);
  });

  // J. Meeus, extreme perigees and apogees (from memory): days and km, see the reference file.
  test.each([
    ["apogee", "1984-03-02", "farthest"],
    ["perigee", "2016-11-14", "nearest"],
    ["perigee", "2034-11-25", "nearest"],
  ])("flags the %s of %s as %s of its year and of many years", (term, date, most) => {
    const rows = calendar({ years: Number(date.slice(0, 4)), zone: "UTC", pairs: ["moon-earth"] });
    const row = only(rows.filter(({ notes }) => notes.some((note) => note.endsWith("-since"))));
    expect(row.term).toBe(term);
    expect(row.printed.slice(0, 10)).toBe(date);
    expect(Math.abs(Number(row.printedKm) - handbook.moonExtremes[term][date])).toBeLessThanOrEqual(1);
    expect(row.notes).toContain(`${most}-of-year`);
    expect(row.notes).toContain(`${most}-since`);
  });

  // The neighbours in the same list of extremes: 2016 lies between 1948 and 2034, 2034 between 1930 and 2052.
  test("looks up since when and until when a perigee is the nearest", () => {
    const record = (year: number) =>
      only(
        calendar({ years: year, zone: "UTC", pairs: ["moon-earth"] }).filter(({ notes }) =>
          notes.includes("nearest-since"),
        ),
      );
    const of2016 = record(2016);
    expect([of2016.sinceUtc?.slice(0, 10), of2016.untilUtc?.slice(0, 10)]).toEqual(["1948-01-26", "2034-11-25"]);
    expect([of2016.sinceCertain, of2016.untilCertain]).toEqual([true, true]);
    const of2034 = record(2034);
    expect([of2034.sinceUtc?.slice(0, 10), of2034.untilUtc?.slice(0, 10)]).toEqual(["1930-01-15", "2052-12-06"]);
  });

  // The phases of 2026 from an independent theory of Sun and Moon.
  test("notes new and full Moon within 24 hours of a passage, with the hours, and no others", async () => {
    const sky = await openSky();
    for (const row of calendar({ years: 2026, zone: "UTC", pairs: ["moon-earth"] })) {
      const apart = (["New", "Full"] as const).map((name) => {
        const phase = name === "New" ? sky.nearestNewMoon(row.tdbSeconds) : sky.nearestFullMoon(row.tdbSeconds);
        return { note: `near-${name.toLowerCase()}-moon`, hours: -phase.hoursAway };
      });
      for (const { note, hours } of apart) {
        expect(row.notes.includes(note as CalendarRow["notes"][number])).toBe(Math.abs(hours) <= 24);
        // both theories are good to seconds
        if (Math.abs(hours) <= 24) expect(Math.abs((row.phaseHours ?? Number.NaN) - hours)).toBeLessThan(0.01);
      }
    }
  });

  // From the office's minutes: 2025-01-04 13:28 to 2026-01-03 17:16, 2025-07-03 19:55 to 2026-07-06 17:31.
  test("tells by how much the Earth's dates moved since last year", () => {
    const [perihelion, aphelion] = calendar({ years: 2026, zone: "UTC", pairs: ["earth-sun"] });
    expect(perihelion?.notes).toContain("earlier-than-last-year");
    expect(perihelion?.dateStepHours).toBeCloseTo(-20.2, 1);
    expect(aphelion?.notes).toContain("later-than-last-year");
    expect(aphelion?.dateStepHours).toBeCloseTo(69.6, 1);
  });

  // Astronomical Almanac values in general use (from memory): the Sun's diameter 32′32″ and 31′27″, the Moon's about 29.4′ to 33.5′.
  test("tells how the body looks: diameter, size and light against the mean, speed", () => {
    const [perihelion, aphelion] = calendar({ years: 2026, zone: "UTC", pairs: ["earth-sun"] });
    expect(perihelion?.diameterArcmin).toBeCloseTo(32 + 31 / 60, 1);
    expect(aphelion?.diameterArcmin).toBeCloseTo(31 + 27 / 60, 1);
    // 30.29 and 29.29 km/s, common practice
    expect(perihelion?.speedKmS).toBeCloseTo(30.29, 1);
    expect(aphelion?.speedKmS).toBeCloseTo(29.29, 1);
    const row = perihelion as CalendarRow;
    expect((1 + row.sizePercent / 100) ** 2).toBeCloseTo(1 + row.lightPercent / 100, 5);
    const moon = calendar({ years: 2016, zone: "UTC", pairs: ["moon-earth"] }).map((each) => each.diameterArcmin ?? 0);
    expect(Math.max(...moon)).toBeCloseTo(33.5, 1);
    expect(Math.min(...moon)).toBeCloseTo(29.4, 1);
  });

  test("has every field of its list in every row, and nothing that does not survive structuredClone", () => {
    for (const row of calendar({ years: 2027, zone: "Asia/Kathmandu" })) {
      expect(Object.keys(row)).toEqual([...CALENDAR_FIELDS]);
      expect(structuredClone(row)).toEqual(row);
      expect(Object.isFrozen(row)).toBe(true);
    }
  });

  test("joined, the calendars of single years are the calendar of the span", () => {
    const zone = "Pacific/Chatham";
    const whole = calendar({ years: [2025, 2028], zone });
    expect([2025, 2026, 2027, 2028].flatMap((year) => calendar({ years: year, zone }))).toEqual(whole);
  });

  test("marks UTC as predicted after the leap-second list expires, and not before", () => {
    const rows = calendar({ years: 2027, zone: "UTC", pairs: ["moon-earth"] });
    for (const row of rows) expect(row.notes.includes("predicted-utc")).toBe(row.utcBasis === "predicted");
    expect(rows.some(({ notes }) => notes.includes("predicted-utc"))).toBe(true);
  });

  test("notes secondary passages, and leaves them out where only principal ones are asked for", () => {
    const query = { years: [2040, 2052], zone: "UTC", pairs: ["neptune-sun"] } as const;
    const all = calendar(query);
    expect(all.some(({ notes }) => notes.includes("secondary"))).toBe(true);
    expect(calendar({ ...query, rank: "principal" }).some(({ notes }) => notes.includes("secondary"))).toBe(false);
  });

  test("covers the Earth, the Moon and the planets where no pairs are named", () => {
    const pairs = new Set(calendar({ years: [2020, 2050], zone: "UTC" }).map(({ pair }) => pair));
    expect([...pairs].sort()).toEqual([...CALENDAR_PAIRS].sort());
  });

  test("takes year by year from a span of any length without holding it", () => {
    const rows = apsisCalendar(ephemeris, { years: [1000, 2999], zone: "UTC", pairs: ["earth-sun"] });
    expect(rows.next().value?.local.slice(0, 4)).toBe("1000");
  });
});

describe("a calendar in a zone", () => {
  // IANA time-zone database: Nepal +05:45; Chatham +12:45, +13:45 in summer.
  test.each([
    ["Asia/Kathmandu", "2026-01-03 23:01", "+05:45", "2026-07-06 23:16", "+05:45"],
    ["Pacific/Chatham", "2026-01-04 07:01", "+13:45", "2026-07-07 06:16", "+12:45"],
    ["-03:30", "2026-01-03 13:46", "-03:30", "2026-07-06 14:01", "-03:30"],
    ["UTC", "2026-01-03 17:16", "+00:00", "2026-07-06 17:31", "+00:00"],
  ])("prints the office's minutes of 2026 in %s", (zone, perihelion, before, aphelion, after) => {
    const rows = calendar({ years: 2026, zone, pairs: ["earth-sun"] });
    expect(rows.map(({ printed, local }) => [printed, local.slice(-6)])).toEqual([
      [perihelion, before],
      [aphelion, after],
    ]);
    for (const { local, utc } of rows)
      expect(DateTime.fromISO(local).toMillis()).toBe(DateTime.fromISO(utc).toMillis());
  });

  test("notes where the local date differs from that of UTC", () => {
    for (const { notes, local, utc } of calendar({ years: 2026, zone: "Pacific/Auckland" })) {
      expect(notes.includes("date-differs-from-utc")).toBe(local.slice(0, 10) !== utc.slice(0, 10));
    }
  });

  // Samoa had no 30 December 2011: its clocks went from the 29th to the 31st.
  test("neither loses nor doubles a passage where a zone skipped a day", () => {
    const zone = "Pacific/Apia";
    const rows = calendar({ years: [2011, 2012], zone });
    const utc = calendar({ years: [2010, 2013], zone: "UTC" }).filter(({ utc }) => {
      const year = DateTime.fromISO(utc).setZone(zone).year;
      return year === 2011 || year === 2012;
    });
    expect(rows.map(({ tdbSeconds }) => tdbSeconds)).toEqual(utc.map(({ tdbSeconds }) => tdbSeconds));
    expect(rows.filter(({ local }) => local.startsWith("2011-12-30"))).toEqual([]);
  });

  // Found by search among the passages of 1970 to 2059. Clocks went back at 02:00 in Halifax on 2008-11-02 and at 03:00 in Auckland on 2001-03-18.
  test.each([
    ["America/Halifax", 2008, "moon-earth", "2008-11-02 01:55", "-03:00"],
    ["Pacific/Auckland", 2001, "mercury-sun", "2001-03-18 02:51", "+12:00"],
  ] as const)(
    "tells by its offset in which of two equal hours a passage fell in %s",
    (zone, years, pair, printed, offset) => {
      const row = only(calendar({ years, zone, pairs: [pair] }).filter((each) => each.printed === printed));
      expect(row.local.slice(-6)).toBe(offset);
      expect(DateTime.fromISO(row.local).setZone(zone).getPossibleOffsets()).toHaveLength(2);
    },
  );

  // Found likewise: 02:04 in New York on 2024-03-10, when clocks leapt from 02:00 to 03:00.
  test("never prints an hour that does not exist", () => {
    const query = { years: 2024, zone: "America/New_York", pairs: ["moon-earth"] } as const;
    const printed = (style: CalendarQuery["style"] & object) =>
      only(calendar({ ...query, style }).filter(({ local }) => local.startsWith("2024-03-10"))).printed;
    expect(printed({})).toBe("2024-03-10 03:04");
    expect(printed({ finest: "hour" })).toBe("2024-03-10 03");
    expect(printed({ finest: "hour", rounding: "cut" })).toBe("2024-03-10 03");
  });

  test("writes offsets in whole minutes where clocks kept the place's own time, and still the same instant", () => {
    for (const { local, utc } of calendar({ years: 1850, zone: "Europe/Paris", pairs: ["earth-sun"] })) {
      expect(local.slice(-6)).toBe("+00:09");
      expect(DateTime.fromISO(local).toMillis()).toBe(DateTime.fromISO(utc).toMillis());
    }
  });

  test("sets zones beside the first, each with its own date", () => {
    const [row] = calendar({
      years: 2026,
      zone: "Pacific/Auckland",
      pairs: ["earth-sun"],
      style: { besides: ["UTC", "America/Los_Angeles"] },
    });
    expect(row?.printed).toBe("2026-01-04 06:16");
    expect(row?.besides?.map(({ zone, printed }) => [zone, printed])).toEqual([
      ["UTC", "2026-01-03 17:16"],
      ["America/Los_Angeles", "2026-01-03 09:16"],
    ]);
  });
});

describe("a calendar refuses", () => {
  const refused = (query: CalendarQuery) => {
    try {
      apsisCalendar(ephemeris, query);
    } catch (error) {
      return { code: (error as { code?: string }).code, message: (error as Error).message };
    }
    return null;
  };

  test("an unknown zone, naming the one that may be meant", () => {
    const error = refused({ years: 2026, zone: "Pacific/Aukland" });
    expect(error?.code).toBe("bad-zone");
    expect(error?.message).toContain("Pacific/Auckland");
  });

  test.each([
    ["years in the wrong order", { years: [2030, 2020], zone: "UTC" }, "bad-span"],
    ["a year that is none", { years: 99999, zone: "UTC" }, "bad-date"],
    ["half a year", { years: 2026.5, zone: "UTC" }, "bad-date"],
    ["a misspelt pair", { years: 2026, zone: "UTC", pairs: ["mon-earth" as "moon-earth"] }, "bad-pair"],
    ["years that no source reaches", { years: 9000, zone: "UTC" }, "not-covered"],
    ["a style that is none", { years: 2026, zone: "UTC", style: { rounding: "up" as "cut" } }, "bad-option"],
    ["a language that is none", { years: 2026, zone: "UTC", style: { language: "no language" } }, "bad-option"],
    ["an unknown zone beside", { years: 2026, zone: "UTC", style: { besides: ["Mars/Base"] } }, "bad-zone"],
  ] as const)("%s", (_, query, code) => {
    expect(refused(query as CalendarQuery)?.code).toBe(code);
  });
});
