import { expect, test } from "vitest";
import { printedDistance } from "../../src/calendar/printed-distance.ts";

test("a distance is printed to the finest power of ten of which its half-width is an eighth at most", () => {
  expect(printedDistance(147_099_894.009, 0.3)).toMatchObject({ km: "147099890", au: "0.9833021" });
  expect(printedDistance(356_509.4, 0.02)).toMatchObject({ km: "356509", au: "0.00238312" });
  expect(printedDistance(4_458_992_322, 3000)).toMatchObject({ km: "4459000000", au: "29.807" });
});

test("a distance on the edge between two values loses a digit, so that it is right by itself", () => {
  // Mercury's perihelion with a half-width of 2500 km: 0.307 or 0.308 is not known, 0.31 is
  expect(printedDistance(46_001_200, 2500).au).toBe("0.31");
  expect(printedDistance(46_031_200, 2500).au).toBe("0.308");
});

test("a half-width of nought prints the kilometre", () => {
  expect(printedDistance(384_400.4, 0)).toMatchObject({ km: "384400", kmDigits: 0 });
});
