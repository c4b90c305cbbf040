import { DAY_SECONDS } from "../bodies/constants.ts";
import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import { type ApsisKind, termOf } from "../bodies/term.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { previousPassage } from "../passages/next-passage.ts";
import type { Passage } from "../passages/passage.ts";
import { passages } from "../passages/passages.ts";
import type { SourceChoice } from "../passages/timeline-for.ts";
import { rounded } from "../report/rounded.ts";
import { formatUtc } from "../time/format-utc.ts";
import type { Moment } from "../time/tdb-of.ts";
import { utcOf } from "../time/utc-of.ts";
import type { DriftRow } from "./drift-row.ts";
import { dateStepSentence, plainStepSentence, type SourcedInstant } from "./drift-sentence.ts";
import { departureSeconds, type MeanLine, meanLineOf, passageNumber } from "./mean-line.ts";
import { elongationOf, nearestSyzygy } from "./moon-phase.ts";
import { moonShift } from "./moon-shift.ts";
import { extremumNear, type SuppliedInstant, supplyOf } from "./supply-near.ts";
import { daysSinceSameDate } from "./whole-days.ts";

/** What to account for. */
export interface DriftQuery {
  /** First moment, included. */
  readonly from: Moment;
  /** Last moment, excluded. */
  readonly to: Moment;
  readonly kind?: ApsisKind | "both";
  /** Left out, `earth-sun`, whose steps are split into calendar, planets and Moon. */
  readonly pair?: PairName | Pair;
  readonly source?: SourceChoice;
}

/**
 * Accounts for every step of a date: how far each passage moved since the one of its kind before it, and why.
 *
 * For `earth-sun`, with B the passage of the Earth's centre, E the passage of the barycentre of the Earth and the Moon nearest to it, and M
 * the straight line through the barycentre's passages (`meanLineOf`), B = M + (E − M) + (B − E). From one year to the next M
 * moves by its slope, E − M by what the other planets do, B − E by what the Moon does; less the 365 or 366 days since the same
 * UTC date of the year before, that is the move of the date. Leap seconds, which shift the reading of UTC by up to 2 s between two passages, are left out.
 * E comes from the source that supplied B. Secondary extrema have no row.
 *
 * @param ephemeris what `openSources` gave
 * @param query     the span; kind, pair and choice of sources where they are not the usual ones
 * @returns a row for each passage in the span that has one of its kind before it, in the span or not; frozen
 * @throws ApsidaryError as `passages`
 */
export function driftAccount(ephemeris: Ephemeris, query: DriftQuery): readonly DriftRow[] {
  const pair = pairOf(query.pair ?? "earth-sun");
  const source = query.source ?? "auto";
  const options = { source, rank: "principal" } as const;
  const rows: DriftRow[] = [];
  const before: Partial<Record<ApsisKind, Measured>> = {};
  const { from, to, kind = "both" } = query;
  for (const passage of passages(ephemeris, pair, { from, to, kind, ...options })) {
    let previous = before[passage.kind];
    if (!previous) {
      const found = previousPassage(ephemeris, pair, passage, passage.kind, options);
      if (found) previous = measure(ephemeris, pair, found, source);
    }
    const measured = measure(ephemeris, pair, passage, source);
    before[passage.kind] = measured;
    if (previous) rows.push(rowOf(ephemeris, pair, measured, previous, source));
  }
  return Object.freeze(rows);
}

/** A passage and what it is held against. */
interface Measured {
  readonly passage: Passage;
  readonly line: MeanLine | null;
  /** The barycentre's passage, of the Earth's alone. */
  readonly barycentre: SuppliedInstant | null;
  readonly instant: SourcedInstant;
}

function measure(ephemeris: Ephemeris, pair: Pair, passage: Passage, choice: SourceChoice): Measured {
  const { kind, tdbSeconds, timeUncertaintySeconds } = passage;
  const barycentre =
    pair.name === "earth-sun" ? extremumNear(ephemeris, "emb-sun", kind, tdbSeconds, passage.source, choice) : null;
  const second = barycentre?.supply.source.id ?? passage.source;
  const source = second === passage.source ? second : `${passage.source}+${second}`;
  return { passage, line: meanLineOf(pair.name, kind), barycentre, instant: { source, timeUncertaintySeconds } };
}

