const SECONDS_PER_JULIAN_CENTURY = 3_155_760_000;

/**
 * Gives TDB − TT in seconds: at most 1.7 ms, nearly all of it one sine with the period of a year.
 *
 * @param seconds TT or TDB past J2000.0; which of the two does not matter at this size
 *
 * Seven terms, good to about 10 µs from 1600 to 2200. Source: G. H. Kaplan, USNO Circular 179 (2005), eq. 2.6, after
 * L. Fairhead and P. Bretagnon, *Astronomy and Astrophysics* 229 (1990) 240.
 */
export function tdbMinusTt(seconds: number): number {
  const t = seconds / SECONDS_PER_JULIAN_CENTURY;
  return (
    0.001657 * Math.sin(628.3076 * t + 6.2401) +
    0.000022 * Math.sin(575.3385 * t + 4.297) +
    0.000014 * Math.sin(1256.6152 * t + 6.1969) +
    0.000005 * Math.sin(606.9777 * t + 4.0212) +
    0.000005 * Math.sin(52.9691 * t + 0.4444) +
    0.000002 * Math.sin(21.3299 * t + 5.5431) +
    0.00001 * t * Math.sin(628.3076 * t + 4.249)
  );
}
