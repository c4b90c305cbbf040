import type { PairName } from "../bodies/pair.ts";

/** Names of points that are not written like their id. */
const NAMES: Readonly<Record<string, string>> = {
  emb: "barycentre of the Earth and the Moon",
  ssb: "barycentre of the solar system",
  earth: "Earth",
  moon: "Moon",
  sun: "Sun",
};
/** Points that take an article inside a sentence. */
const WITH_ARTICLE: ReadonlySet<string> = new Set(["emb", "ssb", "earth", "moon", "sun"]);

/** Gives the name of a point as a heading has it: `Earth`, `Jupiter`. */
export function pointName(point: string): string {
  return NAMES[point] ?? point.slice(0, 1).toUpperCase() + point.slice(1);
}

/** Gives the words for a pair: `Moon about the Earth`, `Mars about the Sun`, `Io about Jupiter`. */
export function pairWords(pair: PairName): string {
  const [target = "", centre = ""] = pair.split("-");
  const name = target === "emb" ? `B${pointName(target).slice(1)}` : pointName(target);
  return `${name} about ${WITH_ARTICLE.has(centre) ? "the " : ""}${pointName(centre)}`;
}
