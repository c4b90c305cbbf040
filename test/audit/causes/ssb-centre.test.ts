import { beforeAll, expect, test } from "vitest";
import { ssbCentre } from "../../../src/audit/causes/ssb-centre.ts";
import { caseMaker } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("ssbCentre gives the passage from the solar system's barycentre, days to weeks away", () => {
  const [found] = ssbCentre.predict(caseOf("earth-sun", "periapsis", "2026-01-03 17:16"));
  expect(Math.abs(found?.residual ?? 0)).toBeGreaterThan(3600);
  expect(Math.abs(found?.residual ?? 0)).toBeLessThan(35 * 86_400);
  expect(ssbCentre.predict(caseOf("moon-earth", "periapsis", "2026-01-03 17:16"))).toEqual([]);
});
