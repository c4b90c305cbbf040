import type { PairName } from "../../bodies/pair.ts";
import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";
import { knownPair } from "../sky.ts";

const OTHERS: Partial<Record<PairName, { readonly pair: PairName; readonly detail: string }>> = {
  "earth-sun": { pair: "emb-sun", detail: "Earth-Moon barycentre" },
  "earth-ssb": { pair: "emb-ssb", detail: "Earth-Moon barycentre" },
  "emb-sun": { pair: "earth-sun", detail: "Earth's centre" },
  "emb-ssb": { pair: "earth-ssb", detail: "Earth's centre" },
};

/** The passage is that of the barycentre of the Earth and the Moon, where the Earth's centre was meant: up to 1.4 days off; or the other way round. */
export const embCentre: TimeCause = Object.freeze({
  name: "emb-centre",
  predict(row: Case): Prediction[] {
    const meant = OTHERS[row.pair.name];
    if (!meant) return [];
    const other = readOtherwise(row, { pair: knownPair(meant.pair) });
    return other ? [{ detail: meant.detail, share: 1, residual: other.residual, bound: other.bound }] : [];
  },
  say: (detail: string) => `it is the passage of the ${detail}`,
});
