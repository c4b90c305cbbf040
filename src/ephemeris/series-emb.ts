import type { PoissonSeries } from "./series-file.ts";
import { moonFromEarth } from "./series-moon.ts";
import { planetFromSun } from "./series-planet.ts";
import type { StateWriter } from "./series-spherical.ts";
import { thinnedSeries } from "./series-thinned.ts";

/** Mass of the Earth over that of the Moon in DE405: E. M. Standish, JPL IOM 312.F-98-048 (1998); from memory. */
const EARTH_OVER_MOON = 81.30056;

/** Least term of the Moon that is kept, km: a hundredth of it shows. */
const LEAST_KM = 0.1;
const MOON_DISTANCE_KM = 385_000;

/**
 * Makes the function that gives the Earth–Moon barycentre from the Sun's centre: the Earth's place and the Moon's
 * share of the way to the Moon.
 *
 * @param earth VSOP87's series of the Earth's centre
 * @param moon  ELP/MPP02's of the Moon
 */
export function embFromSun(earth: PoissonSeries, moon: PoissonSeries): StateWriter {
  const writeEarth = planetFromSun(earth);
  const angle = LEAST_KM / MOON_DISTANCE_KM;
  const writeMoon = moonFromEarth(thinnedSeries(moon, [angle, angle, LEAST_KM], 10));
  const share = 1 / (1 + EARTH_OVER_MOON);
  const moonState = new Float64Array(6);
  return (tdb, out) => {
    writeEarth(tdb, out);
    writeMoon(tdb, moonState);
    for (let i = 0; i < 6; i++) out[i] = (out[i] as number) + share * (moonState[i] as number);
  };
}
