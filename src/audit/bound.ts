/**
 * What a half-width that 95 % of passages keep is multiplied by to give one that 99.9 % keep.
 *
 * For errors after the normal law the factor is 3.29 / 1.96 = 1.68, after Laplace's law, whose tails are far heavier, ln 1000 / ln 20 =
 * 2.31. A right row must never be called wrong, and the half-widths rest on few comparisons, so 2.5 is taken: more than either.
 * It makes 2.5 s for the Earth and 5 s for the Moon today.
 */
export const LIST_BOUND = 2.5;
