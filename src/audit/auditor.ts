import type { ApsisKind } from "../bodies/term.ts";
import { termOf } from "../bodies/term.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { SourceChoice } from "../passages/timeline-for.ts";
import type { PassageRow } from "../passages/to-row.ts";
import { type Alternative, type AuditRow, type ListFinding, VERDICTS, type Verdict } from "./audit-row.ts";
import { type Case, readOtherwise } from "./case.ts";
import { coarseModel } from "./causes/coarse-model.ts";
import { type DistanceJudgement, distanceFits, judgeDistance } from "./judge-distance.ts";
import { judgeList, type ListHabit, signedDuration } from "./judge-list.ts";
import { judgeRow, type TimeJudgement } from "./judge-row.ts";
import { isUnreadRow, type ListRow, type ReadRecord, type UnreadRow } from "./list-row.ts";
import { type Mend, mendsOf } from "./mend.ts";
import type { PublishedWhen } from "./published-when.ts";
import { writeDistance } from "./read-distance.ts";
import { type Sky, type SkyPassage, skyOf } from "./sky.ts";
import { boundOf, tdbNear, wallOf } from "./wall-of.ts";
import { writeWhen } from "./write-when.ts";

/** How a list is to be audited. */
export interface AuditorOptions {
  readonly source?: SourceChoice;
}

/** A record of the list with what was found in it. */
export interface AuditedRecord {
  readonly record: ReadRecord;
  readonly rows: readonly { readonly row: AuditRow; readonly mends: readonly Mend[] }[];
}

/** What is known when a list is over. Frozen. */
export interface AuditEnd {
  readonly list: ListFinding;
  readonly missing: readonly PassageRow[];
  readonly duplicates: readonly (readonly [number, number])[];
  readonly summary: Readonly<Record<Verdict, number>>;
}

/** Takes a list's records as they come. */
export interface Auditor {
  /** Takes records, and gives those that are judged. */
  push(records: readonly ReadRecord[]): AuditedRecord[];
  /** Ends the list: gives the records that were held back, and then `end()` what is known of the whole. */
  rest(): AuditedRecord[];
  end(): AuditEnd;
}

/**
 * Rows that are read before the list is judged as a whole; a longer list is judged by these and goes on row by row, so that memory stays flat.
 */
const ROWS_HELD = 20_000;
/** Duplicates and missing passages that are told at most. */
const MOST_TOLD = 10_000;
/** Rows that must be right beside a slip before the list counts as right. */
const FEW = 3;
/** Rows that all say :00 before the hour counts as their last digit. */
const LEAST_FULL_HOURS = 3;

interface Held {
  readonly row: ListRow;
  one: Case | null;
}

/**
 * Makes an auditor: records go in as they are read, judged rows come out.
 *
 * The first `ROWS_HELD` rows are held until the list's habit can be judged; from then on rows come out as they go in.
 */
