import { ApsidaryError } from "../error.ts";
import { decimalYear, deltaT } from "./delta-t.ts";
import { builtInLeapSeconds, FIRST_LEAP_SECOND_DAY, type LeapSecondList } from "./leap-seconds.ts";
import { predictedHalfWidth } from "./predicted-half-width.ts";
import { tdbMinusTt } from "./tdb-minus-tt.ts";

/** Where civil time comes from: the leap-second list, the same with its offset held past its expiry, or UT1 by ΔT. */
export type UtcBasis = "leap-seconds" | "predicted" | "delta-t";

/** An instant in UTC from 1972-01-01 on, in UT1 before. */
export interface Utc {
  /** Modified Julian day number, whole. */
  readonly day: number;
  /** Since the beginning of the day; 86 400 and more inside a leap second. */
  readonly secondsOfDay: number;
  /** 86 400, or 86 401 where the day ends with a leap second. */
  readonly secondsInDay: number;
  readonly basis: UtcBasis;
  /** What the time scale itself may be off by, half-width, in seconds; 0 by the leap-second list. */
  readonly uncertaintySeconds: number;
}

/** TT − TAI in seconds, by definition. */
export const TT_MINUS_TAI = 32.184;
/** Modified Julian day number of 2000-01-01, at whose noon J2000.0 lies. */
export const J2000_DAY = 51_544;

/**
 * Gives the UTC of an instant; before 1972 its UT1.
 *
 * @param tdb   TDB seconds past J2000.0
 * @param leaps the leap-second list
 * @throws `bad-date` where `tdb` is not a finite number
 *
 * Past the list's expiry its last offset is held and the basis is `predicted`, with the half-width of `predictedHalfWidth`. At
 * 1972-01-01 UT1 lay 0.04 s behind the first UTC, so that much of the last second of 1971 does not occur; time never runs
 * backwards there.
 */
export function utcOf(tdb: number, leaps: LeapSecondList = builtInLeapSeconds()): Utc {
  if (!Number.isFinite(tdb)) {
    throw new ApsidaryError(
      "bad-date",
      `The instant ${tdb} is not a number of TDB seconds past J2000.0; give a finite number.`,
    );
  }
  // whole days are split off first: the subtraction is exact, and what is added afterwards is small
  const wholeDays = Math.floor((tdb + 43_200) / 86_400);
  const ttDay = J2000_DAY + wholeDays;
  const ttSeconds = tdb - wholeDays * 86_400 + 43_200 - tdbMinusTt(tdb);
  const taiSeconds = ttSeconds - TT_MINUS_TAI;
  for (let i = leaps.steps.length - 1; i >= 0; i--) {
    const step = leaps.steps[i];
    if (step === undefined) continue;
    const since = (ttDay - step.utcDay) * 86_400 + taiSeconds - step.taiMinusUtc;
    if (since < (i === 0 ? -RESOLUTION : 0)) continue;
    const next = leaps.steps[i + 1];
    const seconds = taiSeconds - step.taiMinusUtc - Math.min(since, 0);
    const carry = Math.floor(seconds / 86_400);
    let day = ttDay + carry;
    let secondsOfDay = Math.min(seconds - carry * 86_400, BEFORE_MIDNIGHT);
    if (next !== undefined && day >= next.utcDay) {
      // past the end of the last day with this offset: the leap second
      secondsOfDay += (day - next.utcDay + 1) * 86_400;
      day = next.utcDay - 1;
    }
    const daysPast = day - leaps.expiresDay + secondsOfDay / 86_400;
    return Object.freeze({
      day,
      secondsOfDay,
      secondsInDay: secondsInDay(day, leaps),
      basis: daysPast >= 0 ? "predicted" : "leap-seconds",
      uncertaintySeconds: predictedHalfWidth(daysPast / 365.2425),
    });
  }
  const { seconds, uncertaintySeconds } = deltaT(decimalYear(tdb));
  const utSeconds = ttSeconds - seconds;
  const carry = Math.floor(utSeconds / 86_400);
  return Object.freeze({
    day: ttDay + carry,
    secondsOfDay: Math.min(utSeconds - carry * 86_400, BEFORE_MIDNIGHT),
    secondsInDay: 86_400,
    basis: "delta-t",
    uncertaintySeconds,
  });
}

/** Seconds; an instant so little before 1972 is one of 1972 that was rounded, and must not lose the 0.04 s. */
const RESOLUTION = 1e-6;

/** The number next below 86 400: a tiny negative remainder must not round up to a full day. */
const BEFORE_MIDNIGHT = 86_400 - 2 ** -36;

/**
 * Gives how many seconds a UTC day has: 86 401 where it ends with a leap second, else 86 400 (86 399, should a second ever be left out).
 *
 * @param day   Modified Julian day number
 * @param leaps the leap-second list
 */
export function secondsInDay(day: number, leaps: LeapSecondList = builtInLeapSeconds()): number {
  if (day < FIRST_LEAP_SECOND_DAY) return 86_400;
  for (let i = leaps.steps.length - 1; i > 0; i--) {
    const step = leaps.steps[i];
    const before = leaps.steps[i - 1];
    if (step === undefined || before === undefined || step.utcDay <= day) break;
    if (step.utcDay === day + 1) return 86_400 + step.taiMinusUtc - before.taiMinusUtc;
  }
  return 86_400;
}
