import { type BodyName, physicalBody } from "../bodies/physical.ts";
import { trackPair } from "../bodies/track-pair.ts";
import type { Accuracy } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { intervalAt } from "../numeric/interval-at.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { interpolateTable, type StateTable } from "./table-interpolation.ts";
import { centreOf, type Track, trackOf } from "./track.ts";

/** A table of states, and what is known of it besides. */
export interface TableGiven extends StateTable {
  /** What to call the pair: the moving point, then the centre, such as `probe-earth`. */
  readonly name: string;
  /** The body at the centre; it gives the radius that heights are above. */
  readonly about?: BodyName | undefined;
  /** About how long one revolution takes, seconds; left out, it is read off the table's own extremes. */
  readonly periodSeconds?: number | undefined;
  /** Half a unit of the last digit of the positions (km) and velocities (km/s); 0 where they are exact. */
  readonly digits?: { readonly km: number; readonly kmS: number } | undefined;
  /** Half-widths that at least 95 % of true errors of the table's own states keep. */
  readonly accuracy?: { readonly rangeKm: number; readonly rangeRateKmS: number } | undefined;
}

/** Rows that a polynomial needs at the least. */
const LEAST_ROWS = 4;
/** Part of the way from row to row by which the polynomial may be in doubt before the table is refused. */
const MOST_DOUBT = 0.02;
/** Parts of an interval at which the doubt is taken, the largest counts: the polynomials that differ meet each other in between. */
const DOUBT_AT = [0, 0.2, 0.5, 0.8, 1] as const;
/** What an instant of some 10⁹ s resolves, seconds: a table's rows stand at instants so rounded. */
const INSTANT_ROUNDING = 2.4e-7;

/**
 * Makes a track from a table of states: polynomials of the seventh degree between its rows (`interpolateTable`).
 *
 * Its accuracy is the root of the sum of squares of the table's own error (as given, else half a unit of its last digit) and the
 * interpolation's doubt in the interval.
 *
 * @throws ApsidaryError `bad-input`: too few rows, times that do not grow, what is no number, rows that jump, contradict each other or lie
 *   too far apart, with the time; `bad-pair`
 */
export function tableTrack(given: TableGiven): Track {
  const { name, times, positions, velocities, about, digits, accuracy } = given;
  requireRows(name, given);
  const motion = interpolateTable({ times, positions, velocities });
  const doubt = new Float64Array(2);
  const place = new Float64Array(6);
  requireSmooth(name, given, motion.doubt);
  const [from, to] = [times[0] as number, times[times.length - 1] as number];
  const spacing = medianSpacing(times);
  const period = given.periodSeconds ?? periodOf(times, positions) ?? 2 * (to - from);
  const body = about === undefined ? null : physicalBody(about);
  const pair = trackPair({
    name,
    centre: centreOf(about ?? null),
    sampleSeconds: Math.min(spacing, period / 10),
    halfPeriodSeconds: period / 2,
    toleranceSeconds: Math.min(8, spacing * 1e-3),
    referenceRadiusKm: body?.equatorialRadiusKm ?? null,
    radiusSource: body?.radiusSource ?? null,
  });
  const own = accuracy ?? {
    rangeKm: digits?.km ?? 0,
    // where velocities are not given they follow from positions a step apart
    rangeRateKmS: velocities ? (digits?.kmS ?? 0) : (2 * (digits?.km ?? 0)) / spacing,
  };
  const title = `a table of ${times.length} states of ${name}`;
  return trackOf({
    pair,
    id: "table",
    title,
    spans: [{ from, to }],
    motion,
    accuracy(tdb): Accuracy {
      const at = intervalAt(times, tdb);
      const [low, high] = [times[at] as number, times[at + 1] as number];
      let [range, rate] = [0, 0];
      for (const part of DOUBT_AT) {
        motion.doubt(low + part * (high - low), doubt);
        range = Math.max(range, doubt[0] as number);
        rate = Math.max(rate, doubt[1] as number);
      }
      motion.state(tdb, place);
      const blur = INSTANT_ROUNDING * Math.hypot(...place.subarray(3, 6));
      return {
        rangeKm: Math.hypot(own.rangeKm, range, blur),
        rangeRateKmS: Math.hypot(own.rangeRateKmS, rate, (4 * blur) / (high - low)),
        basis: accuracy ? "user" : "assumed",
      };
    },
  });
}