export function auditor(ephemeris: Ephemeris, options: AuditorOptions = {}): Auditor {
  const sky = skyOf(ephemeris, options.source ?? "auto");
  const coarse = ephemeris.sources.some(({ kind }) => kind === "engine") ? skyOf(ephemeris, "engine", true) : null;
  const claims = new Map<string, Claims>();
  const duplicates: [number, number][] = [];
  const summary: Record<Verdict, number> = {
    agrees: 0,
    "last-digit": 0,
    explained: 0,
    disagrees: 0,
    undecided: 0,
    unmatched: 0,
  };
  let waiting: ReadRecord[] = [];
  let waitingRows = 0;
  let state: ListState | null = null;

  const caseOf = (row: ListRow, when: PublishedWhen): Case | null => {
    const at = sky.nearest(row.pair, row.kind, tdbNear(row.scale, when.wallSeconds));
    return at && caseAt(row, when, at, sky, coarse);
  };

  const begin = (): ListState => {
    const held = new Map<ListRow, Held>();
    const rows = waiting.flatMap(({ rows }) => rows.filter((row): row is ListRow => !isUnreadRow(row)));
    const fullHours = onlyFullHours(rows);
    for (const row of rows) held.set(row, { row, one: caseOf(row, whenOf(row, fullHours)) });
    keepOrder([...held.values()], sky, coarse);
    const cases = [...held.values()].flatMap(({ one }) => (one ? [one] : []));
    let habit = judgeList(cases);
    const distances = distanceHabit([...held.values()]);
    const alone = cases.length <= FEW;
    if (habit.cause === null && habit.finding.cause === null)
      habit = withDistances(habit, [...held.values()], distances);
    return { habit, fullHours, cutDistances: distances, alone, held };
  };

  const judged = (record: ReadRecord, list: ListState): AuditedRecord => ({
    record,
    rows: record.rows.map((row) => {
      if (isUnreadRow(row)) {
        summary.unmatched++;
        return { row: unreadRow(row), mends: [] };
      }
      const held = list.held.get(row);
      list.held.delete(row);
      const one = held ? held.one : caseOf(row, whenOf(row, list.fullHours));
      if (!one) {
        summary.unmatched++;
        return { row: beyondSources(row, sky.supplies(row.pair)), mends: [] };
      }
      const found = judgedRow(row, one, list);
      summary[found.row.verdict]++;
      if (found.row.timeVerdict !== "unmatched") claim(claims, duplicates, row, claimedBy(one, list.habit));
      return found;
    }),
  });

  return {
    push(records) {
      if (state) {
        const list = state;
        return records.map((record) => judged(record, list));
      }
      for (const record of records) {
        waiting.push(record);
        waitingRows += record.rows.length;
      }
      // records without rows are held too, but not without end
      return waitingRows >= ROWS_HELD || waiting.length >= 4 * ROWS_HELD ? this.rest() : [];
    },
    rest() {
      state ??= begin();
      const list = state;
      const records = waiting.map((record) => judged(record, list));
      waiting = [];
      waitingRows = 0;
      return records;
    },
    end() {
      state ??= begin();
      return Object.freeze({
        list: state.habit.finding,
        missing: Object.freeze(missingOf(claims, sky)),
        duplicates: Object.freeze(duplicates),
        summary: Object.freeze({ ...summary }),
      });
    },
  };
}

interface ListState {
  readonly habit: ListHabit;
  readonly fullHours: boolean;
  readonly cutDistances: boolean;
  readonly alone: boolean;
  readonly held: Map<ListRow, Held>;
}

interface Claims {
  readonly row: ListRow;
  /** Line of the row that has a passage, by its instant. */
  readonly lines: Map<number, number>;
  first: number;
  last: number;
}

function caseAt(row: ListRow, when: PublishedWhen, at: SkyPassage, sky: Sky, coarse: Sky | null): Case {
  return {
    pair: row.pair,
    kind: row.kind,
    when,
    scale: row.scale,
    sky,
    coarse,
    at,
    residual: when.wallSeconds - wallOf(row.scale, at),
    bound: boundOf(row.scale, at),
  };
}

/** A list whose times all end in :00 is told to the hour. */
function onlyFullHours(rows: readonly ListRow[]): boolean {
  const minutes = rows.filter(({ when }) => when.unitSeconds === 60 && !when.whole);
  return minutes.length >= LEAST_FULL_HOURS && minutes.every(({ when }) => when.wallSeconds % 3600 === 0);
}

function whenOf({ when }: ListRow, fullHours: boolean): PublishedWhen {
  return fullHours && when.unitSeconds === 60 && when.wallSeconds % 3600 === 0 ? { ...when, unitSeconds: 3600 } : when;
}

/**
 * Gives rows that were taken for a passage that another row fits the one that the order of the list leaves free.
 *
 * Nearness alone takes a row with a wrong month or year for its neighbour's passage; where the rows before and after it have passages
 * with exactly one between them, that one is meant.
 */
