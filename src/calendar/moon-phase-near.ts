import { pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { type SourceChoice, timelineFor } from "../passages/timeline-for.ts";

/** A new or full Moon near an instant. */
export interface NearPhase {
  readonly phase: "new" | "full";
  /** Hours from the phase to the instant: above zero after it, below zero before. */
  readonly hours: number;
}

/** Seconds of light over one km. */
const LIGHT_SECONDS_PER_KM = 1 / 299_792.458;
/** Obliquity of the ecliptic of J2000, 84 381.406″ (IAU 2006). The phase moves by less than a second a century with it. */
const OBLIQUITY = (84_381.406 / 3600) * (Math.PI / 180);
/** Mean growth of the elongation, radians a second: a turn in the synodic month of 29.530589 d. */
const MEAN_RATE = (2 * Math.PI) / (29.530589 * 86_400);
/** Radians: the Moon moves so far in a second. */
const CLOSE = 2.5e-6;

/**
 * Gives the new or full Moon within a number of hours of an instant, `null` where there is none, or where no source reaches it.
 *
 * The phase is where the apparent geocentric longitudes of Moon and Sun are equal, or opposite: the Moon is taken where it was when its light left,
 * the Sun likewise, seen from where the Earth is.
 *
 * @param tdb   TDB seconds past J2000
 * @param hours above zero, at most a few days
 *
 * Method: secant steps on the difference of longitude along the ecliptic of J2000.
 */
export function moonPhaseNear(
  ephemeris: Ephemeris,
  tdb: number,
  hours: number,
  choice: SourceChoice = "auto",
): NearPhase | null {
  const elongation = (at: number) => elongationAt(ephemeris, at, choice);
  const now = elongation(tdb);
  if (now === null) return null;
  const phase = Math.abs(turned(now)) <= Math.PI / 2 ? "new" : "full";
  const target = phase === "new" ? 0 : Math.PI;
  let before = tdb;
  let offBefore = turned(now - target);
  let at = tdb - offBefore / MEAN_RATE;
  // the Moon's rate strays from its mean by a fifth, so what is twice too far away cannot come near
  if (Math.abs(at - tdb) > 2 * hours * 3600) return null;
  for (let i = 0; i < 8; i++) {
    const here = elongation(at);
    if (here === null) return null;
    const off = turned(here - target);
    if (Math.abs(off) < CLOSE) break;
    const step = (off * (at - before)) / (off - offBefore);
    before = at;
    offBefore = off;
    at -= step;
  }
  const away = (tdb - at) / 3600;
  return Math.abs(away) <= hours ? { phase, hours: away } : null;
}

/** The Moon's apparent longitude less the Sun's, radians; `null` where a source is missing. */
function elongationAt(ephemeris: Ephemeris, tdb: number, choice: SourceChoice): number | null {
  const moon = longitudeOf(ephemeris, "moon-earth", 1, tdb, choice);
  const sun = longitudeOf(ephemeris, "earth-sun", -1, tdb, choice);
  return moon === null || sun === null ? null : moon - sun;
}

/**
 * Apparent geocentric longitude, radians: the direction of the distance as it was one light-time before, which is light-time and
 * aberration in one, right to the first order in v/c (20″ for the Sun).
 */
function longitudeOf(
  ephemeris: Ephemeris,
  name: "moon-earth" | "earth-sun",
  sign: 1 | -1,
  tdb: number,
  choice: SourceChoice,
): number | null {
  const pair = pairOf(name);
  const supply = timelineFor(ephemeris, pair, choice).supplyAt(tdb);
  if (!supply) return null;
  const distance = supply.range.distance(tdb);
  const then = tdb - distance * LIGHT_SECONDS_PER_KM;
  const s = new Float64Array(6);
  supply.source.motion(pair).state(Math.max(then, supply.span.from), s);
  const [x = 0, y = 0, z = 0] = s;
  return Math.atan2(sign * (y * Math.cos(OBLIQUITY) + z * Math.sin(OBLIQUITY)), sign * x);
}

/** An angle brought between −π and π. */
function turned(angle: number): number {
  return angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI));
}
