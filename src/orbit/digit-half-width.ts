/**
 * Gives half a unit of the last digit that a number is written with: what it may be off by when it was rounded to those digits.
 *
 * @param given a text that begins with a decimal number, or a number (its shortest decimal form counts); `2.77au`, `7000`, `1.5e4`
 * @param value what it comes to in the base unit
 * @returns the half-width in the base unit; 0 where the text is no number
 */
export function digitHalfWidth(given: number | string, value: number): number {
  const match = /^\s*[+-]?(\d*)\.?(\d*)(?:[eE]([+-]?\d+))?/.exec(String(given));
  if (!match) return 0;
  const [whole = "", decimals = "", exponent = "0"] = match.slice(1);
  const number = Number(`${whole || "0"}.${decimals || "0"}e${exponent}`);
  const unit = 10 ** (Number(exponent) - decimals.length);
  const factor = number === 0 ? 1 : Math.abs(value) / number;
  return 0.5 * unit * factor;
}
