/**
 * Gives a number with its thousands set apart by spaces: `4 459 633 000`, `362 312.45`, `-0.02`.
 *
 * @param value  a finite number below 1e21 in size
 * @param digits decimals; below zero the number is rounded to tens, hundreds and so on, and zeros fill those places
 */
export function groupedNumber(value: number, digits: number): string {
  const step = 10 ** Math.max(-digits, 0);
  const text = (Math.round(Math.abs(value) / step) * step).toFixed(0);
  const plain = digits > 0 ? Math.abs(value).toFixed(digits) : text;
  const point = plain.indexOf(".");
  const whole = point < 0 ? plain : plain.slice(0, point);
  let grouped = whole.slice(0, whole.length % 3 || 3);
  for (let i = grouped.length; i < whole.length; i += 3) grouped += ` ${whole.slice(i, i + 3)}`;
  const sign = value < 0 && /[1-9]/.test(plain) ? "-" : "";
  return sign + grouped + (point < 0 ? "" : plain.slice(point));
}
