import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";

/** Says in one line why the steps of a pair are not split into calendar, planets and Moon; `null` for `earth-sun`, whose are. */
export function whyNoSplit(pair: PairName | Pair): string | null {
  const { name } = pairOf(pair);
  if (name === "earth-sun") return null;
  const reason =
    name === "emb-sun"
      ? "the Moon does nothing to the barycentre"
      : name === "earth-ssb" || name === "emb-ssb"
        ? "about the ssb the planets shift it by weeks"
        : "its passages do not follow the year";
  return `${name} has no split into calendar, planets, Moon: ${reason}.`;
}
