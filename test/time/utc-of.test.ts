import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { dayOfGregorian } from "../../src/time/civil-calendar.ts";
import { formatTdb } from "../../src/time/format-tdb.ts";
import { formatUtc, utcText } from "../../src/time/format-utc.ts";
import { builtInLeapSeconds, parseLeapSeconds } from "../../src/time/leap-seconds.ts";
import { tdbOfUtc } from "../../src/time/tdb-of-utc.ts";
import { secondsInDay, utcOf } from "../../src/time/utc-of.ts";

/** One microsecond, and the resolution of the number where that is coarser. */
const fine = (tdb: number): number => Math.max(1e-6, Math.abs(tdb) * 2 ** -52);

describe("utcOf and tdbOfUtc", () => {
  it("agree with ERFA on the TDB of UTC instants, those inside leap seconds included", () => {
    // ERFA 2.0.0: eraDtf2d, eraUtctai, eraTaitt and eraDtdb at the geocentre. Tolerance: the 10 µs of our TDB - TT.
    const published: readonly (readonly [string, number, number, number])[] = [
      ["1972-01-01T00:00:00.000Z", 41_317, 0, -883_655_957.8160824],
      ["1972-06-30T23:59:60.500Z", 41_498, 86_400.5, -867_931_157.3159127],
      ["1985-07-01T00:00:00.000Z", 46_247, 0, -457_703_944.8158915],
      ["1999-12-31T12:00:00.000Z", 51_543, 43_200, -86_335.8161282],
      ["2005-12-31T23:59:59.250Z", 53_735, 86_399.25, 189_345_663.4339446],
      ["2016-12-31T23:59:60.500Z", 57_753, 86_400.5, 536_500_868.6839505],
      ["2017-01-01T00:00:00.500Z", 57_754, 0.5, 536_500_869.6839505],
      ["2026-01-03T17:15:37.939Z", 61_043, 62_137.939, 820_732_607.1229948],
    ];
    for (const [text, day, seconds, tdb] of published) {
      expect(Math.abs(tdbOfUtc(day, seconds) - tdb), text).toBeLessThan(10e-6);
      expect(utcText(tdb, 3)).toBe(text);
    }
  });

  it("are inverse to a microsecond around and inside every leap second", () => {
    const { steps } = builtInLeapSeconds();
    for (const { utcDay } of steps.slice(1)) {
      expect(secondsInDay(utcDay - 1)).toBe(86_401);
      for (let tenths = -30; tenths <= 20; tenths++) {
        const [day, seconds] = tenths < 0 ? [utcDay - 1, 86_401 + tenths / 10] : [utcDay, tenths / 10];
        const tdb = tdbOfUtc(day, seconds);
        const utc = utcOf(tdb);
        // a number of days and one of seconds, compared as one: an instant may come out a rounding before midnight
        const length = secondsInDay(utcDay - 1);
        const since = (d: number, s: number): number => (d === utcDay ? length + s : s);
        expect(Math.abs(since(utc.day, utc.secondsOfDay) - since(day, seconds))).toBeLessThan(1e-6);
        expect(Math.abs(tdbOfUtc(utc.day, utc.secondsOfDay) - tdb)).toBeLessThan(1e-6);
      }
    }
  });

  it("count each leap second as one second more, with no gap and no overlap", () => {
    for (const { utcDay } of builtInLeapSeconds().steps.slice(1)) {
      expect(tdbOfUtc(utcDay, 0) - tdbOfUtc(utcDay - 1, 86_399)).toBeCloseTo(2, 6);
    }
  });

  it("are inverse to a microsecond, or the resolution of the number, at any instant from -2000 to 3500", () => {
    fc.assert(
      fc.property(fc.double({ min: -1.263e11, max: 4.74e10, noNaN: true }), (tdb) => {
        const { day, secondsOfDay, secondsInDay: length } = utcOf(tdb);
        expect(secondsOfDay >= 0 && secondsOfDay < length && Number.isInteger(day)).toBe(true);
        expect(Math.abs(tdbOfUtc(day, secondsOfDay) - tdb)).toBeLessThanOrEqual(fine(tdb));
      }),
      { numRuns: 1000 },
    );
  });

  it("never let time run backwards, the change from UT1 to UTC at 1972 included", () => {
    const join = tdbOfUtc(41_317, 0);
    let before = utcOf(join - 3);
    for (let k = 1; k <= 600; k++) {
      const now = utcOf(join - 3 + k / 100);
      const passed = (now.day - before.day) * 86_400 + now.secondsOfDay - before.secondsOfDay;
      expect(passed).toBeGreaterThan(0);
      expect(passed).toBeLessThan(0.06); // 0.01 s, and the 0.04 s that did not occur
      before = now;
    }
    expect(tdbOfUtc(41_316, 86_399.99)).toBe(join);
    // an instant of 1972 that was rounded down stays in 1972
    expect(utcText(join - 5e-7)).toBe("1972-01-01T00:00:00.000Z");
  });

  it("say by what they go: UT1 before 1972, the list to its expiry, a held offset after it", () => {
    const of = (day: number): string => utcOf(tdbOfUtc(day, 1)).basis;
    expect([of(41_316), of(41_317), of(61_583), of(61_584)]).toEqual([
      "delta-t",
      "leap-seconds",
      "leap-seconds",
      "predicted",
    ]);
    expect(utcOf(tdbOfUtc(61_583, 0)).uncertaintySeconds).toBe(0);
  });

  it("give a predicted UTC a half-width that is nothing at the expiry, half a second a year at first, and grows", () => {
    const width = (years: number): number =>
      utcOf(tdbOfUtc(61_584 + Math.round(years * 365.2425), 0)).uncertaintySeconds;
    expect(width(0)).toBeLessThan(1e-6);
    expect(width(1)).toBeGreaterThan(0.5);
    expect(width(1)).toBeLessThan(0.6);
    expect(width(10)).toBeGreaterThan(8);
    expect(width(500)).toBeGreaterThan(1300);
    // the offset of 37 s is held
    expect(utcText(tdbOfUtc(88_128, 0), 0)).toBe("2100-03-01T00:00:00Z");
  });

  it("follow another list where one is given", () => {
    const old = parseLeapSeconds("#@ 2287785600\n2272060800 10\n");
    const tdb = tdbOfUtc(57_754, 0);
    expect(utcOf(tdb, old).basis).toBe("predicted");
    expect(utcText(tdb, 3, old)).toBe("2017-01-01T00:00:27.000Z");
  });

  it("know a day that lacks its last second, should one ever be left out", () => {
    const list = parseLeapSeconds("#@ 4023129600\n2272060800 10\n2287785600 9\n");
    expect(secondsInDay(41_498, list)).toBe(86_399);
    expect(utcText(tdbOfUtc(41_498, 86_398.5, list) + 1, 1, list)).toBe("1972-07-01T00:00:00.5Z");
    expect(() => tdbOfUtc(41_498, 86_399, list)).toThrowError(expect.objectContaining({ code: "bad-date" }));
  });

  it("refuse what is no instant", () => {
    for (const bad of [Number.NaN, Infinity]) {
      expect(() => utcOf(bad)).toThrowError(expect.objectContaining({ code: "bad-date" }));
      expect(() => formatTdb(bad)).toThrowError(expect.objectContaining({ code: "bad-date" }));
    }
    expect(() => tdbOfUtc(51_544, 86_400)).toThrowError(expect.objectContaining({ code: "bad-date" }));
    expect(() => tdbOfUtc(51_544.5, 0)).toThrowError(expect.objectContaining({ code: "bad-date" }));
  });

  it("give frozen values that survive structuredClone", () => {
    const utc = utcOf(0);
    expect(Object.isFrozen(utc)).toBe(true);
    expect(structuredClone(utc)).toEqual(utc);
  });
});

