import { beforeAll, expect, test } from "vitest";
import { zone } from "../../../src/audit/causes/zone.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("zone gives the offset by which the perihelion of 2026, 17:16 UT, was printed as 22:46", () => {
  expect(fitting(zone, caseOf("earth-sun", "periapsis", "2026-01-03 22:46"))).toEqual(["+05:30"]);
});

test("zone gives UTC (and London, which keeps it in winter) for a list that says Kolkata, and nothing for one in TT", () => {
  expect(fitting(zone, caseOf("earth-sun", "periapsis", "2026-01-03 17:16", "Asia/Kolkata"))).toEqual([
    "+00:00",
    "Europe/London",
  ]);
  expect(zone.predict(caseOf("earth-sun", "periapsis", "2026-01-03 17:16", "tt"))).toEqual([]);
});

test("zone knows summer time: 19:31 in Berlin for 17:31 UT in July, which is +02:00 as well", () => {
  expect(fitting(zone, caseOf("earth-sun", "apoapsis", "2026-07-06 19:31"))).toEqual(["+02:00", "Europe/Berlin"]);
});
