import { describe, expect, it } from "vitest";
import { dateTimeOf } from "../../src/time/date-time-of.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";
import { zoneOf } from "../../src/time/zone-of.ts";

describe("dateTimeOf", () => {
  const tdb = tdbOf("2026-01-03T17:15:37.939Z");

  it("gives the local time in a named zone, with summer time", () => {
    expect(dateTimeOf(tdb, "Pacific/Auckland").toISO()).toBe("2026-01-04T06:15:37.939+13:00");
    expect(dateTimeOf(tdb, "asia/kathmandu").toISO()).toBe("2026-01-03T23:00:37.939+05:45");
  });

  it("takes UTC and fixed offsets", () => {
    expect(dateTimeOf(tdb).toISO()).toBe("2026-01-03T17:15:37.939Z");
    for (const zone of ["+05:45", "UTC+05:45", "utc+5:45", "+0545"]) {
      expect(dateTimeOf(tdb, zone).toISO(), zone).toBe("2026-01-03T23:00:37.939+05:45");
    }
    expect(dateTimeOf(tdb, "-03").toISO()).toBe("2026-01-03T14:15:37.939-03:00");
  });

  it("stays on the day of a leap second, at its last millisecond", () => {
    expect(dateTimeOf(tdbOf("2016-12-31T23:59:60.5Z")).toISO()).toBe("2016-12-31T23:59:59.999Z");
    expect(dateTimeOf(tdbOf("2017-01-01T00:00:00.25Z")).toISO()).toBe("2017-01-01T00:00:00.250Z");
  });

  it("takes UT1 as UTC before 1972", () => {
    expect(dateTimeOf(tdbOf("1850-06-01T12:00:00")).toISO()).toBe("1850-06-01T12:00:00.000Z");
  });
});

describe("zoneOf", () => {
  it.each([
    ["Pacific/Aukland", '"Pacific/Auckland"'],
    ["Auckland", '"Pacific/Auckland"'],
    ["new york", '"America/New_York"'],
    ["Asia/Katmandou", '"Asia/Ka'],
  ])("refuses %s and names the zone that may have been meant", (zone, meant) => {
    expect(() => zoneOf(zone)).toThrowError(
      expect.objectContaining({ code: "bad-zone", message: expect.stringContaining(`did you mean ${meant}`) }),
    );
  });

  it.each(["", "Nowhere/Qqqqqqqq", "+16:00", "UTC+05:75"])("refuses %j", (zone) => {
    expect(() => zoneOf(zone)).toThrowError(expect.objectContaining({ code: "bad-zone" }));
  });
});
