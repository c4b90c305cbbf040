import { describe, expect, test } from "vitest";
import { eclipticLongitude, meanEclipticLongitude, signedDegrees } from "../../src/drift/ecliptic.ts";

describe("ecliptic longitude", () => {
  test("is 0° at the equinox, 90° at the northern solstice of J2000", () => {
    const obliquity = ((84_381.406 / 3600) * Math.PI) / 180; // IAU 2006
    expect(eclipticLongitude(1, 0, 0)).toBeCloseTo(0, 12);
    expect(eclipticLongitude(0, Math.cos(obliquity), Math.sin(obliquity))).toBeCloseTo(90, 10);
    expect(eclipticLongitude(-1, 0, 0)).toBeCloseTo(180, 10);
  });

  test("grows by 50.29″ a year from the equinox of date", () => {
    // general precession 5029″ a century: common practice, no source
    expect(meanEclipticLongitude(0, 1, 0, 36_525 * 86_400) - meanEclipticLongitude(0, 1, 0, 0)).toBeCloseTo(1.3972, 3);
  });

  test("is told with a sign where a difference is meant", () => {
    expect([0, 90, 179, 181, 359, 540].map(signedDegrees)).toEqual([0, 90, 179, -179, -1, -180]);
  });
});
