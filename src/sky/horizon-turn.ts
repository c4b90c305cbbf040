import { DAY_SECONDS } from "../bodies/constants.ts";
import type { EngineLibrary } from "../ephemeris/engine-library.ts";
import type { LeapSecondList } from "../time/leap-seconds.ts";
import { ut1Days, ut1Uncertainty } from "./horizon-ut1.ts";

/** How the Earth stands in space, as a function of TDB seconds past J2000. */
export interface EarthTurn {
  /** Writes the matrix that takes ICRF axes to axes fixed in the Earth, row by row, to `out[0 … 8]`. */
  matrix(tdb: number, out: Float64Array): void;
  /** Gives by how much the Earth may have turned farther or less far, degrees: what UT1 is uncertain by, half-width of 95 %. */
  uncertaintyDeg(tdb: number): number;
}

/** Seconds from one instant for which precession and nutation are worked out to the next. */
const GRID = 21_600;
/** Such instants that are kept, and what is kept of each: a matrix from ICRF to the equator and equinox of date, row by row, and sidereal time. */
const KEPT = 512;
const PLACES = 10;
/** Turns of the Earth against the equinox of date, radians a UT1 second. IERS Conventions (2010), eq. 5.14, and precession in right ascension. */
const TURN_RATE = ((2 * Math.PI) / DAY_SECONDS) * 1.002_737_909_35;

/**
 * Makes the turning of the Earth, with precession and nutation by astronomy-engine (Capitaine et al. 2003; the five largest terms
 * of IAU 2000B, good to 0.1″) and the Earth rotation angle of IERS Conventions (2010), eq. 5.15.
 *
 * The package's own ΔT never comes in: dynamical time is set as the `tt` of a time object, and the angle is taken from `ut1Days`. Precession,
 * nutation and equinox are held for six hours, three either side of an instant (0.03″ at most). The pole's
 * wandering (0.3″) and the frame's offset from the equator of J2000 (0.02″) are left out.
 *
 * @param library astronomy-engine
 * @param leaps   the leap-second list by which UT1 is told after the table of ΔT
 */
export function earthTurn(library: EngineLibrary, leaps: LeapSecondList): EarthTurn {
  const time = new library.AstroTime(0);
  const held = new Float64Array(KEPT * PLACES);
  const heldFor = new Float64Array(KEPT).fill(Number.NaN);
  /** Gives where in `held` the instant of an index stands. */
  const hold = (index: number): number => {
    const slot = ((index % KEPT) + KEPT) % KEPT;
    const start = slot * PLACES;
    if (heldFor[slot] === index) return start;
    const tdb = index * GRID;
    time.tt = tdb / DAY_SECONDS;
    const { rot } = library.Rotation_EQJ_EQD(time); // by column: rot[from][to]
    for (let to = 0; to < 3; to++) {
      for (let from = 0; from < 3; from++) held[start + 3 * to + from] = rot[from]?.[to] ?? Number.NaN;
    }
    held[start + 9] = apparentSiderealTime(library.e_tilt(time).ee, tdb, ut1Days(tdb, leaps));
    heldFor[slot] = index;
    return start;
  };
  return Object.freeze({
    uncertaintyDeg: (tdb: number) => (ut1Uncertainty(tdb, leaps) * TURN_RATE * 180) / Math.PI,
    matrix(tdb: number, out: Float64Array): void {
      const index = Math.round(tdb / GRID);
      const start = hold(index);
      const angle = (held[start + 9] as number) + TURN_RATE * (tdb - index * GRID);
      const sin = Math.sin(angle);
      const cos = Math.cos(angle);
      for (let i = start; i < start + 3; i++) {
        const x = held[i] as number;
        const y = held[i + 3] as number;
        out[i - start] = cos * x + sin * y;
        out[i - start + 3] = cos * y - sin * x;
        out[i - start + 6] = held[i + 6] as number;
      }
    },
  });
}

/**
 * Gives Greenwich apparent sidereal time, radians.
 *
 * Earth rotation angle, the accumulated precession of N. Capitaine, P. T. Wallace and J. Chapront, Astron. Astrophys. 412 (2003) 567
 * (eq. 42; as astronomy-engine and IERS Conventions (2010), eq. 5.32, have it), and the equation of the equinoxes.
 *
 * @param equinoxSeconds equation of the equinoxes, seconds of time, as astronomy-engine's `e_tilt().ee`
 */
function apparentSiderealTime(equinoxSeconds: number, tdb: number, ut1Days: number): number {
  const t = tdb / (36_525 * DAY_SECONDS);
  const turns = ut1Days - Math.floor(ut1Days) + 0.779_057_273_264 + 0.002_737_811_911_354_48 * ut1Days;
  const arcseconds =
    15 * equinoxSeconds +
    0.014506 +
    (4612.156534 + (1.3915817 + (-0.00000044 + (-0.000029956 - 0.0000000368 * t) * t) * t) * t) * t;
  return 2 * Math.PI * (turns - Math.floor(turns) + arcseconds / 1_296_000);
}
