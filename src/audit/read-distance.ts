import { AU_KM } from "../bodies/constants.ts";

/** Units of a printed distance, and their kilometres. A mile is the international one of 1959, 1.609344 km. */
export const DISTANCE_UNITS = { km: 1, au: AU_KM, mi: 1.609344 } as const;
export type DistanceUnit = keyof typeof DISTANCE_UNITS;

/** A distance as it was printed. Frozen. */
export interface PublishedDistance {
  readonly text: string;
  readonly unit: DistanceUnit;
  readonly km: number;
  /** What the last digit is worth, km; the zeros at the end of a whole number do not count as digits. */
  readonly unitKm: number;
  /** The number in its own unit. */
  readonly value: number;
  /** Where the digits stand in the text. */
  readonly digits: {
    readonly start: number;
    readonly end: number;
    readonly decimals: number;
    readonly grouping: string;
  };
  /** What the number is multiplied by: 1e6 for "million km". */
  readonly factor: number;
}

const NUMBER = /[+-]?\d{1,3}(?:([,  \u00a0\u202f'’.])\d{3})(?:\1\d{3})*(?:[.,]\d+)?(?!\d)|[+-]?\d+(?:[.,]\d+)?/;

/**
 * Reads a distance as people print it: `147 099 894 km`, `147,099,894`, `0.98330 au`, `356.5 thousand km`, `91.4 million miles`.
 *
 * @param given the cell
 * @param unit  the unit that the column says, where the cell has none
 * @returns the distance, or `null` where there is none to be read
 */
export function readDistance(given: string, unit: DistanceUnit | null): PublishedDistance | null {
  const found = NUMBER.exec(given);
  if (!found || given.length > 60) return null;
  const word = given.slice(found.index + found[0].length);
  const said = distanceUnit(word) ?? unit;
  if (said === null) return null;
  const grouping = found[1] ?? "";
  let plain = grouping === "" ? found[0] : found[0].replaceAll(grouping, "");
  if (grouping === "." && !plain.includes(",") && found[0].split(".").length === 2) plain = found[0]; // 356.509 is no thousand
  const decimalMark = /[.,](?=\d+$)/.exec(plain);
  const number = Number(plain.replace(",", "."));
  if (!Number.isFinite(number)) return null;
  const decimals = decimalMark ? plain.length - plain.search(/[.,]/) - 1 : 0;
  const factor = /million|mio|mill\b/i.test(word) ? 1e6 : /thousand/i.test(word) ? 1e3 : 1;
  const zeros = decimals === 0 ? (/0*$/.exec(plain)?.[0].length ?? 0) : 0;
  const km = number * factor * DISTANCE_UNITS[said];
  return {
    text: given,
    unit: said,
    km,
    unitKm: 10 ** (Math.min(zeros, 15) - decimals) * factor * DISTANCE_UNITS[said],
    value: number,
    digits: {
      start: found.index,
      end: found.index + found[0].length,
      decimals,
      grouping: plain === found[0] ? "" : grouping,
    },
    factor,
  };
}

/** Gives the unit that a word names, or `null`. */
export function distanceUnit(word: string): DistanceUnit | null {
  if (/\b(?:km|kilomet(?:er|re)s?)\b/i.test(word)) return "km";
  if (/\b(?:a\.?u\.?|ua|astronomical units?)(?![a-z])/i.test(word)) return "au";
  if (/\b(?:mi|miles?)\b/i.test(word)) return "mi";
  return null;
}

/** Writes a distance (km) in the manner and to the precision of a printed one. */
export function writeDistance(km: number, like: PublishedDistance): string {
  const { digits, factor, unit, unitKm } = like;
  const unitsOfOne = unitKm / DISTANCE_UNITS[unit] / factor;
  const value = km / DISTANCE_UNITS[unit] / factor;
  const rounded = digits.decimals > 0 ? value : Math.round(value / unitsOfOne) * unitsOfOne;
  let text = rounded.toFixed(digits.decimals);
  if (digits.grouping) {
    const [whole = "", decimals] = text.split(".");
    text = whole.replace(/\B(?=(\d{3})+$)/g, digits.grouping) + (decimals === undefined ? "" : `.${decimals}`);
  }
  return like.text.slice(0, digits.start) + text + like.text.slice(digits.end);
}
