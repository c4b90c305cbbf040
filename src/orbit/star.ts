import { AU_KM, DAY_SECONDS } from "../bodies/constants.ts";
import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";
import { digitHalfWidth } from "./digit-half-width.ts";
import { type TrackTime, trackTime } from "./track-time.ts";

/** The numbers of a star's orbit, by name; errors go by the same names. */
const STAR_FIELDS = [
  "periastronAt",
  "periodDays",
  "eccentricity",
  "argumentDeg",
  "k1KmS",
  "k2KmS",
  "inclinationDeg",
  "semiMajorAxisArcsec",
  "parallaxMas",
] as const;
/** A number of a star's orbit. */
export type StarField = (typeof STAR_FIELDS)[number];

/**
 * The orbit of a binary star, as a caller writes it.
 *
 * Size: `semiMajorAxisArcsec` and `parallaxMas` (the relative orbit), or `k1KmS` and `k2KmS` (with `inclinationDeg`, else times its sine), or
 * `k1KmS` alone (the first star about the barycentre, times the sine). The light-travel time across the orbit needs `k1KmS` and `argumentDeg`.
 */
export interface StarGiven {
  /** What to call the pair, such as `star-b-star-a`. */
  readonly name: string;
  /** When the light of a periastron passage arrives at the solar-system barycentre: `JD 2455000.123` (TDB), ISO 8601 text, or TDB seconds past J2000. */
  readonly periastronAt: TrackTime;
  readonly periodDays: number;
  readonly eccentricity: number;
  /** Argument of periastron of the first star, whose light is timed: that of its radial velocities. */
  readonly argumentDeg?: number | null | undefined;
  /** Semi-amplitudes of the radial velocities of the first and the second star. */
  readonly k1KmS?: number | null | undefined;
  readonly k2KmS?: number | null | undefined;
  readonly inclinationDeg?: number | null | undefined;
  /** Of the relative orbit. */
  readonly semiMajorAxisArcsec?: number | null | undefined;
  readonly parallaxMas?: number | null | undefined;
  /**
   * Standard errors, as published (one deviation), by field, in its unit; of `periastronAt` days. A field without one counts as rounded to
   * the digits it is written with; 0 says that it is exact.
   */
  readonly sigma?: Readonly<Partial<Record<StarField, number>>> | null | undefined;
  /** Or the whole covariance matrix, in the order of its fields, in the same units. */
  readonly covariance?:
    | { readonly fields: readonly StarField[]; readonly matrix: readonly (readonly number[])[] }
    | null
    | undefined;
}

/** A star's orbit, read. `values` are in the units of the fields; of `periastronAt` days from `epochTdb`. Frozen. */
export interface Star {
  readonly name: string;
  readonly epochTdb: number;
  readonly values: Readonly<Partial<Record<StarField, number>>>;
  readonly fields: readonly StarField[];
  /** Covariance by the order of `fields`. */
  readonly covariance: readonly (readonly number[])[];
  readonly errorsGiven: boolean;
}

/** Deviations of a normal law that hold 95 %. */
export const DEVIATIONS = 1.96;
const OTHERS = ["name", "sigma", "covariance"];
const bad = (message: string) => new ApsidaryError("bad-input", message);

/**
 * Reads the orbit of a binary star.
 *
 * @throws ApsidaryError `bad-input`: what is missing, unknown, out of range; a covariance that is none
 */
export function readStar(given: StarGiven): Star {
  if (typeof given !== "object" || given === null || Array.isArray(given)) throw bad("a star's orbit is an object.");
  const { name } = given;
  if (typeof name !== "string" || name === "") throw bad("a star's orbit needs a name for its pair.");
  for (const [key, value] of Object.entries(given)) {
    const known = [...OTHERS, ...STAR_FIELDS];
    if (value == null || known.includes(key)) continue;
    const near = nearestName(key, known);
    throw bad(
      `${name}: ${JSON.stringify(key.slice(0, 40))} is no element of a star${near ? `; did you mean "${near}"?` : "."} There are ${known.join(", ")}.`,
    );
  }
  const values: Partial<Record<StarField, number>> = { periastronAt: 0 };
  for (const field of STAR_FIELDS) {
    const value = given[field] ?? null;
    if (field === "periastronAt" || value === null) continue;
    if (typeof value !== "number" || !Number.isFinite(value)) {
      throw bad(`${name}: ${field} is ${JSON.stringify(value)?.slice(0, 40)}, no number.`);
    }
    if (value <= 0 && !["eccentricity", "argumentDeg"].includes(field)) {
      throw bad(`${name}: ${field} is ${value}; it must be above zero.`);
    }
    values[field] = value;
  }
  if ((given.periastronAt ?? null) === null) throw bad(`${name}: periastronAt is missing.`);
  const { tdb, halfWidth } = trackTime(given.periastronAt, "tdb", `${name}: periastronAt`);
  for (const field of ["periodDays", "eccentricity"] as const) {
    if (values[field] === undefined) throw bad(`${name}: ${field} is missing.`);
  }
  const e = values.eccentricity as number;
  if (!(e >= 0 && e < 1)) throw bad(`${name}: the eccentricity is ${e}; a binary's is 0 up to 1.`);
  const visual = values.semiMajorAxisArcsec !== undefined && values.parallaxMas !== undefined;
  if (!visual && values.k1KmS === undefined) {
    throw bad(
      `${name}: the size is missing: give semiMajorAxisArcsec and parallaxMas, or k1KmS (and k2KmS, inclinationDeg).`,
    );
  }
  const fields = STAR_FIELDS.filter((field) => values[field] !== undefined);
  return Object.freeze({
    name,
    epochTdb: tdb,
    values: Object.freeze(values),
    fields: Object.freeze(fields),
    covariance: covarianceOf(given, fields, (field) =>
      field === "periastronAt"
        ? halfWidth / DAY_SECONDS
        : digitHalfWidth(values[field] as number, values[field] as number),
    ),
    errorsGiven: given.sigma != null || given.covariance != null,
  });
}

