import { describe, expect, test } from "vitest";
import { isUnread, readWhen } from "../../src/audit/read-when.ts";
import { writeWhen } from "../../src/audit/write-when.ts";

/** Modified Julian day and its share, and the unit, of a text; the day numbers are those of the IAU SOFA cookbook's MJD (2000-01-01 is 51544). */
function read(text: string, year?: number) {
  const when = readWhen(text, year === undefined ? {} : { year });
  if (isUnread(when)) throw new Error(when.problem);
  return when;
}

describe("readWhen", () => {
  test.each([
    ["2000-01-01 12:00", 51544.5, 60],
    ["2000-01-01T12:00:30.5Z", 51544 + 43230.5 / 86400, 0.1],
    ["2000-01-01 12", 51544.5, 3600],
    ["2000-01-01 12h", 51544.5, 3600],
    ["2000-01-01", 51544.5, 86400],
    ["1 Jan 2000 12h", 51544.5, 3600],
    ["January 1, 2000 12:30 PM +01:00", 51544 + 45000 / 86400, 60],
    ["2000-01-01.72", 51544.72, 864],
    ["2000 Jan 1 17.3 h", 51544 + 17.3 / 24, 360],
    ["2000-01-01 17 h 16 min", 51544 + 62160 / 86400, 60],
    ["01/02/2000 07:48", 51575.325, 60],
    ["13.01.2000", 51556.5, 86400],
  ])("reads %s, with the last digit as its precision", (text, mjd, unit) => {
    const when = read(text);
    expect(when.wallSeconds / 86400).toBeCloseTo(mjd, 9);
    expect(when.unitSeconds).toBeCloseTo(unit, 6);
  });

  test("takes the year from its column where the text has none", () => {
    expect(read("Jan. 3.72", 2000).wallSeconds / 86400).toBeCloseTo(51546.72, 9);
    expect(read("July 4 11 35", 2000).unitSeconds).toBe(60);
  });

  test("lets a month and a year stand for their whole length", () => {
    expect(read("2000-02").unitSeconds).toBe(29 * 86400);
    expect(read("2001").unitSeconds).toBe(365 * 86400);
  });

  test("keeps a scale and an offset that stand in the text", () => {
    expect(read("2000-01-01 12:00 TD").scale?.name).toBe("tt");
    expect(read("2000-01-01T12:00+05:30").scale?.name).toBe("+05:30");
  });

  test.each([
    "2026-02-30",
    "2026-13-01",
    "2026-01-03 25:00",
    "=1+2",
    "99999-01-01",
    "next January",
    "Jan 3",
    "",
    "9".repeat(500),
  ])("refuses %s and says why", (text) => {
    const when = readWhen(text);
    expect(isUnread(when) && when.problem.length).toBeGreaterThan(10);
  });

  test.each([
    "2026-01-03 17:16", "2026-01-03T17:16:40Z", "2026-01-03 17h", "2026-01-03", "3 Jan 2026 17h", "2026-01-03 17.3 h", "2026-01-03.72",
    "January 3, 2026 5:16 PM +01:00", "1991 Jan 3 3.00 h TD", "2026-01-03 17:16.5", "3/1/2026 17:16", "2026-07", "2026", "JAN. 3, 2026",
  ])("lets writeWhen write %s again as it stood", (text) => {
    const when = read(text);
    expect(writeWhen(when.wallSeconds, when)).toBe(text);
  }); // biome-ignore format: one list
});
