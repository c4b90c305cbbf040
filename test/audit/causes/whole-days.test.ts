import { beforeAll, expect, test } from "vitest";
import { wholeDays } from "../../../src/audit/causes/whole-days.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("wholeDays tells how many days early or late, up to a month", () => {
  expect(fitting(wholeDays, caseOf("earth-sun", "periapsis", "2026-01-04 17:16"))).toEqual(["1 day late"]);
  expect(fitting(wholeDays, caseOf("earth-sun", "periapsis", "2025-12-30 17:16"))).toEqual(["4 days early"]);
  expect(fitting(wholeDays, caseOf("earth-sun", "periapsis", "2026-01-03 17:16"))).toEqual([]);
});
