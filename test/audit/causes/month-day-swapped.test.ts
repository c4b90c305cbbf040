import { beforeAll, expect, test } from "vitest";
import { monthDaySwapped } from "../../../src/audit/causes/month-day-swapped.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("monthDaySwapped gives 6 July that became 7 June, and says nothing of days past the twelfth", () => {
  expect(fitting(monthDaySwapped, caseOf("earth-sun", "apoapsis", "2026-06-07 17:31"))).toEqual(["day and month"]);
  expect(monthDaySwapped.predict(caseOf("earth-sun", "apoapsis", "2026-07-16 17:31"))).toEqual([]);
});
