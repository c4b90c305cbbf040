import { describe, expect, test } from "vitest";
import { orbitFrom } from "../../src/orbit/orbit-from.ts";
import { twoBodyShares } from "../../src/orbit/two-body-shares.ts";

describe("the shares of two bodies", () => {
  test("put the barycentre of Earth and Moon 4671 km from the Earth's centre, inside it (textbook figure, from memory)", () => {
    const { shares } = orbitFrom({ about: "earth", companion: "moon", semiMajorAxisKm: 384_400, eccentricity: 0.0549 });
    expect(shares?.larger.semiMajorAxisKm).toBeCloseTo(4671, 0);
    expect(shares?.massRatio).toBeCloseTo(81.30057, 4); // DE405 has 81.30056
    expect(shares?.barycentreInsideLarger).toBe("always");
    expect([shares?.larger.name, shares?.smaller.name]).toEqual(["earth", "moon"]);
  });

  test("put the barycentre of Sun and Jupiter just outside the Sun (textbook figure 742 000 km, from memory)", () => {
    const { shares } = orbitFrom({
      about: "sun",
      companion: "jupiter",
      semiMajorAxisKm: "5.2026au",
      eccentricity: 0.0485,
    });
    expect((shares?.larger.semiMajorAxisKm ?? 0) / 1e3).toBeCloseTo(742, 0);
    expect(shares?.barycentreInsideLarger).toBe("never");
  });

  test("divide distances and speeds inversely as the masses, and sum to the orbit", () => {
    const orbit = orbitFrom({ about: "pluto", companion: "105.9km3/s2", periapsisKm: 19_590, apoapsisKm: 19_602 });
    const { larger, smaller, massRatio, barycentreInsideLarger } = orbit.shares ?? expect.fail("no shares");
    expect(larger.share + smaller.share).toBeCloseTo(1, 15);
    for (const field of [
      "semiMajorAxisKm",
      "periapsisKm",
      "apoapsisKm",
      "periapsisSpeedKmS",
      "apoapsisSpeedKmS",
    ] as const) {
      expect((larger[field] ?? 0) + (smaller[field] ?? 0)).toBeCloseTo(orbit[field] ?? 0, 9);
      expect((smaller[field] ?? 0) / (larger[field] ?? 0)).toBeCloseTo(massRatio, 12);
    }
    expect(barycentreInsideLarger).toBe("never");
    expect(orbit.gravitationalParameterKm3S2).toBeCloseTo(869.6 + 105.9, 9);
  });

  test("call the heavier body the larger, whichever is named as the centre", () => {
    const { shares } = orbitFrom({ about: "moon", companion: "earth", semiMajorAxisKm: 384_400, eccentricity: 0.0549 });
    expect(shares?.larger.name).toBe("earth");
    const twins = { name: "a", gmKm3S2: 5, equatorialRadiusKm: null };
    const equal = twoBodyShares(orbitFrom({ about: "earth", periapsisKm: 7000, eccentricity: 0 }), twins, {
      ...twins,
      name: "b",
    });
    expect([equal.larger.name, equal.larger.share, equal.massRatio, equal.barycentreInsideLarger]).toEqual([
      "a",
      0.5,
      1,
      null,
    ]);
  });

  test("say where the barycentre is inside the larger body only near the periapsis, and give an open orbit one apsis each", () => {
    const part = orbitFrom({ about: "sun", companion: "jupiter", periapsisKm: "4.5au", apoapsisKm: "6au" });
    expect(part.shares?.barycentreInsideLarger).toBe("near periapsis");
    const open = orbitFrom({ about: "sun", companion: "jupiter", periapsisKm: "4.5au", eccentricity: 1.5 });
    expect(open.shares?.barycentreInsideLarger).toBe("near periapsis");
    expect([open.shares?.smaller.apoapsisKm, open.shares?.smaller.apoapsisSpeedKmS]).toEqual([null, null]);
    expect(open.shares?.smaller.semiMajorAxisKm).toBeLessThan(0);
  });
});