function keepOrder(held: readonly Held[], sky: Sky, coarse: Sky | null): void {
  const lists = new Map<string, Held[]>();
  for (const each of held) {
    if (!each.one) continue;
    const key = `${each.row.pair.name} ${each.row.kind}`;
    const list = lists.get(key);
    if (list) list.push(each);
    else lists.set(key, [each]);
  }
  for (const list of lists.values()) {
    const owners = new Map<SkyPassage, number>();
    for (const { one } of list) if (one) owners.set(one.at, (owners.get(one.at) ?? 0) + 1);
    list.forEach((each, i) => {
      const { one, row } = each;
      if (!one || Math.abs(one.residual) <= one.when.unitSeconds + one.bound) return;
      if ((owners.get(one.at) ?? 0) < 2 && Math.abs(one.residual) < one.pair.halfPeriodSeconds / 2) return;
      const before = list[i - 1]?.one?.at;
      const after = list[i + 1]?.one?.at;
      const next = before && sky.neighbour(row.pair, row.kind, before.passage.tdbSeconds, 1);
      const meant = after ? sky.neighbour(row.pair, row.kind, after.passage.tdbSeconds, -1) : next;
      if (!meant || (before && after && meant !== next) || meant === one.at || owners.has(meant)) return;
      if (!before && !after) return;
      owners.set(one.at, (owners.get(one.at) ?? 1) - 1);
      owners.set(meant, 1);
      each.one = caseAt(row, one.when, meant, sky, coarse);
    });
  }
}

/** Whether at least nine in ten of the distances that can tell are cut off. */
function distanceHabit(held: readonly Held[]): boolean {
  let rounded = 0;
  let cut = 0;
  for (const { row, one } of held) {
    if (!one || !row.distance || one.at.kmBound > row.distance.unitKm) continue;
    const residual = row.distance.km - one.at.passage.distanceKm;
    if (distanceFits(row.distance, one.at.passage.distanceKm, one.at.kmBound, false, 0)) {
      if (residual > one.at.kmBound) rounded++;
    } else if (distanceFits(row.distance, one.at.passage.distanceKm, one.at.kmBound, true, 0)) cut++;
  }
  return cut > 0 && cut >= 0.9 * (cut + rounded);
}

/** A cause that explains the distances of four in five rows runs through the list. */
function withDistances(habit: ListHabit, held: readonly Held[], cutOff: boolean): ListHabit {
  const rows = held.filter(({ row, one }) => row.distance && one).slice(0, 500);
  if (rows.length < 2) return habit;
  const counts = new Map<string, { count: number; found: DistanceJudgement }>();
  for (const { row, one } of rows) {
    if (!row.distance || !one) continue;
    const found = judgeDistance(one, row.distance, null, cutOff);
    if (found.cause === null) continue;
    const key = `${found.cause} ${found.cause === "distance-digits" ? row.line : found.detail}`;
    const known = counts.get(key);
    if (known) known.count++;
    else counts.set(key, { count: 1, found });
  }
  const best = [...counts.values()].sort((a, b) => b.count - a.count)[0];
  if (!best || best.count < 2 || best.count < 0.8 * rows.length) return habit;
  const { cause, detail, said } = best.found;
  return {
    ...habit,
    ...(cause === "coarse-model" ? { cause: coarseModel, detail } : {}),
    finding: Object.freeze({
      ...habit.finding,
      cause,
      causeDetail: detail,
      alternatives: Object.freeze([]),
      sentence: `Throughout the list ${said}.`,
    }),
  };
}

/** The passage that a row has, for the list's completeness: that of the other kind where kinds are swapped throughout. */
function claimedBy(one: Case, habit: ListHabit): SkyPassage {
  if (habit.cause?.name !== "kind-swapped") return one.at;
  return readOtherwise(one, { kind: otherKind(one.kind) })?.at ?? one.at;
}

function otherKind(kind: ApsisKind): ApsisKind {
  return kind === "periapsis" ? "apoapsis" : "periapsis";
}

