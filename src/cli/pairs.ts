import { allPairs, type Pair, pairOf } from "../bodies/pair.ts";
import { ApsidaryError } from "../error.ts";

/**
 * Gives the pairs that were named, each once, in their order.
 *
 * @param words the arguments: names, or names joined by commas
 * @throws ApsidaryError `bad-pair`
 */
export function pairsOf(words: readonly string[]): Pair[] {
  const names = words.flatMap((word) => word.split(",")).map((name) => name.trim());
  if (names.includes("")) {
    throw new ApsidaryError(
      "bad-pair",
      "a pair's name is empty; write pairs as moon-earth,earth-sun (commas, no spaces).",
    );
  }
  return [...new Set(names)].map((name) => pairOf(name));
}

/** Gives the help text that tells which pairs there are. */
export function pairsHelp(): string {
  const names = allPairs().map((pair) => pair.name);
  const ofPlanets = names
    .filter((name) => name.endsWith("-sun") && !name.startsWith("earth") && !name.startsWith("emb"))
    .map((name) => name.slice(0, -4));
  return `Pairs (the moving point, then the centre of the distance):
  moon-earth                        perigee and apogee
  earth-sun, emb-sun                perihelion and aphelion of the Earth's centre, and of the
                                    barycentre of the Earth and the Moon (emb)
  PLANET-sun                        ${ofPlanets.slice(0, 5).join(", ")},
                                    ${ofPlanets.slice(5).join(", ")}; from jupiter on the barycentre
                                    of the planet and its moons
  earth-ssb, emb-ssb, PLANET-ssb    the same from the barycentre of the solar system (ssb)
  MOON-jupiter                      io, europa, ganymede, callisto`;
}
