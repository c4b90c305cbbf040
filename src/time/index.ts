export {
  type CivilDate,
  dayOfGregorian,
  dayOfJulian,
  daysInMonth,
  gregorianOfDay,
  julianOfDay,
} from "./civil-calendar.ts";
export { dateTimeOf } from "./date-time-of.ts";
export { DELTA_T_MODEL, type DeltaT, decimalYear, deltaT, deltaTSeconds } from "./delta-t.ts";
export { formatTdb } from "./format-tdb.ts";
export { formatUtc, utcText } from "./format-utc.ts";
export { builtInLeapSeconds, type LeapSecondList, type LeapSecondStep, parseLeapSeconds } from "./leap-seconds.ts";
export { tdbMinusTt } from "./tdb-minus-tt.ts";
export { type Moment, tdbOf } from "./tdb-of.ts";
export { tdbOfUtc } from "./tdb-of-utc.ts";
export { secondsInDay, type Utc, type UtcBasis, utcOf } from "./utc-of.ts";
export { zoneOf } from "./zone-of.ts";
