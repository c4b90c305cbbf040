/** An interval of a number line. */
export interface Interval {
  readonly from: number;
  readonly to: number;
}

/**
 * Gives the intervals that lie inside one of each of two lists.
 *
 * @param a in order, not overlapping
 * @param b likewise
 */
export function commonIntervals(a: readonly Interval[], b: readonly Interval[]): Interval[] {
  const common: Interval[] = [];
  for (let i = 0, j = 0; i < a.length && j < b.length; ) {
    const x = a[i] as Interval;
    const y = b[j] as Interval;
    const from = Math.max(x.from, y.from);
    const to = Math.min(x.to, y.to);
    if (from < to) common.push({ from, to });
    if (x.to < y.to) i++;
    else j++;
  }
  return common;
}