function claim(claims: Map<string, Claims>, duplicates: [number, number][], row: ListRow, at: SkyPassage): void {
  const key = `${row.pair.name} ${row.kind}`;
  let known = claims.get(key);
  if (!known) {
    known = { row, lines: new Map(), first: Infinity, last: -Infinity };
    claims.set(key, known);
  }
  const { tdbSeconds } = at.passage;
  const id = Math.round(tdbSeconds / 1000);
  const line = known.lines.get(id);
  if (line !== undefined) {
    if (duplicates.length < MOST_TOLD) duplicates.push([line, row.line]);
    return;
  }
  known.lines.set(id, row.line);
  known.first = Math.min(known.first, tdbSeconds);
  known.last = Math.max(known.last, tdbSeconds);
}

/**
 * The passages between a list's first and last that no row has; a list that has fewer than half of them is a selection, and nothing is missing.
 */
function missingOf(claims: ReadonlyMap<string, Claims>, sky: Sky): PassageRow[] {
  const missing: PassageRow[] = [];
  for (const { row, lines, first, last } of claims.values()) {
    if (lines.size < 2) continue;
    const about = (last - first) / (2 * row.pair.halfPeriodSeconds);
    if (about > 3 * lines.size + 3) continue; // a selection, without looking
    const here: SkyPassage[] = [];
    let all = lines.size;
    let at = sky.neighbour(row.pair, row.kind, first, 1);
    for (let steps = 0; at && at.passage.tdbSeconds < last && steps < 200_000; steps++) {
      if (at.passage.rank !== "secondary" && !lines.has(Math.round(at.passage.tdbSeconds / 1000))) {
        all++;
        if (here.length < MOST_TOLD) here.push(at);
      }
      at = sky.neighbour(row.pair, row.kind, at.passage.tdbSeconds, 1);
    }
    if (lines.size * 2 >= all) for (const each of here) if (missing.length < MOST_TOLD) missing.push(each.row());
  }
  return missing.sort((a, b) => a.tdbSeconds - b.tdbSeconds);
}

function judgedRow(row: ListRow, one: Case, list: ListState): { row: AuditRow; mends: readonly Mend[] } {
  const time = judgeRow(one, list.habit, list.alone);
  const unmatched = time.verdict === "unmatched";
  const distance = row.distance && !unmatched ? judgeDistance(one, row.distance, time.cause, list.cutDistances) : null;
  const verdict = distance ? worse(time.verdict, distance.verdict) : time.verdict;
  const rule = list.habit.rule(one.when);
  const isWrong = verdict !== "agrees" && verdict !== "undecided";
  const rightWhen = isWrong ? writeWhen(wallOf(row.scale, one.at), one.when, rule === "other" && !one.when.whole) : "";
  const rightDistance = isWrong && row.distance ? writeDistance(one.at.passage.distanceKm, row.distance) : "";
  const cause = time.cause?.name ?? distance?.cause ?? null;
  const detail = time.cause ? time.detail : (distance?.detail ?? "");
  const alternatives: Alternative[] = [...time.alternatives, ...(distance?.alternatives ?? [])];
  return {
    row: Object.freeze({
      line: row.line,
      published: Object.freeze({
        when: row.when.text,
        scale: row.scale.name,
        unitSeconds: rounded(one.when.unitSeconds),
        distanceKm: row.distance ? rounded(row.distance.km) : null,
      }),
      verdict,
      timeVerdict: time.verdict,
      distanceVerdict: distance?.verdict ?? null,
      differenceSeconds: unmatched ? null : rounded(one.residual),
      differenceKm: row.distance && !unmatched ? rounded(row.distance.km - one.at.passage.distanceKm) : null,
      cause,
      causeDetail: detail || null,
      alternatives: Object.freeze(alternatives),
      passage: one.at.row(),
      sentence: sentenceOf(row, one, time, distance, rightWhen, rightDistance),
    }),
    mends: isWrong ? mendsOf(row, time, distance, rightWhen, rightDistance) : [],
  };
}

