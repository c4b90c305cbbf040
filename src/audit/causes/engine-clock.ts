/**
 * Gives ΔT = TT − UT as the coarse model itself reckons it, seconds: the polynomials of F. Espenak and J. Meeus (2006), which run ahead of
 * the true ΔT by 6 s in 2026. A date from that model carries its clock.
 *
 * Source: F. Espenak and J. Meeus, *Five Millennium Canon of Solar Eclipses*, NASA/TP-2006-214141, polynomials for 1961 to 2150; `null` outside.
 *
 * @param tdb TDB seconds past J2000
 */
export function engineDeltaT(tdb: number): number | null {
  const y = 2000 + tdb / (365.2425 * 86_400);
  if (y < 1961 || y > 2150) return null;
  if (y < 1986) {
    const t = y - 1975;
    return 45.45 + t * (1.067 + t * (-1 / 260 - t / 718));
  }
  const t = y - 2000;
  if (y < 2005) {
    return 63.86 + t * (0.3345 + t * (-0.060_374 + t * (0.001_727_5 + t * (0.000_651_814 + t * 0.000_023_735_99))));
  }
  if (y < 2050) return 62.92 + t * (0.322_17 + t * 0.005_589);
  const u = (y - 1820) / 100;
  return -20 + 32 * u * u - 0.5628 * (2150 - y);
}
