import { expect, test } from "vitest";
import { printedUtc } from "../../src/cli/printed-utc.ts";

test("printedUtc prints minutes, hours with an h, days, months and years", () => {
  const utc = "2042-09-03T17:31:07.123Z";
  expect([1, 100, 5000, 20_000, 1e6].map((u) => printedUtc(utc, u))).toEqual([
    "2042-09-03 17:31",
    "2042-09-03 18h",
    "2042-09-03",
    "2042-09",
    "2042",
  ]);
});

test("printedUtc rounds an instant inside a leap second into the next day, and keeps it in its own day", () => {
  expect(printedUtc("2016-12-31T23:59:60.500Z", 0.1)).toBe("2017-01-01 00:00");
  expect(printedUtc("2016-12-31T23:59:60.500Z", 5000)).toBe("2016-12-31");
});