function covarianceOf(
  { name, sigma, covariance }: StarGiven,
  fields: readonly StarField[],
  writtenHalfWidth: (field: StarField) => number,
): number[][] {
  const told: readonly string[] = covariance?.fields ?? Object.keys(sigma ?? {});
  const whole = fields.map((field, i) =>
    fields.map((_, j) => (i === j && !told.includes(field) ? (writtenHalfWidth(field) / DEVIATIONS) ** 2 : 0)),
  );
  const placeOf = (field: string): number => {
    const place = (fields as readonly string[]).indexOf(field);
    if (place >= 0) return place;
    throw bad(`${name}: there is an error of ${JSON.stringify(String(field).slice(0, 40))} but no such element.`);
  };
  for (const [field, value] of Object.entries(sigma ?? {})) {
    if (value == null) continue;
    if (!(typeof value === "number" && value >= 0 && Number.isFinite(value))) {
      throw bad(`${name}: the error of ${field} is ${JSON.stringify(value)}; it must be zero or above.`);
    }
    const i = placeOf(field);
    (whole[i] as number[])[i] = value * value;
  }
  if (covariance == null) return whole;
  if (sigma != null) throw bad(`${name}: sigma and covariance say the same; leave one of them out.`);
  const { fields: own, matrix } = covariance;
  const square = Array.isArray(own) && Array.isArray(matrix) && matrix.length === own.length;
  if (!square || matrix.some((row) => !Array.isArray(row) || row.length !== own.length)) {
    throw bad(`${name}: covariance is { "fields": […], "matrix": [[…] …] } with a row and a column for each field.`);
  }
  own.forEach((field, i) => {
    own.forEach((other, j) => {
      const value = matrix[i]?.[j];
      const limit = Math.sqrt((matrix[i]?.[i] ?? -1) * (matrix[j]?.[j] ?? -1));
      if (typeof value !== "number" || !(Math.abs(value) <= limit * (1 + 1e-9)) || matrix[j]?.[i] !== value) {
        throw bad(
          `${name}: no covariance: that of ${field} and ${other} must be the same both ways and at most the root of the variances' product.`,
        );
      }
      (whole[placeOf(field)] as number[])[placeOf(other)] = value;
    });
  });
  return whole;
}

/** Speed of light, km/s; exact. */
const LIGHT = 299_792.458;

/** What a star's elements come to. */
export interface StarOrbit {
  readonly periodSeconds: number;
  readonly eccentricity: number;
  /** What distances are of, km; see `StarGiven`. */
  readonly semiMajorAxisKm: number;
  /** a₁ sin i of the first star in seconds of light; `null` where it is not known. */
  readonly lightSeconds: number | null;
  readonly argument: number;
  /** Seconds by which the light of apastron is later than half a period after that of periastron. */
  readonly apastronDelay: number;
}

/**
 * Gives the orbit of a star's elements.
 *
 * Light-travel time: the first star stands z = a₁ sin i (r/a) sin(ν + ω) beyond the barycentre, and its light is late by z/c: at periastron by
 * a₁ sin i (1 − e) sin ω / c, at apastron by −a₁ sin i (1 + e) sin ω / c; the difference is −2 a₁ sin i sin ω / c.
 */
export function starOrbit(values: Star["values"]): StarOrbit {
  const periodSeconds = (values.periodDays as number) * DAY_SECONDS;
  const eccentricity = values.eccentricity as number;
  const perVelocity = (periodSeconds * Math.sqrt(1 - eccentricity * eccentricity)) / (2 * Math.PI);
  const { k1KmS: k1, k2KmS: k2, inclinationDeg, semiMajorAxisArcsec, parallaxMas, argumentDeg } = values;
  const sine = inclinationDeg === undefined ? 1 : Math.sin((inclinationDeg * Math.PI) / 180);
  const semiMajorAxisKm =
    semiMajorAxisArcsec !== undefined && parallaxMas !== undefined
      ? (semiMajorAxisArcsec / (parallaxMas / 1000)) * AU_KM
      : (perVelocity * ((k1 as number) + (k2 ?? 0))) / sine;
  const known = k1 !== undefined && argumentDeg !== undefined;
  const lightSeconds = known ? (k1 * perVelocity) / LIGHT : null;
  const argument = ((argumentDeg ?? 0) * Math.PI) / 180;
  return {
    periodSeconds,
    eccentricity,
    semiMajorAxisKm,
    lightSeconds,
    argument,
    apastronDelay: lightSeconds === null ? 0 : -2 * lightSeconds * Math.sin(argument),
  };
}
