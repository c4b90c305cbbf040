import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import { isBodyName, physicalBody } from "../bodies/physical.ts";
import { POINTS, type PointName } from "../bodies/point.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Motion, Source, Span } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { type SourceChoice, timelineFor } from "../passages/timeline-for.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { interpolatedPlace } from "./interpolated-place.ts";

/** Writes a place, km, ICRF, for a time in TDB seconds past J2000 to `out[0 … 2]`. */
export type Place = (tdb: number, out: Float64Array) => void;

/** A body as it stands about the Earth's centre. All places are of the best source at the time. */
export interface BodyInSky {
  /** Where it is at an instant. */
  readonly geometric: Place;
  /** Where it is seen: body and Earth both as they were when the light left, which takes light-time and aberration in. */
  readonly apparent: Place;
  /** `apparent` for many times near each other, within 0.1″. */
  readonly apparentNearby: Place;
  /** From the Sun's centre, at an instant. */
  readonly fromSun: Place;
  /** Equatorial (for the Moon mean) radius, km; `null` where none is known here. */
  readonly radiusKm: number | null;
  /** Whether it is the Sun. */
  readonly isSun: boolean;
  /** Stretches in which all of this can be told. */
  readonly covered: readonly Span[];
}

/** km/s, by definition of the metre. */
export const LIGHT_SPEED = 299_792.458;
/** Seconds between the nodes of `apparentNearby`: at most 0.07″ for Mercury, 0.001″ for the Moon and Sun, 0.003″ for Io. */
const NODE_STEP = { planet: 43_200, moon: 7200, jupiterMoon: 3600 } as const;
/** Seconds by which a span is drawn in, so that no light left before its beginning: from beyond Pluto it takes under 7 h. */
const LIGHT_MARGIN = 25_200;

/**
 * Gives the body that an observer of a pair looks at: its moving point, or the Sun where that is the Earth or its barycentre with the Moon.
 *
 * Aberration by the old rule that what is seen lies where the line from Earth to body lay when the light left
 * (*Explanatory Supplement to the Astronomical Almanac*, 3rd ed., section 7.2; from memory): exact but for the curving of the Earth's way during
 * the light-time, 0.1″ for Neptune. The observer's own speed (0.3″) and the bending of light by the Sun (0.004″ at 90°) are left out.
 *
 * @param ephemeris what `openSources` gave
 * @param pair      the pair of the passages
 * @param choice    which sources may serve
 * @throws ApsidaryError `bad-pair` for distances from the solar-system barycentre; `not-supplied`
 */
