import { ApsidaryError } from "../error.ts";
import { amountOf, type Fixed, type Measure, type MeasureName, measures } from "./measure.ts";
import type { Item } from "./orbit-given.ts";
import { type Shape, shapeOf, shapesWith } from "./shape.ts";

/** What fixes an orbit, found. */
export interface FixedOrbit extends Fixed {
  readonly shape: Shape;
  /** An open shape that fits as well and was not taken. */
  readonly otherShape: Shape | null;
}

/** A measure that was given, with its powers. */
interface Row extends Measure {
  readonly item: Item;
}

const CHOICES =
  "distance or height of periapsis or apoapsis, semi-major or semi-minor axis, eccentricity, semi-latus rectum, " +
  "speed at periapsis or apoapsis, period, specific energy, angular momentum";

const bad = (message: string) => new ApsidaryError("bad-input", message);

/**
 * Finds shape, semi-latus rectum and gravitational parameter from three items.
 *
 * @param items what was given, the gravitational parameter of a named body included
 * @param about the named body; for messages
 * @throws ApsidaryError `bad-input`, naming which: too few, too many, contradictory; the far apsis of an open orbit; two orbits that fit
 *
 * Method: p and μ drop out of a product of powers of the three measures, which leaves one equation for the eccentricity.
 */
export function fixOrbit(items: readonly Item[], about: string | null): FixedOrbit {
  refuseMixedShapes(items);
  refuseCount(items, about);
  return solve(items);
}

function solve(items: readonly Item[]): FixedOrbit {
  const table = measures();
  const rows: Row[] = [];
  let given: Shape | null = null;
  for (const item of items) {
    if (item.name === null) given = shapeOf(item.amount);
    else if (item.says === "parabola") given = shapeOf(1);
    else rows.push({ ...table[item.name], item });
  }
  if (given) return { shape: given, ...sizeOf(rows, given, items), otherShape: null };
  const [shape, otherShape] = shapeFrom(rows, items);
  return { shape, ...sizeOf(rows, shape, items), otherShape };
}

function shapeFrom(rows: readonly Row[], items: readonly Item[]): [Shape, Shape | null] {
  const [a, b, c] = rows as [Row, Row, Row];
  // the powers of the three measures in the product from which p and μ have dropped out
  const weights = [
    b.rectum * c.gm - c.rectum * b.gm,
    c.rectum * a.gm - a.rectum * c.gm,
    a.rectum * b.gm - b.rectum * a.gm,
  ];
  if (weights.every((weight) => weight === 0)) throw sizeless(items);
  let plus = 0;
  let minus = 0;
  let value = 1;
  rows.forEach((row, i) => {
    const weight = weights[i] ?? 0;
    plus += weight * row.plus;
    minus += weight * row.minus;
    value *= (row.item.amount / row.factor) ** weight;
  });
  const bound = items.filter((item) => rows.some((row, i) => row.item === item && weights[i] !== 0));
  if (plus === 0 && minus === 0) throw dependent(bound, value);
  const says = items.find((item) => item.says !== null)?.says ?? null;
  const shapes = shapesWith(plus, minus, value).filter((s) => says === null || (says === "closed") === s.closed);
  const closed = shapes.filter((s) => s.closed);
  const [best, rival] = closed.length > 0 ? closed : shapes;
  if (!best) throw noneFits(items);
  if (rival) {
    throw bad(
      `two orbits fit ${list(items.map(named))}: of eccentricity ${short(best.e)} and ${short(rival.e)}. ` +
        "Give another measure instead of one of them.",
    );
  }
  return [best, shapes.find((s) => s !== best) ?? null];
}

/** p and μ from the two rows that depend least on the shape. */
function sizeOf(rows: readonly Row[], shape: Shape, items: readonly Item[]): { rectum: number; gm: number } {
  const pairs = rows
    .flatMap((a, i) => rows.slice(i + 1).map((b) => ({ a, b, determinant: a.rectum * b.gm - b.rectum * a.gm })))
    .filter(({ determinant }) => determinant !== 0);
  const dependence = ({ a, b }: { a: Row; b: Row }) =>
    Math.abs(a.plus) + Math.abs(a.minus) + Math.abs(b.plus) + Math.abs(b.minus);
  const [best] = pairs.sort((x, y) => dependence(x) - dependence(y));
  if (!best) throw sizeless(items);
  const { a, b, determinant } = best;
  const bare = (row: Row) => row.item.amount / amountOf({ ...row, rectum: 0, gm: 0 }, { shape, rectum: 1, gm: 1 });
  const [x, y] = [bare(a), bare(b)];
  return {
    rectum: x ** (b.gm / determinant) * y ** (-a.gm / determinant),
    gm: x ** (-b.rectum / determinant) * y ** (a.rectum / determinant),
  };
}

function list(parts: readonly string[]): string {
  return parts.length < 2 ? parts.join("") : `${parts.slice(0, -1).join(", ")} and ${parts.at(-1)}`;
}

const named = ({ word, shown }: Item) => `${word} ${shown}`;
const wordsOf = (items: readonly Item[]) => list(items.map((item) => item.word));
const short = (value: number) => String(Number(value.toPrecision(9)));

