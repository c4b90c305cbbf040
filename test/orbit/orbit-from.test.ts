import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { PHYSICAL_BODIES } from "../../src/bodies/physical.ts";
import { ApsidaryError } from "../../src/error.ts";
import type { Orbit, OrbitField } from "../../src/orbit/orbit.ts";
import { orbitFrom } from "../../src/orbit/orbit-from.ts";
import type { OrbitGiven } from "../../src/orbit/orbit-given.ts";
import { conicTruth, fixesAnOrbit, type Truth, triplesOf } from "./conic-truth.ts";

/** 0 … 0.9999999, dense at both ends. */
const closedShape = fc.oneof(
  fc
    .tuple(fc.double({ min: 0, max: 9.999, noNaN: true }), fc.integer({ min: 1, max: 10 }))
    .map(([digits, power]) => digits * 10 ** -power)
    .map((e) => ({ e, plus: 1 + e, minus: 1 - e })),
  fc
    .tuple(fc.double({ min: 1, max: 9.99, noNaN: true }), fc.integer({ min: 1, max: 7 }))
    .map(([digits, power]) => digits * 10 ** -power)
    .filter((minus) => minus <= 1)
    .map((minus) => ({ e: 1 - minus, plus: 2 - minus, minus })),
  fc.constant({ e: 0, plus: 1, minus: 1 }),
);
const openShape = fc
  .tuple(fc.double({ min: 1, max: 9.99, noNaN: true }), fc.integer({ min: -7, max: 2 }))
  .map(([digits, power]) => digits * 10 ** power)
  .map((over) => ({ e: 1 + over, plus: 2 + over, minus: over }));
const size = fc.double({ min: 1e3, max: 1e10, noNaN: true });
const mass = fc.double({ min: 1e-2, max: 1e12, noNaN: true });

const pick = (truth: Truth, names: readonly string[]): OrbitGiven =>
  Object.fromEntries(names.map((name) => [name, truth[name]]));

/** Relative difference; of an eccentricity up to 1 the difference itself. */
function differenceOf(orbit: Orbit, truth: Truth, name: string): number {
  const [is, should] = [orbit[name as OrbitField], truth[name] ?? Number.NaN];
  if (is === null) return Infinity;
  const scale = name === "eccentricity" ? Math.max(1, should) : Math.abs(should);
  return Math.abs(is - should) / (scale === 0 ? 1 : scale);
}

/** 1e-12, or the field is named as ill-conditioned. */
function expectSame(orbit: Orbit, truth: Truth, names: readonly string[]): void {
  for (const name of Object.keys(truth)) {
    if (orbit.illConditioned.includes(name as OrbitField)) continue;
    const difference = differenceOf(orbit, truth, name);
    if (!(difference <= 1e-12)) expect.fail(`${name} from ${names.join(", ")} is off by ${difference}`);
  }
}

function refusal(given: unknown): string {
  try {
    orbitFrom(given as OrbitGiven);
  } catch (error) {
    if (error instanceof ApsidaryError && error.code === "bad-input") {
      expect(error.message).toMatch(/^[^\n]+\.$/);
      return error.message;
    }
    throw error;
  }
  return expect.fail(`accepted ${JSON.stringify(given)}`);
}

