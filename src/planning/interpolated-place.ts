import type { Span } from "../ephemeris/source.ts";
import type { Place } from "./body-in-sky.ts";

/** Nodes that are kept, a power of two. */
const KEPT = 512;

/**
 * Gives a place by cubic interpolation between nodes at fixed times, which are worked out once: a night of altitudes costs a few
 * evaluations of the source.
 *
 * The error is at most 3/128 (ωh)⁴ of the orbit's size, with ω the body's angular speed and h the step of the nodes: h is chosen so that it
 * stays below 0.02″ in direction. Results do not depend on what was asked before.
 *
 * @param place   what is interpolated
 * @param step    seconds from node to node
 * @param covered where `place` may be evaluated; within two nodes of an end it is evaluated itself
 */
export function interpolatedPlace(place: Place, step: number, covered: readonly Span[]): Place {
  const nodes = new Float64Array(3 * KEPT);
  const indices = new Float64Array(KEPT).fill(Number.NaN);
  const at = new Float64Array(3);
  const node = (index: number): number => {
    const slot = ((index % KEPT) + KEPT) % KEPT;
    if (indices[slot] !== index) {
      place(index * step, at);
      nodes.set(at, 3 * slot);
      indices[slot] = index;
    }
    return 3 * slot;
  };
  return (tdb, out) => {
    const index = Math.floor(tdb / step);
    const [first, last] = [(index - 1) * step, (index + 2) * step];
    if (!covered.some((span) => span.from <= first && last <= span.to)) {
      place(tdb, out);
      return;
    }
    const s = tdb / step - index;
    const a = node(index - 1);
    const b = node(index);
    const c = node(index + 1);
    const d = node(index + 2);
    // Lagrange's weights for nodes at −1, 0, 1, 2
    const wa = (-s * (s - 1) * (s - 2)) / 6;
    const wb = ((s + 1) * (s - 1) * (s - 2)) / 2;
    const wc = (-(s + 1) * s * (s - 2)) / 2;
    const wd = ((s + 1) * s * (s - 1)) / 6;
    for (let i = 0; i < 3; i++) {
      out[i] =
        wa * (nodes[a + i] as number) +
        wb * (nodes[b + i] as number) +
        wc * (nodes[c + i] as number) +
        wd * (nodes[d + i] as number);
    }
  };
}
