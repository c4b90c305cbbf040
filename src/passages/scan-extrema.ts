import type { Pair } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { Span } from "../ephemeris/source.ts";
import { brentMinimum } from "../numeric/brent-minimum.ts";
import { brentZero } from "../numeric/brent-zero.ts";
import type { RangeFunction } from "./range-function.ts";

/** An extremum of a distance: kind and instant (TDB seconds past J2000). */
export interface Extremum {
  readonly kind: ApsisKind;
  readonly tdb: number;
}

/**
 * Half the width of the last bracket of a zero of the range rate, seconds; absolute. The chord over it is then off by less
 * than 2·10⁻⁵ s (measured on all passages of the Moon and the Earth, 1960–2059).
 */
const ZERO_TOLERANCE = 8;
/** The same where only distances are known; the flatness of the distance is the true limit, see `brentMinimum`. */
const MINIMUM_TOLERANCE = 0.05;
/** How near the place is found where a range rate that keeps its sign comes nearest to zero, seconds. */
const TURN_TOLERANCE = 1;

/**
 * Finds the extrema of a distance one after the other.
 *
 * The function is sampled on a grid fixed in time (multiples of `step` past J2000), so that an extremum is found from
 * the same samples, to the bit, wherever a search begins. A change of sign of the range rate brackets an extremum, which
 * Brent's zero finder refines; where three samples keep their sign but the middle one is nearest to zero, the turning
 * point between them is found by Brent's minimiser, and if it lies across zero, two extrema have been hiding.
 * Without range rate, three distances of which the middle one is extreme bracket an extremum for Brent's minimiser.
 *
 * @param range the distance function
 * @param span  where it may be evaluated
 * @param pair  the pair, for its seconds from sample to sample (well under a quarter of the shortest interval between extrema) and half
 *   the width of the last bracket; where that is left out, one that suits the planets and the Moon
 * @param from  where to begin: no extremum at or after it is missed; earlier ones may come first
 * @param until where the search may end: none before it is missed; later ones may follow
 * @returns a function that gives the next extremum, `null` after the last one
 *
 * Method: R. P. Brent, *Algorithms for Minimization without Derivatives* (1973).
 */
export function scanExtrema(
  range: RangeFunction,
  span: Span,
  pair: Pick<Pair<string>, "sampleSeconds" | "toleranceSeconds">,
  from: number,
  until = Infinity,
): () => Extremum | null {
  const samples = samplesOf(span, pair.sampleSeconds, from);
  return range.givesRate
    ? scanByRate(range, samples, until, pair.toleranceSeconds ?? ZERO_TOLERANCE)
    : scanByDistance(range, samples, until, pair.toleranceSeconds ?? MINIMUM_TOLERANCE);
}

interface Samples {
  readonly startsAtEdge: boolean;
  readonly first: number;
  /** Moves to the next sample; `NaN` after the span's end. */
  next(): number;
}

/** The samples of a grid inside a span, its two ends included; the first lies up to two steps before `from`, or at the span's start. */
function samplesOf(span: Span, step: number, from: number): Samples {
  let index = Math.floor(Math.max(from, span.from) / step);
  while (index * step <= span.from) index++;
  const startsAtEdge = (index - 1) * step <= span.from;
  let at = startsAtEdge ? span.from : (index - 1) * step;
  return {
    startsAtEdge,
    first: at,
    next() {
      if (at >= span.to) return Number.NaN;
      at = Math.min(index * step, span.to);
      index++;
      return at;
    },
  };
}

function scanByRate(range: RangeFunction, samples: Samples, until: number, tolerance: number): () => Extremum | null {
  const { rate } = range;
  // Three samples in a row: a, b, c. Before the span's start the rate counts as infinite, so that a turn at the edge is seen.
  let a = samples.first;
  let b = a;
  let fb = rate(b);
  let fa = samples.startsAtEdge ? (fb < 0 ? -Infinity : Infinity) : fb;
  let pending: Extremum | null = null; // the second of two that were hiding
  let ended = false;
  const refine = (x: number, fx: number, y: number, fy: number): Extremum => ({
    kind: fx < 0 ? "periapsis" : "apoapsis",
    tdb: brentZero(rate, x, fx, y, fy, tolerance),
  });
  return () => {
    if (pending) {
      const second = pending;
      pending = null;
      return second;
    }
    while (!ended && a <= until) {
      let c = samples.next();
      let fc: number;
      if (Number.isNaN(c)) {
        ended = true;
        c = b;
        fc = fb < 0 ? -Infinity : Infinity;
      } else {
        fc = rate(c);
      }
      const start = a;
      const turnsAtB =
        fa < 0 === fb < 0 &&
        fb < 0 === fc < 0 &&
        Math.abs(fb) < Math.abs(fa) &&
        Math.abs(fb) <= Math.abs(fc) &&
        start < c;
      const x = b;
      const fx = fb;
      a = b;
      fa = fb;
      b = c;
      fb = fc;
      if (turnsAtB) {
        const sign = fx < 0 ? -1 : 1;
        const turn = brentMinimum((t) => sign * rate(t), start, c, Math.min(TURN_TOLERANCE, tolerance));
        const fturn = rate(turn);
        if (fturn < 0 !== fx < 0) {
          const before = turn > x ? x : start;
          const after = turn > x ? c : x;
          pending = refine(turn, fturn, after, rate(after));
          return refine(before, rate(before), turn, fturn);
        }
      } else if (fx < 0 !== fc < 0) {
        return refine(x, fx, c, fc);
      }
    }
    return null;
  };
}

function scanByDistance(
  range: RangeFunction,
  samples: Samples,
  until: number,
  tolerance: number,
): () => Extremum | null {
  const { distance } = range;
  let a = samples.first;
  let fa = distance(a);
  let b = samples.next();
  let fb = Number.isNaN(b) ? fa : distance(b);
  return () => {
    for (let c = samples.next(); !Number.isNaN(c) && a <= until; c = samples.next()) {
      const fc = distance(c);
      const low = fb < fa && fb <= fc;
      const high = fb > fa && fb >= fc;
      const start = a;
      a = b;
      fa = fb;
      b = c;
      fb = fc;
      if (!low && !high) continue;
      const sign = low ? 1 : -1;
      return {
        kind: low ? "periapsis" : "apoapsis",
        tdb: brentMinimum((t) => sign * distance(t), start, c, tolerance),
      };
    }
    return null;
  };
}
