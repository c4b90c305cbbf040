/**
 * Gives the index of the interval of a rising list in which a number lies: the last one of `values` that is not above it,
 * but never the last of all; below the first, 0.
 *
 * @param values rising, at least two
 */
export function intervalAt(values: Float64Array, x: number): number {
  let low = 0;
  let high = values.length - 1;
  while (high - low > 1) {
    const half = (low + high) >> 1;
    if ((values[half] as number) <= x) low = half;
    else high = half;
  }
  return low;
}
