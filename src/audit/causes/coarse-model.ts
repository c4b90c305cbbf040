import { type Case, type Prediction, readOtherwise } from "../case.ts";
import type { TimeCause } from "../cause.ts";
import { J2000_WALL } from "../sky.ts";
import { tdbNear, wallOf } from "../wall-of.ts";
import { engineDeltaT } from "./engine-clock.ts";
import { handbookPassage } from "./handbook-formula.ts";

/** Seconds by which a model's own search of the extremum may differ from ours. */
const SEARCH = 2;

/**
 * The time is that of a coarse model, by name, and gives the row's own digits: astronomy-engine's truncated series, by the true UTC
 * or by that package's own ΔT, or the mean-motion formula of the handbooks.
 *
 * That a row is merely off by as much as such a model usually is does not count.
 */
export const coarseModel: TimeCause = Object.freeze({
  name: "coarse-model",
  predict(row: Case): Prediction[] {
    const found: Prediction[] = [];
    const engine = row.coarse && row.at.passage.source !== "engine" ? readOtherwise(row, { sky: row.coarse }) : null;
    if (engine) {
      found.push({ detail: "astronomy-engine", share: 0.5, residual: engine.residual, bound: SEARCH });
      const deltaT = engineDeltaT(engine.at.passage.tdbSeconds);
      if (deltaT !== null && row.scale.kind !== "tt" && row.scale.kind !== "tdb" && row.scale.kind !== "tai") {
        const shift = engine.at.ttWall - engine.at.utcWall - deltaT;
        found.push({
          detail: "astronomy-engine with its own ΔT",
          share: 0.3,
          residual: engine.residual - shift,
          bound: SEARCH,
        });
      }
    }
    const tdb = tdbNear(row.scale, row.when.wallSeconds);
    for (const formula of ["corrected", "mean"] as const) {
      const tt = handbookPassage(row.pair.name, row.kind, tdb, formula);
      if (tt === null) continue;
      // the scale's clock stands as far from TT at the formula's instant as at the passage
      const wall = J2000_WALL + tt + (wallOf(row.scale, row.at) - row.at.ttWall);
      const detail = formula === "mean" ? "mean-motion formula" : "mean-motion formula with the Earth's terms";
      found.push({ detail, share: 0.1, residual: row.when.wallSeconds - wall, bound: SEARCH });
    }
    return found;
  },
  say: (detail: string) => `it is the result of a coarse model (${detail})`,
});
