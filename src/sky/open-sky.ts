import { engineSpan } from "../ephemeris/engine-accuracy.ts";
import { engineLibrary } from "../ephemeris/engine-library.ts";
import { ApsidaryError } from "../error.ts";
import { builtInLeapSeconds, type LeapSecondList } from "../time/leap-seconds.ts";
import { apparentLongitudes } from "./apparent-longitude.ts";
import { type Horizon, horizonOf } from "./horizon.ts";
import { earthTurn } from "./horizon-turn.ts";
import { type MoonPhase, moonElongation, nearestMoonPhase } from "./moon-phase.ts";
import { type Solstice, solsticeBefore } from "./solstice.ts";
import type { Site } from "./topocentric-frame.ts";

/** What the sky says at an instant; instants are TDB seconds past J2000, years −1000 to 4000. All methods throw ApsidaryError `not-covered` outside. */
export interface Sky {
  /**
   * Gives the Moon's elongation from the Sun in apparent geocentric ecliptic longitude, degrees from 0 (new Moon) through 180
   * (full) to below 360; within 5″ from 1900 to 2100, 4′ around the years 1000 and 3000, 37′ around −1000.
   */
  moonElongationDeg(tdb: number): number;
  /** Gives the new Moon nearest to an instant; within 8 s from 1900 to 2100, 7 min around the years 1000 and 3000, 75 min around −1000. */
  nearestNewMoon(tdb: number): MoonPhase;
  /** Gives the full Moon nearest to an instant; as good as the new Moon. */
  nearestFullMoon(tdb: number): MoonPhase;
  /**
   * Gives the last June or December solstice at or before an instant, TDB seconds past J2000; within 60 s from 1900 to 2100, 10 min throughout.
   */
  solsticeBefore(tdb: number, solstice: Solstice): number;
  /**
   * Gives the horizon of a site.
   * @param leaps the leap-second list by which the Earth's turning is told after the table of ΔT; left out, the built-in one
   * @throws ApsidaryError `bad-input` for a site that is none
   */
  horizon(site: Site, leaps?: LeapSecondList): Horizon;
}

/**
 * Opens the sky: loads astronomy-engine, after which everything is synchronous.
 *
 * @throws ApsidaryError `unreadable` where astronomy-engine cannot be loaded
 */
export async function openSky(): Promise<Sky> {
  const library = await engineLibrary();
  const longitudes = apparentLongitudes(library);
  const span = engineSpan("moon-earth");
  const covered = (tdb: number): number => {
    if (tdb >= span.from && tdb <= span.to) return tdb;
    throw new ApsidaryError(
      "not-covered",
      `${tdb} s past J2000 (TDB) is outside what the Sun and Moon are known for: ${span.from} to ${span.to} s, years −1000 to 4000.`,
    );
  };
  return Object.freeze({
    moonElongationDeg: (tdb: number) => moonElongation(longitudes, covered(tdb)),
    nearestNewMoon: (tdb: number) => nearestMoonPhase(longitudes, covered(tdb), "new"),
    nearestFullMoon: (tdb: number) => nearestMoonPhase(longitudes, covered(tdb), "full"),
    solsticeBefore: (tdb: number, solstice: Solstice) => solsticeBefore(longitudes, covered(tdb), solstice),
    horizon: (site: Site, leaps = builtInLeapSeconds()) => horizonOf(library, earthTurn(library, leaps), site),
  });
}
