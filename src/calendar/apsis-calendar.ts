import { DateTime } from "luxon";
import { DAY_SECONDS } from "../bodies/constants.ts";
import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { mergedPassages } from "../passages/merged-passages.ts";
import type { Passage } from "../passages/passage.ts";
import { type SourceChoice, timelineFor } from "../passages/timeline-for.ts";
import { toRow } from "../passages/to-row.ts";
import { rounded } from "../report/rounded.ts";
import { dayOfGregorian, gregorianOfDay } from "../time/civil-calendar.ts";
import { utcText } from "../time/format-utc.ts";
import { tdbOf } from "../time/tdb-of.ts";
import { utcOf } from "../time/utc-of.ts";
import { zoneOf } from "../time/zone-of.ts";
import type { CalendarRow, NoteCode } from "./calendar-row.ts";
import { type CompleteStyle, completeStyle, type HouseStyle } from "./house-style.ts";
import { localTimeOf } from "./local-time-of.ts";
import { meanDistanceKm, seenBody } from "./mean-distance.ts";
import { moonPhaseNear } from "./moon-phase-near.ts";
import { type PassageHistory, type PastPassage, passageHistory } from "./passage-history.ts";
import { printedDistance } from "./printed-distance.ts";
import { printedLocal } from "./printed-local.ts";

/** The pairs of a calendar where none are named: the Earth and the planets about the Sun, the Moon about the Earth. */
export const CALENDAR_PAIRS: readonly PairName[] = Object.freeze<PairName[]>([
  "earth-sun",
  "moon-earth",
  "mercury-sun",
  "venus-sun",
  "mars-sun",
  "jupiter-sun",
  "saturn-sun",
  "uranus-sun",
  "neptune-sun",
]);

/** What a calendar is made for. */
export interface CalendarQuery {
  /** A year of the zone, or the first and the last of several, both included. */
  readonly years: number | readonly [first: number, last: number];
  /** An IANA name, `UTC`, or an offset such as `+05:45`. */
  readonly zone: string;
  /** Left out, `CALENDAR_PAIRS`. */
  readonly pairs?: Iterable<PairName | Pair>;
  readonly source?: SourceChoice;
  /** `principal` leaves out what is known to be secondary. */
  readonly rank?: "principal" | "all";
  readonly style?: HouseStyle;
}

/** Hours within which a new or full Moon is noted. */
const PHASE_HOURS = 24;
/** Years and passages that a record must outdo before it is noted, and years for which one is looked for. */
const RECORD_YEARS = 10;
const RECORD_PASSAGES = 10;
const LOOK_YEARS = 150;
const YEAR_SECONDS = 365.25 * DAY_SECONDS;

/**
 * Gives the passages of the years of a zone, ready to publish: local time, UTC and distance rounded as far as their uncertainty allows, how the
 * body looks, and what is worth a note.
 *
 * Rows come in order of time, one year at a time in memory.
 *
 * - A nearest (farthest) of the year leads the next of its kind by more than the two half-widths together; where two are too close
 *   to tell, neither is noted.
 * - A nearest-since is looked up: the passages of its kind are gone through backwards and forwards, in all sources allowed, until one is more extreme or may be, or
 *   150 years are done. It is noted where it outdoes ten years and ten passages before it.
 * - The Moon's phases come from the same sources (`moonPhaseNear`).
 * - The Earth's date is held against that of the passage before: the step in TDB less the whole days from the same UTC date a year before.
 *
 * @param ephemeris what `openSources` gave
 * @param query     years, zone, pairs, style
 * @throws ApsidaryError at the call: `bad-date` for what is no year, `bad-span` for years in the wrong order, `bad-zone`, `bad-pair`, `bad-option`,
 *   `not-covered`
 */
export function apsisCalendar(ephemeris: Ephemeris, query: CalendarQuery): Generator<CalendarRow, void, undefined> {
  const { first, from, to } = calendarSpan(ephemeris, query);
  const style = completeStyle(query.style);
  const pairs = [...(query.pairs ?? CALENDAR_PAIRS)].map((pair) => pairOf(pair));
  const { source = "auto", rank = "all" } = query;
  const found = mergedPassages(ephemeris, pairs, { from: { tdbSeconds: from }, to: { tdbSeconds: to }, source, rank });
  const maker: Maker = { ephemeris, zone: query.zone, style, source, histories: new Map() };
  return yearByYear(maker, found, first);
}

