import { AU_KM } from "../bodies/constants.ts";
import type { Pair, PairName } from "../bodies/pair.ts";
import { PHYSICAL_BODIES, type PhysicalBody } from "../bodies/physical.ts";

/**
 * Mean distances in au (planets) or km, by the orbit that a pair follows.
 *
 * Planets: mean semi-major axes of J2000, J. L. Simon et al., Astron. Astrophys. 282 (1994) 663 (from memory, rounded); the Earth
 * goes by the axis of the barycentre of the Earth and the Moon. Pluto: mean over its librations, 39.5 au (from memory). The Moon:
 * 384 400 km, the rounded mean distance in general use (common practice, no source). Jupiter's moons: mean semi-major axes as
 * JPL lists them (from memory, rounded).
 */
const MEAN_AU = {
  mercury: 0.3870983,
  venus: 0.7233298,
  earth: 1.000001,
  emb: 1.000001,
  mars: 1.5236793,
  jupiter: 5.202603,
  saturn: 9.55491,
  uranus: 19.218446,
  neptune: 30.110387,
  pluto: 39.5,
} as const;
const MEAN_KM = { moon: 384_400, io: 421_800, europa: 671_100, ganymede: 1_070_400, callisto: 1_882_700 } as const;

/** Gives the mean distance of a pair, km, against which size and light are told. */
export function meanDistanceKm({ name }: Pick<Pair, "name">): number {
  const orbiter = orbiterOf(name);
  return orbiter in MEAN_AU
    ? MEAN_AU[orbiter as keyof typeof MEAN_AU] * AU_KM
    : MEAN_KM[orbiter as keyof typeof MEAN_KM];
}

/** A body that is seen from the other end of a pair's distance. */
export interface SeenBody {
  readonly name: string;
  readonly physical: PhysicalBody;
}

/** Gives the body whose disc the distance of a pair sets: the Moon for `moon-earth`, else the centre; `null` where the centre is no body. */
export function seenBody({ name }: Pick<Pair, "name">): SeenBody | null {
  const seen = name === "moon-earth" ? "moon" : name.slice(name.indexOf("-") + 1);
  return seen === "ssb" ? null : { name: seen, physical: PHYSICAL_BODIES[seen as "moon" | "sun" | "jupiter"] };
}

function orbiterOf(name: PairName): string {
  return name.slice(0, name.indexOf("-"));
}
