import { DAY_SECONDS } from "../bodies/constants.ts";
import { brentZero } from "../numeric/brent-zero.ts";
import type { ApparentLongitudes } from "./apparent-longitude.ts";

/** A new or full Moon near an instant. */
export interface MoonPhase {
  readonly phase: "new" | "full";
  /** When, TDB seconds past J2000. */
  readonly tdbSeconds: number;
  /** From the instant asked about to the phase, hours; negative where the phase came before. */
  readonly hoursAway: number;
}

/** Mean synodic month, seconds; J. Meeus, *Astronomical Algorithms* (2nd ed., 1998), eq. 49.1. */
const SYNODIC_MONTH = 29.530588861 * DAY_SECONDS;
/** How far a phase may lie from where the mean motion puts it, seconds: inequalities of Moon and Sun make up to 1.6 d. */
const REACH = 2 * DAY_SECONDS;
/** Seconds; far below the error of the longitudes. */
const TOLERANCE = 0.1;

/** Gives the Moon's elongation from the Sun in apparent ecliptic longitude, degrees from 0 (new) through 180 (full) to below 360. */
export function moonElongation(longitudes: ApparentLongitudes, tdb: number): number {
  const difference = (longitudes.moon(tdb) - longitudes.sun(tdb)) % 360;
  return difference < 0 ? difference + 360 : difference;
}

/**
 * Gives the new or the full Moon nearest to an instant.
 *
 * The instant at which the Moon's elongation in apparent ecliptic longitude is 0° or 180°, by Brent's zero finder around where
 * the mean motion puts it.
 *
 * @param longitudes of Sun and Moon
 * @param tdb        TDB seconds past J2000
 * @param phase      which of the two
 */
export function nearestMoonPhase(longitudes: ApparentLongitudes, tdb: number, phase: "new" | "full"): MoonPhase {
  const target = phase === "new" ? 0 : 180;
  const excess = (t: number) => signed(moonElongation(longitudes, t) - target);
  const phaseNear = (guess: number) => {
    const from = guess - REACH;
    const to = guess + REACH;
    return brentZero(excess, from, excess(from), to, excess(to), TOLERANCE);
  };
  let found = phaseNear(tdb - (excess(tdb) / 360) * SYNODIC_MONTH);
  // More than 14 days off, the one on the other side may be nearer: months are from 29.2 to 29.9 days long.
  if (Math.abs(found - tdb) > 14 * DAY_SECONDS) {
    const other = phaseNear(found + (found < tdb ? SYNODIC_MONTH : -SYNODIC_MONTH));
    if (Math.abs(other - tdb) < Math.abs(found - tdb)) found = other;
  }
  return Object.freeze({ phase, tdbSeconds: found, hoursAway: (found - tdb) / 3600 });
}

/** Brings degrees to −180 … 180. */
function signed(degrees: number): number {
  return degrees - 360 * Math.round(degrees / 360);
}
