/**
 * Gives the double nearest to a decimal with so many digits after the point.
 *
 * Answers hold milliseconds, metres and 1e-12 au and nothing finer, so that engines whose sines differ in the last bit
 * print them alike.
 *
 * @param value    below 9e15 / 10^decimals in size, so that the whole number of parts is exact
 * @param decimals 0 … 15
 */
export function rounded(value: number, decimals: number): number {
  const parts = 10 ** decimals;
  // dividing a whole number by an exact power of ten rounds once, to the double nearest to the decimal
  return Math.round(value * parts) / parts;
}