/** The years of a calendar and the TDB seconds past J2000 between which they lie. */
export interface CalendarSpan {
  readonly first: number;
  readonly last: number;
  readonly from: number;
  readonly to: number;
}

/**
 * Gives the span of a calendar's years in their zone.
 *
 * @throws ApsidaryError `bad-date`, `bad-span`, `bad-zone`
 */
export function calendarSpan(
  ephemeris: Ephemeris,
  { years, zone }: Pick<CalendarQuery, "years" | "zone">,
): CalendarSpan {
  const [first, last] = typeof years === "number" ? [years, years] : years;
  for (const year of [first, last]) {
    if (Number.isInteger(year) && year >= -9998 && year <= 9998) continue;
    throw new ApsidaryError("bad-date", `${year} is not a year of a calendar; give a whole number such as 2027.`);
  }
  if (first > last) {
    throw new ApsidaryError(
      "bad-span",
      `the calendar's last year, ${last}, comes before its first, ${first}; name the earlier year first.`,
    );
  }
  const edge = (year: number) => startOfYear(ephemeris, year, zone);
  return { first, last, from: edge(first), to: edge(last + 1) };
}

/** Where midnight of New Year does not exist, the year begins with the first instant after it. */
function startOfYear(ephemeris: Ephemeris, year: number, zone: string): number {
  const at = DateTime.fromObject({ year, month: 1, day: 1 }, { zone: zoneOf(zone) });
  if (!at.isValid) throw new ApsidaryError("bad-date", `the year ${year} cannot be laid out in ${zone}.`);
  return tdbOf(at, ephemeris.leapSeconds);
}

/** What the making of all rows shares. */
interface Maker {
  readonly ephemeris: Ephemeris;
  readonly zone: string;
  readonly style: CompleteStyle;
  readonly source: SourceChoice;
  readonly histories: Map<string, PassageHistory>;
}

/** The passages of a year are gathered before the first of its rows, since what is the most extreme shows only then. */
function* yearByYear(maker: Maker, found: Iterable<Passage>, first: number): Generator<CalendarRow, void, undefined> {
  let year = first;
  let end = startOfYear(maker.ephemeris, year + 1, maker.zone);
  let gathered: Passage[] = [];
  for (const passage of found) {
    if (passage.tdbSeconds >= end) {
      yield* rowsOf(maker, gathered);
      gathered = [];
      while (passage.tdbSeconds >= end) end = startOfYear(maker.ephemeris, ++year + 1, maker.zone);
    }
    gathered.push(passage);
  }
  yield* rowsOf(maker, gathered);
}

function* rowsOf(maker: Maker, found: readonly Passage[]): Generator<CalendarRow, void, undefined> {
  const extremes = extremesOf(found);
  for (const passage of found) yield rowOf(maker, passage, extremes.has(passage));
}

/** The passages that are the most extreme of a pair and kind beyond doubt. */
function extremesOf(found: readonly Passage[]): Set<Passage> {
  const best = new Map<string, { leader: Passage; runnerUp: Passage | null }>();
  for (const passage of found) {
    if (passage.rank === "secondary") continue;
    const key = `${passage.pair} ${passage.kind}`;
    const so = best.get(key);
    if (!so) best.set(key, { leader: passage, runnerUp: null });
    else if (lead(passage, so.leader) > 0) best.set(key, { leader: passage, runnerUp: so.leader });
    else if (!so.runnerUp || lead(passage, so.runnerUp) > 0) so.runnerUp = passage;
  }
  const extremes = new Set<Passage>();
  for (const { leader, runnerUp } of best.values()) {
    const doubt = runnerUp ? Math.hypot(leader.distanceUncertaintyKm, runnerUp.distanceUncertaintyKm) : 0;
    if (!runnerUp || lead(leader, runnerUp) > doubt) extremes.add(leader);
  }
  return extremes;
}

