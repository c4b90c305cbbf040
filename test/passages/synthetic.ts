import { type Pair, pairOf } from "../../src/bodies/pair.ts";
import type { Motion, Source, Span } from "../../src/ephemeris/source.ts";

/** A source whose distance is a given function of time along one axis; rates are given or left out. */
export function syntheticSource(
  id: string,
  spans: readonly Span[],
  distance: (t: number) => number,
  rate?: (t: number) => number,
  rangeRateKmS = 1e-9,
): Source {
  const motion: Motion = {
    givesVelocity: rate !== undefined,
    state(t, out) {
      out.fill(0);
      out[0] = distance(t);
      if (rate) out[3] = rate(t);
    },
  };
  return {
    id,
    kind: "track",
    title: id,
    spans: () => spans,
    motion: () => motion,
    accuracy: () => ({ rangeKm: 1, rangeRateKmS, basis: "assumed" }),
    checksum: async () => null,
    describe: () => id,
  };
}

/** A distance that swings as a cosine with the anomalistic month, late by `late` seconds. */
export function cosineSource(id: string, span: Span, late: number): Source {
  const n = (2 * Math.PI) / MONTH;
  return syntheticSource(
    id,
    [span],
    (t) => 384400 - 20000 * Math.cos(n * (t - late)),
    (t) => 20000 * n * Math.sin(n * (t - late)),
    20000 * n * n * Math.abs(late) + 1e-9, // the error that makes it late
  );
}

/** Seconds of the cosine's period. */
export const MONTH = 27.55 * 86400;

/** The pair under which the synthetic sources are searched. */
export const moon: Pair = pairOf("moon-earth");
