import type { ElementsGiven } from "../../src/orbit/elements.ts";

/**
 * The osculating elements of a state (km, km/s, equatorial axes), by the vectors of angular momentum and eccentricity; R. R. Bate, D. D. Mueller and J. E.
 * White, *Fundamentals of Astrodynamics* (1971), ch. 2 (from memory).
 */
export function elementsOfState(state: Float64Array, gm: number, tdb: number): Partial<ElementsGiven> {
  const [x = 0, y = 0, z = 0, vx = 0, vy = 0, vz = 0] = state;
  const r = Math.hypot(x, y, z);
  const h = [y * vz - z * vy, z * vx - x * vz, x * vy - y * vx] as const;
  const size = Math.hypot(...h);
  const v2 = vx * vx + vy * vy + vz * vz;
  const rv = x * vx + y * vy + z * vz;
  const e = [x, y, z].map((value, i) => ((v2 - gm / r) * value - rv * ([vx, vy, vz][i] ?? 0)) / gm) as [
    number,
    number,
    number,
  ];
  const eccentricity = Math.hypot(...e);
  const a = 1 / (2 / r - v2 / gm);
  const node = Math.atan2(h[0], -h[1]);
  const i = Math.acos(h[2] / size);
  const along = e[0] * Math.cos(node) + e[1] * Math.sin(node);
  const across = (e[1] * Math.cos(node) - e[0] * Math.sin(node)) * Math.cos(i) + e[2] * Math.sin(i);
  const anomaly = Math.atan2(rv / Math.sqrt(gm * a), 1 - r / a);
  const degrees = 180 / Math.PI;
  return {
    semiMajorAxisKm: a,
    eccentricity,
    inclinationDeg: i * degrees,
    nodeDeg: node * degrees,
    argumentDeg: Math.atan2(across, along) * degrees,
    frame: "equator",
    epoch: tdb,
    meanAnomalyDeg: (anomaly - eccentricity * Math.sin(anomaly)) * degrees,
  };
}
