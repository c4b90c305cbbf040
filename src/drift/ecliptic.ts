const DEGREE = Math.PI / 180;
const SECONDS_PER_CENTURY = 36_525 * 86_400;
/** Obliquity of the ecliptic at J2000, radians. N. Capitaine, P. T. Wallace and J. Chapront, Astron. Astrophys. 412 (2003) 567, adopted by the IAU in 2006. */
const OBLIQUITY_J2000 = (84_381.406 / 3600) * DEGREE;
const COS_OBLIQUITY = Math.cos(OBLIQUITY_J2000);
const SIN_OBLIQUITY = Math.sin(OBLIQUITY_J2000);

/** Gives the longitude of a direction (ICRF axes) on the mean ecliptic of J2000, degrees, 0 ≤ λ < 360. */
export function eclipticLongitude(x: number, y: number, z: number): number {
  return modulo(Math.atan2(y * COS_OBLIQUITY + z * SIN_OBLIQUITY, x) / DEGREE, 360);
}

/**
 * Gives the longitude of a direction near the ecliptic, counted from the mean equinox of date, degrees, 0 ≤ λ < 360.
 *
 * @param tdb TDB seconds past J2000
 *
 * Method: the longitude on the ecliptic of J2000 and the general precession in longitude (Capitaine, Wallace and Chapront 2003, as above).
 * The ecliptic's own turning (47″ a century) changes the longitude of a direction within 0.1° of it by less than 0.0001° in ten centuries.
 */
export function meanEclipticLongitude(x: number, y: number, z: number, tdb: number): number {
  const t = tdb / SECONDS_PER_CENTURY;
  const precession = (5028.796195 * t + 1.1054348 * t * t) / 3600;
  return modulo(eclipticLongitude(x, y, z) + precession, 360);
}

/** Gives an angle in degrees as −180 ≤ a < 180. */
export function signedDegrees(degrees: number): number {
  return modulo(degrees + 180, 360) - 180;
}

function modulo(value: number, divisor: number): number {
  const rest = value - Math.floor(value / divisor) * divisor;
  return rest === divisor ? 0 : rest;
}