function rowOf(ephemeris: Ephemeris, pair: Pair, now: Measured, before: Measured, choice: SourceChoice): DriftRow {
  const { kind, rank, tdbSeconds } = now.passage;
  const utc = utcOf(tdbSeconds, ephemeris.leapSeconds);
  const term = termOf(pair, kind, rank);
  const stepDays = (tdbSeconds - before.passage.tdbSeconds) / DAY_SECONDS;
  const ofEarth = pair.name === "earth-sun";
  const wholeDays = daysSinceSameDate(utc.day);
  const dateStepHours = ofEarth ? (stepDays - wholeDays) * 24 : null;
  const bodyMinusMeanHours = now.line ? departureSeconds(now.line, tdbSeconds) / 3600 : null;
  const parts = partsOf(now, before, wholeDays);
  const moon = moonOf(ephemeris, now, choice);
  const instants = { now: now.instant, before: before.instant };
  return Object.freeze({
    kind,
    term,
    utc: formatUtc(utc, 3),
    tdbSeconds: rounded(tdbSeconds, 3),
    bodyMinusBarycentreHours: hours(parts?.bodyMinusBarycentreHours ?? null),
    barycentreMinusMeanHours: hours(parts?.barycentreMinusMeanHours ?? null),
    bodyMinusMeanHours: hours(bodyMinusMeanHours),
    stepDays: rounded(stepDays, 8),
    dateStepHours: hours(dateStepHours),
    calendarHours: hours(parts?.calendarHours ?? null),
    planetsHours: hours(parts?.planetsHours ?? null),
    moonHours: hours(parts?.moonHours ?? null),
    moonElongationDeg: moon?.elongationDeg === undefined ? null : rounded(moon.elongationDeg, 6),
    firstOrderHours: hours(moon?.firstOrderHours ?? null),
    source: now.instant.source,
    timeUncertaintySeconds: roundedUp(now.instant.timeUncertaintySeconds),
    previousSource: before.instant.source,
    previousTimeUncertaintySeconds: roundedUp(before.instant.timeUncertaintySeconds),
    sentence:
      dateStepHours === null
        ? plainStepSentence({ term, stepDays, departureHours: bodyMinusMeanHours, ...instants })
        : dateStepSentence({ dateStepHours, parts, moon: moon?.syzygy ?? null, ...instants }),
  });
}

function partsOf(now: Measured, before: Measured, wholeDays: number) {
  const { line } = now;
  if (!line || !now.barycentre || !before.barycentre) return null;
  const bodyMinusBarycentre = ({ passage, barycentre }: Measured) =>
    barycentre ? (passage.tdbSeconds - barycentre.tdb) / 3600 : Number.NaN;
  const periods = passageNumber(line, now.barycentre.tdb) - passageNumber(line, before.barycentre.tdb);
  const bodyMinusBarycentreHours = bodyMinusBarycentre(now);
  const barycentreMinusMeanHours = departureSeconds(line, now.barycentre.tdb) / 3600;
  return {
    bodyMinusBarycentreHours,
    barycentreMinusMeanHours,
    calendarHours: (periods * line.slopeDays - wholeDays) * 24,
    planetsHours: barycentreMinusMeanHours - departureSeconds(line, before.barycentre.tdb) / 3600,
    moonHours: bodyMinusBarycentreHours - bodyMinusBarycentre(before),
  };
}

/** The Moon at the barycentre's passage and what it does there, and its phase at the Earth's own. */
function moonOf(ephemeris: Ephemeris, { passage, barycentre }: Measured, choice: SourceChoice) {
  if (!barycentre) return null;
  const supply = (pair: PairName) => supplyOf(ephemeris, pair, passage.source, barycentre.tdb, choice);
  const earth = supply("earth-sun");
  if (!earth) return null;
  const { firstOrderHours } = moonShift(earth.range, barycentre.tdb);
  const moon = supplies(ephemeris, "moon-earth", choice) ? supply("moon-earth") : null;
  if (!moon) return { firstOrderHours };
  const elongation = elongationOf(earth, moon);
  const span = { from: Math.max(earth.span.from, moon.span.from), to: Math.min(earth.span.to, moon.span.to) };
  return {
    firstOrderHours,
    elongationDeg: elongation(barycentre.tdb),
    syzygy: nearestSyzygy(elongation, passage.tdbSeconds, span),
  };
}

function supplies(ephemeris: Ephemeris, pair: PairName, choice: SourceChoice): boolean {
  return ephemeris.sources.some(
    (source) => (choice === "auto" || source.kind === choice) && source.spans(pairOf(pair)).length > 0,
  );
}

function hours(value: number | null): number | null {
  return value === null ? null : rounded(value, 7);
}

/** A half-width is never rounded to less than it is. */
function roundedUp(seconds: number): number {
  return Math.ceil(seconds * 1e3) / 1e3;
}
