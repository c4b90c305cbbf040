import type { ApsisKind } from "../bodies/term.ts";
import { type AuditScale, auditScale } from "./audit-scale.ts";
import { type DistanceUnit, distanceUnit } from "./read-distance.ts";
import { readKind } from "./read-kind.ts";

/** What a column holds. */
export type ColumnRole =
  | { readonly role: "pair" | "kind" | "scale" | "year" | "unit" | "precision" | "offset" }
  /** `kind` is set in a wide list; `rank` orders columns that could each be the time: the least serves. */
  | { readonly role: "when"; readonly kind: ApsisKind | null; readonly scale: AuditScale | null; readonly rank: number }
  | { readonly role: "date" | "time"; readonly kind: ApsisKind | null; readonly scale: AuditScale | null }
  | {
      readonly role: "distance";
      readonly kind: ApsisKind | null;
      readonly unit: DistanceUnit | null;
      readonly rank: number;
    };

const NAMES: Readonly<Record<string, "pair" | "kind" | "scale" | "year" | "unit" | "precision" | "offset">> = {
  pair: "pair", body: "pair", object: "pair", planet: "pair", target: "pair",
  kind: "kind", event: "kind", passage: "kind", type: "kind", term: "kind", apsis: "kind", phenomenon: "kind", what: "kind",
  scale: "scale", timescale: "scale", "time scale": "scale", zone: "scale", timezone: "scale", "time zone": "scale", tz: "scale",
  offset: "offset", "utc offset": "offset",
  year: "year", yr: "year", y: "year",
  unit: "unit", units: "unit", "distance unit": "unit",
  precision: "precision", printedunit: "precision", "printed unit": "precision",
}; // biome-ignore format: pairs

/** Names of a column that holds a whole time, and which of them serves where a list has several. */
const WHENS: readonly string[] = [
  "printed",
  "when",
  "datetime",
  "date time",
  "date and time",
  "date/time",
  "instant",
  "moment",
  "local",
  "local time",
  "utc",
  "time utc",
  "tdb",
  "tt",
];
/** Columns of our own answers that say nothing of what was published. */
const IGNORED =
  /^(?:printedutc|sinceutc|untilutc)$|^looked|percent|uncertainty|acceleration|existence|accuracy|source|rank|point|tdbseconds|half-width|±/i;

/**
 * Gives what a column holds by its heading, or `null` where it says nothing of a passage.
 *
 * @param heading in plain variants: `date`, `Time (UT)`, `body`, `event`, `km`, `Perihelion distance (au)` …
 */
export function readHeading(heading: string): ColumnRole | null {
  const name = heading
    .trim()
    .toLowerCase()
    .replace(/^["'#]+|["']+$/g, "")
    .replace(/_/g, " ")
    .trim();
  if (name === "" || name.length > 60 || IGNORED.test(name)) return null;
  if (Object.hasOwn(NAMES, name)) return { role: NAMES[name] as "pair" };
  const rank = WHENS.indexOf(name);
  if (rank >= 0) {
    const scale = name.includes("utc") ? auditScale("utc") : name === "tdb" || name === "tt" ? auditScale(name) : null;
    return { role: "when", kind: null, scale, rank };
  }
  if (name === "printedkm" || name === "printedau") {
    return { role: "distance", kind: null, unit: name === "printedkm" ? "km" : "au", rank: -1 };
  }
  const kind = readKind(name)?.kind ?? null;
  const unit = distanceUnit(name);
  if (unit !== null || /\bdist(?:ance)?\b|\brange\b|\bradius\b/.test(name) || /^(distance)(km|au|mi)$/.test(name)) {
    const said = unit ?? (/(km|au|mi)$/.exec(name)?.[0] as DistanceUnit | undefined) ?? null;
    return { role: "distance", kind, unit: said, rank: name === "distance" ? 0 : said === "km" ? 1 : 2 };
  }
  const scaleName = /\b(utc|ut1|ut|gmt|tdt|tdb|tt|td|tai|et)\b/.exec(name)?.[1];
  const scale = scaleName === undefined ? null : auditScale(scaleName);
  if (/\btime\b|\bhour\b|^h$|\bclock\b|^(?:ut|utc|tt|td|gmt)$/.test(name)) return { role: "time", kind, scale };
  if (/\bdate\b|\bday\b/.test(name)) return { role: "date", kind, scale };
  if (kind !== null) return { role: "when", kind, scale, rank: 0 };
  return null;
}
