import { beforeAll, expect, test } from "vitest";
import { kindSwapped } from "../../../src/audit/causes/kind-swapped.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("kindSwapped gives the perihelion's minute that stands under aphelion", () => {
  expect(fitting(kindSwapped, caseOf("earth-sun", "apoapsis", "2026-01-03 17:16"))).toEqual(["periapsis"]);
  expect(fitting(kindSwapped, caseOf("earth-sun", "periapsis", "2026-01-03 17:16"))).toEqual([]);
});
