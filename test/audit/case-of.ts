import { auditScale } from "../../src/audit/audit-scale.ts";
import type { Case, Prediction } from "../../src/audit/case.ts";
import type { TimeCause } from "../../src/audit/cause.ts";
import { isUnread, readWhen } from "../../src/audit/read-when.ts";
import { skyOf } from "../../src/audit/sky.ts";
import { boundOf, tdbNear, wallOf } from "../../src/audit/wall-of.ts";
import { type PairName, pairOf } from "../../src/bodies/pair.ts";
import type { ApsisKind } from "../../src/bodies/term.ts";
import { openSources } from "../../src/ephemeris/open-sources.ts";

/** Gives a function that holds a time against the sky, as causes are asked about it. */
export async function caseMaker() {
  const ephemeris = await openSources();
  const sky = skyOf(ephemeris, "auto");
  const coarse = skyOf(ephemeris, "engine", true);
  return (pair: PairName, kind: ApsisKind, text: string, scaleName = "utc"): Case => {
    const when = readWhen(text);
    if (isUnread(when)) throw new Error(when.problem);
    const scale = auditScale(scaleName);
    const at = sky.nearest(pairOf(pair), kind, tdbNear(scale, when.wallSeconds));
    if (!at) throw new Error("no passage");
    const residual = when.wallSeconds - wallOf(scale, at);
    return { pair: pairOf(pair), kind, when, scale, sky, coarse, at, residual, bound: boundOf(scale, at) };
  };
}

/** The variants of a cause that give a row to its last digit. */
export function fitting(cause: TimeCause, row: Case): string[] {
  const fits = ({ residual, bound }: Prediction) => Math.abs(residual) <= row.when.unitSeconds / 2 + bound;
  return cause
    .predict(row)
    .filter(fits)
    .map(({ detail }) => detail);
}