describe("formatUtc and formatTdb", () => {
  it("round to nearest with the carry into second, minute, day and year", () => {
    const utc = { day: 51_543, secondsInDay: 86_400, basis: "leap-seconds", uncertaintySeconds: 0 } as const;
    expect(formatUtc({ ...utc, secondsOfDay: 86_399.9996 }, 3)).toBe("2000-01-01T00:00:00.000Z");
    expect(formatUtc({ ...utc, secondsOfDay: 86_399.9994 }, 3)).toBe("1999-12-31T23:59:59.999Z");
    expect(formatUtc({ ...utc, secondsOfDay: 59.95 }, 0)).toBe("1999-12-31T00:01:00Z");
    expect(formatUtc({ ...utc, secondsOfDay: 3599.96 }, 1)).toBe("1999-12-31T01:00:00.0Z");
  });

  it("carry into a leap second on the day that has one, and out of it into the next day", () => {
    expect(utcText(tdbOfUtc(57_753, 86_399.9996), 3)).toBe("2016-12-31T23:59:60.000Z");
    expect(utcText(tdbOfUtc(57_753, 86_400.5), 1)).toBe("2016-12-31T23:59:60.5Z");
    expect(utcText(tdbOfUtc(57_753, 86_400.9996), 3)).toBe("2017-01-01T00:00:00.000Z");
  });

  it("write years beyond 0 to 9999 with sign and six digits, and pad the others to four", () => {
    expect(utcText(tdbOfUtc(dayOfGregorian(-500, 1, 1), 0), 0)).toBe("-000500-01-01T00:00:00Z");
    expect(utcText(tdbOfUtc(dayOfGregorian(0, 2, 29), 0), 0)).toBe("0000-02-29T00:00:00Z");
    expect(formatTdb((dayOfGregorian(10_000, 1, 1) - 51_544) * 86_400 - 43_200, 0)).toBe("+010000-01-01T00:00:00");
  });

  it("print TDB without a zone letter, 69.184 s ahead of UTC in 2026", () => {
    const tdb = tdbOfUtc(61_043, 62_137.939);
    expect([formatTdb(tdb), utcText(tdb)]).toEqual(["2026-01-03T17:16:47.123", "2026-01-03T17:15:37.939Z"]);
    expect(formatTdb(0, 0)).toBe("2000-01-01T12:00:00");
  });

  it("refuse decimals that cannot be printed", () => {
    for (const decimals of [-1, 1.5, 10])
      expect(() => formatTdb(0, decimals)).toThrowError(expect.objectContaining({ code: "bad-option" }));
  });
});
