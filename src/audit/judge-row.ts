import type { Alternative, Verdict } from "./audit-row.ts";
import { type Case, readOtherwise } from "./case.ts";
import type { TimeCause } from "./cause.ts";
import { allTimeCauses } from "./causes/all-time-causes.ts";
import { type ListHabit, predictionOf } from "./judge-list.ts";
import { CHANCE_SHARE, chanceDensity, logSum, NAMED, ROW_SHARES } from "./odds.ts";
import { nearMissDensity, type RoundingRule, ruleDensity, ruleFits } from "./rounding.ts";

/** What the audit says of a row's time. */
export interface TimeJudgement {
  readonly verdict: Verdict;
  readonly cause: TimeCause | null;
  readonly detail: string;
  readonly alternatives: readonly Alternative[];
  /** Whether the row agrees only because the list cuts off. */
  readonly cutOff: boolean;
}

/** Beyond this share of the period from a passage a row that no cause explains belongs to none. */
const UNMATCHED_SHARE = 0.25;

/**
 * Judges a row's time against the sky and against what the list does throughout.
 *
 * In this order: it agrees if the list's rule of rounding could have printed it; it is explained by the cause that runs through the list; it is
 * off by one in its last digit; it is explained by a slip of its own, if one stands at odds of 19 to 1 against the next and against chance; else
 * it disagrees, or fits no passage.
 *
 * @param one   the row, with the passage that it is taken for
 * @param habit the list's
 * @param alone whether there are too few other rows to say that the list is right
 */
export function judgeRow(one: Case, habit: ListHabit, alone: boolean): TimeJudgement {
  const { when, residual, bound } = one;
  const rule = habit.rule(when);
  const plain = (verdict: Verdict, cutOff = false): TimeJudgement => ({
    verdict,
    cause: null,
    detail: "",
    alternatives: [],
    cutOff,
  });
  if (bound > when.unitSeconds) {
    if (ruleFits(when, "usual", residual, bound)) return plain("undecided");
  } else {
    if (ruleFits(when, "usual", residual, bound)) return plain("agrees");
    if (rule === "other" && ruleFits(when, "other", residual, bound)) return plain("agrees", true);
  }
  if (habit.cause) {
    const found = predictionOf(one, habit.cause, habit.detail);
    if (found && fitsUnder(found.residual, found.bound, one, rule, 1)) {
      return { verdict: "explained", cause: habit.cause, detail: found.detail, alternatives: [], cutOff: false };
    }
  }
  // in a list that is throughout in another zone a row's own slip is one from that zone's time
  const based = habit.scale ? rebased(one, habit) : one;
  if (
    nearMissDensity(when, "usual", residual, bound) > 0 ||
    (rule === "other" && nearMissDensity(when, "other", residual, bound) > 0)
  ) {
    return plain("last-digit");
  }
  return ownSlip(based, rule, alone);
}

function rebased(one: Case, habit: ListHabit): Case {
  if (!habit.scale) return one;
  const read = readOtherwise(one, { scale: habit.scale });
  return read ? { ...one, scale: habit.scale, at: read.at, residual: read.residual, bound: read.bound } : one;
}

/** Whether the list's rule leaves a residual, or one within so many digits of it. */
function fitsUnder(residual: number, bound: number, one: Case, rule: RoundingRule | null, digits: 0 | 1): boolean {
  const density = digits === 0 ? ruleDensity : nearMissDensity;
  if (density(one.when, "usual", residual, bound) > 0) return true;
  return rule !== null && density(one.when, rule, residual, bound) > 0;
}

function ownSlip(one: Case, rule: RoundingRule | null, alone: boolean): TimeJudgement {
  const shares: Record<RoundingRule, number> =
    rule === null
      ? { usual: 0.7, other: 0.3, up: 0 }
      : rule === "usual"
        ? { usual: 0.98, other: 0.02, up: 0 }
        : { usual: 0.1, other: rule === "other" ? 0.9 : 0, up: rule === "up" ? 0.9 : 0 };
  const likelihood = (residual: number, bound: number) =>
    shares.usual * ruleDensity(one.when, "usual", residual, bound) +
    shares.other * ruleDensity(one.when, "other", residual, bound) +
    shares.up * ruleDensity(one.when, "up", residual, bound);
  const chance = Math.log(CHANCE_SHARE * chanceDensity(one.residual));
  const found: { cause: TimeCause; detail: string; log: number }[] = [];
  for (const cause of allTimeCauses()) {
    let share = ROW_SHARES[cause.name] ?? 0.01;
    // a single row among right ones left its zone less often than it took morning for afternoon
    if (cause.name === "zone" && !alone) share /= 2;
    const logs: number[] = [];
    let best = -Infinity;
    let detail = "";
    for (const each of cause.predict(one)) {
      const log = Math.log(share * each.share * likelihood(each.residual, each.bound));
      if (log === -Infinity) continue;
      logs.push(log);
      if (log > best) {
        best = log;
        detail = each.detail;
      }
    }
    if (logs.length > 0) found.push({ cause, detail, log: logSum(logs) });
  }
  found.sort((a, b) => b.log - a.log);
  const [first, second] = found;
  const rival = Math.max(chance, second?.log ?? -Infinity);
  const named = first && first.log - rival >= Math.log(NAMED) ? first : null;
  const alternatives = found
    .filter((each) => each !== named && first && first.log - each.log < Math.log(NAMED) && each.log > chance)
    .map(({ cause, detail, log }) => ({
      cause: cause.name,
      causeDetail: detail || null,
      odds: Number(Math.min(1e6, Math.exp(log - chance)).toPrecision(2)),
    }));
  if (named) return { verdict: "explained", cause: named.cause, detail: named.detail, alternatives, cutOff: false };
  const far = Math.abs(one.residual) > UNMATCHED_SHARE * 2 * one.pair.halfPeriodSeconds && alternatives.length === 0;
  return { verdict: far ? "unmatched" : "disagrees", cause: null, detail: "", alternatives, cutOff: false };
}
