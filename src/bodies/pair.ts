import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";
import { DAY_SECONDS, SIDEREAL_PERIOD_DAYS } from "./constants.ts";
import { JUPITER_CENTRE, POINTS, type PointId } from "./point.ts";

type Planet = "mercury" | "venus" | "mars" | "jupiter" | "saturn" | "uranus" | "neptune";
type JupiterMoon = "io" | "europa" | "ganymede" | "callisto";
type Orbiter = Planet | "earth" | "emb" | "pluto";

/** The name of a pair: the moving point, then the centre. */
export type PairName = `${Orbiter}-sun` | `${Orbiter}-ssb` | "moon-earth" | `${JupiterMoon}-jupiter`;

/** A moving point and the centre from which its distance is measured. */
export interface Pair<Name extends string = PairName> {
  readonly name: Name;
  /** SPK id of the moving point. */
  readonly target: PointId;
  /** SPK id of the centre. */
  readonly centre: PointId;
  /** Seconds from sample to sample when extrema of the distance are sought; see `SAMPLE_DAYS`. */
  readonly sampleSeconds: number;
  /** Half the sidereal period, seconds: how far rank looks to either side. */
  readonly halfPeriodSeconds: number;
  /** Half the width of the last bracket of a passage, seconds, where orbits are quick; left out, that of the slow ones. */
  readonly toleranceSeconds?: number;
}

/**
 * Days from sample to sample, by moving point; where two are given, the second is for distances from the SSB.
 *
 * Each lies well under a quarter of the shortest interval between extrema of the pair, counting those that the Moon, Venus and
 * Jupiter make by pulling the centre about; a test with dense sampling holds them (measured on DE405, 1960–2059).
 */
const SAMPLE_DAYS: Record<Orbiter | "moon" | JupiterMoon, number | readonly [number, number]> = {
  mercury: 8,
  venus: [20, 8],
  earth: 30,
  emb: 40,
  mars: 60,
  jupiter: 150,
  saturn: 200,
  uranus: 100,
  neptune: [16, 200],
  pluto: [100, 200],
  moon: 2.75,
  io: 0.1,
  europa: 0.2,
  ganymede: 0.3,
  callisto: 1,
};

function makePair(name: PairName, orbiter: Orbiter | "moon" | JupiterMoon, centre: PointId): Pair {
  const days = SAMPLE_DAYS[orbiter];
  const sampleDays = typeof days === "number" ? days : days[centre === POINTS.ssb ? 1 : 0];
  return Object.freeze({
    name,
    target: POINTS[orbiter],
    centre,
    sampleSeconds: sampleDays * DAY_SECONDS,
    halfPeriodSeconds: (SIDEREAL_PERIOD_DAYS[orbiter] * DAY_SECONDS) / 2,
  });
}

function makePairs(): ReadonlyMap<string, Pair> {
  const orbiters: Orbiter[] = [
    "earth",
    "emb",
    "mercury",
    "venus",
    "mars",
    "jupiter",
    "saturn",
    "uranus",
    "neptune",
    "pluto",
  ];
  const moons: JupiterMoon[] = ["io", "europa", "ganymede", "callisto"];
  const pairs = [
    makePair("moon-earth", "moon", POINTS.earth),
    ...orbiters.map((o) => makePair(`${o}-sun`, o, POINTS.sun)),
    ...orbiters.map((o) => makePair(`${o}-ssb`, o, POINTS.ssb)),
    ...moons.map((m) => makePair(`${m}-jupiter`, m, JUPITER_CENTRE)),
  ];
  return new Map(pairs.map((pair) => [pair.name, pair]));
}

let known: ReadonlyMap<string, Pair> | undefined; // made at the first call, not when the module loads

/** Gives all pairs that the library knows, in the order in which lists show them. */
export function allPairs(): readonly Pair[] {
  known ??= makePairs();
  return [...known.values()];
}

/**
 * Gives the pair of a name.
 *
 * @param name as in `PairName`; a pair itself is given back
 * @throws ApsidaryError `bad-pair`, with the nearest name
 */
export function pairOf(name: string | Pair): Pair;
export function pairOf(name: string | Pair<string>): Pair<string>;
export function pairOf(name: string | Pair<string>): Pair<string> {
  if (typeof name !== "string") return name;
  known ??= makePairs();
  const pair = known.get(name);
  if (pair) return pair;
  const near = nearestName(name, known.keys());
  throw new ApsidaryError(
    "bad-pair",
    `unknown pair ${JSON.stringify(name.slice(0, 60))}${near ? `; did you mean "${near}"?` : ""} A pair is the moving point, then the centre: ` +
      "moon-earth, earth-sun, emb-ssb, jupiter-sun, io-jupiter …",
  );
}
