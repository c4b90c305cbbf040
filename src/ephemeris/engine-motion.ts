import type { AstroTime, Body, StateVector, Vector } from "astronomy-engine";
import { DAY_SECONDS } from "../bodies/constants.ts";
import type { Pair } from "../bodies/pair.ts";
import { POINTS, type PointId } from "../bodies/point.ts";
import type { EngineLibrary } from "./engine-library.ts";
import type { Motion } from "./source.ts";

/** Mass of the Earth over mass of the Moon, as astronomy-engine has it (DE405). */
const EARTH_MOON_RATIO = 81.30056;

/**
 * Half the step over which positions are differenced where astronomy-engine's own velocities are not good enough, seconds.
 *
 * Position is then the mean of the two ends, which lies inside the curve by ½ step² × acceleration: the Moon 1.2 m, Io
 * 35 m, Pluto 0.3 km, each below a hundredth of the error of the positions themselves.
 */
const HALF_STEP = { moon: 30, jupiterMoon: 10, pluto: 8640 } as const;

/** Writes something to `out` for a time in days of dynamical time past J2000. */
type Fill = (days: number, out: Float64Array) => void;

/**
 * Makes the motion of a pair from astronomy-engine: ICRF axes to within 0.02″, km and km/s.
 *
 * Time. The theories under astronomy-engine are functions of TDB, which it calls TT, so TDB goes in as it is, with no
 * difference to make up. It is set as the `tt` of one time object that is used again and again: positions depend on that alone,
 * so the package's own ΔT (75 s in 2026, where 69 s are true) never comes in. The way round by `AstroTime.FromTerrestrialTime`
 * inverts that ΔT in steps that need not end: it hangs for some instants of 1955-02-22, and costs as much as a position.
 *
 * Velocity. Planets and the Sun: derivatives of the same truncated series, good to 10⁻⁸ km/s. The Moon: the package differences
 * positions 1.7 s apart, at the mercy of rounding, so that range rates jitter by up to 10⁻⁶ km/s in far centuries;
 * here 60 s. Moons of Jupiter: velocities of the osculating ellipse, up to 3·10⁻³ km/s from the change of
 * the positions (hours at an apsis); here differences. Pluto: up to 3·10⁻⁴ km/s from the change of the positions (days),
 * since two integrations that end 10⁵ km apart are blended over 80 years; here differences.
 *
 * @param library astronomy-engine
 * @param pair    a pair of the library's
 */
export function engineMotion(library: EngineLibrary, pair: Pair): Motion {
  const fill = fillFor(library, pair);
  return Object.freeze({
    givesVelocity: true,
    state: (tdb: number, out: Float64Array) => fill(tdb / DAY_SECONDS, out),
  });
}

function fillFor(library: EngineLibrary, { target, centre }: Pair): Fill {
  const km = library.KM_PER_AU;
  const time: AstroTime = new library.AstroTime(0);
  const at = (days: number): AstroTime => {
    time.tt = days;
    return time;
  };
  const moonName = JUPITER_MOONS[target];
  if (moonName) {
    return differenced((days, out) => place(library.JupiterMoons(at(days))[moonName], km, out), HALF_STEP.jupiterMoon);
  }
  const moon = differenced((days, out) => place(library.GeoMoon(at(days)), km, out), HALF_STEP.moon);
  if (target === POINTS.moon) return moon;

  const { Body } = library;
  if (target === POINTS.pluto) {
    const barycentric = differenced(
      (days, out) => place(library.BaryState(Body.Pluto, at(days)), km, out),
      HALF_STEP.pluto,
    );
    if (centre === POINTS.ssb) return barycentric;
    return sum(barycentric, (days, out) => state(library.BaryState(Body.Sun, at(days)), km, out), -1);
  }
  const body: Body = Body[PLANETS[target] as PlanetName];
  const planet: Fill =
    centre === POINTS.ssb
      ? (days, out) => state(library.BaryState(body, at(days)), km, out)
      : (days, out) => state(library.HelioState(body, at(days)), km, out);
  return target === POINTS.emb ? sum(planet, moon, 1 / (1 + EARTH_MOON_RATIO)) : planet;
}

type PlanetName = "Mercury" | "Venus" | "Earth" | "Mars" | "Jupiter" | "Saturn" | "Uranus" | "Neptune";

const PLANETS: Readonly<Record<PointId, PlanetName>> = {
  [POINTS.mercury]: "Mercury",
  [POINTS.venus]: "Venus",
  [POINTS.earth]: "Earth",
  [POINTS.emb]: "Earth", // to which the Moon's share is added
  [POINTS.mars]: "Mars",
  [POINTS.jupiter]: "Jupiter",
  [POINTS.saturn]: "Saturn",
  [POINTS.uranus]: "Uranus",
  [POINTS.neptune]: "Neptune",
};

const JUPITER_MOONS: Readonly<Record<PointId, "io" | "europa" | "ganymede" | "callisto">> = {
  [POINTS.io]: "io",
  [POINTS.europa]: "europa",
  [POINTS.ganymede]: "ganymede",
  [POINTS.callisto]: "callisto",
};

/** Writes a position in km to `out[0 … 2]`. */
function place(vector: Vector | StateVector, km: number, out: Float64Array): void {
  out[0] = vector.x * km;
  out[1] = vector.y * km;
  out[2] = vector.z * km;
}

/** Writes position and velocity, km and km/s, to `out[0 … 5]`. */
function state(vector: StateVector, km: number, out: Float64Array): void {
  const kmS = km / DAY_SECONDS;
  place(vector, km, out);
  out[3] = vector.vx * kmS;
  out[4] = vector.vy * kmS;
  out[5] = vector.vz * kmS;
}

/** Makes position and velocity from positions `halfStep` seconds before and after. */
function differenced(position: Fill, halfStep: number): Fill {
  const half = halfStep / DAY_SECONDS;
  const before = new Float64Array(3);
  const after = new Float64Array(3);
  return (days, out) => {
    const from = days - half;
    const to = days + half;
    const seconds = (to - from) * DAY_SECONDS; // of the two times as rounded
    position(from, before);
    position(to, after);
    for (let i = 0; i < 3; i++) {
      const a = before[i] as number;
      const b = after[i] as number;
      out[i] = (a + b) / 2;
      out[i + 3] = (b - a) / seconds;
    }
  };
}

/** Adds `weight` times a second state to a first. */
function sum(first: Fill, second: Fill, weight: number): Fill {
  const other = new Float64Array(6);
  return (days, out) => {
    first(days, out);
    second(days, other);
    for (let i = 0; i < 6; i++) out[i] = (out[i] as number) + weight * (other[i] as number);
  };
}
