/** A half-width rounded for print, and the decimals that a value beside it deserves. */
export interface HalfWidth {
  readonly value: number;
  /** Decimals of the half-width and of the value it belongs to; below zero for tens, hundreds and so on. */
  readonly digits: number;
}

/**
 * Gives a half-width as it is printed behind a value: `147 099 894.1 ± 0.3`.
 *
 * It is rounded up, to one significant digit, or two where the first is a 1 (so that rounding never widens it by more
 * than half). The value is rounded to the same place, which moves it by half a unit of that place at most. Common
 * practice, after the *Guide to the Expression of Uncertainty in Measurement* (JCGM 100:2008), 7.2.6 (from memory).
 *
 * @param halfWidth above zero
 * @param finest    most decimals that are printed, whatever the half-width
 */
export function printedHalfWidth(halfWidth: number, finest = 3): HalfWidth {
  const exponent = Math.floor(Math.log10(Math.max(halfWidth, Number.MIN_VALUE)));
  const digits = Math.min(finest, halfWidth / 10 ** exponent < 2 ? 1 - exponent : 0 - exponent);
  const parts = 10 ** digits;
  // a hair is taken off so that 0.3, which is 0.3 / 0.1 = 3.0000000000000004 parts, stays 0.3
  return { value: Math.ceil(halfWidth * parts * (1 - 1e-9)) / parts, digits };
}