function requireRows(name: string, { times, positions, velocities }: StateTable): void {
  const count = times.length;
  if (count < LEAST_ROWS) {
    throw new ApsidaryError(
      "bad-input",
      `the table of ${name} has ${count} rows; it needs ${LEAST_ROWS} at the least.`,
    );
  }
  if (positions.length !== 3 * count || (velocities !== null && velocities.length !== 3 * count)) {
    throw new ApsidaryError(
      "bad-input",
      `the table of ${name} has ${count} times, but not three coordinates for each.`,
    );
  }
  for (let i = 0; i < count; i++) {
    const time = times[i] as number;
    if (!Number.isFinite(time)) throw new ApsidaryError("bad-input", `time ${i + 1} of ${name} is ${time}, no number.`);
    if (i > 0 && time <= (times[i - 1] as number)) {
      throw new ApsidaryError(
        "bad-input",
        `the times of ${name} must grow; row ${i + 1}, ${formatTdb(time)} TDB, does not come after the one before it.`,
      );
    }
    for (let axis = 0; axis < 3; axis++) {
      const values = [positions[3 * i + axis], ...(velocities ? [velocities[3 * i + axis]] : [])];
      if (!values.every(Number.isFinite)) {
        throw new ApsidaryError(
          "bad-input",
          `row ${i + 1} of ${name}, ${formatTdb(time)} TDB, holds what is no number.`,
        );
      }
    }
  }
}

function requireSmooth(
  name: string,
  { times, positions }: StateTable,
  doubtAt: (tdb: number, out: Float64Array) => void,
): void {
  const doubt = new Float64Array(2);
  for (let i = 0; i + 1 < times.length; i++) {
    doubtAt(((times[i] as number) + (times[i + 1] as number)) / 2, doubt);
    let way = 0;
    for (let axis = 0; axis < 3; axis++) {
      way += ((positions[3 * i + 3 + axis] as number) - (positions[3 * i + axis] as number)) ** 2;
    }
    if ((doubt[0] as number) <= MOST_DOUBT * Math.sqrt(way) || way === 0) continue;
    throw new ApsidaryError(
      "bad-input",
      `the table of ${name} cannot be interpolated after ${formatTdb(times[i] as number)} TDB: it jumps there, its velocities contradict its ` +
        `positions, or its rows lie too far apart (the distance is in doubt by ${Number((doubt[0] as number).toPrecision(2))} km).`,
    );
  }
}

function medianSpacing(times: Float64Array): number {
  const gaps = Array.from(times.subarray(1), (time, i) => time - (times[i] as number)).sort((a, b) => a - b);
  return gaps[gaps.length >> 1] as number;
}

/** The median time between extremes of a kind among the rows, seconds; `null` where there are too few. */
function periodOf(times: Float64Array, positions: Float64Array): number | null {
  const distance = (i: number) => Math.hypot(...positions.subarray(3 * i, 3 * i + 3));
  const lows: number[] = [];
  const highs: number[] = [];
  for (let i = 1; i + 1 < times.length; i++) {
    const [a, b, c] = [distance(i - 1), distance(i), distance(i + 1)];
    if (b < a && b <= c) lows.push(times[i] as number);
    if (b > a && b >= c) highs.push(times[i] as number);
  }
  const gaps = [lows, highs].flatMap((list) => list.slice(1).map((time, i) => time - (list[i] as number)));
  if (gaps.length > 0) return gaps.sort((a, b) => a - b)[gaps.length >> 1] as number;
  const [low, high] = [lows[0], highs[0]];
  return low !== undefined && high !== undefined ? 2 * Math.abs(high - low) : null;
}
