import { type PairName, pairOf } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Motion, Span } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { type Elements, type ElementsGiven, readElements } from "./elements.ts";
import { elementsTrack } from "./elements-track.ts";
import { integrate, type Nodes } from "./integrate.ts";
import { keplerMotion } from "./kepler-motion.ts";
import { interpolateTable } from "./table-interpolation.ts";
import { type Track, trackOf } from "./track.ts";

/**
 * What pulls besides the Sun: planets with their moons, gravitational parameters in km³/s². Those of JPL DE440 (R. S. Park et al., Astron. J. 161
 * (2021) 105; from memory).
 */
const PULLS: readonly (readonly [PairName, string, number])[] = [
  ["mercury-sun", "mercury", 22_031.86855],
  ["venus-sun", "venus", 324_858.592],
  ["emb-sun", "earth", 403_503.2356],
  ["mars-sun", "mars", 42_828.375816],
  ["jupiter-sun", "jupiter", 126_712_764.1],
  ["saturn-sun", "saturn", 37_940_584.8418],
  ["uranus-sun", "uranus", 5_794_556.4],
  ["neptune-sun", "neptune", 6_836_527.10058],
  ["pluto-sun", "pluto", 975.5],
];
const LIGHT = 299_792.458;
const TOLERANCE = 1e-13;
/** Parts of a revolution at the periapsis that a step spans at the most, so that the polynomials between the nodes keep to millimetres. */
const STEPS_PER_TURN = 60;
/** Revolutions that are integrated at the most. */
const MOST_TURNS = 2000;

/**
 * Makes a track from osculating elements about the Sun, with the pull of the planets from an ephemeris and the Sun's first post-Newtonian term.
 *
 * The elements need their angles. The planet named as `companion` does not pull itself. Asteroids, the Moon apart from the Earth, radiation and jets are not
 * in it. Half-widths are those of the elements alone, as for two bodies.
 *
 * @param ephemeris what `openSources` gave
 * @param given     the elements
 * @param span      where passages will be asked for, TDB seconds past J2000; half a period is added where the ephemeris reaches so far
 * @throws ApsidaryError `bad-input`, `not-covered`
 *
 * Method: heliocentric equations of motion; post-Newtonian term of a static Sun as in the IERS Conventions (2010), 10.3 (from memory); `integrate`,
 * then `interpolateTable` through its nodes.
 */
export function perturbedTrack(ephemeris: Ephemeris, given: ElementsGiven | Elements, span: Span): Track {
  const elements = "orbit" in given && "error" in given ? given : readElements(given);
  const { name, orbit, axes, epochTdb } = elements;
  if (orbit.about !== "sun") {
    throw new ApsidaryError(
      "bad-input",
      `${name}: the planets' pull is reckoned about the sun alone, not about ${orbit.about ?? "a bare GM"}.`,
    );
  }
  if (axes === null) {
    throw new ApsidaryError(
      "bad-input",
      `${name}: the planets' pull needs the orbit's place in space: inclinationDeg, nodeDeg, argumentDeg.`,
    );
  }
  const twoBodies = elementsTrack(elements);
  const { pair } = twoBodies;
  const room = orbit.periodSeconds === null ? 0 : 1.05 * pair.halfPeriodSeconds;
  const asked = { from: Math.min(span.from, epochTdb), to: Math.max(span.to, epochTdb) };
  const pulls = PULLS.filter(([, body]) => body !== orbit.shares?.smaller.name);
  const covered = coverOf(ephemeris, pulls, asked, name);
  const from = Math.max(covered.from, asked.from - room);
  const to = Math.min(covered.to, asked.to + room);
  if (orbit.periodSeconds !== null && (to - from) / orbit.periodSeconds > MOST_TURNS) {
    throw new ApsidaryError("bad-input", `${name}: more than ${MOST_TURNS} revolutions; ask for a shorter span.`);
  }
  const motions = pulls.map(([pairName, , gm]) => ({ gm, motion: motionFor(ephemeris, pairName, from, to) }));
  const rates = pulledBy(orbit.gravitationalParameterKm3S2, motions);
  const start = new Float64Array(6);
  keplerMotion({
    periapsisKm: orbit.periapsisKm,
    eccentricity: orbit.eccentricity,
    gmKm3S2: orbit.gravitationalParameterKm3S2,
    periapsisTdb: elements.periapsisTdb,
    axes,
  }).state(epochTdb, start);
  const turn = 2 * Math.PI * Math.sqrt(orbit.periapsisKm ** 3 / orbit.gravitationalParameterKm3S2);
  const largest = turn / STEPS_PER_TURN;
  const before = integrate(rates, epochTdb, start, from, TOLERANCE, largest);
  const after = integrate(rates, epochTdb, start, to, TOLERANCE, largest);
  const title = `osculating elements of ${name}, with the pull of the planets`;
  return trackOf({
    pair,
    id: "perturbed",
    title,
    spans: [{ from, to }],
    motion: interpolateTable(tableOf(before, after)),
    accuracy: (tdb) => twoBodies.accuracy(pair, tdb),
  });
}

