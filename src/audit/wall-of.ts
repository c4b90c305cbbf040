import { DAY_SECONDS } from "../bodies/constants.ts";
import { decimalYear, deltaTSeconds } from "../time/delta-t.ts";
import { POSIX_EPOCH_DAY } from "../time/tdb-of.ts";
import { TT_MINUS_TAI } from "../time/utc-of.ts";
import type { AuditScale } from "./audit-scale.ts";
import { J2000_WALL, type SkyPassage } from "./sky.ts";

/** What UT1 and UTC may differ by from 1972 on, seconds: leap seconds keep them within 0.9 s. */
const UT1_MINUS_UTC = 0.9;

/** Gives the reading of a scale's clock at a passage, seconds since Modified Julian day 0. */
export function wallOf(scale: AuditScale, at: SkyPassage): number {
  switch (scale.kind) {
    case "utc":
    case "ut1":
      return at.utcWall;
    case "zone":
      return at.utcWall + offsetSeconds(scale, at.utcWall);
    case "tt":
      return at.ttWall;
    case "tai":
      return at.ttWall - TT_MINUS_TAI;
    case "tdb":
      return J2000_WALL + at.passage.tdbSeconds;
  }
}

/** Gives how far that reading may be off, 99.9 %, seconds. */
export function boundOf(scale: AuditScale, at: SkyPassage): number {
  if (scale.kind === "utc" || scale.kind === "zone") return at.utcBound;
  if (scale.kind === "ut1") return at.isUt1 ? at.utcBound : at.utcBound + UT1_MINUS_UTC;
  return at.ttBound;
}

/** Gives the TDB seconds past J2000 of a clock's reading, to within a second or two: enough to look a passage up. */
export function tdbNear(scale: AuditScale, wallSeconds: number): number {
  const past = wallSeconds - J2000_WALL;
  if (scale.kind === "tt" || scale.kind === "tdb") return past;
  if (scale.kind === "tai") return past + TT_MINUS_TAI;
  const utc = scale.kind === "zone" ? past - offsetSeconds(scale, wallSeconds) : past;
  return utc + deltaTSeconds(decimalYear(utc));
}

/** Seconds east of UTC at a UTC reading. */
export function offsetSeconds(scale: AuditScale, utcWall: number): number {
  if (scale.kind !== "zone") return 0;
  if (scale.zone.isUniversal) return scale.zone.offset(0) * 60;
  // offsets change on quarters of an hour; the run-time takes long to look one up
  const quarter = Math.floor(utcWall / 900);
  let known = offsets.get(scale);
  if (!known) {
    known = new Map();
    offsets.set(scale, known);
  }
  let seconds = known.get(quarter);
  if (seconds === undefined) {
    seconds = scale.zone.offset((quarter * 900 - POSIX_EPOCH_DAY * DAY_SECONDS) * 1000) * 60;
    if (known.size >= MOST_OFFSETS) known.clear();
    known.set(quarter, seconds);
  }
  return seconds;
}

/** Only remembers what can be worked out again. */
const offsets = new WeakMap<AuditScale, Map<number, number>>();
const MOST_OFFSETS = 20_000;
