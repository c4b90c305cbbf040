import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";
import { digitHalfWidth } from "./digit-half-width.ts";
import type { OrbitAxes } from "./kepler-motion.ts";
import type { Orbit } from "./orbit.ts";
import { orbitFrom } from "./orbit-from.ts";
import { type OrbitGiven, orbitGivenNames } from "./orbit-given.ts";
import { parseQuantity, type Quantity } from "./quantity.ts";
import { type TrackScale, type TrackTime, trackTime } from "./track-time.ts";

/**
 * Osculating elements, as a caller writes them: the orbit by any set that `orbitFrom` takes, and when it is run through.
 *
 * When: `periapsisAt`, or `epoch` with `meanAnomalyDeg`.
 */
export interface ElementsGiven extends OrbitGiven {
  /** What to call the pair: the moving point, then the centre, such as `probe-earth`. */
  readonly name: string;
  readonly periapsisAt?: TrackTime | null | undefined;
  readonly epoch?: TrackTime | null | undefined;
  readonly meanAnomalyDeg?: Quantity | null | undefined;
  /** Of the times; left out, TDB. */
  readonly scale?: TrackScale | null | undefined;
  /** The orbit's place in space, degrees; distances do without it. */
  readonly inclinationDeg?: Quantity | null | undefined;
  readonly nodeDeg?: Quantity | null | undefined;
  readonly argumentDeg?: Quantity | null | undefined;
  /** What the angles refer to: the ecliptic (left out) or the equator, both of J2000. */
  readonly frame?: "ecliptic" | "equator" | null | undefined;
  /**
   * Half-widths that at least 95 % of true values keep, by the name of the field, in its unit (`periapsisAt` and `epoch`: seconds). A field
   * without one counts as rounded to the digits it is written with; 0 says that it is exact.
   */
  readonly uncertainty?: Readonly<Record<string, Quantity>> | null | undefined;
}

/** Elements, read. Frozen. */
export interface Elements {
  readonly name: string;
  readonly orbit: Orbit;
  /** The passage through the periapsis nearest to the epoch, TDB seconds past J2000. */
  readonly periapsisTdb: number;
  /** When the elements hold best, TDB seconds past J2000. */
  readonly epochTdb: number;
  /** Where the plane lies; `null` where no angles were given. */
  readonly axes: OrbitAxes | null;
  readonly error: ElementsError;
}

/** What elements may be off by: half-widths. */
export interface ElementsError {
  readonly periapsisKm: number;
  /** 0 for an open orbit. */
  readonly apoapsisKm: number;
  readonly eccentricity: number;
  /** 0 for an open orbit. */
  readonly periodSeconds: number;
  /** Of the passage nearest to the epoch, seconds, the line of apsides' own included. */
  readonly periapsisSeconds: number;
  /** `user` where every element came with its own half-width, else `assumed`. */
  readonly basis: "user" | "assumed";
}

const TIMES = ["periapsisAt", "epoch", "meanAnomalyDeg"] as const;
const ANGLES = ["inclinationDeg", "nodeDeg", "argumentDeg"] as const;
const OTHERS = ["name", "scale", "frame", "uncertainty", ...TIMES, ...ANGLES] as const;
/** Measures that have no digits of their own, or are no measure. */
const WORDS = ["about", "companion"];
/** Obliquity of the ecliptic of J2000: 84 381.448″ (J. H. Lieske et al., Astron. Astrophys. 58 (1977) 1; IAU 1976). */
const OBLIQUITY = ((84_381.448 / 3600) * Math.PI) / 180;
const DEGREE = Math.PI / 180;

const bad = (message: string) => new ApsidaryError("bad-input", message);

/**
 * Reads osculating elements.
 *
 * Errors come from the half-widths given, each put through `orbitFrom` by itself and added as the root of the sum of squares. Where the time
 * of periapsis has no half-width of its own, the line of apsides is taken to be known no better than the shape, to δe/e, so that for e near
 * zero the time is as ill-defined as it is in truth.
 *
 * @throws ApsidaryError `bad-input`, naming what is missing, unknown or contradictory; as `orbitFrom`
 */
