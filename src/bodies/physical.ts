import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";

/** Mass and size of a body. */
export interface PhysicalBody {
  /** Gravitational parameter GM of the body alone, without its moons, km³/s². */
  readonly gmKm3S2: number;
  /** Equatorial radius, km. */
  readonly equatorialRadiusKm: number;
  /** What radius that is, and whose. */
  readonly radiusSource: string;
}

const EQUATOR = "equatorial radius, IAU WGCCRE 2015";
const ONE_BAR = "equatorial radius at 1 bar, IAU WGCCRE 2015";

/**
 * Gravitational parameters and equatorial radii, by body.
 *
 * GM: the values of JPL DE440 (R. S. Park et al., Astron. J. 161 (2021) 105) and, for the planets without their moons,
 * of the satellite ephemerides of the same time; rounded, from memory. Radii: B. A. Archinal et al., *Report of the IAU
 * Working Group on Cartographic Coordinates and Rotational Elements: 2015*, Celest. Mech. Dyn. Astr. 130 (2018) 22, and
 * IAU 2015 Resolution B3 for the Sun; from memory.
 */
export const PHYSICAL_BODIES = {
  sun: {
    gmKm3S2: 132_712_440_041.28,
    equatorialRadiusKm: 695_700,
    radiusSource: "nominal radius, IAU 2015 Resolution B3",
  },
  mercury: { gmKm3S2: 22_031.8686, equatorialRadiusKm: 2440.53, radiusSource: EQUATOR },
  venus: { gmKm3S2: 324_858.592, equatorialRadiusKm: 6051.8, radiusSource: EQUATOR },
  earth: { gmKm3S2: 398_600.4355, equatorialRadiusKm: 6378.1366, radiusSource: EQUATOR },
  moon: { gmKm3S2: 4902.80012, equatorialRadiusKm: 1737.4, radiusSource: "mean radius, IAU WGCCRE 2015" },
  mars: { gmKm3S2: 42_828.3736, equatorialRadiusKm: 3396.19, radiusSource: EQUATOR },
  jupiter: { gmKm3S2: 126_686_534.2, equatorialRadiusKm: 71_492, radiusSource: ONE_BAR },
  saturn: { gmKm3S2: 37_931_206.2, equatorialRadiusKm: 60_268, radiusSource: ONE_BAR },
  uranus: { gmKm3S2: 5_793_951.3, equatorialRadiusKm: 25_559, radiusSource: ONE_BAR },
  neptune: { gmKm3S2: 6_835_103.1, equatorialRadiusKm: 24_764, radiusSource: ONE_BAR },
  pluto: { gmKm3S2: 869.6, equatorialRadiusKm: 1188.3, radiusSource: "mean radius, IAU WGCCRE 2015" },
} as const satisfies Record<string, PhysicalBody>;

/** A body whose mass and size are known here. */
export type BodyName = keyof typeof PHYSICAL_BODIES;

/** Tells whether a text names a body whose mass and size are known here. */
export function isBodyName(name: string): name is BodyName {
  return Object.hasOwn(PHYSICAL_BODIES, name);
}

/**
 * Gives mass and size of a body.
 *
 * @param name as in `BodyName`
 * @throws ApsidaryError `bad-input`, with the nearest name
 */
export function physicalBody(name: string): PhysicalBody {
  if (isBodyName(name)) return PHYSICAL_BODIES[name];
  const known = Object.keys(PHYSICAL_BODIES);
  const near = nearestName(String(name), known);
  throw new ApsidaryError(
    "bad-input",
    `unknown body ${JSON.stringify(String(name).slice(0, 60))}${near ? `; did you mean "${near}"?` : "."} ` +
      `Known are ${known.join(", ")}; for any other give its gravitational parameter.`,
  );
}
