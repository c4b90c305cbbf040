import { type BodyName, physicalBody } from "../bodies/physical.ts";
import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";
import { type MeasureName, measures } from "./measure.ts";
import type { OrbitField } from "./orbit.ts";
import { type Dimension, parseQuantity, type Quantity } from "./quantity.ts";
import type { Partner } from "./two-body-shares.ts";

type Given = Quantity | null | undefined;

/**
 * What may be given of an orbit: numbers in the unit of the name, or texts with a unit (`250km`, `1.5R`, `7.5km/s`, `2h`).
 *
 * Two of the measures and the central body (or its gravitational parameter), or three measures that together fix size, shape
 * and mass. What is `null` or left out counts as not given.
 */
export interface OrbitGiven {
  /** The central body; it gives gravitational parameter and equatorial radius. */
  readonly about?: BodyName | null | undefined;
  /** The other body, where its mass counts: its name or its gravitational parameter. Needs `about`. */
  readonly companion?: BodyName | Quantity | null | undefined;
  /** The radius for heights and for the unit `R`, where the central body is not one of those known. */
  readonly equatorialRadiusKm?: Given;
  readonly gravitationalParameterKm3S2?: Given;
  readonly periapsisKm?: Given;
  readonly apoapsisKm?: Given;
  readonly periapsisHeightKm?: Given;
  readonly apoapsisHeightKm?: Given;
  /** Below zero for a hyperbola. */
  readonly semiMajorAxisKm?: Given;
  /** Taken for that of an ellipse where an ellipse and a hyperbola both fit; a remark tells it. */
  readonly semiMinorAxisKm?: Given;
  readonly semiLatusRectumKm?: Given;
  readonly eccentricity?: Given;
  readonly periapsisSpeedKmS?: Given;
  readonly apoapsisSpeedKmS?: Given;
  readonly specificEnergyKm2S2?: Given;
  readonly angularMomentumKm2S?: Given;
  readonly periodSeconds?: Given;
}

/** One thing that was given. */
export interface Item {
  readonly field: OrbitField;
  /** The measure that it tells; `null` for the eccentricity. */
  readonly name: MeasureName | null;
  readonly word: string;
  /** As given, in the base unit: a height, a negative axis. */
  readonly value: number;
  /** The measure's amount: above zero but for eccentricity and the energy of a parabola. */
  readonly amount: number;
  /** Relative change of the amount for a relative change of the value; of the eccentricity, its change as such. */
  readonly weight: number;
  /** What it says about the shape. */
  readonly says: "closed" | "parabola" | "hyperbola" | null;
  /** What the caller wrote, for messages. */
  readonly shown: string;
}

/** What is known of the central body. */
export interface Centre {
  readonly about: BodyName | null;
  readonly radiusKm: number | null;
  readonly radiusSource: string | null;
  /** Both bodies, where a companion was given. */
  readonly partners: readonly [Partner, Partner] | null;
}

const PLAIN_FIELDS = [
  "periapsisKm",
  "apoapsisKm",
  "semiMajorAxisKm",
  "semiMinorAxisKm",
  "semiLatusRectumKm",
  "periapsisSpeedKmS",
  "apoapsisSpeedKmS",
  "periodSeconds",
  "specificEnergyKm2S2",
  "angularMomentumKm2S",
  "gravitationalParameterKm3S2",
] as const;
const HEIGHTS = [
  ["periapsisHeightKm", "periapsisKm", "periapsis height"],
  ["apoapsisHeightKm", "apoapsisKm", "apoapsis height"],
] as const;

const bad = (message: string) => new ApsidaryError("bad-input", message);

/**
 * Reads what was given of an orbit, with its units.
 *
 * @returns what is known of the central body, and the items, the gravitational parameter of a named body included
 * @throws ApsidaryError `bad-input`: an unknown name or unit, a quantity that cannot be, the same thing given twice
 */
export function readGiven(given: OrbitGiven): { centre: Centre; items: Item[] } {
  refuseUnknownNames(given);
  const { centre, gm } = centreOf(given);
  const items: Item[] = [];
  if (gm !== null) {
    if ((given.gravitationalParameterKm3S2 ?? null) !== null) {
      throw bad(`too many: the gravitational parameter is given, and ${centre.about} has one; leave one of them out.`);
    }
    items.push({ ...plainItem("gravitationalParameterKm3S2", gm, centre), shown: `of ${centre.about}` });
  }
  for (const field of PLAIN_FIELDS) {
    const value = given[field] ?? null;
    if (value !== null) items.push(plainItem(field, value, centre));
  }
  for (const [field, name, word] of HEIGHTS) {
    const value = given[field] ?? null;
    if (value === null) continue;
    if ((given[name] ?? null) !== null) {
      throw bad(
        `too many: the ${measures()[name].word} and the ${word} are given and say the same; leave one of them out.`,
      );
    }
    items.push(heightItem(field, name, word, value, centre.radiusKm));
  }
  const e = given.eccentricity ?? null;
  if (e !== null) items.push(eccentricityItem(e));
  return { centre, items };
}

/** Gives the names of all that an orbit is made from. */
export function orbitGivenNames(): string[] {
  return [
    "about",
    "companion",
    "equatorialRadiusKm",
    "eccentricity",
    ...HEIGHTS.map(([field]) => field),
    ...PLAIN_FIELDS,
  ];
}

