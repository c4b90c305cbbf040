import { beforeAll, expect, test } from "vitest";
import { halfDay } from "../../../src/audit/causes/half-day.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("halfDay gives the afternoon for 05:16 instead of 17:16, on the same date", () => {
  expect(fitting(halfDay, caseOf("earth-sun", "periapsis", "2026-01-03 05:16"))).toEqual(["afternoon"]);
});

test("halfDay says nothing of whole days, nor of twelve hours across midnight", () => {
  expect(halfDay.predict(caseOf("earth-sun", "periapsis", "2026-01-03"))).toEqual([]);
  expect(fitting(halfDay, caseOf("earth-sun", "periapsis", "2026-01-04 05:16"))).toEqual([]);
});
