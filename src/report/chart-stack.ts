/** Where a part of a stacked bar begins and ends, in the unit of the parts. */
export interface StackedPart {
  readonly from: number;
  readonly to: number;
}

/**
 * Stacks the parts of a sum on both sides of nought: those above it upwards, those below it downwards, each in the order given.
 *
 * @param parts the parts
 * @returns a stretch for each, in order; the upward ones and the downward ones each begin at nought
 */
export function stackedParts(parts: readonly number[]): StackedPart[] {
  let above = 0;
  let below = 0;
  return parts.map((part) => {
    const from = part >= 0 ? above : below;
    const to = from + part;
    if (part >= 0) above = to;
    else below = to;
    return { from, to };
  });
}
