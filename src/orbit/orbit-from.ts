import { ApsidaryError } from "../error.ts";
import { ellipseCircumference } from "./ellipse-circumference.ts";
import { type FixedOrbit, fixOrbit } from "./fix-orbit.ts";
import { amountOf, type MeasureName, measures } from "./measure.ts";
import type { Orbit, OrbitField } from "./orbit.ts";
import { type Item, type OrbitGiven, readGiven } from "./orbit-given.ts";
import { sensitivities } from "./sensitivities.ts";
import { twoBodyShares } from "./two-body-shares.ts";

/** A field that changes more than this many times as much as what was given is called ill-conditioned. */
const MOST_SENSITIVE = 1000;

/**
 * Gives the whole orbit that a sufficient set of its measures fixes.
 *
 * What was given comes back as it was given. Fields that the set fixes badly are named in `illConditioned`: a circle's
 * eccentricity from its two axes, for one, or the far apsis of a near-parabola from its eccentricity.
 *
 * @param given two measures and the central body (or its gravitational parameter), or three that fix the mass as well; see `OrbitGiven`
 * @returns the orbit, frozen; see `Orbit`
 * @throws ApsidaryError `bad-input`, in words: too few, too many or contradictory, and which; the far apsis of an open orbit; a set that
 *   two orbits fit; a quantity or unit that cannot be
 *
 * Method: every measure is a product of powers of p, μ, 1 + e and |1 − e| (`measures`); see `fixOrbit` and `sensitivities`.
 */
export function orbitFrom(given: OrbitGiven): Orbit {
  const { centre, items } = readGiven(given);
  const fixed = fixOrbit(items, centre.about);
  const fields = fieldsOf(items, fixed, centre.radiusKm);
  const factors = sensitivities(items, fixed.shape);
  const illConditioned = (Object.keys(fields) as OrbitField[]).filter(
    (field) => fields[field] !== null && !(factors[field] <= MOST_SENSITIVE),
  );
  const worst = Math.max(...illConditioned.map((field) => factors[field]));
  return Object.freeze({
    conic: conicOf(fixed),
    about: centre.about,
    ...fields,
    equatorialRadiusKm: centre.radiusKm,
    radiusSource: centre.radiusSource,
    shares: centre.partners && twoBodyShares(fields, ...centre.partners),
    illConditioned: Object.freeze(illConditioned),
    remarks: Object.freeze(remarksOf(items, fixed, fields, centre.radiusKm, illConditioned, worst)),
  });
}

function conicOf({ shape }: FixedOrbit): Orbit["conic"] {
  if (shape.e === 0) return "circle";
  if (shape.minus === 0) return "parabola";
  return shape.closed ? "ellipse" : "hyperbola";
}

type Fields = Pick<Orbit, OrbitField>;

function fieldsOf(items: readonly Item[], fixed: FixedOrbit, radiusKm: number | null): Fields {
  const { closed, e, plus, minus } = fixed.shape;
  const table = measures();
  const value = (name: MeasureName) => items.find((item) => item.name === name)?.amount ?? amountOf(table[name], fixed);
  const ifClosed = (name: MeasureName) => (closed ? value(name) : null);
  const height = (distance: number | null) => (radiusKm === null || distance === null ? null : distance - radiusKm);
  const parabola = minus === 0;
  const axis = value("semiMajorAxisKm");
  const period = ifClosed("periodSeconds");
  const periapsisKm = value("periapsisKm");
  const apoapsisKm = ifClosed("apoapsisKm");
  const fields: Record<OrbitField, number | null> = {
    gravitationalParameterKm3S2: value("gravitationalParameterKm3S2"),
    semiMajorAxisKm: parabola ? null : closed ? axis : -axis,
    semiMinorAxisKm: parabola ? null : value("semiMinorAxisKm"),
    semiLatusRectumKm: value("semiLatusRectumKm"),
    eccentricity: e,
    periapsisKm,
    apoapsisKm,
    periapsisHeightKm: height(periapsisKm),
    apoapsisHeightKm: height(apoapsisKm),
    periapsisSpeedKmS: value("periapsisSpeedKmS"),
    apoapsisSpeedKmS: ifClosed("apoapsisSpeedKmS"),
    circularSpeedKmS: ifClosed("circularSpeedKmS"),
    meanSpeedKmS: period === null ? null : ellipseCircumference(axis, plus * minus) / period,
    specificEnergyKm2S2: parabola ? 0 : (closed ? -1 : 1) * value("specificEnergyKm2S2"),
    angularMomentumKm2S: value("angularMomentumKm2S"),
    periodSeconds: period,
  };
  for (const item of items) fields[item.field] = item.value;
  for (const [field, number] of Object.entries(fields)) {
    if (number !== null && !Number.isFinite(number)) {
      throw new ApsidaryError(
        "bad-input",
        `the set makes a ${field} beyond what numbers hold. Check the units: km, s, km/s where none is written.`,
      );
    }
  }
  return fields as Fields; // those that may not be null are not: they were filled in above
}

function remarksOf(
  items: readonly Item[],
  { shape, otherShape }: FixedOrbit,
  { periapsisKm }: Fields,
  radiusKm: number | null,
  illConditioned: readonly OrbitField[],
  worst: number,
): string[] {
  const remarks: string[] = [];
  if (illConditioned.length > 0) {
    const times = Number.isFinite(worst) ? `up to ${worst.toPrecision(2)} times as much as` : "without bound with";
    remarks.push(
      `ill-conditioned: ${illConditioned.join(", ")} change ${times} what was given; another set, such as both apsides, fixes them better.`,
    );
  }
  if (otherShape) {
    const kind =
      otherShape.minus === 0 ? "a parabola" : `a hyperbola of eccentricity ${Number(otherShape.e.toPrecision(6))}`;
    remarks.push(`${kind} fits as well; give the eccentricity or a negative semi-major axis if it is meant.`);
  }
  if (shape.minus === 0 && items.every((item) => item.says !== "parabola")) {
    remarks.push(
      "to rounding this is a parabola; give the semi-major axis or the energy to tell it from a long ellipse or a hyperbola.",
    );
  }
  if (radiusKm !== null && periapsisKm < radiusKm) {
    remarks.push(
      `the periapsis lies ${Number((radiusKm - periapsisKm).toPrecision(6))} km below the equatorial radius of ${radiusKm} km.`,
    );
  }
  return remarks;
}
