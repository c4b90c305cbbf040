import { ApsidaryError } from "../error.ts";
import { decimalYear, deltaTSeconds } from "./delta-t.ts";
import { builtInLeapSeconds, FIRST_LEAP_SECOND_DAY, type LeapSecondList } from "./leap-seconds.ts";
import { tdbMinusTt } from "./tdb-minus-tt.ts";
import { J2000_DAY, secondsInDay, TT_MINUS_TAI } from "./utc-of.ts";

/**
 * Gives the TDB seconds past J2000.0 of a UTC instant, before 1972 of a UT1 instant: the inverse of `utcOf`.
 *
 * @param day          Modified Julian day number, whole
 * @param secondsOfDay since its beginning, `0 ≤ s < 86 400`, and up to 86 401 on a day that ends with a leap second
 * @param leaps        the leap-second list
 * @returns rounded once, to the resolution of the number: 0.12 µs about 2026, 0.5 µs about 1900, 15 µs about the year −2000
 * @throws `bad-date` where the day is not whole or has no such second
 *
 * The 0.04 s of UT1 before 1972-01-01 that did not occur (see `utcOf`) stand for that midnight.
 */
export function tdbOfUtc(day: number, secondsOfDay: number, leaps: LeapSecondList = builtInLeapSeconds()): number {
  if (!Number.isInteger(day)) {
    throw new ApsidaryError("bad-date", `The day ${day} is not a Modified Julian day number; give a whole number.`);
  }
  const length = secondsInDay(day, leaps);
  if (!(secondsOfDay >= 0 && secondsOfDay < length)) {
    throw new ApsidaryError("bad-date", `Day ${day} has the seconds 0 up to ${length}, not ${secondsOfDay}.`);
  }
  return day < FIRST_LEAP_SECOND_DAY
    ? Math.min(tdbOfUt1(day, secondsOfDay), tdbOfTai(FIRST_LEAP_SECOND_DAY, 0, firstOffset(leaps)))
    : tdbOfTai(day, secondsOfDay, offsetOn(day, leaps));
}

/** TAI − UTC on a day, in seconds. */
function offsetOn(day: number, leaps: LeapSecondList): number {
  for (let i = leaps.steps.length - 1; i >= 0; i--) {
    const step = leaps.steps[i];
    if (step !== undefined && step.utcDay <= day) return step.taiMinusUtc;
  }
  return firstOffset(leaps);
}

function firstOffset(leaps: LeapSecondList): number {
  return leaps.steps[0]?.taiMinusUtc ?? 10;
}

function tdbOfTai(day: number, secondsOfDay: number, taiMinusUtc: number): number {
  return tdbOfTt(day, secondsOfDay + taiMinusUtc + TT_MINUS_TAI);
}

function tdbOfUt1(day: number, secondsOfDay: number): number {
  // TT = UT1 + ΔT(TT); each round shrinks the error by the rate of ΔT, which is below 3e-6
  const ut = (day - J2000_DAY) * 86_400 - 43_200 + secondsOfDay;
  let shift = 0;
  for (let round = 0; round < 4; round++) shift = deltaTSeconds(decimalYear(ut + shift));
  return tdbOfTt(day, secondsOfDay + shift);
}

/** The whole seconds are summed exactly; the small parts are added last and together. */
function tdbOfTt(day: number, secondsOfDay: number): number {
  const midnight = (day - J2000_DAY) * 86_400 - 43_200;
  return midnight + (secondsOfDay + tdbMinusTt(midnight + secondsOfDay));
}
