import fc from "fast-check";
import { expect, it } from "vitest";
import {
  dayOfGregorian,
  dayOfJulian,
  daysInMonth,
  gregorianOfDay,
  julianOfDay,
} from "../../src/time/civil-calendar.ts";

it("gives the day numbers that ERFA gives for Gregorian dates, the year 0 and years before it included", () => {
  // ERFA 2.0.0, eraCal2jd (valid from -4799-01-01)
  expect(dayOfGregorian(-4799, 1, 1)).toBe(-2_431_739);
  expect(dayOfGregorian(-4712, 1, 1)).toBe(-2_399_963);
  expect(dayOfGregorian(-1, 3, 1)).toBe(-679_247);
  expect(dayOfGregorian(0, 2, 29)).toBe(-678_882);
  expect(dayOfGregorian(1600, 2, 29)).toBe(-94_494);
  expect(dayOfGregorian(1858, 11, 17)).toBe(0);
  expect(dayOfGregorian(2000, 1, 1)).toBe(51_544);
  expect(dayOfGregorian(2100, 3, 1)).toBe(88_128);
});

it("gives the day numbers by which the Julian calendar is defined and was left", () => {
  // Julian day 0 began at noon of -4712-01-01 Julian; the Julian 4 October 1582 was followed by the Gregorian 15 October (Explanatory Supplement)
  expect(dayOfJulian(-4712, 1, 1)).toBe(-2_400_001);
  expect(dayOfJulian(1582, 10, 4) + 1).toBe(dayOfGregorian(1582, 10, 15));
  expect(julianOfDay(dayOfGregorian(1918, 2, 14))).toEqual({ year: 1918, month: 2, day: 1 });
  expect(julianOfDay(dayOfJulian(1900, 2, 29))).toEqual({ year: 1900, month: 2, day: 29 });
});

it("gives back, from any day number, a date that leads to the same day, in both calendars", () => {
  fc.assert(
    fc.property(fc.integer({ min: -5_000_000, max: 5_000_000 }), (mjd) => {
      const g = gregorianOfDay(mjd);
      const j = julianOfDay(mjd);
      expect(dayOfGregorian(g.year, g.month, g.day)).toBe(mjd);
      expect(dayOfJulian(j.year, j.month, j.day)).toBe(mjd);
    }),
  );
});

it("counts the same Gregorian dates as the Date of JavaScript", () => {
  fc.assert(
    fc.property(fc.integer({ min: -5_000_000, max: 5_000_000 }), (mjd) => {
      const date = new Date((mjd - 40_587) * 86_400_000);
      const { year, month, day } = gregorianOfDay(mjd);
      expect([year, month, day]).toEqual([date.getUTCFullYear(), date.getUTCMonth() + 1, date.getUTCDate()]);
    }),
  );
});

it("knows the length of February in common, leap and century years", () => {
  expect([2023, 2024, 1900, 2000, 0, -100].map((year) => daysInMonth(year, 2))).toEqual([28, 29, 28, 29, 29, 28]);
  expect(daysInMonth(2026, 12)).toBe(31);
});