function refuseMixedShapes(items: readonly Item[]): void {
  const told = items.filter((item) => item.says !== null);
  const closed = told.find((item) => item.says === "closed");
  const open = told.find((item) => item.says !== "closed");
  const parabola = told.find((item) => item.says === "parabola");
  const hyperbola = told.find((item) => item.says === "hyperbola");
  if (closed && open) {
    const comesBack = told.find(
      (item) => item.name !== null && item.says === "closed" && measures()[item.name].closedOnly,
    );
    throw bad(
      comesBack
        ? `an open orbit has one apsis only and never comes back: with ${named(open)} there is no ${comesBack.word}. Leave one of them out.`
        : `the set contradicts itself: ${named(closed)} belongs to a closed orbit, ${named(open)} to a ${open.says}. Leave one of them out.`,
    );
  }
  if (parabola && hyperbola) {
    throw bad(
      `the set contradicts itself: ${named(hyperbola)} belongs to a hyperbola, ${named(parabola)} to a parabola. Leave one of them out.`,
    );
  }
  const axis = items.find((item) => item.name === "semiMinorAxisKm");
  if (parabola && axis)
    throw bad(`a parabola has no axes: with ${named(parabola)} there is no ${axis.word}. Leave one of them out.`);
}

function refuseCount(items: readonly Item[], about: string | null): void {
  const measured = items.filter((item) => item.name !== "gravitationalParameterKm3S2");
  const hasMass = items.length > measured.length;
  if (items.length < 3) {
    const have =
      measured.length === 0
        ? "too few: no measure of the orbit is given"
        : `too few: only ${wordsOf(measured)} ${measured.length > 1 ? "are" : "is"} given`;
    if (!hasMass && measured.length === 2)
      throw bad(`${have}; name the central body too, or give its gravitational parameter.`);
    const more = measured.length === 0 ? "two" : "one more";
    throw bad(`${have}; ${hasMass ? "give" : "name the central body, and give"} ${more} of ${CHOICES}.`);
  }
  if (items.length > 3) {
    const beside = hasMass
      ? ` besides ${about === null ? "the gravitational parameter" : `the central body ${about}`}`
      : "";
    throw bad(
      `too many: ${wordsOf(measured)} are given${beside}${agreement(items)}. Leave ${items.length - 3} of them out.`,
    );
  }
}

/** Whether what is more than enough agrees, in words; nothing where no three of them make an orbit. */
function agreement(items: readonly Item[]): string {
  const table = measures();
  for (const kept of triples(items)) {
    let fixed: FixedOrbit;
    try {
      fixed = solve(kept);
    } catch {
      continue;
    }
    for (const spare of items) {
      if (kept.includes(spare)) continue;
      const made = spare.name === null ? fixed.shape.e : amountOf(table[spare.name], fixed);
      const scale = spare.name === null ? 1 : made;
      if (!(Math.abs(made - spare.amount) <= 1e-6 * scale)) {
        const word = spare.name === null ? spare.word : table[spare.name].word;
        return ` and contradict each other: ${list(kept.map(named))} make the ${word} ${short(made)}, not ${short(spare.amount)}`;
      }
    }
    return ", and they agree";
  }
  return "";
}

function triples(items: readonly Item[]): Item[][] {
  return items.flatMap((a, i) => items.slice(i + 1).flatMap((b, j) => items.slice(i + j + 2).map((c) => [a, b, c])));
}

function sizeless(items: readonly Item[]): ApsidaryError {
  const table = measures();
  if (items.some((item) => item.name !== null && table[item.name].rectum < 0)) {
    return bad(
      `too few: ${wordsOf(items)} together fix no size; give a distance, the period, the angular momentum or the central body instead of one of them.`,
    );
  }
  const lengths = items.some((item) => item.name !== null && table[item.name].dimension === "length");
  return bad(
    lengths
      ? `too few: ${wordsOf(items)} together fix no mass; name the central body or give its gravitational parameter instead of one of them.`
      : `too few: ${wordsOf(items)} together fix no size; give a distance instead of one of them.`,
  );
}

function dependent(bound: readonly Item[], value: number): ApsidaryError {
  return bad(
    Math.abs(Math.log(value)) < 1e-6
      ? `too few: ${wordsOf(bound)} say the same, each follows from the rest; give another measure instead of one of them.`
      : `the set contradicts itself: ${list(bound.map(named))} cannot be together, each follows from the rest. Give another measure instead of one of them.`,
  );
}

/** Measures of a closed orbit from the least to the greatest, for the reason why none fits. */
const ORDERS: readonly (readonly MeasureName[])[] = [
  ["periapsisKm", "semiLatusRectumKm", "semiMinorAxisKm", "semiMajorAxisKm", "apoapsisKm"],
  ["apoapsisSpeedKmS", "periapsisSpeedKmS"],
];

function noneFits(items: readonly Item[]): ApsidaryError {
  for (const order of ORDERS) {
    const present = order.flatMap((name) => items.filter((item) => item.name === name));
    for (const [i, more] of present.entries()) {
      const less = present[i - 1];
      if (less && less.amount > more.amount) {
        return bad(
          `the set contradicts itself: the ${named(less)} must not exceed the ${named(more)}. Change one of them.`,
        );
      }
    }
  }
  return bad(`the set contradicts itself: no orbit has ${list(items.map(named))}. Change one of them.`);
}
