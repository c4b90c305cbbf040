import type { PairName } from "../bodies/pair.ts";
import type { Alternative, Verdict } from "./audit-row.ts";
import { type Case, readOtherwise } from "./case.ts";
import type { CauseName, TimeCause } from "./cause.ts";
import { allDistanceCauses } from "./causes/all-distance-causes.ts";
import { CHANCE_SHARE, NAMED } from "./odds.ts";
import type { PublishedDistance } from "./read-distance.ts";
import { knownPair } from "./sky.ts";

/** What the audit says of a row's distance. */
export interface DistanceJudgement {
  readonly verdict: Verdict;
  readonly cause: CauseName | null;
  readonly detail: string;
  readonly alternatives: readonly Alternative[];
  /** What happened, as the end of a sentence; empty without a cause. */
  readonly said: string;
}

/** Errors by chance spread evenly over the logarithm of their size, from half a digit to a thousand million digits. */
const LOG_WIDTH = Math.log(2e9);

/**
 * Judges a row's distance.
 *
 * @param one       the row
 * @param distance  as published
 * @param timeCause what its time was explained by: a passage of another centre or kind brings its own distance
 * @param cutOff    whether the list cuts its distances off
 */
export function judgeDistance(
  one: Case,
  distance: PublishedDistance,
  timeCause: TimeCause | null,
  cutOff: boolean,
): DistanceJudgement {
  const { unitKm } = distance;
  const { distanceKm } = one.at.passage;
  const plain = (verdict: Verdict): DistanceJudgement => ({
    verdict,
    cause: null,
    detail: "",
    alternatives: [],
    said: "",
  });
  const fits = (trueKm: number, boundKm: number, digits = 0) => distanceFits(distance, trueKm, boundKm, cutOff, digits);
  const inside = fits(distanceKm, one.at.kmBound);
  if (inside) return plain(one.at.kmBound > unitKm ? "undecided" : "agrees");
  const other = otherDistance(one, timeCause);
  if (timeCause && other !== null && fits(other, one.at.kmBound + 1)) {
    return {
      verdict: "explained",
      cause: timeCause.name,
      detail: "",
      alternatives: [],
      said: "the distance is that passage's",
    };
  }
  const residual = distance.km - distanceKm;
  const chance = Math.log(CHANCE_SHARE / (2 * Math.max(Math.abs(residual), unitKm / 2) * LOG_WIDTH));
  const found: { cause: CauseName; detail: string; said: string; log: number }[] = [];
  for (const cause of allDistanceCauses()) {
    for (const each of cause.predict(one, distance)) {
      if (!fits(each.km, each.boundKm)) continue;
      const log = Math.log((cause.share * each.share) / (each.unitKm + 2 * each.boundKm));
      found.push({ cause: cause.name, detail: each.detail, said: cause.say(each.detail), log });
    }
  }
  found.sort((a, b) => b.log - a.log);
  const [first] = found;
  const second = found.find(({ cause }) => cause !== first?.cause);
  const rival = Math.max(chance, second?.log ?? -Infinity);
  // one digit off comes before a cause that could be the same by chance
  const nearMiss = fits(distanceKm, one.at.kmBound, 1);
  if (first && !nearMiss && first.log - rival >= Math.log(NAMED)) {
    return { verdict: "explained", cause: first.cause, detail: first.detail, alternatives: [], said: first.said };
  }
  if (nearMiss) return plain("last-digit");
  const alternatives = found
    .filter(({ log }) => log > chance)
    .map(({ cause, detail, log }) => ({
      cause,
      causeDetail: detail,
      odds: Number(Math.min(1e6, Math.exp(log - chance)).toPrecision(2)),
    }));
  return { verdict: "disagrees", cause: null, detail: "", alternatives, said: "" };
}

/** Whether a true distance, known to `boundKm`, could have been printed so. */
export function distanceFits(
  { km, unitKm }: PublishedDistance,
  trueKm: number,
  boundKm: number,
  cutOff: boolean,
  digits: number,
): boolean {
  const residual = km - trueKm;
  const slack = boundKm + digits * unitKm + unitKm * 1e-9 + 1e-6;
  if (Math.abs(residual) <= unitKm / 2 + slack) return true;
  return cutOff && residual >= -unitKm - slack && residual <= slack;
}

function otherDistance(one: Case, cause: TimeCause | null): number | null {
  const read = (otherwise: Parameters<typeof readOtherwise>[1]) =>
    readOtherwise(one, otherwise)?.at.passage.distanceKm ?? null;
  const { name } = one.pair;
  const body = name.slice(0, name.indexOf("-"));
  const centre = name.slice(name.indexOf("-") + 1);
  switch (cause?.name) {
    case "emb-centre":
      return read({ pair: knownPair(`${body === "earth" ? "emb" : "earth"}-${centre}` as PairName) });
    case "ssb-centre":
      return read({ pair: knownPair(`${body}-${centre === "sun" ? "ssb" : "sun"}` as PairName) });
    case "kind-swapped":
      return read({ kind: one.kind === "periapsis" ? "apoapsis" : "periapsis" });
    default:
      return null;
  }
}
