/** A calendar date; the year before year 1 is year 0, the one before that −1. */
export interface CivilDate {
  readonly year: number;
  /** 1 to 12. */
  readonly month: number;
  /** 1 to 31. */
  readonly day: number;
}

/** Modified Julian day number of 0000-03-01, proleptic Gregorian. */
const GREGORIAN_MARCH_OF_YEAR_0 = -678_881;
/** Modified Julian day number of 0000-03-01, proleptic Julian: two days earlier. */
const JULIAN_MARCH_OF_YEAR_0 = -678_883;

/**
 * Gives the Modified Julian day number of a date of the proleptic Gregorian calendar.
 *
 * @param year  astronomical: 0 is the year before 1
 * @param month 1 to 12
 * @param day   day of the month; days past its end run on into the next
 *
 * Method: years counted from 1 March, so that the leap day comes last; every 400 of them have 146 097 days.
 */
export function dayOfGregorian(year: number, month: number, day: number): number {
  const marchYear = month > 2 ? year : year - 1;
  const leapDays = Math.floor(marchYear / 4) - Math.floor(marchYear / 100) + Math.floor(marchYear / 400);
  return GREGORIAN_MARCH_OF_YEAR_0 + 365 * marchYear + leapDays + dayOfMarchYear(month, day);
}

/** Gives the proleptic Gregorian date of a Modified Julian day number (a whole number). */
export function gregorianOfDay(mjd: number): CivilDate {
  const days = mjd - GREGORIAN_MARCH_OF_YEAR_0;
  const cycle = Math.floor(days / 146_097);
  const inCycle = days - 146_097 * cycle;
  const yearOfCycle = Math.floor(
    (inCycle - Math.floor(inCycle / 1460) + Math.floor(inCycle / 36_524) - Math.floor(inCycle / 146_096)) / 365,
  );
  const dayOfYear = inCycle - (365 * yearOfCycle + Math.floor(yearOfCycle / 4) - Math.floor(yearOfCycle / 100));
  return dateOfMarchYear(400 * cycle + yearOfCycle, dayOfYear);
}

/** Gives the Modified Julian day number of a date of the proleptic Julian calendar; arguments as for `dayOfGregorian`. */
export function dayOfJulian(year: number, month: number, day: number): number {
  const marchYear = month > 2 ? year : year - 1;
  return JULIAN_MARCH_OF_YEAR_0 + 365 * marchYear + Math.floor(marchYear / 4) + dayOfMarchYear(month, day);
}

/** Gives the proleptic Julian date of a Modified Julian day number (a whole number). */
export function julianOfDay(mjd: number): CivilDate {
  const days = mjd - JULIAN_MARCH_OF_YEAR_0;
  const cycle = Math.floor(days / 1461);
  const inCycle = days - 1461 * cycle;
  const yearOfCycle = Math.floor((inCycle - Math.floor(inCycle / 1460)) / 365);
  return dateOfMarchYear(4 * cycle + yearOfCycle, inCycle - 365 * yearOfCycle);
}

/** Gives the number of days in a month of the proleptic Gregorian calendar. */
export function daysInMonth(year: number, month: number): number {
  return (
    dayOfGregorian(month === 12 ? year + 1 : year, month === 12 ? 1 : month + 1, 1) - dayOfGregorian(year, month, 1)
  );
}

/** Days since 1 March: March to July, August to December and January on have the lengths 31, 30, 31, 30, 31. */
function dayOfMarchYear(month: number, day: number): number {
  return Math.floor((153 * (month > 2 ? month - 3 : month + 9) + 2) / 5) + day - 1;
}

function dateOfMarchYear(marchYear: number, dayOfYear: number): CivilDate {
  const monthFromMarch = Math.floor((5 * dayOfYear + 2) / 153);
  const day = dayOfYear - Math.floor((153 * monthFromMarch + 2) / 5) + 1;
  const month = monthFromMarch < 10 ? monthFromMarch + 3 : monthFromMarch - 9;
  return Object.freeze({ year: month > 2 ? marchYear : marchYear + 1, month, day });
}