describe("an orbit, over the whole range of eccentricity", () => {
  test("keeps the identities of a closed orbit: means, areas, energy, vis-viva", () => {
    fc.assert(
      fc.property(closedShape, size, mass, ({ plus, minus }, periapsisKm, mu) => {
        const o = orbitFrom({ periapsisKm, apoapsisKm: (periapsisKm * plus) / minus, gravitationalParameterKm3S2: mu });
        expect(o.illConditioned).toEqual([]);
        const near = (a: number | null, b: number | null) =>
          expect(Math.abs((a ?? 0) / (b ?? 0) - 1)).toBeLessThan(3e-15 * 4);
        const [rp, ra, a] = [o.periapsisKm, o.apoapsisKm ?? 0, o.semiMajorAxisKm ?? 0];
        const [vp, va] = [o.periapsisSpeedKmS, o.apoapsisSpeedKmS ?? 0];
        near(a, (rp + ra) / 2); // the arithmetic mean of the distances
        near(o.semiMinorAxisKm, Math.sqrt(rp) * Math.sqrt(ra)); // the geometric
        near(o.semiLatusRectumKm, (2 * rp * ra) / (rp + ra)); // the harmonic
        near(o.circularSpeedKmS, Math.sqrt(vp * va)); // the geometric mean of the speeds
        near(o.circularSpeedKmS, Math.sqrt(mu / a));
        near(o.angularMomentumKm2S, rp * vp);
        near(o.angularMomentumKm2S, ra * va);
        near(o.specificEnergyKm2S2, -mu / (2 * a));
        near(vp * vp, mu * (2 / rp - 1 / a)); // vis-viva
        near((o.periodSeconds ?? 0) * o.angularMomentumKm2S, 2 * Math.PI * a * (o.semiMinorAxisKm ?? 0)); // Kepler's second law
        expect(o.meanSpeedKmS ?? 0).toBeLessThanOrEqual((o.circularSpeedKmS ?? 0) * (1 + 1e-15));
        expect(o.meanSpeedKmS ?? 0).toBeGreaterThan(((o.circularSpeedKmS ?? 0) * 2) / Math.PI);
      }),
    );
  });

  test("keeps the identities of an open orbit, and has null for what an open orbit has not", () => {
    fc.assert(
      fc.property(openShape, size, mass, ({ e }, periapsisKm, mu) => {
        const o = orbitFrom({ periapsisKm, eccentricity: e, gravitationalParameterKm3S2: mu });
        expect(o.conic).toBe("hyperbola");
        const near = (a: number | null, b: number, tolerance: number) =>
          expect(Math.abs((a ?? 0) / b - 1)).toBeLessThan(tolerance);
        const a = o.semiMajorAxisKm ?? 0;
        expect(a).toBeLessThan(0);
        near(o.periapsisKm, a * (1 - e), 1e-14);
        near(o.angularMomentumKm2S, periapsisKm * o.periapsisSpeedKmS, 1e-14);
        near(o.specificEnergyKm2S2, -mu / (2 * a), 1e-14);
        // vis-viva at the periapsis: near the parabola the two parts of the energy cancel, e − 1 of them is left
        near(o.periapsisSpeedKmS ** 2, mu * (2 / periapsisKm - 1 / a), 1e-14);
        near(o.semiMinorAxisKm, Math.abs(a) * Math.sqrt((e - 1) * (e + 1)), 1e-14);
        expect([o.apoapsisKm, o.apoapsisSpeedKmS, o.periodSeconds, o.circularSpeedKmS, o.meanSpeedKmS]).toEqual(
          Array(5).fill(null),
        );
      }),
    );
  });

  test("is a parabola at eccentricity 1 or energy 0: no axes, escape speed at the periapsis", () => {
    fc.assert(
      fc.property(size, mass, (rp, mu) => {
        const truth = conicTruth(rp, mu, { e: 1, plus: 2, minus: 0 });
        const names = ["periapsisKm", "semiLatusRectumKm", "periapsisSpeedKmS", "angularMomentumKm2S"] as const;
        for (const tells of ["eccentricity", "specificEnergyKm2S2"]) {
          for (const name of names) {
            const o = orbitFrom(pick(truth, [tells, name, "gravitationalParameterKm3S2"]));
            expect(o.conic).toBe("parabola");
            expect([o.eccentricity, o.specificEnergyKm2S2, o.semiMajorAxisKm, o.semiMinorAxisKm, o.apoapsisKm]).toEqual(
              [1, 0, null, null, null],
            );
            expectSame(o, truth, [tells, name]);
            expect(Math.abs(o.periapsisSpeedKmS / Math.sqrt((2 * mu) / rp) - 1)).toBeLessThan(1e-14);
          }
        }
      }),
      { numRuns: 30 },
    );
  });
});