/** Kilometres by which one passage is more extreme than another of its kind. */
function lead(passage: Passage, other: Passage): number {
  return (passage.kind === "periapsis" ? -1 : 1) * (passage.distanceKm - other.distanceKm);
}

function rowOf(maker: Maker, passage: Passage, extremeOfYear: boolean): CalendarRow {
  const { ephemeris, zone, style } = maker;
  const row = toRow(passage, ephemeris);
  const pair = pairOf(passage.pair);
  const at = localTimeOf(passage.tdbSeconds, zone, ephemeris.leapSeconds);
  const printed = printedLocal(at, row.utcUncertaintySeconds, style);
  const distance = printedDistance(passage.distanceKm, passage.distanceUncertaintyKm);
  const ratio = meanDistanceKm(pair) / passage.distanceKm;
  const seen = seenBody(pair);
  const nearest = passage.kind === "periapsis";

  const notes: NoteCode[] = [];
  if (extremeOfYear) notes.push(nearest ? "nearest-of-year" : "farthest-of-year");
  const record = recordOf(maker, pair, passage);
  if (record) notes.push(nearest ? "nearest-since" : "farthest-since");
  const phase =
    pair.name === "moon-earth" ? moonPhaseNear(ephemeris, passage.tdbSeconds, PHASE_HOURS, maker.source) : null;
  if (phase) notes.push(phase.phase === "new" ? "near-new-moon" : "near-full-moon");
  if (printed.unit !== "month" && printed.unit !== "year" && at.toISODate() !== at.toUTC().toISODate()) {
    notes.push("date-differs-from-utc");
  }
  if (row.utcBasis === "predicted") notes.push("predicted-utc");
  if (passage.rank === "secondary") notes.push("secondary");
  const step = dateStepOf(maker, pair, passage);
  if (step !== null && Math.abs(step) * 3600 > passage.timeUncertaintySeconds * Math.SQRT2) {
    notes.push(step > 0 ? "later-than-last-year" : "earlier-than-last-year");
  }

  return Object.freeze({
    ...row,
    local: isoOf(at),
    printed: printed.text,
    printedUnit: printed.unit,
    notes: Object.freeze(notes),
    printedUtc: printedLocal(at.toUTC(), row.utcUncertaintySeconds, style).text,
    printedKm: distance.km,
    printedAu: distance.au,
    diameterArcmin:
      seen && rounded(2 * Math.asin(seen.physical.equatorialRadiusKm / passage.distanceKm) * (10_800 / Math.PI), 6),
    sizePercent: rounded(100 * (ratio - 1), 4),
    lightPercent: rounded(100 * (ratio * ratio - 1), 4),
    speedKmS: rounded(speedOf(maker, pair, passage), 6),
    phaseHours: phase && rounded(phase.hours, 3),
    dateStepHours: step === null ? null : rounded(step, 3),
    sinceUtc: record?.since ? utcText(record.since.tdb, 3, ephemeris.leapSeconds) : null,
    untilUtc: record?.until ? utcText(record.until.tdb, 3, ephemeris.leapSeconds) : null,
    sinceCertain: record?.since ? record.since.certain : null,
    untilCertain: record?.until ? record.until.certain : null,
    lookedFromYear: record ? yearOf(record.lookedFrom) : null,
    lookedToYear: record ? yearOf(record.lookedTo) : null,
    ...(style.besides.length === 0 ? {} : { besides: Object.freeze(style.besides.map(beside)) }),
  });

  function beside(other: string) {
    const there = localTimeOf(passage.tdbSeconds, other, ephemeris.leapSeconds);
    const { text } = printedLocal(there, row.utcUncertaintySeconds, style);
    return Object.freeze({ zone: other, local: isoOf(there), printed: text });
  }
}

/** ISO 8601 with an offset in digits, for UTC as well; years beyond 0 to 9999 with sign and six digits. */
function isoOf(at: DateTime<true>): string {
  return at.toISO({ includeOffset: false }) + at.toFormat("ZZ");
}

function yearOf(tdb: number): number {
  return gregorianOfDay(utcOf(tdb).day).year;
}

