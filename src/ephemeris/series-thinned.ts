import type { PoissonSeries } from "./series-file.ts";

/**
 * Gives a series without its small terms, for use where it enters another sum with a small factor.
 *
 * @param limits by variable, the least amplitude that is kept
 * @param reach  greatest |T|: an amplitude counts with its power of it
 */
export function thinnedSeries(series: PoissonSeries, limits: readonly number[], reach: number): PoissonSeries {
  const { bases, degree, first, second } = series;
  const blocks = series.blocks.map((block) => {
    const { variable, power, places, coefficients } = block;
    const least = (limits[variable] ?? 0) / reach ** power;
    const kept = [...places.keys()].filter(
      (i) => Math.hypot(coefficients[2 * i] as number, coefficients[2 * i + 1] as number) >= least,
    );
    return {
      variable,
      power,
      places: kept.map((i) => places[i] as number),
      coefficients: Float64Array.from(kept.flatMap((i) => [...coefficients.subarray(2 * i, 2 * i + 2)])),
    };
  });
  const needed = new Uint8Array(bases + first.length);
  for (const { places } of blocks) for (const place of places) needed[place] = 1;
  for (let i = needed.length - 1; i >= bases; i--) {
    if (!needed[i]) continue;
    needed[first[i - bases] as number] = 1;
    needed[second[i - bases] as number] = 1;
  }
  const kept = [...needed.keys()].filter((i) => needed[i]);
  const renamed = new Uint16Array(needed.length);
  for (const [now, old] of kept.entries()) renamed[old] = now;
  const ownBases = kept.filter((i) => i < bases);
  const sums = kept.filter((i) => i >= bases).map((i) => i - bases);
  return {
    name: series.name,
    degree,
    bases: ownBases.length,
    rates: Float64Array.from(ownBases.flatMap((i) => [...series.rates.subarray(i * degree, (i + 1) * degree)])),
    first: Uint16Array.from(sums, (i) => renamed[first[i] as number] as number),
    second: Uint16Array.from(sums, (i) => renamed[second[i] as number] as number),
    signs: Float64Array.from(sums, (i) => series.signs[i] as number),
    blocks: blocks
      .filter(({ places }) => places.length > 0)
      .map((block) => ({ ...block, places: Uint16Array.from(block.places, (place) => renamed[place] as number) })),
  };
}
