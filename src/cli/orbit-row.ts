import type { BodyName } from "../bodies/physical.ts";
import type { Orbit, OrbitField } from "../orbit/orbit.ts";
import { terms } from "../orbit/terms.ts";
import type { BodyShare, TwoBodyShares } from "../orbit/two-body-shares.ts";
import { rounded } from "../report/rounded.ts";

/** An orbit as it is given out: its numbers rounded, and the words for its apsides. */
export interface OrbitRow extends Orbit {
  /** The trade's word for the nearest point, such as `perigee`; the generic one where none is in common use. */
  readonly periapsisTerm: string;
  readonly apoapsisTerm: string;
}

/** Decimals of the fields: 1 m, 1 µm/s, 1 ms; an eccentricity to 1e-12. */
const DECIMALS: Readonly<Record<OrbitField, number>> = {
  semiMajorAxisKm: 3,
  semiMinorAxisKm: 3,
  semiLatusRectumKm: 3,
  eccentricity: 12,
  periapsisKm: 3,
  apoapsisKm: 3,
  periapsisHeightKm: 3,
  apoapsisHeightKm: 3,
  periapsisSpeedKmS: 9,
  apoapsisSpeedKmS: 9,
  circularSpeedKmS: 9,
  meanSpeedKmS: 9,
  specificEnergyKm2S2: 9,
  angularMomentumKm2S: 6,
  periodSeconds: 3,
  gravitationalParameterKm3S2: 6,
};

/** The fields of a row that are numbers, in the order in which they stand. */
export const ORBIT_NUMBERS = Object.keys(DECIMALS) as readonly OrbitField[];

/** Gives the row of an orbit. Numbers have their decimals, and no more than 14 digits. */
export function orbitRow(orbit: Orbit): OrbitRow {
  const words = wordsOf(orbit.about);
  const numbers = {} as Record<OrbitField, number | null>;
  for (const field of ORBIT_NUMBERS) numbers[field] = roundedTo(orbit[field], DECIMALS[field]);
  const { conic, about, equatorialRadiusKm, radiusSource, illConditioned, remarks } = orbit;
  return {
    conic,
    about,
    periapsisTerm: words.nearest,
    apoapsisTerm: words.farthest,
    ...(numbers as Pick<Orbit, OrbitField>), // what is not null in an orbit is not null here
    equatorialRadiusKm,
    radiusSource,
    shares: orbit.shares && sharesRow(orbit.shares),
    illConditioned,
    remarks,
  };
}

function wordsOf(about: BodyName | null) {
  const known = terms(about ?? "other");
  return known.common ?? known.generic[0] ?? { nearest: "periapsis", farthest: "apoapsis" };
}

function sharesRow(shares: TwoBodyShares): TwoBodyShares {
  const part = (body: BodyShare): BodyShare => ({
    name: body.name,
    share: rounded(body.share, 12),
    semiMajorAxisKm: roundedTo(body.semiMajorAxisKm, 3),
    periapsisKm: fine(body.periapsisKm, 3),
    apoapsisKm: roundedTo(body.apoapsisKm, 3),
    periapsisSpeedKmS: fine(body.periapsisSpeedKmS, 9),
    apoapsisSpeedKmS: roundedTo(body.apoapsisSpeedKmS, 9),
  });
  return {
    larger: part(shares.larger),
    smaller: part(shares.smaller),
    massRatio: fine(shares.massRatio, 9),
    barycentreInsideLarger: shares.barycentreInsideLarger,
  };
}

function roundedTo(value: number | null, decimals: number): number | null {
  return value === null ? null : fine(value, decimals);
}

function fine(value: number, decimals: number): number {
  const short = Number(value.toPrecision(14));
  return Math.abs(short) * 10 ** decimals < 2 ** 53 ? rounded(short, decimals) : short;
}
