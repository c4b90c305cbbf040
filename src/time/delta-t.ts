import { DELTA_T_FIRST_YEAR, DELTA_T_LAST_YEAR, DELTA_T_TABLE } from "./delta-t-table.ts";
import { predictedHalfWidth } from "./predicted-half-width.ts";

/** ΔT = TT − UT1 and how well it is known. */
export interface DeltaT {
  readonly seconds: number;
  /** Half-width that holds at least 95 in 100 (two standard errors), in seconds. */
  readonly uncertaintySeconds: number;
}

/** What ΔT is taken from, for the provenance of an answer. */
export const DELTA_T_MODEL =
  "Espenak and Meeus 2006 before 1657, USNO table to 1961, IERS C04 to 2026.5, then a parabola of 32 s per century squared";

const SECONDS_PER_YEAR = 365.2425 * 86_400;

/** Half-widths (two standard errors), years and seconds; straight lines between them. */
// biome-ignore format: pairs
const UNCERTAINTY: readonly (readonly [year: number, seconds: number])[] = [
  [1200, 61.5], [1300, 40], [1600, 40], [1657, 30], [1700, 14], [1750, 8], [1800, 5], [1850, 3], [1900, 1], [1950, 0.2], [1955, 0.1],
  [1962, 0.05], [DELTA_T_LAST_YEAR, 0.05],
];

/**
 * Gives the year with decimals of an instant, by the mean Gregorian year of 365.2425 d; 2000.0 is 2000-01-01T00:00.
 *
 * @param ttSeconds TT past J2000.0
 */
export function decimalYear(ttSeconds: number): number {
  return 2000 + (ttSeconds + 43_200) / SECONDS_PER_YEAR;
}

/**
 * Gives ΔT = TT − UT1 and its uncertainty for any year.
 *
 * @param year with decimals, as `decimalYear` gives it; astronomical (0 is the year before 1)
 *
 * From 1657.0 to 2026.5 a half-yearly table, by Catmull-Rom cubics (continuous in value and slope; seasons are lost, at most 0.05 s).
 * Before it the polynomials of F. Espenak and J. Meeus, *Five Millennium Canon of Solar Eclipses*, NASA/TP-2006-214141, which fit
 * L. V. Morrison and F. R. Stephenson, *Journal for the History of Astronomy* 35 (2004) 327; the step of 3.7 s where the table begins is
 * spread over 1600 to 1657. After the table the last value and the long-term parabola of 32 s per century² (Morrison and Stephenson 2004) with its vertex there: a continuation, no forecast.
 *
 * Uncertainty: to 1200 twice the published standard error of 0.8 s per century² from 1820 (Morrison and Stephenson 2004), to 1600
 * twice that of their table; from there to 1955 our own figures, wide enough to hold what determinations of
 * ΔT differ by (11 s in 1700); from 1962 the lost seasons; after the table `predictedHalfWidth`.
 */
export function deltaT(year: number): DeltaT {
  return Object.freeze({ seconds: deltaTSeconds(year), uncertaintySeconds: uncertaintyOf(year) });
}

/** Gives ΔT in seconds alone, as `deltaT` does; allocates nothing. */
export function deltaTSeconds(year: number): number {
  if (year >= DELTA_T_LAST_YEAR) {
    const centuries = (year - DELTA_T_LAST_YEAR) / 100;
    return entry(DELTA_T_TABLE.length - 1) + 32 * centuries * centuries;
  }
  if (year >= DELTA_T_FIRST_YEAR) return interpolated(year);
  if (year >= 1600) {
    const joined = (year - 1600) / (DELTA_T_FIRST_YEAR - 1600);
    return polynomial(year) + joined * (entry(0) - polynomial(DELTA_T_FIRST_YEAR));
  }
  return polynomial(year);
}

/** Espenak and Meeus 2006, up to the year 1700. */
function polynomial(year: number): number {
  if (year < -500) {
    const u = (year - 1820) / 100;
    return -20 + 32 * u * u;
  }
  if (year < 500) {
    const u = year / 100;
    return (
      10583.6 +
      u * (-1014.41 + u * (33.78311 + u * (-5.952053 + u * (-0.1798452 + u * (0.022174192 + u * 0.0090316521)))))
    );
  }
  if (year < 1600) {
    const u = (year - 1000) / 100;
    return (
      1574.2 +
      u * (-556.01 + u * (71.23472 + u * (0.319781 + u * (-0.8503463 + u * (-0.005050998 + u * 0.0083572073)))))
    );
  }
  const t = year - 1600;
  return 120 + t * (-0.9808 + t * (-0.01532 + t / 7129));
}

function interpolated(year: number): number {
  const place = 2 * (year - DELTA_T_FIRST_YEAR);
  const i = Math.min(Math.floor(place), DELTA_T_TABLE.length - 2);
  const s = place - i;
  const before = entry(i);
  const after = entry(i + 1);
  const slopeBefore = (after - entry(i - 1)) / 2;
  const slopeAfter = (entry(i + 2) - before) / 2;
  return (
    before +
    s *
      (slopeBefore +
        s *
          (3 * (after - before) - 2 * slopeBefore - slopeAfter + s * (2 * (before - after) + slopeBefore + slopeAfter)))
  );
}

/** An entry of the table; past either end the one at the end. */
function entry(i: number): number {
  return DELTA_T_TABLE[Math.min(Math.max(i, 0), DELTA_T_TABLE.length - 1)] ?? Number.NaN;
}

function uncertaintyOf(year: number): number {
  let yearBefore = -Infinity;
  let secondsBefore = 0;
  for (const [yearAfter, seconds] of UNCERTAINTY) {
    if (year < yearAfter) {
      if (yearBefore === -Infinity) return 1.6 * ((year - 1820) / 100) ** 2;
      return secondsBefore + ((seconds - secondsBefore) * (year - yearBefore)) / (yearAfter - yearBefore);
    }
    yearBefore = yearAfter;
    secondsBefore = seconds;
  }
  return secondsBefore + predictedHalfWidth(year - DELTA_T_LAST_YEAR);
}
