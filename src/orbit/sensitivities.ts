import { completeEllipticIntegrals } from "./ellipse-circumference.ts";
import { type Measure, type MeasureName, measures } from "./measure.ts";
import type { OrbitField } from "./orbit.ts";
import type { Item } from "./orbit-given.ts";
import type { Shape } from "./shape.ts";

type Vector = readonly [number, number, number];

/** Below this eccentricity the derivatives are taken here: rounding itself makes such ellipses of circles. */
const LEAST_ECCENTRICITY = 1e-8;

/**
 * Gives how much each field of an orbit changes, relatively, for a relative change of what it was made from.
 *
 * The eccentricity of a closed orbit counts as such, not relatively. What was given counts as it is: 0.
 *
 * @param items the three items
 * @param shape the shape that they fix
 * @returns by field the sum over the items; `Infinity` where the first derivative is without bound
 *
 * Method: the logarithms of the measures are linear in ln p and ln μ, and their derivatives by e are elementary; so the
 * inverse of a 3×3 matrix tells all.
 */
export function sensitivities(items: readonly Item[], shape: Shape): Readonly<Record<OrbitField, number>> {
  const e = shape.closed ? Math.max(shape.e, LEAST_ECCENTRICITY) : shape.e;
  const { plus, minus } = e === shape.e ? shape : { plus: 1 + e, minus: 1 - e };
  const rowOf = (m: Measure, extra = 0): Vector => [
    m.rectum,
    m.gm,
    m.plus / plus + (m.minus === 0 ? 0 : ((shape.closed ? -1 : 1) * m.minus) / minus) + extra,
  ];
  const table = measures();
  const given = items.map((item): Vector => {
    const itself = item.name === null || item.says === "parabola";
    return itself ? [0, 0, 1] : rowOf(table[item.name as MeasureName]);
  });
  const [a, b, c] = given as unknown as readonly [Vector, Vector, Vector];
  const columns = [cross(b, c), cross(c, a), cross(a, b)] as const;
  const determinant = dot(a, columns[0]);
  const of = (row: Vector): number => {
    let sum = 0;
    columns.forEach((column, i) => {
      const { weight, says } = items[i] as Item;
      const fixed = says === "parabola";
      if (!fixed && weight > 0) sum += Math.abs(dot(row, column) / determinant) * weight;
    });
    return Number.isNaN(sum) ? Infinity : sum;
  };
  const result = {} as Record<OrbitField, number>;
  for (const name of Object.keys(table) as MeasureName[]) result[name] = of(rowOf(table[name]));
  result.eccentricity = of([0, 0, shape.closed ? 1 : 1 / shape.e]);
  result.meanSpeedKmS = shape.closed ? of(rowOf(table.circularSpeedKmS, circumferenceSlope(e, plus * minus))) : 0;
  result.periapsisHeightKm = result.periapsisKm;
  result.apoapsisHeightKm = result.apoapsisKm;
  for (const { field, name } of items) {
    result[field] = 0;
    if (name === "periapsisKm") result.periapsisKm = result.periapsisHeightKm = 0;
    if (name === "apoapsisKm") result.apoapsisKm = result.apoapsisHeightKm = 0;
  }
  return result;
}

/** d ln E/de = (E − K)/(e E), for the circumference of an ellipse. */
function circumferenceSlope(e: number, complement: number): number {
  if (e < 1e-4) return -e / 2;
  const [k, whole] = completeEllipticIntegrals(complement);
  return (whole - k) / (e * whole);
}

function dot(a: Vector, b: Vector): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

function cross(a: Vector, b: Vector): Vector {
  return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
}
