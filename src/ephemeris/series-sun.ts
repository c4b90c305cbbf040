import type { PoissonSeries } from "./series-file.ts";
import { planetFromSun } from "./series-planet.ts";
import { plutoFromSun } from "./series-pluto.ts";
import type { StateWriter } from "./series-spherical.ts";
import { thinnedSeries } from "./series-thinned.ts";

/**
 * Masses of the Sun over those of the planets with their moons, as DE405 has them: E. M. Standish, *JPL Planetary and
 * Lunar Ephemerides, DE405/LE405*, JPL IOM 312.F-98-048 (1998); from memory.
 */
const SUN_OVER_PLANET = {
  mercury: 6_023_600,
  venus: 408_523.71,
  earth: 328_900.5614,
  mars: 3_098_708,
  jupiter: 1_047.3486,
  saturn: 3_497.898,
  uranus: 22_902.98,
  neptune: 19_412.24,
} as const;
const SUN_OVER_PLUTO = 135_200_000;

/** Greatest share of a dropped term in the Sun's place, au. */
const LEAST_SHARE_AU = 3e-10;

/**
 * Makes the function that gives the Sun from the solar-system barycentre: minus the planets' places from the Sun,
 * weighted by their masses.
 *
 * Terms whose share lies below 45 m are left out. The Earth stands for the Earth–Moon barycentre (14 m). Pluto, which
 * the theory does not hold, goes on an ellipse: its share is 44 km, without which the Earth's range rate from the
 * barycentre would be 9 mm/s off. Asteroids are left out.
 *
 * @param series those of the eight planets
 */
export function sunFromBarycentre(series: ReadonlyMap<string, PoissonSeries>): StateWriter {
  let whole = 1 + 1 / SUN_OVER_PLUTO;
  for (const ratio of Object.values(SUN_OVER_PLANET)) whole += 1 / ratio;
  const shares = Object.entries(SUN_OVER_PLANET).flatMap(([planet, ratio]) => {
    const given = series.get(planet);
    if (!given) return [];
    const share = 1 / ratio / whole;
    const least = LEAST_SHARE_AU / share;
    const distance = MEAN_DISTANCE_AU[planet as keyof typeof SUN_OVER_PLANET];
    return [{ share, write: planetFromSun(thinnedSeries(given, [least / distance, least / distance, least], 1)) }];
  });
  shares.push({ share: 1 / SUN_OVER_PLUTO / whole, write: plutoFromSun() });
  const planet = new Float64Array(6);
  return (tdb, out) => {
    for (let i = 0; i < 6; i++) out[i] = 0;
    for (let k = 0; k < shares.length; k++) {
      const { share, write } = shares[k] as (typeof shares)[number];
      write(tdb, planet);
      for (let i = 0; i < 6; i++) out[i] = (out[i] as number) - share * (planet[i] as number);
    }
  };
}

/** Rounded; they only scale the limits of what is left out. */
const MEAN_DISTANCE_AU = {
  mercury: 0.39,
  venus: 0.72,
  earth: 1,
  mars: 1.5,
  jupiter: 5.2,
  saturn: 9.6,
  uranus: 19.2,
  neptune: 30,
};
