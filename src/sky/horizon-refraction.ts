import type { EngineLibrary } from "../ephemeris/engine-library.ts";

/**
 * Gives by how much the air lifts a body, degrees, as a function of its altitude without air.
 *
 * T. Sæmundsson's formula, Sky and Telescope 72 (1986) 70, by astronomy-engine (1010 hPa, 10 °C; below −1° it fades out
 * towards the nadir), times the density of the standard air at the site's height against that at sea level. Near the horizon
 * the real air differs from any formula by several minutes of arc.
 *
 * @param library astronomy-engine
 * @param heightM the site's height, −500 … 100 000 m
 */
export function horizonRefraction(library: EngineLibrary, heightM: number): (altitudeDeg: number) => number {
  const { density } = library.Atmosphere(heightM);
  return (altitudeDeg) => density * library.Refraction("normal", altitudeDeg);
}
