import { beforeAll, expect, test } from "vitest";
import { distanceDigits } from "../../../src/audit/causes/distance-digits.ts";
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
  return distanceDigits
    .predict(caseOf("earth-sun", "periapsis", when), distance)
    .filter(({ km, boundKm }) => Math.abs(distance.km - km) <= distance.unitKm / 2 + boundKm)
    .map(({ detail }) => detail);
}

test("distanceDigits gives the neighbours that changed places", () => {
  expect(fitting("147130622 km")).toEqual(["3 and 0"]);
  expect(fitting("147 103 262 km")).toEqual(["2 and 6"]);
  expect(fitting("147103622 km")).toEqual([]);
});
