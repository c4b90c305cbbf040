import { allPairs, type Pair, pairOf } from "../bodies/pair.ts";
import { nearestName } from "../nearest-name.ts";

/** Bodies as lists name them, in several languages' plain spellings, and the pair that is meant where no centre is told. */
const BODIES: Readonly<Record<string, string>> = {
  earth: "earth-sun",
  sun: "earth-sun",
  moon: "moon-earth",
  luna: "moon-earth",
  emb: "emb-sun",
  "earth-moon barycentre": "emb-sun",
  "earth-moon barycenter": "emb-sun",
};

/**
 * Gives the pair that a cell of a list names.
 *
 * @param given `moon-earth`, `Moon`, `Earth`, `Mars`, `Mars–Sun` …; a body alone means about the Sun's centre, the Moon about the Earth's
 * @returns the pair, or `null` where no pair is named so
 */
export function readPair(given: string): Pair | null {
  const before = read.get(given);
  if (before !== undefined) return before;
  const found = lookUp(given);
  if (read.size < 1000) read.set(given, found);
  return found;
}

/** Only remembers what can be worked out again. */
const read = new Map<string, Pair | null>();

function lookUp(given: string): Pair | null {
  const name = given
    .trim()
    .toLowerCase()
    .replace(/^the /, "")
    .replace(/[\u2010-\u2015_/]/g, "-")
    .replace(/\s*-\s*/g, "-");
  if (Object.hasOwn(BODIES, name)) return pairOf(BODIES[name] as string);
  const pairs = allPairs();
  return (
    pairs.find((pair) => pair.name === name) ??
    pairs.find((pair) => pair.name === `${name}-sun` || pair.name === `${name}-jupiter`) ??
    null
  );
}

/** Gives the pair's name or body that may have been meant, `null` where none is near. */
export function nearPair(given: string): string | null {
  const known = [...Object.keys(BODIES), ...allPairs().flatMap(({ name }) => [name, name.slice(0, name.indexOf("-"))])];
  return nearestName(given.slice(0, 60), known);
}
