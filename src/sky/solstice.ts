import { DAY_SECONDS } from "../bodies/constants.ts";
import { brentZero } from "../numeric/brent-zero.ts";
import type { ApparentLongitudes } from "./apparent-longitude.ts";

/** A solstice by its month, since summer and winter depend on where one stands. */
export type Solstice = "june" | "december";

/** Mean tropical year, seconds; J. L. Simon et al., Astron. Astrophys. 282 (1994) 663, from memory. */
const TROPICAL_YEAR = 365.2422 * DAY_SECONDS;
/** How far a solstice may lie from where the mean motion puts it, seconds: twice the Sun's equation of centre makes 4 d. */
const REACH = 6 * DAY_SECONDS;
/** Seconds; far below the error of the longitude. */
const TOLERANCE = 0.1;

/**
 * Gives the last solstice of a month at or before an instant, TDB seconds past J2000.
 *
 * The instant at which the Sun's apparent longitude is 90° (June) or 270° (December), by Brent's zero finder around
 * where the mean motion puts it.
 *
 * @param longitudes of Sun and Moon
 * @param tdb        TDB seconds past J2000
 * @param solstice   which of the two
 */
export function solsticeBefore(longitudes: ApparentLongitudes, tdb: number, solstice: Solstice): number {
  const target = solstice === "june" ? 90 : 270;
  const since = (((longitudes.sun(tdb) - target) % 360) + 360) % 360;
  const excess = (t: number) => {
    const degrees = longitudes.sun(t) - target;
    return degrees - 360 * Math.round(degrees / 360);
  };
  const guess = tdb - (since / 360) * TROPICAL_YEAR;
  const from = guess - REACH;
  const to = guess + REACH;
  return Math.min(brentZero(excess, from, excess(from), to, excess(to), TOLERANCE), tdb);
}
