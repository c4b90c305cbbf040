import { beforeAll, expect, test } from "vitest";
import { distanceUnit } from "../../../src/audit/causes/distance-unit.ts";
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
  return distanceUnit
    .predict(caseOf("earth-sun", "periapsis", when), distance)
    .filter(({ km, boundKm }) => Math.abs(distance.km - km) <= distance.unitKm / 2 + boundKm)
    .map(({ detail }) => detail);
}

test("distanceUnit gives the unit in which the number is right (a mile is 1.609344 km)", () => {
  expect(fitting("91405953 km")).toEqual(["mi"]);
  expect(fitting("147103622 mi")).toEqual(["km"]);
  expect(fitting("147103622 km")).toEqual([]);
});
