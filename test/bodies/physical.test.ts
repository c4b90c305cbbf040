import { Body, MassProduct } from "astronomy-engine";
import { describe, expect, test } from "vitest";
import { AU_KM, DAY_SECONDS } from "../../src/bodies/constants.ts";
import { isBodyName, PHYSICAL_BODIES, physicalBody } from "../../src/bodies/physical.ts";

/** GM as astronomy-engine 2.1.19 has it, from DE405, km³/s²: of whole systems for the planets with moons. */
const system = (body: Body) => (MassProduct(body) * AU_KM ** 3) / DAY_SECONDS ** 2;

describe("masses of bodies", () => {
  test("agree with DE405's for bodies that have no moons, to the uncertainty of either", () => {
    expect(PHYSICAL_BODIES.sun.gmKm3S2 / system(Body.Sun)).toBeCloseTo(1, 9);
    expect(PHYSICAL_BODIES.mercury.gmKm3S2 / system(Body.Mercury)).toBeCloseTo(1, 4); // later by the MESSENGER mission
    expect(PHYSICAL_BODIES.venus.gmKm3S2 / system(Body.Venus)).toBeCloseTo(1, 7);
    expect(PHYSICAL_BODIES.earth.gmKm3S2 / system(Body.Earth)).toBeCloseTo(1, 7);
    expect(PHYSICAL_BODIES.moon.gmKm3S2 / system(Body.Moon)).toBeCloseTo(1, 6);
  });

  test("are less than the system's by the mass of the moons", () => {
    // GM of the larger moons, km³/s² (JPL satellite ephemerides; from memory, rounded)
    const moons: readonly (readonly [keyof typeof PHYSICAL_BODIES, Body, number, number])[] = [
      ["mars", Body.Mars, 0.0008, 0.1],
      ["jupiter", Body.Jupiter, 5959.9 + 3202.7 + 9887.8 + 7179.3, 10],
      ["saturn", Body.Saturn, 8978.1 + 153.9 + 120.5 + 73.1 + 41.2 + 7.2 + 2.5, 60],
      ["uranus", Body.Uranus, 228.2 + 192.4 + 83.5 + 85.1 + 4.3, 15],
      ["neptune", Body.Neptune, 1427.6, 15],
    ];
    for (const [name, body, mass, tolerance] of moons) {
      expect(Math.abs(system(body) - PHYSICAL_BODIES[name].gmKm3S2 - mass)).toBeLessThan(tolerance);
    }
  });
});

describe("sizes of bodies", () => {
  test("keep to the conventional figures of other bodies of experts", () => {
    // WGS 84: 6378.137 km; IAU 2015 Resolution B3: Sun 695 700, Earth 6378.1, Jupiter 71 492 km
    expect(PHYSICAL_BODIES.earth.equatorialRadiusKm).toBeCloseTo(6378.137, 2);
    expect(PHYSICAL_BODIES.sun.equatorialRadiusKm).toBe(695_700);
    expect(PHYSICAL_BODIES.jupiter.equatorialRadiusKm).toBe(71_492);
  });

  test("say what radius they are", () => {
    expect(physicalBody("earth").radiusSource).toBe("equatorial radius, IAU WGCCRE 2015");
    expect(physicalBody("moon").radiusSource).toContain("mean radius");
  });
});

describe("physicalBody", () => {
  test("knows its names and refuses others with the nearest", () => {
    expect(isBodyName("mars")).toBe(true);
    expect(isBodyName("toString")).toBe(false);
    expect(() => physicalBody("jupitre")).toThrow(
      'unknown body "jupitre"; did you mean "jupiter"? Known are sun, mercury',
    );
  });
});
