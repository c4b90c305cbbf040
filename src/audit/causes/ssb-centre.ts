import type { PairName } from "../../bodies/pair.ts";
import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";
import { knownPair } from "../sky.ts";

/** The distance was taken from the barycentre of the solar system instead of the Sun's centre, or the other way round: weeks off for the Earth. */
export const ssbCentre: TimeCause = Object.freeze({
  name: "ssb-centre",
  predict(row: Case): Prediction[] {
    const [body = "", centre] = row.pair.name.split("-");
    if (centre !== "sun" && centre !== "ssb") return [];
    const toSsb = centre === "sun";
    const other = readOtherwise(row, { pair: knownPair(`${body}-${toSsb ? "ssb" : "sun"}` as PairName) });
    const detail = toSsb ? "solar-system barycentre" : "Sun's centre";
    return other ? [{ detail, share: 1, residual: other.residual, bound: other.bound }] : [];
  },
  say: (detail: string) => `it is the passage reckoned from the ${detail}`,
});
