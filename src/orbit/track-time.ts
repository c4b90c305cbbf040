import { DAY_SECONDS } from "../bodies/constants.ts";
import { ApsidaryError } from "../error.ts";
import { parseIso } from "../time/parse-iso.ts";
import { tdbOf } from "../time/tdb-of.ts";

/** The scale of the times in a track's data. TT differs from TDB by 2 ms at most and is taken for it. */
export type TrackScale = "tdb" | "utc";

/** An instant of a track's data: TDB seconds past J2000, or text: ISO 8601, `JD 2461000.5`, `MJD 61000.25`. */
export type TrackTime = number | string;

/** Modified Julian day of 2000-01-01, and seconds from its beginning to J2000. */
const J2000_DAY = 51_544;
const J2000_SECONDS = 43_200;

/**
 * Reads an instant of a track's data.
 *
 * @param given TDB seconds past J2000 (whatever the scale), or text: ISO 8601 without or, where the scale is UTC, with an offset; `JD` or `MJD`
 *   and a number
 * @param scale of the texts
 * @param what  what to call it in messages
 * @returns the instant in TDB seconds past J2000, and half a unit of the last place it is written to
 * @throws ApsidaryError `bad-input`
 */
export function trackTime(given: TrackTime, scale: TrackScale, what: string): { tdb: number; halfWidth: number } {
  if (typeof given === "number" && Number.isFinite(given)) return { tdb: given, halfWidth: 0 };
  const text = typeof given === "string" ? given.trim() : "";
  const day = /^(M?)JD\s*(\d+)(\.\d*)?$/i.exec(text);
  try {
    if (day) {
      const [, modified = "", whole = "", part = ""] = day;
      // the whole days first: a Julian day in one number resolves 40 µs only
      const days = modified ? Number(whole) - J2000_DAY : Number(whole) - 2_451_545;
      const seconds = Number(`0${part || "."}0`) * DAY_SECONDS - (modified ? J2000_SECONDS : 0);
      const civil = days * DAY_SECONDS + seconds;
      const halfWidth = 0.5 * DAY_SECONDS * 10 ** -Math.max(0, part.length - 1);
      return { tdb: scale === "tdb" ? civil : fromUtc(civil), halfWidth };
    }
    const halfWidth = writtenHalfWidth(text);
    if (scale === "utc") return { tdb: tdbOf(text), halfWidth };
    if (/[Zz]$|\d[+-]\d\d(:?\d\d)?$/.test(text.slice(11))) {
      throw new ApsidaryError("bad-date", `${JSON.stringify(text.slice(0, 40))} has an offset, which TDB knows not`);
    }
    const { day: mjd, secondsOfDay } = parseIso(text);
    return { tdb: (mjd - J2000_DAY) * DAY_SECONDS + secondsOfDay - J2000_SECONDS, halfWidth };
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    const shown = typeof given === "string" ? JSON.stringify(given.slice(0, 40)) : String(given).slice(0, 40);
    throw new ApsidaryError(
      "bad-input",
      `${what} is ${shown}, which is no time; write "2026-03-01T12:00:00" or "JD 2461100.5".`,
    );
  }
}

/** A UTC instant counted in days of 86 400 s since J2000, as Julian days count. */
function fromUtc(civil: number): number {
  const posix = civil + 946_728_000;
  return tdbOf(new Date(Math.floor(posix) * 1000)) + (posix - Math.floor(posix));
}

function writtenHalfWidth(text: string): number {
  const match = /^[+-]?\d{4,6}(-\d\d)?(-\d\d)?(?:[T ](\d\d)(:?\d\d)?(:?\d\d)?([.,]\d+)?)?/.exec(text);
  if (!match) return 0;
  const [, month, day, hour, minute, second, decimals] = match;
  if (decimals) return 0.5 * 10 ** -(decimals.length - 1);
  if (second) return 0.5;
  if (minute) return 30;
  if (hour) return 1800;
  if (day) return DAY_SECONDS / 2;
  return (month ? 15.5 : 183) * DAY_SECONDS;
}
