/** A point whose motion an ephemeris gives, by its SPK id. */
export type PointId = number;

/**
 * Names of the points and their SPK ids.
 *
 * `mercury` to `pluto` are the barycentres of the planets' systems (1 … 9), as kernels give them: for Mercury and Venus
 * the planet itself, for Mars within a metre of it; Jupiter's own centre (599) is another point.
 * Ids: NAIF Integer ID codes, the list that the SPK format refers to.
 */
export const POINTS = {
  ssb: 0,
  mercury: 1,
  venus: 2,
  emb: 3,
  mars: 4,
  jupiter: 5,
  saturn: 6,
  uranus: 7,
  neptune: 8,
  pluto: 9,
  sun: 10,
  moon: 301,
  earth: 399,
  io: 501,
  europa: 502,
  ganymede: 503,
  callisto: 504,
} as const satisfies Record<string, PointId>;

/** A point's name. */
export type PointName = keyof typeof POINTS;

/** SPK id of Jupiter's own centre, about which its moons are reckoned. */
export const JUPITER_CENTRE: PointId = 599;

/** Gives the words for an SPK id in a message: its name where it has one, else the number. */
export function pointLabel(id: PointId): string {
  for (const [name, known] of Object.entries(POINTS)) if (known === id) return name;
  return id === JUPITER_CENTRE ? "jupiter's own centre" : `point ${id}`;
}
