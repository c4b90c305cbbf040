import { beforeAll, expect, test } from "vitest";
import { coarseModel } from "../../../src/audit/causes/coarse-model.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("coarseModel says nothing to the office's minute, which no coarse model gives", () => {
  expect(fitting(coarseModel, caseOf("earth-sun", "periapsis", "2026-01-03 17:16"))).toEqual([]);
});

test("coarseModel gives the mean-motion formula's own minute: J. Meeus, Astronomical Algorithms, example 38.a, Venus 1978-12-31.1 (TD), JD 2443873.704 (from memory)", () => {
  expect(fitting(coarseModel, caseOf("venus-sun", "periapsis", "1978-12-31.204", "tt"))).toEqual([
    "mean-motion formula",
  ]);
});
