import fc from "fast-check";
import { DateTime } from "luxon";
import { describe, expect, it } from "vitest";
import { formatTdb } from "../../src/time/format-tdb.ts";
import { utcText } from "../../src/time/format-utc.ts";
import { type Moment, tdbOf } from "../../src/time/tdb-of.ts";

describe("tdbOf", () => {
  it.each([
    ["2026", "2026-01-01T00:00:00.000Z"],
    ["2026-07", "2026-07-01T00:00:00.000Z"],
    ["2026-07-06", "2026-07-06T00:00:00.000Z"],
    ["2026-07-06T17", "2026-07-06T17:00:00.000Z"],
    ["2026-07-06T17:30Z", "2026-07-06T17:30:00.000Z"],
    ["2026-07-06 17:30:15,25", "2026-07-06T17:30:15.250Z"],
    ["2026-07-06T17:30:00+05:45", "2026-07-06T11:45:00.000Z"],
    ["2026-01-01T01:00:00+1200", "2025-12-31T13:00:00.000Z"],
    ["2026-12-31T20:00-05", "2027-01-01T01:00:00.000Z"],
    ["2026-12-31T24:00", "2027-01-01T00:00:00.000Z"],
    ["20260706T1730Z", "2026-07-06T17:30:00.000Z"],
    ["2026-187T12", "2026-07-06T12:00:00.000Z"],
    ["2026-W28-1", "2026-07-06T00:00:00.000Z"],
    ["2016-12-31T23:59:60.5Z", "2016-12-31T23:59:60.500Z"],
    ["2017-01-01T01:59:60+02:00", "2016-12-31T23:59:60.000Z"],
    ["1899-12-31T23:59:59.5", "1899-12-31T23:59:59.500Z"],
    ["0999", "0999-01-01T00:00:00.000Z"],
    ["0000-02-29", "0000-02-29T00:00:00.000Z"],
    ["-0500-03-01T06:00", "-000500-03-01T06:00:00.000Z"],
    ["-000500", "-000500-01-01T00:00:00.000Z"],
    ["+002026-07-06", "2026-07-06T00:00:00.000Z"],
    ["-9999", "-009999-01-01T00:00:00.000Z"],
    ["9999-12-31", "9999-12-31T00:00:00.000Z"],
  ])("reads %s", (text, utc) => {
    expect(utcText(tdbOf(text), 3)).toBe(utc);
  });

  it.each([
    ["soon", /cannot be read/],
    ["", /cannot be read/],
    ["12:30", /cannot be read/],
    ["2026-02-30", /2026-02 has the days 01 to 28/],
    ["2026-13", /no month 13/],
    ["2026-00-10", /no month 00/],
    ["2026-W60", /does not exist/],
    ["2026-366", /does not exist/],
    ["2026-01-01T25:00", /time of day that does not exist/],
    ["2026-01-01T24:01", /time of day that does not exist/],
    ["2026-01-01T10:60", /time of day that does not exist/],
    ["2026-01-01T10:00:61", /time of day that does not exist/],
    ["2026-06-30T23:59:60Z", /no leap second/],
    ["2016-12-31T12:00:60Z", /no leap second/],
    ["1969-12-31T23:59:60Z", /no leap second/],
    ["2026-01-01T10:00+99:00", /offset/],
    ["2026Z", /offset without a time/],
    ["2026-01T10:00", /time of day without a day/],
    ["999", /"0999"/],
    ["99999", /-9999 to 9999/],
    ["-10000-01-01", /-9999 to 9999/],
  ])("refuses %j and says what would be right", (text, message) => {
    expect(() => tdbOf(text)).toThrowError(
      expect.objectContaining({ code: "bad-date", message: expect.stringMatching(message) }),
    );
  });

  it("reads Date, DateTime and nanoseconds as the same instant, whatever their zone", () => {
    const text = "2026-01-03T17:15:37.939Z";
    const ms = Date.parse(text);
    const expected = tdbOf(text);
    const moments: readonly Moment[] = [
      new Date(ms),
      DateTime.fromMillis(ms, { zone: "Pacific/Auckland" }),
      { epochNanoseconds: BigInt(ms) * 1_000_000n },
      { tdbSeconds: expected },
      "2026-01-04T06:15:37.939+13:00",
    ];
    for (const moment of moments) expect(Math.abs(tdbOf(moment) - expected)).toBeLessThan(1e-6);
    expect(formatTdb(expected)).toBe("2026-01-03T17:16:47.123");
  });

  it("keeps the nanoseconds of an instant as far as the number can, before 1970 too", () => {
    expect(tdbOf({ epochNanoseconds: -1n }) - tdbOf({ epochNanoseconds: -1_000_001n })).toBeCloseTo(0.001, 6);
    expect(
      tdbOf({ epochNanoseconds: 1_700_000_000_000_250_000n }) - tdbOf({ epochNanoseconds: 1_700_000_000_000_000_000n }),
    ).toBeCloseTo(250e-6, 6);
  });

  it("refuses values that are no moment, invalid or beyond the years it knows", () => {
    const wrong: readonly unknown[] = [
      undefined,
      null,
      5,
      true,
      {},
      new Date(Number.NaN),
      new Date(8.64e15),
      DateTime.invalid("made so"),
      { tdbSeconds: Number.NaN },
      { tdbSeconds: 1e13 },
      { epochNanoseconds: 10n ** 24n },
    ];
    for (const value of wrong) {
      expect(() => tdbOf(value as Moment)).toThrowError(expect.objectContaining({ code: "bad-date" }));
    }
  });

  it("reads any printed UTC as the instant it was printed from, to a microsecond", () => {
    fc.assert(
      fc.property(fc.double({ min: -3.1e9, max: 3.1e9, noNaN: true }), (tdb) => {
        // six decimals round by half a microsecond, the number by another half
        expect(Math.abs(tdbOf(utcText(tdb, 6)) - tdb)).toBeLessThan(1.5e-6);
      }),
    );
  });
});
