import { brentMinimum } from "../numeric/brent-minimum.ts";
import { brentZero } from "../numeric/brent-zero.ts";

/** A stretch of time. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
}

/**
 * Gives the stretches of time in which a smooth function is above zero.
 *
 * Samples, Brent's zero finder between them, and his minimiser where three samples turn back towards zero, so that a stretch or a gap shorter
 * than a step is found as well.
 *
 * @param f         the function
 * @param from      first time
 * @param to        last time
 * @param step      between samples; well under a quarter of the function's period
 * @param tolerance of the ends
 */
export function stretchesAbove(
  f: (t: number) => number,
  from: number,
  to: number,
  step: number,
  tolerance: number,
): Stretch[] {
  if (!(from < to)) return [];
  const crossings: number[] = [];
  const count = Math.max(2, Math.ceil((to - from) / step));
  const at = (i: number) => (i === count ? to : from + ((to - from) * i) / count);
  const first = f(from);
  const cross = (a: number, fa: number, b: number, fb: number): void => {
    if (fa > 0 !== fb > 0) crossings.push(brentZero(f, a, fa, b, fb, tolerance));
  };
  let before = Number.NaN;
  let a = from;
  let fa = first;
  let fb = f(at(1));
  for (let i = 1; i <= count; i++) {
    const b = at(i);
    const next = i < count ? f(at(i + 1)) : Number.NaN;
    // an extremum of the other sign may hide in a–b where both ends have one sign and the samples beside them lie farther off
    if (fa > 0 === fb > 0) {
      const sign = fa > 0 ? -1 : 1; // upwards where both are below
      const turnsBefore = Number.isNaN(before) || sign * fa >= sign * before;
      const turnsAfter = Number.isNaN(next) || sign * fb >= sign * next;
      if (turnsBefore && turnsAfter && Math.min(Math.abs(fa), Math.abs(fb)) < reach(before, fa, fb, next)) {
        const top = brentMinimum((t) => -sign * f(t), a, b, tolerance);
        const ft = f(top);
        if (ft > 0 !== fa > 0) {
          cross(a, fa, top, ft);
          cross(top, ft, b, fb);
        }
      }
    } else cross(a, fa, b, fb);
    before = fa;
    a = b;
    fa = fb;
    fb = next;
  }
  const ends = [...(first > 0 ? [from] : []), ...crossings];
  const stretches: Stretch[] = [];
  for (let i = 0; i < ends.length; i += 2) stretches.push({ from: ends[i] as number, to: ends[i + 1] ?? to });
  return stretches;
}

/** How far a smooth function may go beyond two samples in between: four times what its second differences make of it. */
function reach(before: number, a: number, b: number, after: number): number {
  const second = Math.max(Math.abs(before - 2 * a + b) || 0, Math.abs(a - 2 * b + after) || 0);
  return Number.isNaN(before) || Number.isNaN(after) ? Infinity : second / 2;
}
