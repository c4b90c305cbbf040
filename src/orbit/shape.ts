import { brentZero } from "../numeric/brent-zero.ts";

/** Kinds of conic orbit. */
export type Conic = "circle" | "ellipse" | "parabola" | "hyperbola";

/** The shape of a conic, with 1 + e and |1 − e| each to its own full precision. */
export interface Shape {
  readonly closed: boolean;
  readonly e: number;
  /** 1 + e */
  readonly plus: number;
  /** |1 − e|; 0 for the parabola */
  readonly minus: number;
}

/** Rounding that carries a circle just past the end of what is possible is put down to rounding. */
const SLACK = 1e-13;

/** Gives the shape of an eccentricity. */
export function shapeOf(e: number): Shape {
  return { closed: e < 1, e, plus: 1 + e, minus: Math.abs(1 - e) };
}

/**
 * Finds every shape whose (1 + e)ᶜ · |1 − e|ᵈ has a given value.
 *
 * @param c     power of 1 + e
 * @param d     power of |1 − e|; not both zero
 * @param value the value, above zero
 * @returns the shapes, closed ones first, each family in order of eccentricity; none where the value is out of reach
 *
 * Method: closed forms where there are such; else zeros by Brent's method in y = ln((1 + e)/|1 − e|), in which neither end
 * of the scale loses digits, between the ends and the one turning point that the product can have.
 */
export function shapesWith(c: number, d: number, value: number): Shape[] {
  if (d === 0) return ofPlus(value ** (1 / c));
  if (c === 0) return ofMinus(value ** (1 / d));
  if (c === -d) return ofRatio(value ** (1 / c));
  if (c === d) return ofProduct(value ** (1 / c));
  return [...search(c, d, Math.log(value), true), ...search(c, d, Math.log(value), false)];
}

const CIRCLE: Shape = { closed: true, e: 0, plus: 1, minus: 1 };

function ofPlus(plus: number): Shape[] {
  if (plus < 1) return plus > 1 - SLACK ? [CIRCLE] : [];
  const minus = Math.abs(2 - plus);
  if (minus <= 4 * 2 ** -52) return [{ closed: false, e: 1, plus: 2, minus: 0 }]; // no double tells it from a parabola
  return [{ closed: plus < 2, e: plus - 1, plus, minus }];
}

function ofMinus(minus: number): Shape[] {
  const open: Shape = { closed: false, e: 1 + minus, plus: 2 + minus, minus };
  if (minus > 1) return minus < 1 + SLACK ? [CIRCLE, open] : [open];
  return [{ closed: true, e: 1 - minus, plus: 2 - minus, minus }, open];
}

function ofRatio(ratio: number): Shape[] {
  if (ratio <= 1) return ratio > 1 - SLACK ? [CIRCLE] : [];
  const shape = (closed: boolean, sum: number, difference: number): Shape => ({
    closed,
    e: difference / sum,
    plus: (2 * ratio) / sum,
    minus: 2 / sum,
  });
  return [shape(true, ratio + 1, ratio - 1), shape(false, ratio - 1, ratio + 1)];
}

function ofProduct(product: number): Shape[] {
  const shape = (closed: boolean, e: number): Shape => ({ closed, e, plus: 1 + e, minus: product / (1 + e) });
  const open = shape(false, Math.sqrt(1 + product));
  if (product > 1) return product < 1 + SLACK ? [CIRCLE, open] : [open];
  return [shape(true, Math.sqrt(1 - product)), open];
}

/** y from 0 (circle; for the hyperbola e without bound) to 700 (|1 − e| = 10⁻³⁰⁴). */
const LARGEST_Y = 700;
const LEAST_OPEN_Y = 1e-15;

function search(c: number, d: number, wanted: number, closed: boolean): Shape[] {
  const logPlus = (y: number) => Math.LN2 - Math.log(closed ? 1 + Math.exp(-y) : -Math.expm1(-y));
  const f = (y: number) => (c + d) * logPlus(y) - d * y - wanted;
  const slope = (y: number) => {
    const { plus, minus } = shapeAt(y, closed);
    return closed ? (c * minus - d * plus) / 2 : -(c * minus + d * plus) / 2;
  };
  const least = closed ? 0 : LEAST_OPEN_Y;
  const turn = Math.log(((closed ? 1 : -1) * c) / d); // where the product is largest or least; NaN where it has no turn
  const turns = turn > least && turn < LARGEST_Y;
  const found: number[] = [];
  const between = (from: number, to: number): boolean => {
    const [before, after] = [f(from), f(to)];
    if (before === 0 || before < 0 === after < 0) return false;
    const y = brentZero(f, from, before, to, after, 0);
    const better = y - f(y) / slope(y); // one step of Newton's: Brent's last bracket is two spacings of numbers wide
    found.push(better > from && better < to && Math.abs(f(better)) <= Math.abs(f(y)) ? better : y);
    return true;
  };
  const first = between(least, turns ? turn : LARGEST_Y);
  if (!first && closed && Math.abs(f(0)) < SLACK) found.push(0);
  const second = turns && between(turn, LARGEST_Y);
  if (turns && !first && !second && Math.abs(f(turn)) < SLACK) found.push(turn);
  // two that rounding alone parts, about the turn, are one
  const [one = 0, two = 0] = found;
  if (first && second && two - one < 1e-6) found.splice(0, 2, turn);
  const shapes = found.map((y) => shapeAt(y, closed));
  return closed ? shapes : shapes.reverse();
}

function shapeAt(y: number, closed: boolean): Shape {
  if (closed) return { closed, e: Math.tanh(y / 2), plus: 2 / (1 + Math.exp(-y)), minus: 2 / (1 + Math.exp(y)) };
  return { closed, e: 1 / Math.tanh(y / 2), plus: -2 / Math.expm1(-y), minus: 2 / Math.expm1(y) };
}
