import { DAY_SECONDS } from "../bodies/constants.ts";
import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import type { TrackPair } from "../bodies/track-pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { type Moment, tdbOf } from "../time/tdb-of.ts";
import { type SourceChoice, timelineFor } from "./timeline-for.ts";

/** Distance at an instant, with its rates. */
export interface Range {
  /** TDB seconds past J2000. */
  readonly tdbSeconds: number;
  readonly distanceKm: number;
  readonly rangeRateKmPerDay: number;
  readonly rangeAccelerationKmPerDay2: number;
  /** Id of the source. */
  readonly source: string;
}

/** Seconds by which a distance is differenced for its rate, where a source gives no velocity. */
const RATE_STEP = 60;

/**
 * Gives the distance of a pair at a moment, geometric, centre to centre, with its first and second derivative.
 *
 * @param ephemeris what `openSources` gave
 * @param pair      the pair's name
 * @param moment    when
 * @param source    which sources may serve
 * @throws ApsidaryError `bad-pair`, `bad-date`, `not-supplied`, `not-covered`
 */
export function rangeAt(
  ephemeris: Ephemeris,
  pair: PairName | Pair | TrackPair,
  moment: Moment,
  source: SourceChoice = "auto",
): Range {
  const tdb = tdbOf(moment, ephemeris.leapSeconds);
  const timeline = timelineFor(ephemeris, pairOf(pair), source);
  const supply = timeline.supplyAt(tdb);
  if (!supply) {
    const spans = timeline.covered
      .map((span) => `${formatTdb(span.from, 0)} to ${formatTdb(span.to, 0)}`)
      .join(", and ");
    throw new ApsidaryError(
      "not-covered",
      `${formatTdb(tdb, 0)} is not covered for ${timeline.pair.name}: the sources allowed here span ${spans} (TDB).`,
    );
  }
  const { range } = supply;
  const measures = new Float64Array(2);
  range.measure(tdb, measures);
  const rate = range.givesRate
    ? range.rate(tdb)
    : (range.distance(tdb + RATE_STEP) - range.distance(tdb - RATE_STEP)) / (2 * RATE_STEP);
  return Object.freeze({
    tdbSeconds: tdb,
    distanceKm: measures[0] as number,
    rangeRateKmPerDay: rate * DAY_SECONDS,
    rangeAccelerationKmPerDay2: (measures[1] as number) * DAY_SECONDS * DAY_SECONDS,
    source: supply.source.id,
  });
}
