import type { BodyName } from "../bodies/physical.ts";
import type { Conic } from "./shape.ts";
import type { TwoBodyShares } from "./two-body-shares.ts";

/**
 * An orbit of two bodies about each other, as the path of one about the other. Frozen.
 *
 * Open orbits have no far apsis: its fields, the period and the circular and mean speed are `null`; a parabola has no axes
 * either, and a hyperbola's semi-major axis is below zero, its semi-minor axis the impact parameter.
 */
export interface Orbit {
  readonly conic: Conic;
  /** The central body; `null` where only a gravitational parameter is known. */
  readonly about: BodyName | null;
  readonly gravitationalParameterKm3S2: number;
  readonly semiMajorAxisKm: number | null;
  readonly semiMinorAxisKm: number | null;
  readonly semiLatusRectumKm: number;
  readonly eccentricity: number;
  /** From the centre of the body. */
  readonly periapsisKm: number;
  readonly apoapsisKm: number | null;
  /** Above the equatorial radius; `null` where none is known. */
  readonly periapsisHeightKm: number | null;
  readonly apoapsisHeightKm: number | null;
  readonly periapsisSpeedKmS: number;
  readonly apoapsisSpeedKmS: number | null;
  /** √(μ/a): the speed on a circle of that radius, and the geometric mean of the two speeds above. */
  readonly circularSpeedKmS: number | null;
  /** The circumference over the period. */
  readonly meanSpeedKmS: number | null;
  readonly specificEnergyKm2S2: number;
  readonly angularMomentumKm2S: number;
  readonly periodSeconds: number | null;
  /** The radius that heights are above, and what it is. */
  readonly equatorialRadiusKm: number | null;
  readonly radiusSource: string | null;
  /** Each body's part, where a companion was given. */
  readonly shares: TwoBodyShares | null;
  /**
   * Fields that the given set does not fix well: they change more than a thousand times as much as what was given (both
   * relatively; the eccentricity of a closed orbit as such), so that rounding alone reaches the twelfth digit.
   */
  readonly illConditioned: readonly OrbitField[];
  /** What a person should know of the answer, in sentences. */
  readonly remarks: readonly string[];
}

/** A field of an orbit that is a number. */
export type OrbitField =
  | "gravitationalParameterKm3S2"
  | "semiMajorAxisKm"
  | "semiMinorAxisKm"
  | "semiLatusRectumKm"
  | "eccentricity"
  | "periapsisKm"
  | "apoapsisKm"
  | "periapsisHeightKm"
  | "apoapsisHeightKm"
  | "periapsisSpeedKmS"
  | "apoapsisSpeedKmS"
  | "circularSpeedKmS"
  | "meanSpeedKmS"
  | "specificEnergyKm2S2"
  | "angularMomentumKm2S"
  | "periodSeconds";
