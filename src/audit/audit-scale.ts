import type { Zone } from "luxon";
import { ApsidaryError } from "../error.ts";
import { zoneOf } from "../time/zone-of.ts";

/** The clock by which a published time is told: a scale, or the civil time of a zone. Frozen. */
export type AuditScale =
  | { readonly kind: "utc" | "ut1" | "tt" | "tai" | "tdb"; readonly name: string }
  | { readonly kind: "zone"; readonly name: string; readonly zone: Zone };

/** Words that lists use for a scale. `ut` and `gmt` are what UTC has been called in print; `td` and `et` are older names of TT. */
const SCALES: Readonly<Record<string, "utc" | "ut1" | "tt" | "tai" | "tdb">> = {
  utc: "utc",
  ut: "utc",
  gmt: "utc",
  z: "utc",
  ut1: "ut1",
  tt: "tt",
  td: "tt",
  tdt: "tt",
  et: "tt",
  tai: "tai",
  tdb: "tdb",
};

const PLAIN = Object.freeze({
  utc: Object.freeze({ kind: "utc", name: "utc" }),
  ut1: Object.freeze({ kind: "ut1", name: "ut1" }),
  tt: Object.freeze({ kind: "tt", name: "tt" }),
  tai: Object.freeze({ kind: "tai", name: "tai" }),
  tdb: Object.freeze({ kind: "tdb", name: "tdb" }),
} as const);

/** UTC, by which a list is read that says nothing else. */
export const UTC_SCALE: AuditScale = PLAIN.utc;

/** Gives the scale of a word that names one, or `null`; case does not count. */
export function scaleWord(word: string): AuditScale | null {
  const lower = word.toLowerCase();
  return Object.hasOwn(SCALES, lower) ? PLAIN[SCALES[lower] as "utc"] : null;
}

/**
 * Gives the scale of a name.
 *
 * @param name `utc`, `ut1`, `tt`, `tai`, `tdb` and their usual variants, an IANA zone, or an offset such as `+05:30`
 * @throws ApsidaryError `bad-zone`
 */
export function auditScale(name: string): AuditScale {
  const given = name.trim();
  const word = scaleWord(given);
  if (word) return word;
  let known = zones.get(given);
  if (!known) {
    if (given.length > 60) throw new ApsidaryError("bad-zone", `"${given.slice(0, 30)}…" is no scale and no zone.`);
    const zone = zoneOf(given);
    known = zone.isUniversal && zone.offset(0) === 0 ? UTC_SCALE : Object.freeze({ kind: "zone", name: given, zone });
    if (zones.size < 2000) zones.set(given, known);
  }
  return known;
}

/** Only remembers what can be worked out again. */
const zones = new Map<string, AuditScale>();
