import type { Dimension } from "./quantity.ts";

/**
 * A measure of a conic orbit as a product of powers: factor · pᵃ · μᵇ · (1 + e)ᶜ · |1 − e|ᵈ, with p the semi-latus rectum
 * and μ the gravitational parameter. Every measure but the eccentricity itself has this form, for ellipse and hyperbola alike.
 */
export interface Measure {
  /** How messages call it. */
  readonly word: string;
  readonly dimension: Dimension;
  readonly factor: number;
  /** The powers a, b, c, d. */
  readonly rectum: number;
  readonly gm: number;
  readonly plus: number;
  readonly minus: number;
  /** Whether only a closed orbit has it. */
  readonly closedOnly: boolean;
}

function measure(
  word: string,
  dimension: Dimension,
  [rectum, gm, plus, minus]: readonly [number, number, number, number],
  factor = 1,
  closedOnly = false,
): Measure {
  return { word, dimension, factor, rectum, gm, plus, minus, closedOnly };
}

/** The measures of a conic orbit, by the name of the orbit's field. Semi-major axis and energy stand for their amounts. */
export type MeasureName =
  | "periapsisKm"
  | "apoapsisKm"
  | "semiMajorAxisKm"
  | "semiMinorAxisKm"
  | "semiLatusRectumKm"
  | "periapsisSpeedKmS"
  | "apoapsisSpeedKmS"
  | "circularSpeedKmS"
  | "specificEnergyKm2S2"
  | "angularMomentumKm2S"
  | "periodSeconds"
  | "gravitationalParameterKm3S2";

let table: Readonly<Record<MeasureName, Measure>> | undefined; // made at the first call, not when the module loads

/**
 * Gives the measures of a conic orbit.
 *
 * Source: the relations of the two-body problem as in any textbook, such as R. R. Bate, D. D. Mueller and J. E. White,
 * *Fundamentals of Astrodynamics* (1971), ch. 1.
 */
export function measures(): Readonly<Record<MeasureName, Measure>> {
  table ??= makeMeasures();
  return table;
}

function makeMeasures(): Readonly<Record<MeasureName, Measure>> {
  return {
    periapsisKm: measure("periapsis distance", "length", [1, 0, -1, 0]),
    apoapsisKm: measure("apoapsis distance", "length", [1, 0, 0, -1], 1, true),
    semiMajorAxisKm: measure("semi-major axis", "length", [1, 0, -1, -1]),
    semiMinorAxisKm: measure("semi-minor axis", "length", [1, 0, -0.5, -0.5]),
    semiLatusRectumKm: measure("semi-latus rectum", "length", [1, 0, 0, 0]),
    periapsisSpeedKmS: measure("periapsis speed", "speed", [-0.5, 0.5, 1, 0]),
    apoapsisSpeedKmS: measure("apoapsis speed", "speed", [-0.5, 0.5, 0, 1], 1, true),
    circularSpeedKmS: measure("circular speed", "speed", [-0.5, 0.5, 0.5, 0.5], 1, true),
    specificEnergyKm2S2: measure("specific energy", "energy", [-1, 1, 1, 1], 0.5),
    angularMomentumKm2S: measure("angular momentum", "momentum", [0.5, 0.5, 0, 0]),
    periodSeconds: measure("period", "time", [1.5, -0.5, -1.5, -1.5], 2 * Math.PI, true),
    gravitationalParameterKm3S2: measure("gravitational parameter", "gm", [0, 1, 0, 0]),
  };
}

/** What fixes an orbit: its shape, semi-latus rectum (km) and gravitational parameter (km³/s²). */
export interface Fixed {
  readonly shape: { readonly plus: number; readonly minus: number };
  readonly rectum: number;
  readonly gm: number;
}

/** Gives the amount of a measure, in its base unit; meaningless for what the orbit does not have. */
export function amountOf(m: Measure, { shape, rectum, gm }: Fixed): number {
  const form = m.minus === 0 ? shape.plus ** m.plus : shape.plus ** m.plus * shape.minus ** m.minus;
  return m.factor * form * rectum ** m.rectum * gm ** m.gm;
}