function historyOf(maker: Maker, pair: Pair, passage: Passage): PassageHistory {
  let history = maker.histories.get(pair.name);
  if (!history || passage.tdbSeconds > history.to) {
    history = passageHistory(maker.ephemeris, pair, passage.tdbSeconds, maker.source);
    maker.histories.set(pair.name, history);
  }
  return history;
}

/** A passage that ends a record. */
interface Rival {
  readonly tdb: number;
  readonly certain: boolean;
}

interface RecordFound {
  readonly since: Rival | null;
  readonly until: Rival | null;
  readonly lookedFrom: number;
  readonly lookedTo: number;
}

function recordOf(maker: Maker, pair: Pair, passage: Passage): RecordFound | null {
  if (passage.rank !== "principal") return null;
  // one that takes longer to outdo ten passages than is looked for is no record
  if (2 * pair.halfPeriodSeconds * RECORD_PASSAGES > LOOK_YEARS * YEAR_SECONDS) return null;
  const { tdbSeconds: tdb } = passage;
  const history = historyOf(maker, pair, passage);
  const lookedFrom = Math.max(history.from, tdb - LOOK_YEARS * YEAR_SECONDS);
  const lookedTo = Math.min(history.to, tdb + LOOK_YEARS * YEAR_SECONDS);
  let outdone = 0;
  let since: Rival | null = null;
  for (const other of history.before(tdb, passage.kind)) {
    if (other.tdb < lookedFrom) break;
    since = rivalOf(passage, other);
    if (since) break;
    outdone++;
  }
  if (outdone < RECORD_PASSAGES || (since?.tdb ?? lookedFrom) > tdb - RECORD_YEARS * YEAR_SECONDS) return null;
  let until: Rival | null = null;
  for (const other of history.after(tdb, passage.kind)) {
    if (other.tdb > lookedTo) break;
    until = rivalOf(passage, other);
    if (until) break;
  }
  return { since, until, lookedFrom, lookedTo };
}

/** Tells whether another passage is more extreme, or may be. */
function rivalOf(passage: Passage, other: PastPassage): Rival | null {
  const ahead = (passage.kind === "periapsis" ? -1 : 1) * (other.distanceKm - passage.distanceKm);
  const doubt = Math.hypot(passage.distanceUncertaintyKm, other.uncertaintyKm);
  return ahead > -doubt ? { tdb: other.tdb, certain: ahead > doubt } : null;
}

/** Hours by which the Earth's date is later than that of the passage before. */
function dateStepOf(maker: Maker, pair: Pair, passage: Passage): number | null {
  if (pair.name !== "earth-sun" && pair.name !== "emb-sun") return null;
  for (const last of historyOf(maker, pair, passage).before(passage.tdbSeconds, passage.kind)) {
    const { day } = utcOf(passage.tdbSeconds, maker.ephemeris.leapSeconds);
    const date = gregorianOfDay(day);
    const wholeDays = day - dayOfGregorian(date.year - 1, date.month, date.day);
    return (passage.tdbSeconds - last.tdb) / 3600 - 24 * wholeDays;
  }
  return null;
}

/** Step by which positions are differenced where a source gives no velocity, seconds. */
const VELOCITY_STEP = 60;

/** The relative speed at a passage, km/s, from the source that supplied it. */
function speedOf(maker: Maker, pair: Pair, passage: Passage): number {
  const { tdbSeconds: tdb } = passage;
  const supply = timelineFor(maker.ephemeris, pair, maker.source).supplies.find(
    ({ source, span }) => source.id === passage.source && span.from <= tdb && tdb <= span.to,
  );
  if (!supply) return Number.NaN;
  const motion = supply.source.motion(pair);
  const s = new Float64Array(6);
  motion.state(tdb, s);
  if (motion.givesVelocity) return Math.hypot(s[3] as number, s[4] as number, s[5] as number);
  const later = Math.min(tdb + VELOCITY_STEP, supply.span.to);
  const earlier = Math.max(tdb - VELOCITY_STEP, supply.span.from);
  motion.state(later, s);
  const [x = 0, y = 0, z = 0] = s;
  motion.state(earlier, s);
  return Math.hypot(x - (s[0] as number), y - (s[1] as number), z - (s[2] as number)) / (later - earlier);
}
