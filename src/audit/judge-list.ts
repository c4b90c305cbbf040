import type { Alternative, ListFinding } from "./audit-row.ts";
import type { AuditScale } from "./audit-scale.ts";
import { type Case, type Prediction, readOtherwise } from "./case.ts";
import type { CauseName, TimeCause } from "./cause.ts";
import { allTimeCauses } from "./causes/all-time-causes.ts";
import { scaleOfDetail } from "./causes/zone.ts";
import {
  CONSTANT_SHARE,
  chanceDensity,
  LIST_SHARES,
  logSum,
  NAMED,
  NEAR_MISSES,
  NO_CAUSE_SHARE,
  SHIFTED,
  SLIP_SHARE,
} from "./odds.ts";
import type { PublishedWhen } from "./published-when.ts";
import { nearMissDensity, ROUNDING_RULES, type RoundingRule, RULE_SHARES, ruleDensity, ruleFits } from "./rounding.ts";

/** What a list does throughout: rows are judged against it. */
export interface ListHabit {
  readonly finding: ListFinding;
  /** The cause that runs through the list, with its variant. */
  readonly cause: TimeCause | null;
  readonly detail: string;
  /** The scale that the list really keeps, where that is what is wrong. */
  readonly scale: AuditScale | null;
  /** The rule of rounding, by the size of the last digit; `null` where the rows do not tell. */
  rule(when: PublishedWhen): RoundingRule | null;
}

/** Rows that are judged for the list's habit at most: evenly spread over those at hand. */
const MOST_ROWS = 2000;
/** Share of the rows that can tell that must be cut off before cutting off counts as the list's rule. */
const RULE_SHARE = 0.9;
/** Rows that must tell before rounding up is believed. */
const LEAST_UP = 5;

/** The habits that a list may have whatever its slip: a rule of rounding, and how many of its values are one digit off. */
interface Manner {
  readonly rule: RoundingRule;
  readonly nearMisses: number;
  readonly logLikely: number;
}

function manners(): readonly Manner[] {
  return ROUNDING_RULES.flatMap((rule) =>
    NEAR_MISSES.map(({ share, likely }) => ({
      rule,
      nearMisses: share,
      logLikely: Math.log(RULE_SHARES[rule] * likely),
    })),
  );
}

/**
 * Judges a list as a whole: which slip, if any, runs through it, and how it rounds.
 *
 * Each variant of each cause says what every row would be off by; a row's likelihood is even over its last digit, with a share for values
 * one digit off and for slips of any kind. The sum of the logarithms over all rows, with the share that a cause had before, decides:
 * a cause is named at odds of 19 to 1 against the next one, against none and against one unknown amount through the whole list; a shift of years
 * or kinds at 100 to 1 against none.
 *
 * @param cases the rows that were matched
 */
export function judgeList(cases: readonly Case[]): ListHabit {
  const every = Math.max(1, Math.ceil(cases.length / MOST_ROWS));
  const sample = every === 1 ? cases : cases.filter((_, i) => i % every === 0);
  const causes = allTimeCauses();
  const all = manners();
  const nought = () => all.map(() => 0);
  const none = nought();
  const sums = new Map<string, { cause: TimeCause; detail: string; share: number; rows: number; more: number[] }>();
  for (const one of sample) {
    const plain = all.map((manner) => logRow(one, manner, one.residual, one.bound));
    plain.forEach((log, i) => {
      none[i] = (none[i] ?? 0) + log;
    });
    for (const cause of causes) {
      for (const { detail, share, residual, bound } of cause.predict(one)) {
        const key = `${cause.name} ${detailOfList(cause.name, detail)}`;
        let sum = sums.get(key);
        if (!sum) {
          sum = { cause, detail: detailOfList(cause.name, detail), share, rows: 0, more: nought() };
          sums.set(key, sum);
        }
        sum.rows++;
        all.forEach((manner, i) => {
          sum.more[i] = (sum.more[i] ?? 0) + logRow(one, manner, residual, bound) - (plain[i] ?? 0);
        });
      }
    }
  }
  const overRules = (logs: readonly number[]) => logSum(logs.map((log, i) => log + (all[i]?.logLikely ?? 0)));
  const noneLog = overRules(none) + Math.log(NO_CAUSE_SHARE);
  const constant = constantLog(
    sample,
    all.filter(({ rule }) => rule === "usual"),
  );
  const variants = [...sums.values()].map((sum) => ({
    ...sum,
    log:
      overRules(sum.more.map((more, i) => more + (none[i] ?? 0))) +
      Math.log((LIST_SHARES[sum.cause.name] ?? 0.001) * sum.share),
  }));
  const groups = causes.flatMap((cause) => {
    const own = variants.filter((variant) => variant.cause === cause);
    if (own.length === 0) return [];
    const best = own.reduce((a, b) => (b.log > a.log ? b : a));
    return [{ cause, best, log: logSum(own.map(({ log }) => log)) }];
  });
  groups.sort((a, b) => b.log - a.log);
  const [first, second] = groups;
  const rival = Math.max(noneLog, constant.log, second?.log ?? -Infinity);
  const demand = first && /^(?:year-copied|kind-swapped)$/.test(first.cause.name) ? SHIFTED : NAMED;
  // Where every row is right as it stands there is nothing to explain: a clock that is known better than UTC to come would only fit more snugly.
  const spotless = sample.every((one) => Math.abs(one.residual) <= one.when.unitSeconds / 2 + one.bound);
  const named =
    first !== undefined &&
    sample.length > 1 &&
    !spotless &&
    first.log - rival >= Math.log(NAMED) &&
    first.log - noneLog >= Math.log(demand)
      ? first
      : null;
  const against = Math.max(noneLog, constant.log);
  const alternatives: Alternative[] = groups
    .filter(
      (group) =>
        !spotless && group !== named && first && first.log > noneLog && first.log - group.log < Math.log(NAMED),
    )
    .map((group) => ({
      cause: group.cause.name,
      causeDetail: group.best.detail || null,
      odds: roundedOdds(group.log - against),
    }));

  const under = named
    ? sample.flatMap((one) => underCause(one, named.cause, named.best.detail))
    : sample.map(plainUnder);
  const rules = rulesOf(under);
  const wholeRule = wholeListRule(under, named ? named.best.more.map((more, i) => more + (none[i] ?? 0)) : none, rules);
  const isConstant = !named && constant.log - Math.max(noneLog, first?.log ?? -Infinity) >= Math.log(NAMED);
  const cause = named?.cause.name ?? wholeRule;
  const detail = named ? named.best.detail : "";
  return {
    cause: named?.cause ?? null,
    detail,
    scale: named?.cause.name === "zone" ? scaleOfDetail(detail) : null,
    rule: (when) => rules.get(unitKey(when)) ?? null,
    finding: Object.freeze({
      cause,
      causeDetail: named ? (wholeRule ? `${detail} and ${wholeRule}` : detail || null) : null,
      rowsJudged: sample.length,
      alternatives: Object.freeze(alternatives),
      sentence: sentenceOf(sample.length, named, wholeRule, alternatives, isConstant ? constant.seconds : null),
    }),
  };
}

