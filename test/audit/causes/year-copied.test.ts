import { beforeAll, expect, test } from "vitest";
import { yearCopied } from "../../../src/audit/causes/year-copied.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("yearCopied gives the line of 2025, January 4 13:28, under 2026, and that of 2024 under it", () => {
  expect(fitting(yearCopied, caseOf("earth-sun", "periapsis", "2026-01-04 13:28"))).toEqual(["the year before"]);
  expect(fitting(yearCopied, caseOf("earth-sun", "periapsis", "2026-01-03 00:39"))).toEqual(["two years before"]);
  expect(fitting(yearCopied, caseOf("earth-sun", "periapsis", "2026-01-03 17:16"))).toEqual([]);
});