describe("every sufficient set", () => {
  const closedNames = Object.keys(conicTruth(1, 1, { e: 0, plus: 1, minus: 1 }));
  const openNames = Object.keys(conicTruth(1, 1, { e: 2, plus: 3, minus: 1 }));
  const closedSets = triplesOf(closedNames).map((names) => ({ names, sufficient: fixesAnOrbit(names, 0.3) }));
  const openSets = triplesOf(openNames).map((names) => ({ names, sufficient: fixesAnOrbit(names, 1.7) }));
  /** The one set of a closed orbit that two orbits fit: in it the product to be solved turns at e = 1/2. */
  const TWOFOLD = ["semiLatusRectumKm", "apoapsisSpeedKmS", "periodSeconds"];
  const isTwofold = (names: readonly string[]) => TWOFOLD.every((name) => names.includes(name));

  test("gives back the same closed orbit to 1e-12, or names the fields that it does not fix to that", () => {
    const sufficient = closedSets.filter((set) => set.sufficient && !isTwofold(set.names));
    expect(sufficient.length).toBe(187); // of 220 triples
    fc.assert(
      fc.property(closedShape, size, mass, (shape, rp, mu) => {
        const truth = conicTruth(rp, mu, shape);
        for (const { names } of sufficient) expectSame(orbitFrom(pick(truth, names)), truth, names);
      }),
      { numRuns: 40 },
    );
  });

  test("gives back the same open orbit, or the ellipse that fits as well, with the hyperbola in a remark", () => {
    fc.assert(
      fc.property(openShape, size, mass, (shape, rp, mu) => {
        const truth = conicTruth(rp, mu, shape);
        for (const { names, sufficient } of openSets) {
          if (!sufficient) continue;
          const o = orbitFrom(pick(truth, names));
          if (o.conic === "hyperbola" || o.conic === "parabola") expectSame(o, truth, names);
          else {
            // the semi-minor axis alone does not tell on which side of the parabola an orbit lies
            expect(names).toContain("semiMinorAxisKm");
            expect(names).not.toContain("eccentricity");
            expect(o.remarks.join()).toMatch(/a hyperbola of eccentricity [\d.e+]+ fits as well/);
          }
        }
      }),
      { numRuns: 40 },
    );
  });

  test("is told from a set that does not suffice, which is refused in words", () => {
    const truth = conicTruth(7000, 398600, { e: 0.3, plus: 1.3, minus: 0.7 });
    const others = closedSets.filter((set) => !set.sufficient);
    expect(others.length).toBe(32);
    for (const { names } of others)
      expect(refusal(pick(truth, names))).toMatch(/^too few: .* (say the same|together fix no (mass|size))/);
    const open = conicTruth(7000, 398600, { e: 1.7, plus: 2.7, minus: 0.7 });
    for (const { names, sufficient } of openSets) {
      if (!sufficient)
        expect(refusal(pick(open, names))).toMatch(/^too few: .* (say the same|together fix no (mass|size))/);
    }
  });

  test("is refused where two orbits fit it, with both eccentricities", () => {
    const truth = conicTruth(7000, 398600, { e: 0.3, plus: 1.3, minus: 0.7 });
    const message = refusal(pick(truth, TWOFOLD));
    expect(message).toMatch(
      /^two orbits fit semi-latus rectum .*: of eccentricity 0\.3 and 0\.669504941\. Give another measure/,
    );
  });

  test("does not cry wolf: both apsides, and the speeds at both, fix everything up to 0.9999999", () => {
    fc.assert(
      fc.property(closedShape, size, mass, (shape, rp, mu) => {
        const truth = conicTruth(rp, mu, shape);
        for (const pair of [
          ["periapsisKm", "apoapsisKm"],
          ["periapsisSpeedKmS", "apoapsisSpeedKmS"],
          ["periapsisKm", "semiMajorAxisKm"],
          ["periapsisSpeedKmS", "periodSeconds"],
        ]) {
          expect(orbitFrom(pick(truth, [...pair, "gravitationalParameterKm3S2"])).illConditioned).toEqual([]);
        }
      }),
    );
  });

  test("names what it fixes badly, and by how much", () => {
    // a circle from its axes: one part in 10¹⁶ of b makes an eccentricity of 1.5·10⁻⁸
    const circle = orbitFrom({ about: "earth", semiMajorAxisKm: 7000, semiMinorAxisKm: 7000 });
    expect(circle.illConditioned).toEqual([
      "eccentricity",
      "periapsisKm",
      "apoapsisKm",
      "periapsisHeightKm",
      "apoapsisHeightKm",
      "periapsisSpeedKmS",
      "apoapsisSpeedKmS",
    ]);
    expect(circle.remarks[0]).toMatch(
      /^ill-conditioned: eccentricity, .* change up to 2\.0e\+8 times as much as what was given/,
    );
    // a long ellipse from its eccentricity: 1 − e has lost seven digits
    const long = orbitFrom({ about: "sun", periapsisKm: "1au", eccentricity: 0.9999999 });
    expect(long.illConditioned).toContain("apoapsisKm");
    expect(long.illConditioned).toContain("periodSeconds");
    expect(long.illConditioned).not.toContain("periapsisSpeedKmS");
    // the escape speed, to rounding
    const escaping = orbitFrom({ gravitationalParameterKm3S2: 2, periapsisKm: 1, periapsisSpeedKmS: 2 });
    expect(escaping.conic).toBe("parabola");
    expect(escaping.remarks.join()).toContain("to rounding this is a parabola");
  });
});