/** Half-days of morning and of afternoon are one slip. */
function detailOfList(cause: CauseName, detail: string): string {
  if (cause === "half-day" || cause === "kind-swapped") return "";
  return detail;
}

function plainUnder(one: Case): Under {
  return { when: one.when, residual: one.residual, bound: one.bound };
}

interface Under {
  readonly when: PublishedWhen;
  readonly residual: number;
  readonly bound: number;
}

/** What a row is off by if the list's cause is counted in; nothing where the cause says nothing of it. */
export function underCause(one: Case, cause: TimeCause, detail: string): Under[] {
  const found = predictionOf(one, cause, detail);
  return found ? [{ when: one.when, residual: found.residual, bound: found.bound }] : [];
}

/** Gives what one variant of a cause says of a row, `null` where it says nothing. */
export function predictionOf(one: Case, cause: TimeCause, detail: string): Prediction | null {
  if (cause.name === "zone") {
    const other = readOtherwise(one, { scale: scaleOfDetail(detail) }); // one zone, not all that there are
    return other ? { detail, share: 1, residual: other.residual, bound: other.bound } : null;
  }
  return cause.predict(one).find((each) => detailOfList(cause.name, each.detail) === detail) ?? null;
}

function logRow(one: Case, { rule, nearMisses }: Manner, residual: number, bound: number): number {
  return Math.log(
    (1 - SLIP_SHARE - nearMisses) * ruleDensity(one.when, rule, residual, bound) +
      nearMisses * nearMissDensity(one.when, rule, residual, bound) +
      SLIP_SHARE * chanceDensity(residual),
  );
}

/** One amount of any size through the whole list, summed over all amounts near the median. */
function constantLog(sample: readonly Case[], all: readonly Manner[]): { log: number; seconds: number } {
  if (sample.length < 2) return { log: -Infinity, seconds: 0 };
  const sorted = sample.map(({ residual }) => residual).sort((a, b) => a - b);
  const median = sorted[sorted.length >> 1] ?? 0;
  const unit = Math.max(...sample.map(({ when }) => when.unitSeconds));
  const steps = 24;
  const step = (3 * unit) / steps;
  const logs: number[] = [];
  let best = -Infinity;
  let seconds = median;
  for (let i = 0; i <= steps; i++) {
    const amount = median + (i - steps / 2) * step;
    if (Math.abs(amount) < unit / 2) continue;
    const sums = all.map((manner) => {
      let sum = manner.logLikely;
      for (const one of sample) sum += logRow(one, manner, one.residual - amount, one.bound);
      return sum;
    });
    const log = Math.log(CONSTANT_SHARE * amountDensity(amount) * step) + logSum(sums);
    logs.push(log);
    if (log > best) {
      best = log;
      seconds = amount;
    }
  }
  return { log: logs.length === 0 ? -Infinity : logSum(logs), seconds };
}

