import { beforeAll, expect, test } from "vitest";
import { lightTime } from "../../../src/audit/causes/light-time.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("lightTime gives 8.2 minutes at the perihelion, added or taken off (147 099 894 km over 299 792.458 km/s is 490.7 s)", () => {
  expect(fitting(lightTime, caseOf("earth-sun", "periapsis", "2026-01-03 17:24"))).toEqual(["added"]);
  expect(fitting(lightTime, caseOf("earth-sun", "periapsis", "2026-01-03 17:07"))).toEqual(["taken off"]);
});
