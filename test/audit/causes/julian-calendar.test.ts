import { beforeAll, expect, test } from "vitest";
import { julianCalendar } from "../../../src/audit/causes/julian-calendar.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("julianCalendar gives a date that is thirteen days behind in this century", () => {
  expect(fitting(julianCalendar, caseOf("earth-sun", "periapsis", "2025-12-21 17:16"))).toEqual(["Julian date"]);
  expect(fitting(julianCalendar, caseOf("earth-sun", "periapsis", "2026-01-03 17:16"))).toEqual([]);
});