function refuseUnknownNames(given: OrbitGiven): void {
  if (typeof given !== "object" || given === null) {
    throw bad(`an orbit is made from an object such as { about: "earth", … }, not ${String(given).slice(0, 60)}.`);
  }
  const known = orbitGivenNames();
  for (const [name, value] of Object.entries(given)) {
    if (value === undefined || value === null || known.includes(name)) continue;
    if (name === "circularSpeedKmS" || name === "meanSpeedKmS") {
      throw bad(`${name} is a result only; give the semi-major axis or the period instead.`);
    }
    const near = nearestName(name, known);
    throw bad(
      `${JSON.stringify(name.slice(0, 60))} is nothing that an orbit is made from${near ? `; did you mean "${near}"?` : "."} ` +
        `It is made from ${known.join(", ")}.`,
    );
  }
}

function centreOf(given: OrbitGiven): { centre: Centre; gm: number | null } {
  const { about = null, companion = null, equatorialRadiusKm = null } = given;
  if (about === null) {
    if (companion !== null) throw bad("a companion needs a central body; name it as `about`.");
    const radiusKm =
      equatorialRadiusKm === null ? null : positive(equatorialRadiusKm, "length", "the equatorial radius", null);
    return {
      centre: { about, radiusKm, radiusSource: radiusKm === null ? null : "as given", partners: null },
      gm: null,
    };
  }
  const body = physicalBody(about);
  if (equatorialRadiusKm !== null) {
    throw bad(`too many: the equatorial radius is given, and ${about} has one; leave one of them out.`);
  }
  const other = companion === null ? null : partnerOf(companion);
  return {
    centre: {
      about,
      radiusKm: body.equatorialRadiusKm,
      radiusSource: body.radiusSource,
      partners: other && [{ name: about, ...body }, other],
    },
    gm: body.gmKm3S2 + (other?.gmKm3S2 ?? 0),
  };
}

function partnerOf(companion: BodyName | Quantity): Partner {
  if (typeof companion === "string" && /^[a-z]/i.test(companion)) {
    const body = physicalBody(companion); // refuses an unknown one with the nearest name
    return { name: companion, ...body };
  }
  const gmKm3S2 = positive(companion, "gm", "the companion's gravitational parameter", null);
  return { name: "companion", gmKm3S2, equatorialRadiusKm: null };
}

function positive(given: Quantity, dimension: Dimension, what: string, radiusKm: number | null): number {
  const value = parseQuantity(given, dimension, what, radiusKm);
  if (value > 0) return value;
  throw bad(`${what} is ${shownOf(given)}; it must be above zero.`);
}

function shownOf(given: Quantity): string {
  return typeof given === "string" ? given.trim().slice(0, 60) : String(given);
}

function plainItem(field: (typeof PLAIN_FIELDS)[number], given: Quantity, { radiusKm }: Centre): Item {
  const { word, dimension, closedOnly } = measures()[field];
  const common = { field, name: field, word, weight: 1, shown: shownOf(given) };
  if (field === "specificEnergyKm2S2") {
    const value = parseQuantity(given, dimension, `the ${word}`);
    return {
      ...common,
      value,
      amount: Math.abs(value),
      says: value < 0 ? "closed" : value > 0 ? "hyperbola" : "parabola",
    };
  }
  if (field === "semiMajorAxisKm") {
    const value = parseQuantity(given, dimension, `the ${word}`, radiusKm);
    if (value === 0) throw bad(`the ${word} is zero; it must be above zero, or below zero for a hyperbola.`);
    return { ...common, value, amount: Math.abs(value), says: value > 0 ? "closed" : "hyperbola" };
  }
  const value = positive(given, dimension, `the ${word}`, radiusKm);
  return { ...common, value, amount: value, says: closedOnly ? "closed" : null };
}

function heightItem(
  field: (typeof HEIGHTS)[number][0],
  name: (typeof HEIGHTS)[number][1],
  word: string,
  given: Quantity,
  radiusKm: number | null,
): Item {
  if (radiusKm === null)
    throw bad(`the ${word} needs a radius to stand on; name the central body, or give its equatorial radius.`);
  const value = parseQuantity(given, "length", `the ${word}`, radiusKm);
  const amount = radiusKm + value;
  if (!(amount > 0))
    throw bad(
      `the ${word} is ${shownOf(given)}, at or below the centre of the body; it must be above -${radiusKm} km.`,
    );
  const says = measures()[name].closedOnly ? "closed" : null;
  return { field, name, word, value, amount, weight: Math.abs(value) / amount, says, shown: shownOf(given) };
}

function eccentricityItem(given: Quantity): Item {
  const value = parseQuantity(given, "number", "the eccentricity");
  if (!(value >= 0)) throw bad(`the eccentricity is ${shownOf(given)}; it must be zero or above.`);
  const says = value < 1 ? "closed" : value === 1 ? "parabola" : "hyperbola";
  return {
    field: "eccentricity",
    name: null,
    word: "eccentricity",
    value,
    amount: value,
    weight: value,
    says,
    shown: shownOf(given),
  };
}
