import { AU_KM, DAY_SECONDS } from "../bodies/constants.ts";
import type { PoissonSeries } from "./series-file.ts";
import { rotateInPlace, vsop87ToIcrf } from "./series-frame.ts";
import { type StateWriter, sphericalToRectangular } from "./series-spherical.ts";
import { seriesSum } from "./series-sum.ts";

/** Seconds in a thousand Julian years, VSOP87's unit of time. */
const MILLENNIUM_SECONDS = 365_250 * DAY_SECONDS;

/**
 * Makes the function that gives a planet from the Sun's centre by VSOP87, version B.
 *
 * @param series longitude and latitude (rad) and distance (au) by thousands of Julian years, dynamical ecliptic J2000
 *
 * Source: P. Bretagnon and G. Francou, *Planetary theories in rectangular and spherical variables: VSOP87 solutions*,
 * Astron. Astrophys. 202 (1988) 309.
 */
export function planetFromSun(series: PoissonSeries): StateWriter {
  const sum = seriesSum(series);
  const turn = vsop87ToIcrf();
  return (tdb, out) => {
    sum(tdb / MILLENNIUM_SECONDS, out);
    sphericalToRectangular(out, AU_KM, 1 / MILLENNIUM_SECONDS);
    rotateInPlace(turn, out, 0);
    rotateInPlace(turn, out, 3);
  };
}
