import { beforeAll, expect, test } from "vitest";
import { distanceCoarse } from "../../../src/audit/causes/distance-coarse.ts";
import { readDistance } from "../../../src/audit/read-distance.ts";
import { caseMaker } from "../case-of.ts";

// The right distance of the perihelion of 2006, 147 103 622 km: IMCCE (from memory).
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

/** The variants that give a printed distance to its last digit. */
function fitting(text: string, when = "2006-01-04 15"): string[] {
  const distance = readDistance(text, "km");
  if (!distance) throw new Error("cannot be read");
  return distanceCoarse
    .predict(caseOf("earth-sun", "periapsis", when), distance)
    .filter(({ km, boundKm }) => Math.abs(distance.km - km) <= distance.unitKm / 2 + boundKm)
    .map(({ detail }) => detail);
}

test("distanceCoarse does not give the right kilometre, but that of a coarse model some kilometres away", () => {
  expect(fitting("147103622 km")).toEqual([]);
  const distance = readDistance("147103622 km", "km");
  if (!distance) throw new Error("cannot be read");
  const [found] = distanceCoarse.predict(caseOf("earth-sun", "periapsis", "2006-01-04 15"), distance);
  expect(Math.abs((found?.km ?? 0) - 147103622)).toBeGreaterThan(1);
  expect(Math.abs((found?.km ?? 0) - 147103622)).toBeLessThan(3000);
});
