import { ApsidaryError } from "../error.ts";
import { isoText } from "./iso-text.ts";
import { J2000_DAY } from "./utc-of.ts";

/**
 * Gives the TDB of an instant as ISO text without a zone letter, `2026-01-03T17:16:47.123`.
 *
 * @param tdb      TDB seconds past J2000.0
 * @param decimals of the second, 0 to 9; rounded to nearest
 * @throws `bad-date` where `tdb` is not a finite number
 */
export function formatTdb(tdb: number, decimals = 3): string {
  if (!Number.isFinite(tdb)) {
    throw new ApsidaryError(
      "bad-date",
      `The instant ${tdb} is not a number of TDB seconds past J2000.0; give a finite number.`,
    );
  }
  const wholeDays = Math.floor((tdb + 43_200) / 86_400);
  return isoText(J2000_DAY + wholeDays, tdb - wholeDays * 86_400 + 43_200, 86_400, decimals);
}
