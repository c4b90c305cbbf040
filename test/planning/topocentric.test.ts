import { describe, expect, test } from "vitest";
import { openSources } from "../../src/ephemeris/open-sources.ts";
import { planSeason } from "../../src/planning/plan-season.ts";
import { openSky } from "../../src/sky/open-sky.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";
import { findDe405 } from "../de405/fetch.ts";
import { openDe405 } from "../de405/read.ts";

/**
 * A site's place from the Earth's centre, ICRF, km, from first principles: WGS 84 (NIMA TR8350.2), the Earth's turning by mean sidereal time
 * (Aoki et al. 1982, Astron. Astrophys. 105, 359) with UT1 = UTC + `dut1`, the main term of nutation, precession of 1976 (Lieske et al.,
 * Astron. Astrophys. 58, 1). All numbers from memory; none of the project's code.
 */
function siteFromFirstPrinciples(
  [latitude, longitude, height]: readonly number[],
  tdb: number,
  ttMinusUtc: number,
): number[] {
  const rad = Math.PI / 180;
  const [phi, h] = [(latitude as number) * rad, (height as number) / 1000];
  const a = 6378.137;
  const b = 6356.752314245;
  const n = (a * a) / Math.hypot(a * Math.cos(phi), b * Math.sin(phi));
  const across = (n + h) * Math.cos(phi);
  const axial = ((b * b * n) / (a * a) + h) * Math.sin(phi);
  const t = tdb / 86_400 / 36_525;
  const node = (125.04 - 1934.136 * t) * rad;
  const sun = (280.466 + 36_000.77 * t) * rad;
  const psi = -17.2 * Math.sin(node) - 1.32 * Math.sin(2 * sun);
  const epsilon = 9.2 * Math.cos(node) + 0.57 * Math.cos(2 * sun);
  const obliquity = 23.4392911 - 0.0130042 * t;
  const ut = (tdb - ttMinusUtc) / 86_400; // days past 2000-01-01 12:00
  const tu = ut / 36_525;
  const mean = 280.46061837 + 360.98564736629 * ut + 0.000387933 * tu * tu;
  const theta = (mean + (psi * Math.cos(obliquity * rad)) / 3600 + (longitude as number)) * rad;
  const turnX = (v: number[], angle: number) => [
    v[0] as number,
    Math.cos(angle) * (v[1] as number) - Math.sin(angle) * (v[2] as number),
    Math.sin(angle) * (v[1] as number) + Math.cos(angle) * (v[2] as number),
  ];
  const turnZ = (v: number[], angle: number) => [
    Math.cos(angle) * (v[0] as number) - Math.sin(angle) * (v[1] as number),
    Math.sin(angle) * (v[0] as number) + Math.cos(angle) * (v[1] as number),
    v[2] as number,
  ];
  const turnY = (v: number[], angle: number) => [
    Math.cos(angle) * (v[0] as number) + Math.sin(angle) * (v[2] as number),
    v[1] as number,
    -Math.sin(angle) * (v[0] as number) + Math.cos(angle) * (v[2] as number),
  ];
  const second = rad / 3600;
  let v = [across * Math.cos(theta), across * Math.sin(theta), axial];
  // true equator of date to the mean one
  v = turnX(v, -(obliquity * rad + epsilon * second));
  v = turnZ(v, -psi * second);
  v = turnX(v, obliquity * rad);
  // mean equator of date to that of J2000
  const zeta = (2306.2181 * t + 0.30188 * t * t) * second;
  const z = (2306.2181 * t + 1.09468 * t * t) * second;
  const bend = (2004.3109 * t - 0.42665 * t * t) * second;
  v = turnZ(v, -z);
  v = turnY(v, bend);
  v = turnZ(v, -zeta);
  return v;
}

describe.skipIf(!findDe405())("the topocentric distance of the Moon", () => {
  const de405 = findDe405() ? openDe405() : null;
  const distance = (site: readonly number[], tdb: number): number => {
    const place = siteFromFirstPrinciples(site, tdb, 69.184);
    const moon = de405?.pairState("moon-earth", tdb) ?? new Float64Array(9);
    return Math.hypot(...place.map((x, i) => (moon[i] as number) - x));
  };

  // The sidereal time of 1982 and nutation of four terms are good to 1″, 30 m at the equator.
  test.each([
    [46.5, 8, 2100],
    [0, 180, 0],
    [-33.9, 18.5, 10],
    [28, 86.9, 8849],
    [78.2, 15.6, 50],
  ])("and the site's own least and greatest distance at %f, %f agree with first principles", async (...site) => {
    const [ephemeris, sky] = await Promise.all([openSources(), openSky()]);
    const [latitudeDeg = 0, longitudeDeg = 0, heightM = 0] = site;
    const rows = planSeason(ephemeris, {
      pair: "moon-earth",
      site: { latitudeDeg, longitudeDeg, heightM },
      from: "2026",
      to: "2026-07",
      sky,
    });
    let [km, seconds, count] = [0, 0, 0];
    for (const row of rows) {
      km = Math.max(km, Math.abs(row.topocentricDistanceKm - distance(site, row.tdbSeconds)));
      const sign = row.kind === "periapsis" ? 1 : -1;
      // every moment of 2 d either side, then ever finer around the best
      let [best, step] = [row.tdbSeconds, 600];
      for (let reach = 288; step > 0.01; reach = 30, step /= 10) {
        const middle = best;
        let least = Infinity;
        for (let i = -reach; i <= reach; i++) {
          const there = sign * distance(site, middle + i * step);
          if (there < least) [least, best] = [there, middle + i * step];
        }
      }
      const own = tdbOf((row.topocentricLeastUtc ?? row.topocentricGreatestUtc) as string);
      seconds = Math.max(seconds, Math.abs(own - best));
      km = Math.max(km, Math.abs((row.topocentricExtremeKm as number) - distance(site, best)));
      expect(row.kind === "periapsis" ? row.topocentricGreatestUtc : row.topocentricLeastUtc).toBeNull();
      count++;
    }
    expect(count).toBe(14);
    expect(km).toBeLessThan(0.1); // demanded is 1 km
    expect(seconds).toBeLessThan(2); // demanded are 10 s
  });
});
