import { AU_KM, DAY_SECONDS } from "../bodies/constants.ts";
import { rotateInPlace, vsop87ToIcrf } from "./series-frame.ts";
import type { StateWriter } from "./series-spherical.ts";

const DEGREE = Math.PI / 180;
const CENTURY_SECONDS = 36_525 * DAY_SECONDS;

/**
 * Mean elements of Pluto's system, ecliptic and equinox J2000: au and degrees, and the rates of the longitudes a
 * century.
 */
const ELEMENTS = {
  semiMajorAxis: 39.48686035,
  eccentricity: 0.24885238,
  inclination: 17.1410426,
  meanLongitude: 238.96535011,
  meanLongitudeRate: 145.18042903,
  meanLongitudeBend: -0.01262724,
  perihelion: 224.09702598,
  perihelionRate: -0.00968827,
  node: 110.30167986,
} as const;

/**
 * Makes the function that gives Pluto from the Sun's centre on a fixed ellipse.
 *
 * It lies within 0.1 au of DE405 in 1960–2059, which is enough for what it is for: Pluto's share in the solar-system
 * barycentre, 1/135 200 000 of the way (0.1 au make 0.1 km).
 *
 * Source: E. M. Standish and J. G. Williams, *Approximate positions of the planets*, table for 3000 BC to AD 3000
 * (from memory).
 */
export function plutoFromSun(): StateWriter {
  const e = ELEMENTS.eccentricity;
  const a = ELEMENTS.semiMajorAxis * AU_KM;
  const b = a * Math.sqrt(1 - e * e);
  const argument = (ELEMENTS.perihelion - ELEMENTS.node) * DEGREE;
  const [cosW, sinW] = [Math.cos(argument), Math.sin(argument)];
  const [cosN, sinN] = [Math.cos(ELEMENTS.node * DEGREE), Math.sin(ELEMENTS.node * DEGREE)];
  const [cosI, sinI] = [Math.cos(ELEMENTS.inclination * DEGREE), Math.sin(ELEMENTS.inclination * DEGREE)];
  // unit vectors to the perihelion and 90° ahead of it
  const p = [cosN * cosW - sinN * sinW * cosI, sinN * cosW + cosN * sinW * cosI, sinW * sinI];
  const q = [-cosN * sinW - sinN * cosW * cosI, -sinN * sinW + cosN * cosW * cosI, cosW * sinI];
  const rate = (ELEMENTS.meanLongitudeRate - ELEMENTS.perihelionRate) * DEGREE;
  const turn = vsop87ToIcrf();
  return (tdb, out) => {
    const t = tdb / CENTURY_SECONDS;
    const m = (ELEMENTS.meanLongitude - ELEMENTS.perihelion + ELEMENTS.meanLongitudeBend * t * t) * DEGREE + rate * t;
    let anomaly = m + e * Math.sin(m);
    for (let i = 0; i < 6; i++) anomaly -= (anomaly - e * Math.sin(anomaly) - m) / (1 - e * Math.cos(anomaly));
    const x = a * (Math.cos(anomaly) - e);
    const y = b * Math.sin(anomaly);
    const speed = rate / CENTURY_SECONDS / (1 - e * Math.cos(anomaly));
    const vx = -a * Math.sin(anomaly) * speed;
    const vy = b * Math.cos(anomaly) * speed;
    for (let k = 0; k < 3; k++) {
      out[k] = x * (p[k] as number) + y * (q[k] as number);
      out[k + 3] = vx * (p[k] as number) + vy * (q[k] as number);
    }
    rotateInPlace(turn, out, 0);
    rotateInPlace(turn, out, 3);
  };
}
