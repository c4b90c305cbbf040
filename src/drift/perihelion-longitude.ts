import { pairOf } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { Supply } from "../passages/timeline.ts";
import { meanEclipticLongitude } from "./ecliptic.ts";

const SECONDS_PER_CENTURY = 36_525 * 86_400;

/**
 * Longitude of perihelion as the Sun's longitude at perihelion, counted from the mean equinox of date: degrees at J2000, degrees a Julian century.
 *
 * The straight line through the longitudes of all passages of the barycentre of the Earth and the Moon in DE405, 1960–2059, made by
 * `bench/fit-mean-lines.ts`.
 */
const AT_J2000 = 282.93706;
const PER_CENTURY = 1.7272;

/**
 * Gives the mean longitude of perihelion of date, degrees: where the Sun stands when the Earth's mean orbit is at perihelion.
 *
 * @param tdb TDB seconds past J2000
 *
 * The mean elements of J. L. Simon et al., Astron. Astrophys. 282 (1994) 663 (from memory), give 282.937° in 2000 and 283.109° in 2010; this
 * line stays within 0.002° of them from 1985 to 2010, 0.005° from 1960 to 2059, and 0.13° to the years 1000 and 3000.
 */
export function meanPerihelionLongitude(tdb: number): number {
  const longitude = AT_J2000 + (PER_CENTURY * tdb) / SECONDS_PER_CENTURY;
  return ((longitude % 360) + 360) % 360;
}

/**
 * Gives the longitude of perihelion of the barycentre's osculating two-body orbit about the Sun, from the mean equinox of date, degrees.
 *
 * @param barycentre a supply of `emb-sun`
 * @param kind       which passage
 * @param tdb        a passage of the barycentre, TDB seconds past J2000
 *
 * At a passage the velocity is square to the line to the Sun, so that line is the osculating orbit's line of apsides, whatever the masses.
 */
export function osculatingPerihelionLongitude(barycentre: Supply, kind: ApsisKind, tdb: number): number {
  const state = new Float64Array(6);
  barycentre.source.motion(pairOf("emb-sun")).state(tdb, state);
  const towards = kind === "periapsis" ? -1 : 1;
  const [x = 0, y = 0, z = 0] = state;
  return meanEclipticLongitude(towards * x, towards * y, towards * z, tdb);
}
