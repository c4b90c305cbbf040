/**
 * The offsets from UTC that civil clocks keep, minutes: 39 besides UTC itself, by the zone data of the IANA as of today and the summer
 * times of those zones.
 */
export const CIVIL_OFFSETS: readonly number[] = Object.freeze([
  -720, -660, -600, -570, -540, -480, -420, -360, -300, -240, -210, -180, -150, -120, -60, 60, 120, 180, 210, 240, 270,
  300, 330, 345, 360, 390, 420, 480, 525, 540, 570, 600, 630, 660, 720, 765, 780, 825, 840,
]);

/** Zones with summer time that stand for all that keep the same clock; a list that was left in one of them has two offsets. */
export const SUMMER_ZONES: readonly string[] = Object.freeze([
  "Europe/London",
  "Europe/Berlin",
  "Europe/Athens",
  "America/St_Johns",
  "America/Halifax",
  "America/New_York",
  "America/Chicago",
  "America/Denver",
  "America/Los_Angeles",
  "America/Anchorage",
  "America/Santiago",
  "Australia/Adelaide",
  "Australia/Sydney",
  "Pacific/Auckland",
]);

/** Writes an offset: `+05:30`. */
export function offsetText(minutes: number): string {
  const size = Math.abs(minutes);
  const two = (value: number) => String(value).padStart(2, "0");
  return `${minutes < 0 ? "-" : "+"}${two(Math.floor(size / 60))}:${two(size % 60)}`;
}