describe("what was given", () => {
  test("comes back as it was given, height or distance, with heights above the equatorial radius and whose that is", () => {
    const o = orbitFrom({ about: "earth", periapsisHeightKm: "250km", apoapsisHeightKm: "35786km" });
    expect([o.periapsisHeightKm, o.apoapsisHeightKm]).toEqual([250, 35786]);
    expect(o.periapsisKm).toBe(6378.1366 + 250);
    expect([o.equatorialRadiusKm, o.radiusSource]).toEqual([6378.1366, "equatorial radius, IAU WGCCRE 2015"]);
    const p = orbitFrom({ about: "moon", periapsisKm: o.periapsisKm, periodSeconds: "2d" });
    expect(p.periapsisHeightKm).toBe(o.periapsisKm - 1737.4);
    expect(p.periodSeconds).toBe(2 * 86400);
  });

  test("may carry any unit that fits, R for the radius of the central body", () => {
    const plain = orbitFrom({ about: "earth", periapsisKm: 1.5 * 6378.1366, apoapsisKm: 20000 });
    expect(orbitFrom({ about: "earth", periapsisKm: "1.5R", apoapsisKm: "20000000 m" })).toEqual(plain);
    const given = { gravitationalParameterKm3S2: "3.986e14m3/s2", equatorialRadiusKm: "6378km", eccentricity: 0 };
    expect(orbitFrom({ ...given, periapsisHeightKm: "1R" }).periapsisKm).toBe(12756);
    expect(orbitFrom({ ...given, periodSeconds: "2h" }).periodSeconds).toBe(7200);
    expect(orbitFrom({ ...given, periapsisSpeedKmS: "7500m/s" }).periapsisSpeedKmS).toBe(7.5);
  });

  test("takes null and undefined for what is not given, and may be one of the answer's own sets", () => {
    const o = orbitFrom({
      about: "mars",
      periapsisKm: 4000,
      apoapsisKm: 9000,
      eccentricity: null,
      companion: undefined,
    });
    const { semiMajorAxisKm, periapsisSpeedKmS } = o;
    expect(orbitFrom({ about: "mars", semiMajorAxisKm, periapsisSpeedKmS }).apoapsisKm).toBeCloseTo(9000, 9);
  });

  test("is answered by a frozen plain value that survives structuredClone", () => {
    const o = orbitFrom({ about: "earth", companion: "moon", semiMajorAxisKm: 384400, eccentricity: 0.0549 });
    expect(structuredClone(o)).toEqual(o);
    for (const part of [o, o.shares, o.shares?.larger, o.illConditioned, o.remarks])
      expect(Object.isFrozen(part)).toBe(true);
    expect(JSON.parse(JSON.stringify(o))).toEqual(o);
  });

  test("may make a periapsis below the surface, which a remark tells", () => {
    const o = orbitFrom({ about: "earth", periapsisHeightKm: -6000, apoapsisHeightKm: "300km" });
    expect(o.remarks).toEqual(["the periapsis lies 6000 km below the equatorial radius of 6378.1366 km."]);
  });
});

