/**
 * Rounds the parts of a sum to whole numbers that add up to the rounded sum.
 *
 * Each part is rounded to nearest; where the parts then fail the sum by one or two, those are moved that were rounded furthest the
 * other way. Each stays within 1 of its own value.
 *
 * @param parts the parts
 * @returns the rounded parts, in order
 */
export function roundedParts(parts: readonly number[]): number[] {
  const total = Math.round(parts.reduce((sum, part) => sum + part, 0));
  const whole = parts.map((part) => Math.round(part));
  for (let missing = total - sumOf(whole); missing !== 0; missing = total - sumOf(whole)) {
    const way = Math.sign(missing);
    const lacks = parts.map((part, i) => way * (part - (whole[i] ?? 0)));
    const most = lacks.indexOf(Math.max(...lacks));
    whole[most] = (whole[most] ?? 0) + way;
  }
  return whole;
}

function sumOf(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0);
}