export function readElements(given: ElementsGiven): Elements {
  const { name, size, uncertainty, scale } = partsOf(given);
  const orbit = orbitFrom(size);
  const when = whenOf(given, orbit, scale);
  const half = halfWidths(size, uncertainty);
  const spread = { periapsisKm: 0, apoapsisKm: 0, eccentricity: 0, periodSeconds: 0 };
  for (const [field, width] of half.widths) {
    if (width === 0) continue;
    const moved = movedOrbit(size, field, width, orbit);
    for (const key of Object.keys(spread) as (keyof typeof spread)[]) {
      spread[key] = Math.hypot(spread[key], (moved[key] ?? 0) - (orbit[key] ?? 0));
    }
  }
  const meanMotion = meanMotionOf(orbit);
  const timeGiven = when.field in uncertainty;
  // an apsis may stand anywhere on a circle, but no farther off than half a turn
  const halfTurn = orbit.periodSeconds === null ? Infinity : orbit.periodSeconds / 2;
  const apsidesLine = orbit.eccentricity === 0 ? halfTurn : spread.eccentricity / (orbit.eccentricity * meanMotion);
  const ownTime = timeGiven
    ? half.of(when.field) * (when.field === "meanAnomalyDeg" ? DEGREE / meanMotion : 1)
    : Math.hypot(when.halfWidth, Math.min(apsidesLine, halfTurn));
  const extremes = [...Object.values(spread), ownTime, meanMotion].map((value) => value * value * 1e12);
  if (!extremes.every(Number.isFinite)) {
    throw bad(`the elements of ${name}, or their uncertainties, go beyond what numbers hold. Check their units.`);
  }
  const epochWidth = when.field === "meanAnomalyDeg" ? half.of("epoch") : 0;
  return Object.freeze({
    name,
    orbit,
    periapsisTdb: when.periapsisTdb,
    epochTdb: when.epochTdb,
    axes: axesOf(given),
    error: Object.freeze({
      ...spread,
      periapsisSeconds: Math.hypot(ownTime, epochWidth),
      basis: half.allGiven && timeGiven ? ("user" as const) : ("assumed" as const),
    }),
  });
}

/** Mean motion, rad/s; of an open orbit what takes its place, √(μ/|a|³), of a parabola √(μ/q³). */
export function meanMotionOf({ gravitationalParameterKm3S2: gm, semiMajorAxisKm: a, periapsisKm: q }: Orbit): number {
  return Math.sqrt(gm / Math.abs(a ?? q) ** 3);
}

function partsOf(given: ElementsGiven) {
  if (typeof given !== "object" || given === null || Array.isArray(given)) {
    throw bad(`elements are an object such as { "name": "probe-earth", "about": "earth", … }.`);
  }
  const size: Record<string, unknown> = {};
  for (const [key, value] of Object.entries(given)) {
    if ((OTHERS as readonly string[]).includes(key)) continue;
    const known = [...OTHERS, ...orbitGivenNames()];
    if (value != null && !known.includes(key)) {
      const near = nearestName(key, known);
      throw bad(
        `${JSON.stringify(key.slice(0, 60))} is no element${near ? `; did you mean "${near}"?` : "."} Elements are ${known.join(", ")}.`,
      );
    }
    size[key] = value;
  }
  const { name, uncertainty, scale, frame } = given;
  if (typeof name !== "string" || name === "") throw bad("elements need a name: the moving point, then the centre.");
  if (scale !== undefined && scale !== null && scale !== "tdb" && scale !== "utc") {
    throw bad(`${name}: the scale is ${JSON.stringify(scale).slice(0, 40)}; it must be "tdb" or "utc".`);
  }
  if (frame !== undefined && frame !== null && frame !== "ecliptic" && frame !== "equator") {
    throw bad(`${name}: the frame is ${JSON.stringify(frame).slice(0, 40)}; it must be "ecliptic" or "equator".`);
  }
  const widths: Record<string, Quantity> = {};
  if (uncertainty !== undefined && uncertainty !== null) {
    if (typeof uncertainty !== "object" || Array.isArray(uncertainty)) {
      throw bad(`${name}: uncertainty is an object of half-widths by field, such as { "eccentricity": 1e-6 }.`);
    }
    const known = [...Object.keys(size), ...TIMES].filter((key) => !WORDS.includes(key));
    for (const [key, width] of Object.entries(uncertainty)) {
      if (width === null) continue;
      if (!known.includes(key) || (given as unknown as Record<string, unknown>)[key] == null) {
        const near = nearestName(key, known);
        throw bad(
          `${name}: there is an uncertainty of ${JSON.stringify(key.slice(0, 40))} but no such element${near && near !== key ? `; did you mean "${near}"?` : "."}`,
        );
      }
      widths[key] = width;
    }
  }
  return { name, size: size as OrbitGiven, uncertainty: widths, scale: scale ?? "tdb" } as const;
}

type When = {
  readonly field: (typeof TIMES)[number];
  readonly periapsisTdb: number;
  readonly epochTdb: number;
  readonly halfWidth: number;
};