describe("a set that cannot be", () => {
  test.each([
    [{}, "too few: no measure of the orbit is given; name the central body, and give two of distance or height"],
    [{ about: "earth" }, "too few: no measure of the orbit is given; give two of"],
    [{ about: "earth", eccentricity: 0.1 }, "too few: only eccentricity is given; give one more of"],
    [
      { periapsisKm: 1, apoapsisKm: 2 },
      "only periapsis distance and apoapsis distance are given; name the central body too",
    ],
    [{ periapsisKm: 1, apoapsisKm: 2, semiMajorAxisKm: 1.5 }, "together fix no mass; name the central body"],
    [{ periapsisSpeedKmS: 3, apoapsisSpeedKmS: 2, eccentricity: 0.2 }, "together fix no size; give a distance"],
    [{ gravitationalParameterKm3S2: 1, eccentricity: 0.2 }, "too few: only eccentricity is given; give one more"],
  ])("is refused where it is too small, saying what is missing (%#)", (given, words) => {
    expect(refusal(given)).toContain(words);
  });

  test.each([
    [
      { about: "earth", periapsisKm: 7000, apoapsisKm: 9000, eccentricity: 0.125 },
      "too many: periapsis distance, apoapsis distance and eccentricity are given besides the central body earth, and they agree. Leave 1 of them out.",
    ],
    [
      { about: "earth", periapsisKm: 7000, apoapsisKm: 9000, eccentricity: 0.2 },
      "periapsis distance 7000 and apoapsis distance 9000 make the eccentricity 0.125, not 0.2",
    ],
    [
      { about: "earth", periapsisKm: 7000, periapsisHeightKm: 622 },
      "the periapsis distance and the periapsis height are given and say the same",
    ],
    [
      { about: "earth", gravitationalParameterKm3S2: 4e5 },
      "too many: the gravitational parameter is given, and earth has one",
    ],
    [{ about: "earth", equatorialRadiusKm: 6400 }, "too many: the equatorial radius is given, and earth has one"],
  ])("is refused where it is too large, saying which and whether it agrees (%#)", (given, words) => {
    expect(refusal(given)).toContain(words);
  });

  test.each([
    [
      { about: "earth", periapsisKm: 9000, apoapsisKm: 8000 },
      "the periapsis distance 9000 must not exceed the apoapsis distance 8000",
    ],
    [
      { about: "earth", semiMinorAxisKm: 9000, semiMajorAxisKm: 8000 },
      "the semi-minor axis 9000 must not exceed the semi-major axis 8000",
    ],
    [
      { about: "earth", apoapsisSpeedKmS: 8, periapsisSpeedKmS: 7 },
      "the apoapsis speed 8 must not exceed the periapsis speed 7",
    ],
    [
      { about: "earth", semiMajorAxisKm: 7000, periodSeconds: "2h" },
      "gravitational parameter of earth, semi-major axis 7000 and period 2h cannot be together",
    ],
    [
      { about: "earth", semiMajorAxisKm: -7000, eccentricity: 0.5 },
      "eccentricity 0.5 belongs to a closed orbit, semi-major axis -7000 to a hyperbola",
    ],
    [
      { about: "earth", specificEnergyKm2S2: 0, eccentricity: 1.5 },
      "eccentricity 1.5 belongs to a hyperbola, specific energy 0 to a parabola",
    ],
    [
      { about: "earth", semiMajorAxisKm: 7000, eccentricity: 1 },
      "semi-major axis 7000 belongs to a closed orbit, eccentricity 1 to a parabola",
    ],
    [{ about: "earth", semiMinorAxisKm: 7000, eccentricity: 1 }, "a parabola has no axes"],
    [{ about: "earth", periapsisKm: 7000, periapsisSpeedKmS: 2 }, "no orbit has"],
  ])("is refused where it contradicts itself, saying which (%#)", (given, words) => {
    expect(refusal(given)).toContain(words);
  });

  test.each([
    [{ about: "earth", eccentricity: 1.2, apoapsisKm: 9000 }, "with eccentricity 1.2 there is no apoapsis distance"],
    [{ about: "earth", eccentricity: 1, apoapsisHeightKm: 9000 }, "with eccentricity 1 there is no apoapsis height"],
    [
      { about: "earth", semiMajorAxisKm: -9000, apoapsisSpeedKmS: 3 },
      "with semi-major axis -9000 there is no apoapsis speed",
    ],
    [
      { about: "earth", specificEnergyKm2S2: "3km2/s2", periodSeconds: 3600 },
      "with specific energy 3km2/s2 there is no period",
    ],
  ])("is refused where it asks an open orbit for its far apsis (%#)", (given, words) => {
    expect(refusal(given)).toContain(`an open orbit has one apsis only and never comes back: ${words}`);
  });

  test.each([
    [{ about: "eart", eccentricity: 0 }, 'unknown body "eart"; did you mean "earth"?'],
    [{ about: "earth", companion: "mon" }, 'unknown body "mon"; did you mean "moon"?'],
    [{ companion: "moon" }, "a companion needs a central body"],
    [
      { about: "earth", periapsisHeigthKm: 250 },
      '"periapsisHeigthKm" is nothing that an orbit is made from; did you mean "periapsisHeightKm"?',
    ],
    [{ about: "earth", meanSpeedKmS: 3 }, "meanSpeedKmS is a result only"],
    [{ periapsisHeightKm: 250, eccentricity: 0 }, "the periapsis height needs a radius to stand on"],
    [{ about: "earth", periapsisHeightKm: -7000 }, "the periapsis height is -7000, at or below the centre of the body"],
    [{ about: "earth", eccentricity: -0.1 }, "the eccentricity is -0.1; it must be zero or above"],
    [{ about: "earth", periapsisKm: 0 }, "the periapsis distance is 0; it must be above zero"],
    [{ about: "earth", semiMajorAxisKm: 0 }, "the semi-major axis is zero"],
    [{ about: "earth", periapsisKm: Number.NaN }, "the periapsis distance is NaN, which is no finite number"],
    [{ about: "earth", periapsisKm: Infinity }, "is Infinity, which is no finite number"],
    [{ about: "earth", periapsisKm: true }, "is true, which is no finite number"],
    [{ about: "sun", periapsisSpeedKmS: 1e200, apoapsisSpeedKmS: 1e-200 }, "beyond what numbers hold"],
    [null, "an orbit is made from an object"],
    ["earth", "an orbit is made from an object"],
  ])("is refused for a name or a quantity that cannot be (%#)", (given, words) => {
    expect(refusal(given)).toContain(words);
  });

  test("is refused or answered whatever numbers are given, never with NaN", () => {
    const names = [
      "about",
      "eccentricity",
      "gravitationalParameterKm3S2",
      ...Object.keys(conicTruth(1, 1, { e: 0, plus: 1, minus: 1 })),
    ];
    const anything = fc.oneof(
      fc.double(),
      fc.constantFrom<unknown>(0, -1, 1, "1R", "x", "", null, [], {}, "earth"),
      fc.string(),
    );
    fc.assert(
      fc.property(fc.dictionary(fc.constantFrom(...names, "periapsisHeightKm"), anything, { maxKeys: 4 }), (given) => {
        try {
          const o = orbitFrom(given as OrbitGiven);
          for (const value of Object.values(o))
            if (typeof value === "number") expect(Number.isFinite(value)).toBe(true);
        } catch (error) {
          expect((error as ApsidaryError).code).toBe("bad-input");
          expect((error as ApsidaryError).message).not.toMatch(/\p{Cc}/u);
        }
      }),
      { numRuns: 1000 },
    );
  });
});

