import { AU_KM, DAY_SECONDS } from "../bodies/constants.ts";
import { ApsidaryError } from "../error.ts";

/** What kind of thing a quantity measures; each has its base unit. */
export type Dimension = "length" | "speed" | "time" | "number" | "energy" | "momentum" | "gm";

/** A number in its base unit (km, km/s, s, km²/s², km³/s²), or a text with a unit: `250km`, `7.5km/s`, `2h`, `1.5R`. */
export type Quantity = number | string;

/** Units by dimension, the base unit first; `R`, the radius of the central body, is added where there is one. */
const UNITS: Record<Dimension, Readonly<Record<string, number>>> = {
  length: { km: 1, m: 1e-3, au: AU_KM },
  speed: { "km/s": 1, "m/s": 1e-3 },
  time: { s: 1, min: 60, h: 3600, d: DAY_SECONDS },
  number: {},
  energy: { "km2/s2": 1, "m2/s2": 1e-6 },
  momentum: { "km2/s": 1, "m2/s": 1e-6 },
  gm: { "km3/s2": 1, "m3/s2": 1e-9 },
};

/**
 * Reads a quantity with its unit.
 *
 * @param given     a number in the base unit, or a text: a decimal number, then the unit (`km`, `m`, `au`, `R`; `km/s`, `m/s`; `s`,
 *   `min`, `h`, `d`; `km2/s2`, `km2/s`, `km3/s2` and the same with `m`, also as `km^2` or `km²`); a text without unit is in the base unit
 * @param dimension what it measures
 * @param what      what to call it in messages, such as `the periapsis height`
 * @param radiusKm  the radius that `R` stands for; `null` where there is none
 * @returns the quantity in the base unit: km, km/s, s, km²/s², km²/s, km³/s²
 * @throws ApsidaryError `bad-input`
 */
export function parseQuantity(
  given: Quantity,
  dimension: Dimension,
  what: string,
  radiusKm: number | null = null,
): number {
  const value = typeof given === "string" ? parseText(given, dimension, what, radiusKm) : given;
  if (typeof value === "number" && Number.isFinite(value)) return value;
  const shown = typeof given === "string" ? JSON.stringify(given.slice(0, 60)) : String(given);
  throw new ApsidaryError(
    "bad-input",
    `${what} is ${shown}, which is no finite number. Write it as ${example(dimension)}.`,
  );
}

function parseText(given: string, dimension: Dimension, what: string, radiusKm: number | null): number {
  const match = /^\s*([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)\s*([^\s\d.,]\S*)?\s*$/.exec(
    given.length > 200 ? "" : given,
  );
  if (!match) return Number.NaN;
  const [, digits = "", suffix = ""] = match;
  const units = UNITS[dimension];
  const unit = suffix.replace("AU", "au").replaceAll("^", "").replaceAll("²", "2").replaceAll("³", "3");
  if (unit === "") return Number(digits);
  if (Object.hasOwn(units, unit)) return Number(digits) * (units[unit] ?? Number.NaN);
  if (dimension === "length" && unit === "R") {
    if (radiusKm !== null) return Number(digits) * radiusKm;
    throw new ApsidaryError(
      "bad-input",
      `${what} is in R, the radius of the central body, and none is known. Name the body, give its equatorial radius, or write km.`,
    );
  }
  const allowed = [...Object.keys(units), ...(dimension === "length" ? ["R"] : [])];
  const right = allowed.length > 0 ? `Write ${allowed.join(", ")}` : "It takes no unit";
  throw new ApsidaryError(
    "bad-input",
    `${what} is in an unknown unit, ${JSON.stringify(suffix.slice(0, 40))}. ${right}, as in ${example(dimension)}.`,
  );
}

function example(dimension: Dimension): string {
  return {
    length: "250km",
    speed: "7.5km/s",
    time: "2h",
    number: "0.0167",
    energy: "-29.8km2/s2",
    momentum: "52500km2/s",
    gm: "398600.44km3/s2",
  }[dimension];
}