function worse(a: Verdict, b: Verdict): Verdict {
  return VERDICTS.indexOf(a) >= VERDICTS.indexOf(b) ? a : b;
}

function sentenceOf(
  row: ListRow,
  one: Case,
  time: TimeJudgement,
  distance: DistanceJudgement | null,
  rightWhen: string,
  rightDistance: string,
): string {
  const said = timeSaid(row, one, time, rightWhen);
  if (!distance || distance.verdict === "agrees") return said;
  return `${said.replace(/^Agrees/, "The time agrees")} ${distanceSaid(row, one, distance, rightDistance)}`;
}

function timeSaid(row: ListRow, one: Case, time: TimeJudgement, right: string): string {
  const off = signedDuration(one.residual);
  switch (time.verdict) {
    case "agrees":
      return time.cutOff ? "Agrees, cut off as the list does." : "Agrees.";
    case "undecided":
      return `Cannot be decided: the computed time is known to ${Math.ceil(one.bound)} s only, and the row lies inside that.`;
    case "last-digit":
      return `Off by one in its last digit (${off}): print ${right}.`;
    case "explained": {
      const cause = time.cause?.say(time.detail) ?? "";
      return `${cause.slice(0, 1).toUpperCase()}${cause.slice(1)} (${off}): print ${right}.`;
    }
    case "disagrees": {
      const could = time.alternatives.map(({ cause, causeDetail }) =>
        causeDetail ? `${cause} (${causeDetail})` : cause,
      );
      const why =
        could.length > 0
          ? `it could be ${could.join(" or ")}, which one row does not tell`
          : "no known cause gives that";
      return `${off.slice(0, 1).toUpperCase()}${off.slice(1)}, and ${why}: print ${right}.`;
    }
    case "unmatched": {
      const term = termOf(row.pair, row.kind, one.at.passage.rank);
      return `Fits no ${term}; the nearest is at ${right}.`;
    }
  }
}

function distanceSaid(row: ListRow, one: Case, distance: DistanceJudgement, right: string): string {
  if (distance.verdict === "undecided") {
    return `The distance cannot be decided: the computed one is known to ${Math.ceil(one.at.kmBound)} km only.`;
  }
  const km = (row.distance?.km ?? 0) - one.at.passage.distanceKm;
  const off = `${Math.abs(km) < 10 ? Math.abs(km).toFixed(1) : Math.round(Math.abs(km))} km too ${km < 0 ? "short" : "long"}`;
  if (distance.verdict === "last-digit") return `The distance is off by one in its last digit: print ${right}.`;
  const why = distance.said || "no known cause gives that";
  return `The distance is ${off}, ${distance.said ? "for " : "and "}${why}: print ${right}.`;
}

function unreadRow({ line, when, problem }: UnreadRow): AuditRow {
  return Object.freeze({
    ...blank(line),
    published: Object.freeze({ when, scale: null, unitSeconds: null, distanceKm: null }),
    sentence: `Line ${line} ${problem.startsWith('"') ? `cannot be used: ${problem}` : problem}.`,
  });
}

function beyondSources(row: ListRow, supplied: boolean): AuditRow {
  return Object.freeze({
    ...blank(row.line),
    published: Object.freeze({
      when: row.when.text,
      scale: row.scale.name,
      unitSeconds: rounded(row.when.unitSeconds),
      distanceKm: row.distance ? rounded(row.distance.km) : null,
    }),
    sentence: supplied
      ? "Lies outside the years that the sources cover: nothing can be said about it."
      : `No source that is open supplies ${row.pair.name}.`,
  });
}

function blank(line: number): Omit<AuditRow, "published" | "sentence"> {
  return {
    line,
    verdict: "unmatched",
    timeVerdict: "unmatched",
    distanceVerdict: null,
    differenceSeconds: null,
    differenceKm: null,
    cause: null,
    causeDetail: null,
    alternatives: [],
    passage: null,
  };
}

function rounded(value: number): number {
  return Math.round(value * 1000) / 1000;
}
