/** A body with its gravitational parameter. */
export interface Partner {
  readonly name: string;
  readonly gmKm3S2: number;
  /** Equatorial radius, km; `null` where it is not known. */
  readonly equatorialRadiusKm: number | null;
}

/** One body's own orbit about the barycentre: of the same eccentricity and period, its line of apsides opposite to the other's. */
export interface BodyShare {
  readonly name: string;
  /** Part of the separation that lies between this body and the barycentre: the other's mass over the sum of both. */
  readonly share: number;
  readonly semiMajorAxisKm: number | null;
  readonly periapsisKm: number;
  readonly apoapsisKm: number | null;
  readonly periapsisSpeedKmS: number;
  readonly apoapsisSpeedKmS: number | null;
}

/** How two bodies share their orbit. Frozen. */
export interface TwoBodyShares {
  readonly larger: BodyShare;
  readonly smaller: BodyShare;
  /** Mass of the larger over that of the smaller. */
  readonly massRatio: number;
  /** Whether the barycentre lies inside the larger body (its equatorial radius); `null` where that is not known. */
  readonly barycentreInsideLarger: "always" | "never" | "near periapsis" | null;
}

/** What is shared: the orbit of one body about the other. */
export interface SharedOrbit {
  readonly semiMajorAxisKm: number | null;
  readonly periapsisKm: number;
  readonly apoapsisKm: number | null;
  readonly periapsisSpeedKmS: number;
  readonly apoapsisSpeedKmS: number | null;
}

/**
 * Gives the two orbits about the barycentre that make up the orbit of two bodies about each other.
 *
 * Distances and speeds divide inversely as the masses.
 *
 * @param orbit the orbit of one about the other; its gravitational parameter should be the sum of theirs
 * @param one   either body
 * @param other the other; of equal bodies the first counts as the larger
 */
export function twoBodyShares(orbit: SharedOrbit, one: Partner, other: Partner): TwoBodyShares {
  const [larger, smaller] = one.gmKm3S2 >= other.gmKm3S2 ? [one, other] : [other, one];
  const sum = larger.gmKm3S2 + smaller.gmKm3S2;
  const shareOf = (body: Partner, counterpart: Partner): BodyShare => {
    const share = counterpart.gmKm3S2 / sum;
    const part = (value: number | null) => (value === null ? null : value * share);
    return Object.freeze({
      name: body.name,
      share,
      semiMajorAxisKm: part(orbit.semiMajorAxisKm),
      periapsisKm: orbit.periapsisKm * share,
      apoapsisKm: part(orbit.apoapsisKm),
      periapsisSpeedKmS: orbit.periapsisSpeedKmS * share,
      apoapsisSpeedKmS: part(orbit.apoapsisSpeedKmS),
    });
  };
  const ofLarger = shareOf(larger, smaller);
  return Object.freeze({
    larger: ofLarger,
    smaller: shareOf(smaller, larger),
    massRatio: larger.gmKm3S2 / smaller.gmKm3S2,
    barycentreInsideLarger: insideness(ofLarger, larger.equatorialRadiusKm),
  });
}

function insideness(
  { periapsisKm, apoapsisKm }: BodyShare,
  radius: number | null,
): TwoBodyShares["barycentreInsideLarger"] {
  if (radius === null) return null;
  if (periapsisKm >= radius) return "never";
  return apoapsisKm !== null && apoapsisKm < radius ? "always" : "near periapsis";
}
