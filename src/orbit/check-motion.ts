import type { Motion, Span } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { formatTdb } from "../time/format-tdb.ts";

/** Samples that are looked over; in a longer span so many, further apart. */
const MOST_SAMPLES = 20_000;
/** Halvings after which an interval that still departs holds a jump or a contradiction. */
const HALVINGS = 20;
/** Part of the way in an interval by which a motion may depart from the rule; the part of the speed by which a velocity may be wrong. */
const SMOOTH = 1e-5;
/** Digits of a position, and of an instant, that are taken for rounding. */
const ROUNDING = 1e-12;
const INSTANT_ROUNDING = 4 * 2 ** -52;

/**
 * Looks a motion over for jumps, and for a velocity that contradicts the position.
 *
 * In every interval the way is held against Simpson's rule of the velocities; where there are none, the middle position against the
 * cubic through four others. What a smooth motion departs by falls with the fifth (fourth) power of the interval, a wrong velocity with
 * the first, a jump not at all; so an interval that departs is halved until that can be told.
 *
 * @param name     of the track, for messages
 * @param motion   the motion
 * @param span     where to look
 * @param step     seconds from look to look
 * @param slackKmS by which velocities may be off besides, km/s
 * @throws ApsidaryError `bad-state` with the time
 */
export function checkMotion(name: string, motion: Motion, span: Span, step: number, slackKmS: number): void {
  const count = Math.min(MOST_SAMPLES, Math.max(8, Math.ceil((span.to - span.from) / step)));
  const width = (span.to - span.from) / count;
  const states = [0, 0.25, 0.5, 0.75, 1].map((part) => ({ part, state: new Float64Array(6) }));
  const instantRounding = INSTANT_ROUNDING * Math.max(Math.abs(span.from), Math.abs(span.to));
  const { givesVelocity } = motion;

  /** By how much an interval departs from the rule, and by how much it may, km. */
  const look = (from: number, to: number): { departs: number; allowed: number } => {
    for (const { part, state } of states) motion.state(from + part * (to - from), state);
    const at = (k: number, i: number) => states[k]?.state[i] ?? 0;
    let departs = 0;
    let way = 0;
    let size = 0;
    for (let i = 0; i < 3; i++) {
      const moved = at(4, i) - at(0, i);
      const rule = givesVelocity
        ? ((to - from) * (at(0, i + 3) + 4 * at(2, i + 3) + at(4, i + 3))) / 6 - moved
        : at(2, i) - (4 * (at(1, i) + at(3, i)) - at(0, i) - at(4, i)) / 6;
      departs += rule * rule;
      way += Math.max(moved * moved, (at(2, i) - at(0, i)) ** 2);
      size += at(2, i) ** 2;
    }
    const speed = Math.sqrt(way) / (to - from);
    const rounding = ROUNDING * Math.sqrt(size) + instantRounding * Math.min(speed, Math.sqrt(size));
    return { departs: Math.sqrt(departs), allowed: SMOOTH * Math.sqrt(way) + slackKmS * (to - from) + rounding };
  };

  const examine = (from: number, to: number, halvings: number, before: number): void => {
    const { departs, allowed } = look(from, to);
    if (departs <= allowed) return;
    if (halvings === HALVINGS || to - from < 8 * instantRounding) throw refusal(from, to, departs, before);
    const middle = (from + to) / 2;
    examine(from, middle, halvings + 1, departs);
    examine(middle, to, halvings + 1, departs);
  };

  const refusal = (from: number, to: number, departs: number, before: number): ApsidaryError => {
    const tdb = (from + to) / 2;
    const when = `${formatTdb(tdb)} TDB (${tdb} s past J2000)`;
    if (givesVelocity && departs < 0.75 * before) {
      const kmS = Number((departs / (to - from)).toPrecision(3));
      return new ApsidaryError(
        "bad-state",
        `the velocity of ${name} contradicts its position at ${when}: they differ by ${kmS} km/s. Velocities are km/s, in the axes of the positions.`,
      );
    }
    return new ApsidaryError("bad-state", `${name} jumps at ${when}; a track must be continuous.`);
  };

  for (let k = 0; k < count; k++) {
    const from = span.from + k * width;
    examine(from, k + 1 === count ? span.to : from + width, 0, Infinity);
  }
}