function amountDensity(amount: number): number {
  return 1 / (2 * Math.max(Math.abs(amount), 30) * Math.log(1e6));
}

function unitKey(when: PublishedWhen): string {
  return when.whole ?? String(when.unitSeconds);
}

/** The rule that nine in ten of the rows that can tell keep, by the size of the last digit. */
function rulesOf(rows: readonly Under[]): ReadonlyMap<string, RoundingRule> {
  const tallies = new Map<string, { usual: number; other: number; up: number; notUp: number }>();
  for (const { when, residual, bound } of rows) {
    if (bound > when.unitSeconds || when.whole === "month" || when.whole === "year") continue;
    const usual = ruleFits(when, "usual", residual, bound);
    const other = ruleFits(when, "other", residual, bound);
    const up = ruleFits(when, "up", residual, bound);
    const key = unitKey(when);
    const tally = tallies.get(key) ?? { usual: 0, other: 0, up: 0, notUp: 0 };
    if (usual && !other) tally.usual++;
    if (other && !usual) tally.other++;
    if (up && !usual) tally.up++;
    if (usual && !up) tally.notUp++;
    tallies.set(key, tally);
  }
  const rules = new Map<string, RoundingRule>();
  for (const [key, { usual, other, up, notUp }] of tallies) {
    if (other > 0 && other >= RULE_SHARE * (other + usual)) rules.set(key, "other");
    else if (key !== "day" && up >= LEAST_UP && up >= RULE_SHARE * (up + notUp)) rules.set(key, "up");
    else if (usual > 0) rules.set(key, "usual");
  }
  return rules;
}

/** The rule as a finding about the list: named at the same odds as a cause. */
function wholeListRule(
  rows: readonly Under[],
  logs: readonly number[],
  rules: ReadonlyMap<string, RoundingRule>,
): "rounded-down" | "rounded-up" | null {
  const clocks = rows.filter(({ when }) => !when.whole);
  if (clocks.length < LEAST_UP || clocks.length < rows.length / 2) return null;
  const found = new Set(clocks.map(({ when }) => rules.get(unitKey(when))));
  const all = manners();
  const logOf = (rule: RoundingRule) =>
    logSum(all.map((manner, i) => (manner.rule === rule ? (logs[i] ?? 0) + manner.logLikely : -Infinity)));
  const usual = logOf("usual");
  if (found.has("other") && logOf("other") - usual >= Math.log(NAMED)) return "rounded-down";
  if (found.has("up") && logOf("up") - usual >= Math.log(NAMED)) return "rounded-up";
  return null;
}

function roundedOdds(log: number): number {
  const odds = Math.exp(Math.min(log, 40));
  return odds >= 1e6 ? 1e6 : Number(odds.toPrecision(2));
}

function sentenceOf(
  rows: number,
  named: { readonly cause: TimeCause; readonly best: { readonly detail: string } } | null,
  rule: "rounded-down" | "rounded-up" | null,
  alternatives: readonly Alternative[],
  constant: number | null,
): string {
  const rounding =
    rule === "rounded-down"
      ? "its times are cut off, not rounded, which is usual"
      : rule === "rounded-up"
        ? "its times are rounded up; round them to the nearest"
        : "";
  if (named) {
    const said = `Throughout the list ${named.cause.say(named.best.detail)}`;
    return `${said}${rounding ? `, and ${rounding}` : ""}.`;
  }
  if (constant !== null) {
    return `The whole list is off by about ${signedDuration(constant)}, and no known cause gives that.`;
  }
  if (rounding) return `No cause runs through the list; ${rounding}.`;
  const causes = alternatives.map(({ cause, causeDetail }) => (causeDetail ? `${cause} (${causeDetail})` : cause));
  const [only] = alternatives;
  if (only && alternatives.length === 1) {
    return `${causes.join("")} may run through the list, at odds of ${only.odds} to 1: the rows do not make it certain.`;
  }
  if (alternatives.length > 1) {
    return `The rows do not tell apart ${causes.join(" and ")}.`;
  }
  if (rows === 0) return "No row could be held against a passage.";
  return rows === 1 ? "One row tells nothing about a list." : "No cause runs through the list.";
}

/** An amount of time with its sign in words: `1 min 10 s late`. */
export function signedDuration(seconds: number): string {
  const size = Math.abs(seconds);
  const parts: string[] = [];
  const days = Math.floor(size / 86_400);
  const hours = Math.floor((size % 86_400) / 3600);
  const minutes = Math.floor((size % 3600) / 60);
  const rest = Math.round(size % 60);
  if (days) parts.push(`${days} d`);
  if (hours) parts.push(`${hours} h`);
  if (minutes && days < 10) parts.push(`${minutes} min`);
  if (size < 7200 && (rest || parts.length === 0)) parts.push(`${rest} s`);
  return `${parts.slice(0, 3).join(" ")} ${seconds < 0 ? "early" : "late"}`;
}