describe("worked examples from textbooks (all from memory)", () => {
  test("H. D. Curtis, Orbital Mechanics for Engineering Students, ch. 2: a satellite of perigee 400 km and apogee 4000 km", () => {
    const o = orbitFrom({
      gravitationalParameterKm3S2: 398600,
      equatorialRadiusKm: 6378,
      periapsisHeightKm: 400,
      apoapsisHeightKm: 4000,
    });
    expect(o.eccentricity).toBeCloseTo(0.2098, 4);
    expect(o.angularMomentumKm2S).toBeCloseTo(57172, 0);
    expect(o.periapsisSpeedKmS).toBeCloseTo(8.435, 3);
    expect(o.apoapsisSpeedKmS).toBeCloseTo(5.509, 3);
    expect(o.semiMajorAxisKm).toBeCloseTo(8578, 6);
    expect((o.periodSeconds ?? 0) / 3600).toBeCloseTo(2.196, 3);
  });

  test("D. A. Vallado, Fundamentals of Astrodynamics and Applications, ch. 6: Hohmann transfer from 191.34411 to 35781.34857 km", () => {
    const earth = { gravitationalParameterKm3S2: 398600.4415, equatorialRadiusKm: 6378.137 };
    const transfer = orbitFrom({ ...earth, periapsisHeightKm: 191.34411, apoapsisHeightKm: 35781.34857 });
    const low = orbitFrom({ ...earth, periapsisHeightKm: 191.34411, eccentricity: 0 });
    const high = orbitFrom({ ...earth, periapsisHeightKm: 35781.34857, eccentricity: 0 });
    expect(transfer.semiMajorAxisKm).toBeCloseTo(24364.4833, 4);
    expect((transfer.periodSeconds ?? 0) / 7200).toBeCloseTo(5.256713, 6);
    const first = transfer.periapsisSpeedKmS - low.periapsisSpeedKmS;
    const second = high.periapsisSpeedKmS - (transfer.apoapsisSpeedKmS ?? 0);
    expect(first + second).toBeCloseTo(3.935224, 6);
  });

  test("R. R. Bate, D. D. Mueller and J. E. White, Fundamentals of Astrodynamics, ch. 8: the transfer from Earth to Mars takes 258.9 days", () => {
    const o = orbitFrom({ about: "sun", periapsisKm: "1au", apoapsisKm: "1.524au" });
    expect((o.periodSeconds ?? 0) / 2 / 86400).toBeCloseTo(258.9, 1);
    expect(o.periapsisSpeedKmS).toBeCloseTo(32.73, 2);
  });

  test("J. Meeus, Astronomical Algorithms, ch. 33: a comet of a = 17.9400782 au, e = 0.96727426 does 54.52 and 0.91 km/s at its apsides", () => {
    const o = orbitFrom({ about: "sun", semiMajorAxisKm: "17.9400782au", eccentricity: 0.96727426 });
    expect(o.periapsisSpeedKmS).toBeCloseTo(54.52, 2);
    expect(o.apoapsisSpeedKmS).toBeCloseTo(0.91, 2);
    // the period in years is a^1.5, the Gaussian year being 365.25690 d
    expect((o.periodSeconds ?? 0) / 86400 / 365.2569).toBeCloseTo(17.9400782 ** 1.5, 3);
  });

  test("J. Meeus, the same chapter: a comet on a parabola does 42.1219 km/s at one au", () => {
    const o = orbitFrom({ about: "sun", periapsisKm: "1au", eccentricity: 1 });
    expect(o.periapsisSpeedKmS).toBeCloseTo(42.1219, 4);
  });

  test("the Moon: from its sidereal period follows the semi-major axis of the lunar theory ELP 2000, 384 747.98 km (J. Chapront)", () => {
    const o = orbitFrom({ about: "earth", companion: "moon", periodSeconds: "27.321661d", eccentricity: 0.0549 });
    expect(o.semiMajorAxisKm).toBeCloseTo(384747.98, 0);
    expect(o.meanSpeedKmS).toBeCloseTo(1.023, 2);
  });

  test("the Earth: 29.78 km/s in the mean, 30.29 and 29.29 at the apsides, 147.1 and 152.1 million km (almanac figures)", () => {
    const o = orbitFrom({ about: "sun", semiMajorAxisKm: "1.00000011au", eccentricity: 0.01671022 });
    expect(o.meanSpeedKmS).toBeCloseTo(29.78, 2);
    expect(o.periapsisSpeedKmS).toBeCloseTo(30.29, 2);
    expect(o.apoapsisSpeedKmS).toBeCloseTo(29.29, 2);
    expect(o.periapsisKm / 1e6).toBeCloseTo(147.1, 1);
    expect((o.apoapsisKm ?? 0) / 1e6).toBeCloseTo(152.1, 1);
  });

  test("the geostationary orbit: one sidereal day makes 42 164.17 km, 35 786.0 km of height, 3.0747 km/s", () => {
    const o = orbitFrom({ about: "earth", periodSeconds: "86164.1s", eccentricity: 0 });
    expect(o.semiMajorAxisKm).toBeCloseTo(42164.17, 1);
    expect(o.periapsisHeightKm).toBeCloseTo(35786.0, 1);
    expect(o.circularSpeedKmS).toBeCloseTo(3.0747, 4);
    expect(o.meanSpeedKmS).toBeCloseTo(3.0747, 4);
  });

  test("a planet weighed by its moon: Io's 421 800 km and 1.769138 d make Jupiter's mass to one in a thousand", () => {
    const o = orbitFrom({ semiMajorAxisKm: 421_800, periodSeconds: "1.769138d", eccentricity: 0.0041 });
    expect(o.gravitationalParameterKm3S2 / PHYSICAL_BODIES.jupiter.gmKm3S2).toBeCloseTo(1, 2);
  });
});
