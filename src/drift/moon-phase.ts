import { DAY_SECONDS } from "../bodies/constants.ts";
import { pairOf } from "../bodies/pair.ts";
import type { Supply } from "../passages/timeline.ts";
import { eclipticLongitude, signedDegrees } from "./ecliptic.ts";

/** Mean growth of the elongation, degrees a day: 360° in the synodic month of 29.530589 d. */
const MEAN_RATE = 360 / 29.530589;
/** Steps of the secant method; the elongation's rate strays from its mean by a fifth at most. */
const STEPS = 6;
/** Degrees within which new or full Moon is found: a few seconds. */
const CLOSE = 1e-4;

/** Gives the Moon's elongation from the Sun, degrees: 0 new, 90 first quarter, 180 full, 270 last quarter. */
export type Elongation = (tdb: number) => number;

/**
 * Makes the function that gives the Moon's elongation: geocentric, geometric, along the ecliptic.
 *
 * @param earth a supply of `earth-sun`
 * @param moon  a supply of `moon-earth`
 */
export function elongationOf(earth: Supply, moon: Supply): Elongation {
  const earthMotion = earth.source.motion(pairOf("earth-sun"));
  const moonMotion = moon.source.motion(pairOf("moon-earth"));
  const s = new Float64Array(6);
  const longitude = (sign: number) =>
    eclipticLongitude(sign * (s[0] as number), sign * (s[1] as number), sign * (s[2] as number));
  return (tdb) => {
    earthMotion.state(tdb, s);
    const ofSun = longitude(-1);
    moonMotion.state(tdb, s);
    const elongation = signedDegrees(longitude(1) - ofSun);
    return elongation < 0 ? elongation + 360 : elongation;
  };
}

/** The nearer of new and full Moon, and how long ago it was. */
export interface NearestSyzygy {
  readonly phase: "new" | "full";
  /** Above zero after it, below before. */
  readonly daysPast: number;
}

/**
 * Gives how long an instant lies after or before the nearer of new and full Moon.
 *
 * @param elongation as `elongationOf` makes it
 * @param tdb        TDB seconds past J2000
 * @param span       where the elongation may be asked for; beyond it the mean motion serves
 *
 * Method: secant steps on the elongation.
 */
export function nearestSyzygy(
  elongation: Elongation,
  tdb: number,
  span: { readonly from: number; readonly to: number },
): NearestSyzygy {
  const now = signedDegrees(elongation(tdb));
  const phase = Math.abs(now) <= 90 ? "new" : "full";
  const off = (at: number) => signedDegrees(elongation(at) - (phase === "new" ? 0 : 180));
  let before = tdb;
  let offBefore = off(tdb);
  let at = tdb - (offBefore / MEAN_RATE) * DAY_SECONDS;
  for (let i = 0; i < STEPS && at >= span.from && at <= span.to; i++) {
    const offNow = off(at);
    if (Math.abs(offNow) < CLOSE) break;
    const rate = (offNow - offBefore) / (at - before);
    before = at;
    offBefore = offNow;
    at -= offNow / rate;
  }
  return { phase, daysPast: (tdb - at) / DAY_SECONDS };
}
