import { beforeAll, expect, test } from "vitest";
import { distanceSurface } from "../../../src/audit/causes/distance-surface.ts";
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
  return distanceSurface
    .predict(caseOf("earth-sun", "periapsis", when), distance)
    .filter(({ km, boundKm }) => Math.abs(distance.km - km) <= distance.unitKm / 2 + boundKm)
    .map(({ detail }) => detail);
}

test("distanceSurface gives the surface from which a distance is reckoned: the Earth's 6378 km, the Sun's 695 700 km", () => {
  expect(fitting("147097244 km")).toEqual(["the Earth's surface"]);
  expect(fitting("146407922 km")).toEqual(["the Sun's surface"]);
  expect(fitting("147103622 km")).toEqual([]);
});
