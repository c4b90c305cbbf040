import { describe, expect, test } from "vitest";
import { daysSinceSameDate } from "../../src/drift/whole-days.ts";
import { dayOfGregorian } from "../../src/time/civil-calendar.ts";

describe("the days since the same date of the year before", () => {
  test.each([
    [2020, 1, 5, 365], // the leap day of 2020 is still to come
    [2021, 1, 2, 366],
    [2020, 7, 4, 366],
    [2021, 7, 5, 365],
    [2019, 12, 31, 365],
    [2020, 12, 31, 366],
    [1901, 1, 3, 365], // 1900 was no leap year
    [2001, 1, 3, 366], // 2000 was one
    [2020, 2, 29, 365], // from 1 March 2019
    [2020, 3, 1, 366],
  ])("to %i-%i-%i are %i", (year, month, day, days) => {
    expect(daysSinceSameDate(dayOfGregorian(year, month, day))).toBe(days);
  });
});
