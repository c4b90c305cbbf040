import { FixedOffsetZone, IANAZone, type Zone } from "luxon";
import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";

/** Zones that are accepted but that engines leave out of their own list of names. */
const ALIASES: readonly string[] = [
  "UTC",
  "GMT",
  "Africa/Asmara",
  "America/Argentina/Buenos_Aires",
  "Asia/Ho_Chi_Minh",
  "Asia/Kathmandu",
  "Asia/Kolkata",
  "Asia/Yangon",
  "Atlantic/Faroe",
  "Europe/Kyiv",
  "Pacific/Kanton",
  "US/Central",
  "US/Eastern",
  "US/Mountain",
  "US/Pacific",
];

/**
 * Gives the zone of a name.
 *
 * @param zone an IANA name, `Pacific/Auckland`, case does not count; `UTC` or `Z`; or a fixed offset, `+05:45` or `UTC+05:45`
 * @throws `bad-zone` where there is no such zone, with the name that may have been meant
 */
export function zoneOf(zone: string): Zone {
  const given = zone.trim();
  if (/^(z|utc|gmt)$/i.test(given)) return FixedOffsetZone.utcInstance;
  const fixed = /^(?:utc|gmt)?([+-])(\d{1,2})(?::?(\d\d))?$/i.exec(given);
  if (fixed) {
    const hours = Number(fixed[2]);
    const minutes = Number(fixed[3] ?? 0);
    if (hours <= 15 && minutes <= 59) {
      return FixedOffsetZone.instance((fixed[1] === "-" ? -1 : 1) * (hours * 60 + minutes));
    }
    throw new ApsidaryError("bad-zone", `There is no zone "${zone}": offsets are -15:59 to +15:59.`);
  }
  if (IANAZone.isValidZone(given)) return IANAZone.create(given);
  const near = nearZone(given);
  const meant = near === null ? "." : `; did you mean "${near}"?`;
  throw new ApsidaryError(
    "bad-zone",
    `There is no zone "${zone}"${meant} Give an IANA name such as "Pacific/Auckland", "UTC" or an offset such as "+05:45".`,
  );
}

/** By the whole name, or else by the place alone. */
function nearZone(given: string): string | null {
  const names = [...Intl.supportedValuesOf("timeZone"), ...ALIASES];
  const byPlace = new Map(names.map((name) => [placeOf(name), name]));
  const exactPlace = byPlace.get(placeOf(given.replaceAll(" ", "_")));
  if (exactPlace !== undefined) return exactPlace;
  const near = nearestName(given, names);
  if (near !== null) return near;
  const place = nearestName(placeOf(given.replaceAll(" ", "_")), byPlace.keys());
  return place === null ? null : (byPlace.get(place) ?? null);
}

function placeOf(name: string): string {
  return name.slice(name.lastIndexOf("/") + 1).toLowerCase();
}