export function bodyInSky(ephemeris: Ephemeris, pair: Pair, choice: SourceChoice): BodyInSky {
  if (pair.centre === POINTS.ssb) {
    throw new ApsidaryError(
      "bad-pair",
      `${pair.name} cannot be planned: nobody sees the barycentre of the solar system. Take ${pair.name.replace("-ssb", "-sun")}.`,
    );
  }
  const spans: (readonly Span[])[] = [];
  const placeOf = (name: PairName): Place => {
    const [place, covered] = placesOf(ephemeris, pairOf(name), choice);
    spans.push(covered);
    return place;
  };
  const earth = placeOf("earth-sun");
  const isSun = pair.target === POINTS.earth || pair.target === POINTS.emb;
  const scratch = new Float64Array(9);
  const minus = (first: Place): Place => {
    return (tdb, out) => {
      first(tdb, out);
      earth(tdb, scratch);
      for (let i = 0; i < 3; i++) out[i] = (out[i] as number) - (scratch[i] as number);
    };
  };
  const plus = (first: Place, second: Place): Place => {
    const other = new Float64Array(9);
    return (tdb, out) => {
      first(tdb, out);
      second(tdb, other);
      for (let i = 0; i < 3; i++) out[i] = (out[i] as number) + (other[i] as number);
    };
  };
  let geometric: Place;
  let fromSun: Place;
  if (isSun) {
    geometric = (tdb, out) => {
      earth(tdb, out);
      for (let i = 0; i < 3; i++) out[i] = -(out[i] as number);
    };
    fromSun = (_, out) => out.fill(0, 0, 3);
  } else if (pair.centre === POINTS.earth) {
    geometric = placeOf(pair.name);
    fromSun = plus(geometric, earth);
  } else if (pair.centre === POINTS.sun) {
    fromSun = placeOf(pair.name);
    geometric = minus(fromSun);
  } else {
    // a moon of Jupiter; the planet's centre and its system's barycentre lie 200 km apart at most, 0.05″ from here
    fromSun = plus(placeOf("jupiter-sun"), placeOf(pair.name));
    geometric = minus(fromSun);
  }
  const rounds = pair.centre === POINTS.earth || isSun ? 1 : 2;
  const name = isSun ? "sun" : nameOf(pair);
  const covered = common(spans).map(({ from, to }) => ({ from: from + LIGHT_MARGIN, to }));
  const apparent = seenPlace(geometric, rounds);
  const step =
    isSun || pair.centre === POINTS.sun
      ? NODE_STEP.planet
      : pair.centre === POINTS.earth
        ? NODE_STEP.moon
        : NODE_STEP.jupiterMoon;
  return Object.freeze({
    geometric,
    apparent,
    apparentNearby: interpolatedPlace(apparent, step, covered),
    fromSun,
    radiusKm: name !== null && isBodyName(name) ? physicalBody(name).equatorialRadiusKm : null,
    isSun,
    covered,
  });
}

/** Gives the Sun as it is seen from the Earth. */
export function sunInSky(ephemeris: Ephemeris, choice: SourceChoice): BodyInSky {
  return bodyInSky(ephemeris, pairOf("earth-sun"), choice);
}

/** The place of a body `light-time` before; each round shortens what is left by speed ÷ speed of light, 10⁻⁴. */
function seenPlace(geometric: Place, rounds: number): Place {
  return (tdb, out) => {
    geometric(tdb, out);
    for (let i = 0; i < rounds; i++) geometric(tdb - norm(out) / LIGHT_SPEED, out);
  };
}

/** Length of a vector. */
export function norm(v: Float64Array): number {
  const [x, y, z] = [v[0] as number, v[1] as number, v[2] as number];
  return Math.sqrt(x * x + y * y + z * z);
}

/** The place of a pair's moving point by the best source at each time, and where there is one. */
function placesOf(ephemeris: Ephemeris, pair: Pair, choice: SourceChoice): [Place, readonly Span[]] {
  const timeline = timelineFor(ephemeris, pair, choice);
  const motions = new Map<Source, Motion>();
  const state = new Float64Array(9);
  const place: Place = (tdb, out) => {
    const supply = timeline.supplyAt(tdb);
    if (!supply) {
      throw new ApsidaryError("not-covered", `${formatTdb(tdb, 0)} (TDB) is not covered for ${pair.name}.`);
    }
    let motion = motions.get(supply.source);
    if (!motion) {
      motion = supply.source.motion(pair);
      motions.set(supply.source, motion);
    }
    motion.state(tdb, state);
    for (let i = 0; i < 3; i++) out[i] = state[i] as number;
  };
  return [place, timeline.covered];
}

function nameOf({ target }: Pair): PointName | null {
  for (const [name, id] of Object.entries(POINTS)) if (id === target) return name as PointName;
  return null;
}

function common(lists: readonly (readonly Span[])[]): Span[] {
  return lists.reduce<readonly Span[]>(
    (left, right) =>
      left.flatMap((a) =>
        right.flatMap((b) => {
          const span = { from: Math.max(a.from, b.from), to: Math.min(a.to, b.to) };
          return span.from < span.to ? [span] : [];
        }),
      ),
    [{ from: -Infinity, to: Infinity }],
  ) as Span[];
}
