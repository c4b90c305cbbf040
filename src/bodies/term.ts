import type { Pair } from "./pair.ts";
import { POINTS } from "./point.ts";

/** Which extreme of the distance: the least or the greatest. */
export type ApsisKind = "periapsis" | "apoapsis";

/** Whether a more extreme passage of the same kind lies within half a sidereal period (`secondary`); `null` where no source reaches that far. */
export type ApsisRank = "principal" | "secondary" | null;

/**
 * Gives the trade's word for an apsis.
 *
 * Perihelion and aphelion only about the Sun's centre, perigee and apogee only about the Earth's, else the general
 * words; a secondary extremum is no apsis of the orbit and is called what it is.
 */
export function termOf(pair: Pick<Pair, "centre">, kind: ApsisKind, rank: ApsisRank): string {
  if (rank === "secondary") return kind === "periapsis" ? "local minimum of distance" : "local maximum of distance";
  if (pair.centre === POINTS.sun) return kind === "periapsis" ? "perihelion" : "aphelion";
  if (pair.centre === POINTS.earth) return kind === "periapsis" ? "perigee" : "apogee";
  return kind;
}
