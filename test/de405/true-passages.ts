import { type De405, openDe405 } from "./read.ts";

/** A passage as DE405 itself has it. */
export interface TruePassage {
  readonly kind: "periapsis" | "apoapsis";
  /** TDB seconds past J2000. */
  readonly tdb: number;
  readonly distanceKm: number;
  /** Second derivative of the distance: above zero at a periapsis, below at an apoapsis. */
  readonly rangeAccelerationKmPerDay2: number;
}

const PLANETS = [
  "mercury",
  "venus",
  "earth",
  "emb",
  "mars",
  "jupiter",
  "saturn",
  "uranus",
  "neptune",
  "pluto",
] as const;

/** Names of all pairs that DE405 supplies. */
export const DE405_PAIRS: readonly string[] = Object.freeze([
  "moon-earth",
  ...PLANETS.map((planet) => `${planet}-sun`),
  ...PLANETS.map((planet) => `${planet}-ssb`),
]);

const DAY = 86400;
/** 1960-01-01 and 2060-01-01, 0 h TDB, seconds past J2000. */
export const TRUE_FROM = (2436934.5 - 2451545) * DAY;
export const TRUE_TO = (2473459.5 - 2451545) * DAY;

const known = new Map<string, readonly TruePassage[]>();

/**
 * Gives all passages of a pair from 1960-01-01 to 2060-01-01 (TDB), in order, from DE405 as JPL made it.
 *
 * Method: r·v, which has the sign of the range rate, is sampled every 6 h (the Moon: every hour); each change of sign is
 * halved until the interval is 1 s long and closed by Newton's steps with d(r·v)/dt = v·v + r·a.
 * No code of the product is used.
 *
 * @param pair one of `DE405_PAIRS`
 * @param de405 the table; left out, it is found or downloaded
 */
export function truePassages(pair: string, de405?: De405): readonly TruePassage[] {
  const before = known.get(pair);
  if (before) return before;
  const found = search(pair, de405 ?? openDe405());
  known.set(pair, found);
  return found;
}

function search(pair: string, de405: De405): readonly TruePassage[] {
  const s = new Float64Array(9);
  const dot = (i: number, j: number): number =>
    (s[i] as number) * (s[j] as number) +
    (s[i + 1] as number) * (s[j + 1] as number) +
    (s[i + 2] as number) * (s[j + 2] as number);
  const product = (tdb: number): number => {
    de405.pairState(pair, tdb, s);
    return dot(0, 3);
  };
  const step = pair === "moon-earth" ? 3600 : 6 * 3600;
  const passages: TruePassage[] = [];
  let before = product(TRUE_FROM);
  for (let at = TRUE_FROM + step; at <= TRUE_TO; at += step) {
    const after = product(at);
    if (before < 0 !== after < 0) {
      let low = at - step;
      let high = at;
      while (high - low > 1) {
        const middle = (low + high) / 2;
        if (product(middle) < 0 === before < 0) low = middle;
        else high = middle;
      }
      let tdb = (low + high) / 2;
      for (let i = 0; i < 4; i++) {
        const value = product(tdb);
        tdb -= value / (dot(3, 3) + dot(0, 6));
      }
      de405.pairState(pair, tdb, s);
      const distance = Math.sqrt(dot(0, 0));
      const rangeRate = dot(0, 3) / distance;
      passages.push(
        Object.freeze({
          kind: before < 0 ? "periapsis" : "apoapsis",
          tdb,
          distanceKm: distance,
          rangeAccelerationKmPerDay2: ((dot(3, 3) + dot(0, 6) - rangeRate ** 2) / distance) * DAY ** 2,
        }),
      );
    }
    before = after;
  }
  return Object.freeze(passages);
}
