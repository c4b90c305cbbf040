import { beforeAll, expect, test } from "vitest";
import { scaleTt } from "../../../src/audit/causes/scale-tt.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("scaleTt gives TT for J. Meeus's 7 h 13.02 of 1999 (TD) read as UT, and UTC for the office's minute read as TT", () => {
  expect(fitting(scaleTt, caseOf("earth-sun", "periapsis", "1999 Jan 3 13.02 h"))).toEqual(["TT"]);
  expect(fitting(scaleTt, caseOf("earth-sun", "periapsis", "2026-01-03 17:16", "tt"))).toEqual(["UTC"]);
});
