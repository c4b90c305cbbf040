/** The astronomical unit, km. IAU 2012 Resolution B2. */
export const AU_KM = 149_597_870.7;

/** Seconds in a day. */
export const DAY_SECONDS = 86_400;

/**
 * Sidereal periods, days of 86 400 s, by name of the moving point.
 *
 * They set how far the rank of a passage looks to either side (half a period), not any date. Planets, Pluto and the
 * Moon: J. L. Simon et al., *Numerical expressions for precession formulae and mean elements for the Moon and the
 * planets*, Astron. Astrophys. 282 (1994) 663 (from memory, rounded). Moons of Jupiter: J. H. Lieske's mean motions
 * (1998, from memory, rounded).
 */
export const SIDEREAL_PERIOD_DAYS = {
  mercury: 87.969,
  venus: 224.701,
  earth: 365.256,
  emb: 365.256,
  mars: 686.98,
  jupiter: 4332.59,
  saturn: 10759.2,
  uranus: 30688.5,
  neptune: 60182,
  pluto: 90560,
  moon: 27.32166,
  io: 1.769138,
  europa: 3.551181,
  ganymede: 7.154553,
  callisto: 16.689018,
} as const;
