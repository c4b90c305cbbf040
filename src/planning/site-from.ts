import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";
import { requireSite } from "../sky/topocentric-frame.ts";
import { zoneOf } from "../time/zone-of.ts";
import type { PlanSite } from "./plan-options.ts";

const EXAMPLE = "46.5,8.0,2100";
const KEYS = ["name", "latitude", "longitude", "height", "zone"];

/**
 * Gives the site of a text such as `46.5,8.0,2100`: geodetic latitude, east longitude, height in metres (left out: 0).
 *
 * @throws ApsidaryError `bad-input`
 */
export function siteFromText(text: string): PlanSite {
  const parts = text.split(",").map((part) => part.trim());
  const numbers = parts.map((part) => (/^[+-]?(\d+\.?\d*|\.\d+)$/.test(part) ? Number(part) : Number.NaN));
  const [latitudeDeg, longitudeDeg, heightM = 0] = numbers;
  if (latitudeDeg === undefined || longitudeDeg === undefined || parts.length > 3 || numbers.some(Number.isNaN)) {
    throw new ApsidaryError(
      "bad-input",
      `the site ${JSON.stringify(text.slice(0, 60))} is not latitude,longitude,height in degrees (north and east positive) and metres, such as ${EXAMPLE}.`,
    );
  }
  const site = { latitudeDeg, longitudeDeg, heightM };
  requireSite(site);
  return Object.freeze(site);
}

/**
 * Gives the sites of a JSON text: a list of `{"name", "latitude", "longitude", "height", "zone"}`, height (m, 0) and zone being optional, or an object that
 * holds such a list as `sites`.
 *
 * @param text the JSON
 * @param file what messages call it
 * @throws ApsidaryError `bad-input`, `bad-zone`; each names the file and the site
 */
export function sitesFromJson(text: string, file: string): PlanSite[] {
  const bad = (why: string) => new ApsidaryError("bad-input", `${file}: ${why}`);
  let parsed: unknown;
  try {
    parsed = JSON.parse(text.replace(/^\uFEFF/, ""));
  } catch (error) {
    throw bad(`it is not JSON (${error instanceof Error ? error.message.replace(/\s+/g, " ") : String(error)}).`);
  }
  const list = isObject(parsed) && "sites" in parsed ? parsed.sites : parsed;
  if (!Array.isArray(list) || list.length === 0) {
    throw bad(
      'give a list of sites, such as [{"name": "North Ridge", "latitude": 46.5, "longitude": 8.0, "height": 2100}].',
    );
  }
  const seen = new Set<string>();
  return list.map((entry: unknown, index) => {
    if (!isObject(entry)) throw bad(`site ${index + 1} is not an object with name, latitude and longitude.`);
    const { name, latitude, longitude, height = 0, zone } = entry;
    if (typeof name !== "string" || name.trim() === "") throw bad(`site ${index + 1} has no name.`);
    const called = `site ${index + 1} ("${name}")`;
    for (const key of Object.keys(entry)) {
      if (KEYS.includes(key)) continue;
      const near = nearestName(key, KEYS);
      throw bad(
        `${called} has the unknown field "${key}"${near ? `; did you mean "${near}"?` : `; known are ${KEYS.join(", ")}.`}`,
      );
    }
    if (seen.has(name)) throw bad(`two sites are called "${name}"; give each a name of its own.`);
    seen.add(name);
    if (typeof latitude !== "number" || typeof longitude !== "number" || typeof height !== "number") {
      throw bad(`${called} needs latitude and longitude in degrees and height in metres as numbers.`);
    }
    if (zone !== undefined && typeof zone !== "string") throw bad(`${called} has a zone that is no text.`);
    const site = { name, latitudeDeg: latitude, longitudeDeg: longitude, heightM: height };
    try {
      requireSite(site);
      if (zone !== undefined) zoneOf(zone);
    } catch (error) {
      if (!(error instanceof ApsidaryError)) throw error;
      throw new ApsidaryError(error.code, `${file}, ${called}: ${error.message}`);
    }
    return Object.freeze(zone === undefined ? site : { ...site, zone });
  });
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