function coverOf(
  ephemeris: Ephemeris,
  pulls: readonly (readonly [PairName, string, number])[],
  asked: Span,
  name: string,
): Span {
  let cover: Span = { from: -Infinity, to: Infinity };
  for (const [pairName] of pulls) {
    const own = ephemeris.covers(pairName).find((span) => span.from <= asked.from && asked.to <= span.to);
    if (!own) {
      throw new ApsidaryError(
        "not-covered",
        `${name}: no one source has ${pairName} from ${formatTdb(asked.from, 0)} to ${formatTdb(asked.to, 0)} (TDB), the span asked for and the epoch of the elements.`,
      );
    }
    cover = { from: Math.max(cover.from, own.from), to: Math.min(cover.to, own.to) };
  }
  return cover;
}

function motionFor(ephemeris: Ephemeris, name: PairName, from: number, to: number): Motion {
  const pair = pairOf(name);
  const source = ephemeris.sources.find((it) => it.spans(pair).some((span) => span.from <= from && to <= span.to));
  if (!source) throw new ApsidaryError("not-covered", `no one source has ${name} for the whole span.`);
  return source.motion(pair);
}

/** The heliocentric equations of motion. */
function pulledBy(gmSun: number, pulls: readonly { readonly gm: number; readonly motion: Motion }[]) {
  const p = new Float64Array(6);
  return (t: number, s: Float64Array, out: Float64Array): void => {
    const [x = 0, y = 0, z = 0, vx = 0, vy = 0, vz = 0] = s;
    const r2 = x * x + y * y + z * z;
    const r = Math.sqrt(r2);
    const v2 = vx * vx + vy * vy + vz * vz;
    const rv = x * vx + y * vy + z * vz;
    // Newton's pull, and the Sun's post-Newtonian term: μ/(c² r³) [(4 μ/r − v²) r + 4 (r·v) v]
    const newton = -gmSun / (r2 * r);
    const einstein = gmSun / (LIGHT * LIGHT * r2 * r);
    const along = newton + einstein * ((4 * gmSun) / r - v2);
    const forth = einstein * 4 * rv;
    let ax = along * x + forth * vx;
    let ay = along * y + forth * vy;
    let az = along * z + forth * vz;
    for (const { gm, motion } of pulls) {
      motion.state(t, p);
      const [px = 0, py = 0, pz = 0] = p;
      const [dx, dy, dz] = [px - x, py - y, pz - z];
      const d2 = dx * dx + dy * dy + dz * dz;
      const p2 = px * px + py * py + pz * pz;
      const direct = gm / (d2 * Math.sqrt(d2));
      const indirect = gm / (p2 * Math.sqrt(p2));
      ax += direct * dx - indirect * px;
      ay += direct * dy - indirect * py;
      az += direct * dz - indirect * pz;
    }
    out[0] = vx;
    out[1] = vy;
    out[2] = vz;
    out[3] = ax;
    out[4] = ay;
    out[5] = az;
  };
}

function tableOf(before: Nodes, after: Nodes) {
  const nodes = [
    ...before.times.map((time, i) => ({ time, state: before.states[i] as Float64Array })).reverse(),
    ...after.times.slice(1).map((time, i) => ({ time, state: after.states[i + 1] as Float64Array })),
  ];
  const times = Float64Array.from(nodes, ({ time }) => time);
  const positions = new Float64Array(3 * nodes.length);
  const velocities = new Float64Array(3 * nodes.length);
  nodes.forEach(({ state }, i) => {
    positions.set(state.subarray(0, 3), 3 * i);
    velocities.set(state.subarray(3, 6), 3 * i);
  });
  return { times, positions, velocities };
}