function whenOf(given: ElementsGiven, orbit: Orbit, scale: TrackScale): When {
  const { name, periapsisAt = null, epoch = null, meanAnomalyDeg = null } = given;
  if (periapsisAt !== null) {
    if (meanAnomalyDeg !== null) {
      throw bad(`${name}: too many: periapsisAt and meanAnomalyDeg say the same; leave one of them out.`);
    }
    const { tdb, halfWidth } = trackTime(periapsisAt, scale, `${name}: periapsisAt`);
    const epochTdb = epoch === null ? tdb : trackTime(epoch, scale, `${name}: the epoch`).tdb;
    return { field: "periapsisAt", periapsisTdb: tdb, epochTdb, halfWidth };
  }
  if (epoch === null || meanAnomalyDeg === null) {
    throw bad(
      `${name}: when is missing: give periapsisAt, or epoch and meanAnomalyDeg${epoch === null && meanAnomalyDeg === null ? "" : `; only ${epoch === null ? "meanAnomalyDeg" : "epoch"} is given`}.`,
    );
  }
  const degrees = parseQuantity(meanAnomalyDeg, "number", `${name}: meanAnomalyDeg`);
  const { tdb } = trackTime(epoch, scale, `${name}: the epoch`);
  const meanMotion = meanMotionOf(orbit);
  const turned = orbit.periodSeconds === null ? degrees : degrees - 360 * Math.round(degrees / 360);
  return {
    field: "meanAnomalyDeg",
    periapsisTdb: tdb - (turned * DEGREE) / meanMotion,
    epochTdb: tdb,
    halfWidth: (digitHalfWidth(meanAnomalyDeg, degrees) * DEGREE) / meanMotion,
  };
}

function halfWidths(size: OrbitGiven, uncertainty: Readonly<Record<string, Quantity>>) {
  const widths = new Map<string, number>();
  let allGiven = true;
  const widthOf = (field: string): number => {
    const given = uncertainty[field];
    if (given === undefined) return 0;
    const value =
      typeof given === "number" ? given : parseQuantity(given, dimensionOf(field), `uncertainty of ${field}`);
    if (value >= 0 && Number.isFinite(value)) return value;
    throw bad(`the uncertainty of ${field} is ${String(given).slice(0, 40)}; it must be zero or above.`);
  };
  for (const [field, given] of Object.entries(size)) {
    if (given === null || given === undefined || WORDS.includes(field) || field === "equatorialRadiusKm") continue;
    if (field in uncertainty) {
      widths.set(field, widthOf(field));
      continue;
    }
    allGiven = false;
    const value = typeof given === "number" ? given : parseQuantity(given as string, dimensionOf(field), field, 1);
    // a length in radii has its half-width in radii: `movedOrbit` writes it so
    widths.set(field, digitHalfWidth(given as Quantity, value));
  }
  return { widths, allGiven, of: widthOf };
}

function dimensionOf(field: string) {
  if (field === "eccentricity" || field === "meanAnomalyDeg") return "number" as const;
  if (field.endsWith("SpeedKmS")) return "speed" as const;
  if (field === "periodSeconds" || field === "periapsisAt" || field === "epoch") return "time" as const;
  if (field === "specificEnergyKm2S2") return "energy" as const;
  if (field === "angularMomentumKm2S") return "momentum" as const;
  if (field === "gravitationalParameterKm3S2") return "gm" as const;
  return "length" as const;
}

/** The orbit with one element moved by its half-width; to the other side where there is no orbit on this one. */
function movedOrbit(size: OrbitGiven, field: string, width: number, orbit: Orbit): Orbit {
  const given = (size as Record<string, Quantity>)[field];
  const inRadii = typeof given === "string" && /R\s*$/.test(given);
  const radius = inRadii ? (orbit.equatorialRadiusKm ?? 1) : 1;
  const value = orbit[field as keyof Orbit] as number;
  for (const side of [1, -1]) {
    try {
      const moved = orbitFrom({ ...size, [field]: value + side * width * radius });
      if ((moved.periodSeconds === null) === (orbit.periodSeconds === null)) return moved;
    } catch (error) {
      if (!(error instanceof ApsidaryError)) throw error;
    }
  }
  throw bad(
    `${field} ${String(given).slice(0, 40)} ± ${Number(width.toPrecision(3))} leaves no orbit on either side; give it finer, or its uncertainty.`,
  );
}

function axesOf(given: ElementsGiven): OrbitAxes | null {
  const angles = ANGLES.map((field) => given[field] ?? null);
  if (angles.every((angle) => angle === null)) return null;
  const [i = 0, node = 0, argument = 0] = angles.map((angle, k) => {
    if (angle !== null) return parseQuantity(angle, "number", `${given.name}: ${ANGLES[k]}`) * DEGREE;
    throw bad(`${given.name}: ${ANGLES[k]} is missing; give all three of ${ANGLES.join(", ")}, or none.`);
  });
  const tilt = given.frame === "equator" ? 0 : OBLIQUITY;
  const turn = (u: number): [number, number, number] => {
    const x = Math.cos(node) * Math.cos(u) - Math.sin(node) * Math.sin(u) * Math.cos(i);
    const y = Math.sin(node) * Math.cos(u) + Math.cos(node) * Math.sin(u) * Math.cos(i);
    const z = Math.sin(u) * Math.sin(i);
    return [x, y * Math.cos(tilt) - z * Math.sin(tilt), y * Math.sin(tilt) + z * Math.cos(tilt)];
  };
  return { p: turn(argument), q: turn(argument + Math.PI / 2) };
}
